import { roundedLimits } from '$lib/engines/measures/classing/rounded-limits';
import { mostClasses, type Theme } from '$lib/engines/measures/theme';

/** Limits as people move them, each move a new list; the old one is never touched. */

/** A theme whose limits are set by hand: ascending, none twice, one class at least on both sides. */
export function withHandLimits(theme: Theme, breaks: readonly number[]): Theme {
	const limits = [...new Set(breaks.filter(Number.isFinite))].sort((a, b) => a - b);
	const kept = limits.slice(0, mostClasses - 1);
	return {
		...{ ...theme, method: 'by-hand', breaks: kept },
		classes: Math.max(2, kept.length + 1),
	};
}

/** One limit moved to a figure, but never onto or past the limits beside it. */
export function moved(breaks: readonly number[], place: number, to: number): number[] {
	const inside = to > (breaks[place - 1] ?? -Infinity) && to < (breaks[place + 1] ?? Infinity);
	return inside ? breaks.map((limit, i) => (i === place ? to : limit)) : [...breaks];
}

/**
 * One limit moved by so many distinct figures, up or down, to the roundest place between two of them. In:
 * figures in any order. It stays where it is when there is none that way before the next limit.
 */
export function stepped(
	breaks: readonly number[],
	place: number,
	by: number,
	figures: readonly number[],
): number[] {
	const distinct = [...new Set(figures)].sort((a, b) => a - b);
	const below = distinct.filter((figure) => figure <= breaks[place]).length;
	const low = breaks[place - 1] ?? -Infinity;
	const high = breaks[place + 1] ?? Infinity;
	const way = Math.sign(by);
	for (let step = by; step !== 0; step -= way) {
		const figure = distinct[below + step - 1];
		if (figure === undefined || below + step >= distinct.length) continue;
		const next = Math.min(distinct[below + step], high);
		const middle = figure + (next - figure) / 2;
		const [to] = roundedLimits([middle], [figure, next]);
		if (to > low && to < high) return moved(breaks, place, to);
	}
	return [...breaks];
}

/** Another limit in the class with most figures, where as many lie below it as above. */
export function parted(breaks: readonly number[], figures: readonly number[]): number[] {
	const edges = [-Infinity, ...breaks, Infinity];
	const groups = edges.slice(1).map((to, i) => {
		const inside = figures.filter((figure) => figure > edges[i] && figure <= to);
		return [...new Set(inside)].sort((a, b) => a - b);
	});
	const largest = groups.reduce((best, group) => (group.length > best.length ? group : best), []);
	if (largest.length < 2 || breaks.length + 1 >= mostClasses) return [...breaks];
	const half = (largest.length - 1) >> 1;
	const [limit] = roundedLimits([(largest[half] + largest[half + 1]) / 2], largest);
	return [...breaks, limit].sort((a, b) => a - b);
}
