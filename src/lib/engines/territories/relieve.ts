import type { Impossible, Relief, TerritoryProblem } from './problem.ts';

/**
 * The problem after a relief; null for a split, which needs new boundaries. The given problem is
 * untouched.
 */
export function relieve(problem: TerritoryProblem, relief: Relief): TerritoryProblem | null {
	if (relief.kind === 'split') return null;
	if (relief.kind === 'unlock') {
		const locks = problem.locks?.slice();
		locks?.fill(-1, relief.unit, relief.unit + 1);
		return { ...problem, locks };
	}
	if (relief.kind === 'unfreeze') {
		const territories = problem.territories.map((territory, t) =>
			t === relief.territory ? { ...territory, frozen: false } : territory,
		);
		return { ...problem, territories };
	}
	const measures = problem.measures.map((measure, m) =>
		m === relief.measure ? { ...measure, tolerance: relief.value } : measure,
	);
	return { ...problem, measures };
}

/** The reliefs after which `find` no longer answers with the same witness. At most 12 are tried. */
export function thatHelp(
	problem: TerritoryProblem,
	fault: Impossible,
	reliefs: Relief[],
	find: (problem: TerritoryProblem) => Impossible | null,
): Relief[] {
	const seen = new Set<string>();
	const witness = JSON.stringify(fault.witness);
	return reliefs.slice(0, 12).filter((relief) => {
		const key = JSON.stringify(relief);
		const eased = relieve(problem, relief);
		if (!eased || seen.has(key)) return false;
		seen.add(key);
		const again = find(eased);
		return !again || JSON.stringify(again.witness) !== witness;
	});
}
