import type { ColouringResult, Explanation } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import { inkDistances } from '$lib/engines/palettes';
import { deskColouring } from '../colouring-on-desk.svelte';
import type { WayOutcome } from './way';

interface Shown {
	/** the draft changed as the way says */
	document: Draft;
	/** what is on the sheet now; -1 for none */
	before: ArrayLike<number>;
	/** the borders that count */
	borders: { a: ArrayLike<number>; b: ArrayLike<number> };
	nameOf: (region: number) => string;
	sentence: (result: ColouringResult, document: Draft) => string;
}

/** What the engine's answer for a way means to those who compare ways. */
export function outcomeOf(result: ColouringResult, shown: Shown): WayOutcome {
	if (result.status === 'undecided')
		return { state: 'fails', words: 'No colouring was found within this effort.' };
	if (result.status === 'impossible')
		return { state: 'fails', words: stillCollides(result.explanation, shown.nameOf) };
	const answer = deskColouring(result, shown.sentence(result, shown.document));
	if (answer.status !== 'coloured') throw new Error('a colouring is told as none');
	const inks = result.colouring;
	const { before, borders } = shown;
	const hexes = shown.document.palette.inks.map(({ hex }) => hex);
	return {
		...{ state: 'works', answer, inks, inksUsed: new Set(inks).size },
		changed: [...inks.keys()].filter((r) => before[r] >= 0 && before[r] !== inks[r]),
		least: leastDifference(inks, hexes, borders),
	};
}

function stillCollides({ locks }: Explanation, nameOf: (region: number) => string): string {
	if (locks.length === 0) return 'Not enough: the rules still collide.';
	if (locks.length > 3) return `Not enough: ${locks.length} locks still collide.`;
	const names = locks.map(nameOf);
	const [last, ...others] = names.reverse();
	if (others.length === 0) return `Not enough: the lock of ${last} still collides.`;
	return `Not enough: the locks of ${others.reverse().join(', ')} and ${last} still collide.`;
}

/** Of the closest two inks that touch, for whoever sees them least apart; null where none touch. */
export function leastDifference(
	inks: ArrayLike<number>,
	hexes: readonly string[],
	{ a, b }: Shown['borders'],
): number | null {
	const distances = inkDistances(hexes);
	let least = Infinity;
	for (let i = 0; i < a.length; i++) {
		least = Math.min(least, distances[inks[a[i]]]?.[inks[b[i]]] ?? Infinity);
	}
	return least === Infinity ? null : least;
}
