import { checkDrup } from '../solver/drup.ts';
import { holdersOfReserved } from './check-reserved.ts';
import type { ColouringProblem, ColouringResult } from './problem.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/**
 * Replays a refutation on clauses written down afresh from the problem: every region named has one of
 * the inks, and every rule of the problem among those regions holds.
 */
export function checkRefutation(
	problem: ColouringProblem,
	{ proof, inksUsed }: Coloured,
): string[] {
	const { refutation, regions } = proof;
	if (!refutation) return ['The refutation has no clauses.'];
	const { inks } = refutation;
	if (inks !== inksUsed - 1) return [`The refutation is about ${inks} inks, not ${inksUsed - 1}.`];
	const numbered = new Map(regions.map((region, i) => [region, i * inks + 1]));
	const clauses: number[][] = [];
	for (const first of numbered.values()) clauses.push(range(inks).map((c) => first + c));
	for (const c of range(inks)) clauses.push(...clausesOfInk(problem, numbered, c));
	clauses.push(...clausesOfLocks(problem, numbered, inks));
	clauses.push(...clausesOfReserved(problem, numbered, inks));
	const { valid, reason } = checkDrup(clauses, refutation.clauses);
	return valid ? [] : [`The refutation fails: ${reason}.`];
}

const range = (n: number) => [...Array(n).keys()];

/** Everything that is said about one ink. */
function clausesOfInk(problem: ColouringProblem, numbered: Map<number, number>, c: number) {
	const clauses: number[][] = [];
	const both = (p: number, q: number) => {
		const [x, y] = [numbered.get(p), numbered.get(q)];
		return x === undefined || y === undefined ? null : ([x + c, y + c] as const);
	};
	const { a, b } = problem.borders;
	for (let i = 0; i < a.length; i++) {
		const pair = both(a[i], b[i]);
		if (pair) clauses.push([-pair[0], -pair[1]]);
	}
	for (const [p, q] of problem.apart ?? []) {
		const pair = both(p, q);
		if (pair) clauses.push([-pair[0], -pair[1]]);
	}
	for (const [p, q] of problem.alike ?? []) {
		const pair = both(p, q);
		if (pair) clauses.push([-pair[0], pair[1]], [pair[0], -pair[1]]);
	}
	for (const [region, ink] of problem.forbidden ?? []) {
		const first = numbered.get(region);
		if (first !== undefined && ink === c) clauses.push([-(first + c)]);
	}
	return clauses;
}

function clausesOfLocks({ locks }: ColouringProblem, numbered: Map<number, number>, inks: number) {
	const clauses: number[][] = [];
	for (const [region, first] of locks ? numbered : []) {
		const lock = (locks as Int32Array)[region];
		if (lock < 0) continue;
		for (const c of range(inks)) if (c !== lock) clauses.push([-(first + c)]);
	}
	return clauses;
}

function clausesOfReserved(problem: ColouringProblem, numbered: Map<number, number>, inks: number) {
	const clauses: number[][] = [];
	for (const [ink, holders] of holdersOfReserved(problem)) {
		if (ink >= inks) continue;
		for (const [region, first] of numbered)
			if (!holders.has(region)) clauses.push([-(first + ink)]);
	}
	return clauses;
}
