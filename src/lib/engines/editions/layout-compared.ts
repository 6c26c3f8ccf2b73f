import { wholeDraft, type Draft } from './draft.ts';

/**
 * The layout of a draft as members that can be compared one by one: those of its parts are named after
 * the part (`collar legendTitle`). A draft written before a part could be said has it as it was then.
 */
export function layoutCompared(stored: Draft): Record<string, unknown> {
	const { frame, lettering, lines, collar, ...own } = wholeDraft(stored).layout;
	const parts = { frame, lettering, lines, collar };
	return Object.fromEntries([
		...Object.entries(own),
		...Object.entries(parts).flatMap(([part, members]) =>
			Object.entries(members).map(([name, value]) => [`${part} ${name}`, value] as const),
		),
	]);
}
