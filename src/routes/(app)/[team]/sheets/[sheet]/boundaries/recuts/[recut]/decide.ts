import type { RecutDecision, RecutGroup } from '$lib/schemas/recut';
import type { LoadedSides } from '$lib/state/recut-drawer';

/** The decisions with one more; a region decided before is decided anew. */
export const decided = (
	decisions: readonly RecutDecision[],
	decision: RecutDecision,
): RecutDecision[] => [
	...decisions.filter(
		({ before, after }) =>
			before !== decision.before || (before === null && after.join() !== decision.after.join()),
	),
	decision,
];

/**
 * The key of the region that was typed: a key as it stands, or a name that only one region has; null where
 * there is none. Without the list of regions what was typed is taken as a key, and the server judges.
 */
export function keyTyped(typed: string, side: LoadedSides['before'] | null): string | null {
	const text = typed.trim();
	if (!text) return null;
	if (!side || side.keys.includes(text)) return text;
	const wanted = text.toLocaleLowerCase();
	const found = side.keys.filter(
		(key, i) => key.toLocaleLowerCase() === wanted || side.names[i].toLocaleLowerCase() === wanted,
	);
	return found.length === 1 ? found[0] : null;
}

/** What a group says now about one of its old regions. */
export const standing = (
	group: RecutGroup,
	before: string,
	decisions: readonly RecutDecision[],
): string[] =>
	decisions.find((one) => one.before === before)?.after ?? group.after.map(({ key }) => key);
