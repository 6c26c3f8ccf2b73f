import type { Desk } from './desk.svelte';

/** The region that people name by its key, or by its name where that is the only one so called; else null. */
export function regionCalled({ sheet, numbers }: Desk, text: string): number | null {
	const byKey = numbers.get(text.trim());
	if (byKey !== undefined) return byKey;
	const wanted = text.trim().toLocaleLowerCase();
	const found = sheet.regions.name.flatMap((each, region) =>
		each.toLocaleLowerCase() === wanted ? [region] : [],
	);
	return wanted && found.length === 1 ? found[0] : null;
}
