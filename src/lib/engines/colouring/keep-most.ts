import { Sat } from '../solver/sat.ts';
import { totalizer } from './totalizer.ts';

export type Kept = { status: 'optimal'; cost: number } | { status: 'open'; lowerBound: number };

/** Conflicts for one try to leave a literal out of a core. */
const trimConflicts = 200;

/**
 * Breaks as little weight of the wishes as the clauses in `sat` allow; the assignment is then in `sat`.
 * 'open' when the conflicts ran out: breaking less than `lowerBound` is impossible all the same.
 *
 * Source: core-guided search with soft cardinality constraints: B. Andres et al., Unsatisfiability-based
 * optimization in clasp, ICLP 2012; A. Morgado, C. Dodaro, J. Marques-Silva, CP 2014.
 */
export function keepMost(
	sat: Sat,
	wishes: ReadonlyMap<number, number>,
	budget: { conflicts: number; cancelled?: () => boolean },
): Kept {
	const weights = new Map(wishes);
	const next = new Map<number, number>();
	const last = sat.conflicts + budget.conflicts;
	let lowerBound = 0;
	for (;;) {
		const conflicts = last - sat.conflicts;
		if (conflicts <= 0) return { status: 'open', lowerBound };
		const answer = sat.solve([...weights.keys()], { conflicts, cancelled: budget.cancelled });
		if (answer === 'sat') return { status: 'optimal', cost: lowerBound };
		const core = answer === 'unsat' ? trimmed(sat, sat.core()) : [];
		if (core.length === 0) return { status: 'open', lowerBound };
		lowerBound += relax(sat, core, weights, next);
	}
}

/** Leaves out what the core can spare. */
function trimmed(sat: Sat, core: number[]): number[] {
	for (let i = 0; i < core.length && core.length > 1;) {
		const rest = core.filter((_, j) => j !== i);
		if (sat.solve(rest, { conflicts: trimConflicts }) !== 'unsat') i++;
		else core = sat.core();
	}
	return core;
}

/** Takes the least weight off a core and allows one of its wishes to be broken; that weight. */
function relax(
	sat: Sat,
	core: number[],
	weights: Map<number, number>,
	next: Map<number, number>,
): number {
	const least = Math.min(...core.map((literal) => weights.get(literal) as number));
	const add = (literal: number) => weights.set(literal, (weights.get(literal) ?? 0) + least);
	for (const literal of core) {
		const left = (weights.get(literal) as number) - least;
		if (left > 0) weights.set(literal, left);
		else weights.delete(literal);
		const after = next.get(literal);
		if (after !== undefined) add(after);
	}
	if (core.length > 1) {
		const broken = totalizer(
			sat,
			core.map((literal) => -literal),
		);
		for (let i = 1; i + 1 < broken.length; i++) next.set(-broken[i], -broken[i + 1]);
		add(-broken[1]);
	}
	return least;
}
