import type { DeskFinding } from '$lib/schemas/desk';
import type { Desk } from '$lib/state/desk.svelte';
import { evidence } from '$lib/state/evidence';

/** so many regions are outlined at most */
const most = 200;

/** Shows on the sheet where a finding is and which regions it speaks of. */
export function pointOut(desk: Desk, finding: DeskFinding): void {
	const index = desk.sheet.findings.indexOf(finding);
	desk.view = 'sheet';
	desk.evidence = evidence({
		words: finding.message,
		light: finding.regions.slice(0, most).flatMap((key) => desk.numbers.get(key) ?? []),
		finding: finding.at ? index : null,
	});
}
