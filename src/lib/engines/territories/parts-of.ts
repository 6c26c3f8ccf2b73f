import type { RegionGraph } from '../graph/region-graph.ts';

/** The connected parts of every territory under an assignment. */
export interface TerritoryParts {
	/** part of each unit, numbered by their lowest unit */
	of: Int32Array;
	/** territory of each part, -1 for units without one */
	territory: number[];
	/** units of each part, ascending */
	units: number[][];
}

/** Splits every territory into its connected parts. Linear time. */
export function partsOf(graph: RegionGraph, assignment: Int32Array): TerritoryParts {
	const { offsets, targets, count } = graph;
	const of = new Int32Array(count).fill(-1);
	const territory: number[] = [];
	const units: number[][] = [];
	for (let root = 0; root < count; root++) {
		if (of[root] >= 0) continue;
		const part = units.length;
		const members = [root];
		of[root] = part;
		for (let head = 0; head < members.length; head++) {
			const v = members[head];
			for (let i = offsets[v]; i < offsets[v + 1]; i++) {
				const w = targets[i];
				if (of[w] >= 0 || assignment[w] !== assignment[root]) continue;
				of[w] = part;
				members.push(w);
			}
		}
		territory.push(assignment[root]);
		units.push(members.sort((a, b) => a - b));
	}
	return { of, territory, units };
}
