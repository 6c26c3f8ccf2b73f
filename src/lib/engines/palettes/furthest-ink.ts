import { housePalettes } from './house.ts';
import { inkDistances } from './ink-distances.ts';
import type { Ink } from './palette.ts';

/**
 * Of the house's inks, the one that stands furthest from all the given ones for whoever tells it least from
 * one of them. The first of the house where none is given. Throws a RangeError on text that is no colour.
 */
export function furthestInk(hexes: readonly string[]): Ink {
	const offered = housePalettes.flatMap(({ inks }) => inks);
	if (hexes.length === 0) return offered[0];
	const distances = inkDistances([...offered.map(({ hex }) => hex), ...hexes]);
	const nearest = (one: number) => Math.min(...distances[one].slice(offered.length));
	return offered.reduce((best, ink, number) => {
		const before = offered.indexOf(best);
		return nearest(number) > nearest(before) ? ink : best;
	});
}
