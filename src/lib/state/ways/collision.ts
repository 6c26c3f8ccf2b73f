import type { Explanation } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { Desk } from '../desk.svelte';
import { collisionEvidence, type Evidence } from '../evidence';
import { colouringParts } from '../problem-of-draft';

/** A collision as the sheet shows it, every lock with the ink it asks for. */
export function collisionOnSheet(
	{ sheet, draft, nameOf }: Pick<Desk, 'sheet' | 'draft' | 'nameOf'>,
	explanation: Explanation,
): Evidence {
	const { locks, palette } = draft.document;
	return collisionEvidence(explanation, (region) => {
		const ink = locks[sheet.regions.key[region]]?.ink ?? 0;
		const text = `${ink + 1} ${palette.inks[ink]?.name ?? ''}`.trimEnd();
		return { name: nameOf(region), text };
	});
}

/** Names a collision and all that ways out of it depend on; who signed a lock, and when, is no part of it. */
export const collisionName = (explanation: Explanation, draft: Draft): string =>
	JSON.stringify([explanation, colouringParts(draft)], (key, value: unknown) =>
		key === 'by' || key === 'at' ? undefined : value,
	);
