import type { ColouringProblem } from '../problem.ts';
import type { Pair } from './proof-form.ts';

/** What a refutation looks at: a part of a problem without reserved inks (see `expandReserved`). */
export interface Part {
	problem: ColouringProblem;
	regions: readonly number[];
	/** the inks written down, in the order of their variables */
	inks: readonly number[];
	/** regions whose locks count */
	locks: ReadonlySet<number>;
	/** the pairs that must differ and are written down; all among the regions when absent */
	borders?: readonly Pair[];
}

/** The pairs among the regions that must differ, each once, smaller number first. */
export function pairsApart({ borders, apart }: ColouringProblem, regions: readonly number[]) {
	const inside = new Set(regions);
	const found = new Map<string, Pair>();
	const note = (a: number, b: number) => {
		if (!inside.has(a) || !inside.has(b)) return;
		const pair = [Math.min(a, b), Math.max(a, b)] as const;
		found.set(pair.join(' '), pair);
	};
	for (let e = 0; e < borders.a.length; e++) note(borders.a[e], borders.b[e]);
	for (const [a, b] of apart ?? []) note(a, b);
	return [...found.values()].sort((p, q) => p[0] - q[0] || p[1] - q[1]);
}

/** The clauses of a part, numbered as a proof file says. */
export function partClauses(part: Part): number[][] {
	const { problem, regions, inks } = part;
	const place = new Map(regions.map((region, i) => [region, i]));
	const variable = (i: number, c: number) => i * inks.length + c + 1;
	const each = inks.map((_, c) => c);
	const clauses = regions.map((_, i) => each.map((c) => variable(i, c)));
	for (const [a, b] of part.borders ?? pairsApart(problem, regions)) {
		const [i, j] = [place.get(a) as number, place.get(b) as number];
		for (const c of each) clauses.push([-variable(i, c), -variable(j, c)]);
	}
	for (const [a, b] of problem.alike ?? []) {
		const [i, j] = [place.get(a), place.get(b)];
		if (i === undefined || j === undefined || i === j) continue;
		for (const c of each) {
			clauses.push([-variable(i, c), variable(j, c)], [variable(i, c), -variable(j, c)]);
		}
	}
	return [...clauses, ...inkClauses(part, place, variable)];
}

/** What is said of single regions: forbidden inks, and locks that leave no other. */
function inkClauses(
	{ problem, inks, locks }: Part,
	place: ReadonlyMap<number, number>,
	variable: (i: number, c: number) => number,
): number[][] {
	const clauses: number[][] = [];
	for (const [region, ink] of problem.forbidden ?? []) {
		const i = place.get(region);
		const c = inks.indexOf(ink);
		if (i !== undefined && c >= 0) clauses.push([-variable(i, c)]);
	}
	for (const [region, i] of place) {
		if (!locks.has(region)) continue;
		const lock = problem.locks?.[region];
		inks.forEach((ink, c) => {
			if (ink !== lock) clauses.push([-variable(i, c)]);
		});
	}
	return clauses;
}

/**
 * The inks to write down for a part when `limit` inks are allowed: all of a few; of many, those that a
 * rule names here and of the others, which are alike, as many as there are regions.
 */
export function inksToWrite(
	{ problem, regions, locks }: Omit<Part, 'inks'>,
	limit: number | 'any',
): number[] {
	const most = limit === 'any' ? Infinity : limit;
	const inside = new Set(regions);
	const named = new Set<number>();
	for (const region of regions) {
		if (locks.has(region)) named.add((problem.locks as Int32Array)[region]);
	}
	for (const [region, ink] of problem.forbidden ?? []) if (inside.has(region)) named.add(ink);
	const inks = [...named].filter((ink) => ink < most);
	for (let ink = 0, others = 0; ink < most && others < regions.length; ink++) {
		if (named.has(ink)) continue;
		inks.push(ink);
		others++;
	}
	return inks.sort((a, b) => a - b);
}
