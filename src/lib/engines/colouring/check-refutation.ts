import { checkDrup } from '../solver/drup.ts';
import { holdersOfReserved } from './check-reserved.ts';
import type { ColouringProblem, ColouringResult, Proof } from './problem.ts';

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
	const pairs = pairsToDiffer(problem, proof);
	if (!pairs) return ['The refutation leans on a border that is not there.'];
	const numbered = new Map(regions.map((region, i) => [region, i * inks + 1]));
	const clauses: number[][] = [];
	for (const first of numbered.values()) clauses.push(range(inks).map((c) => first + c));
	for (const c of range(inks)) clauses.push(...clausesOfInk(problem, pairs, numbered, c));
	clauses.push(...clausesOfLocks(problem, numbered, inks));
	clauses.push(...clausesOfReserved(problem, numbered, inks));
	const { valid, reason } = checkDrup(clauses, refutation.clauses);
	return valid ? [] : [`The refutation fails: ${reason}.`];
}

const range = (n: number) => [...Array(n).keys()];

/** The borders the proof names, or all where it names none; null when one of them is no border. */
function pairsToDiffer(problem: ColouringProblem, { borders, regions }: Proof) {
	const { a, b } = problem.borders;
	const inside = new Set(regions);
	const real = [...Array.from(a, (p, i) => [p, b[i]] as const), ...(problem.apart ?? [])].filter(
		([p, q]) => inside.has(p) && inside.has(q),
	);
	if (!borders) return real;
	const name = (p: number, q: number) => `${Math.min(p, q)} ${Math.max(p, q)}`;
	const names = new Set(real.map(([p, q]) => name(p, q)));
	return borders.every(([p, q]) => names.has(name(p, q))) ? borders : null;
}

/** Everything that is said about one ink. */
function clausesOfInk(
	problem: ColouringProblem,
	pairs: readonly (readonly [number, number])[],
	numbered: Map<number, number>,
	c: number,
) {
	const clauses: number[][] = [];
	const both = (p: number, q: number) => {
		const [x, y] = [numbered.get(p), numbered.get(q)];
		return x === undefined || y === undefined ? null : ([x + c, y + c] as const);
	};
	for (const [p, q] of pairs) {
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
