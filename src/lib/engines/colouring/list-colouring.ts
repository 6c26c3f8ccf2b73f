import type { RegionGraph } from '../graph/region-graph.ts';
import { Sat, type Budget } from '../solver/sat.ts';

/** Which inks vertex i of a part may have, and what it had before (-1 for nothing). */
export interface Lists {
	inks: number;
	allowed: (i: number, ink: number) => boolean;
	hint: (i: number) => number;
}

/**
 * Colours a graph from lists by satisfiability: variable i * inks + c + 1 says that vertex i has ink c.
 * The ink of every vertex; 'unsat' when none exists; 'unknown' when the budget ran out.
 */
export function listColouring(
	graph: RegionGraph,
	lists: Lists,
	budget: Budget & { seed?: number },
): Int32Array | 'unsat' | 'unknown' {
	const sat = new Sat({ seed: budget.seed });
	if (!addLists(sat, graph.count, lists)) return 'unsat';
	if (!addBorders(sat, graph, lists)) return 'unsat';
	const answer = sat.solve([], budget);
	return answer === 'sat' ? readInks(sat, graph.count, lists.inks) : answer;
}

/** Variables and one clause a vertex: it has one of its inks at least. */
export function addLists(sat: Sat, count: number, { inks, allowed, hint }: Lists): boolean {
	for (let i = 0; i < count; i++) {
		const choices: number[] = [];
		for (let c = 0; c < inks; c++) {
			const variable = sat.newVariable();
			if (allowed(i, c)) choices.push(variable);
			else if (!sat.addClause([-variable])) return false;
		}
		const wished = hint(i);
		if (wished >= 0 && wished < inks) sat.setPhase(i * inks + wished + 1, true);
		if (!sat.addClause(choices)) return false;
	}
	return true;
}

/** One clause a border and ink that both ends may have. */
export function addBorders(sat: Sat, graph: RegionGraph, { inks, allowed }: Lists): boolean {
	const { offsets, targets } = graph;
	for (let i = 0; i < graph.count; i++) {
		for (let e = offsets[i]; e < offsets[i + 1]; e++) {
			const j = targets[e];
			if (j < i) continue;
			for (let c = 0; c < inks; c++) {
				if (!allowed(i, c) || !allowed(j, c)) continue;
				if (!sat.addClause([-(i * inks + c + 1), -(j * inks + c + 1)])) return false;
			}
		}
	}
	return true;
}

/** The ink of each vertex: the lowest of those set true, which no neighbour has. */
export function readInks(sat: Sat, count: number, inks: number): Int32Array {
	const ink = new Int32Array(count).fill(-1);
	for (let i = 0; i < count; i++) {
		for (let c = inks - 1; c >= 0; c--) if (sat.value(i * inks + c + 1)) ink[i] = c;
	}
	return ink;
}
