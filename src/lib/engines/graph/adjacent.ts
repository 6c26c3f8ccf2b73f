import type { RegionGraph } from './region-graph.ts';

/** Whether two vertices are neighbours: a binary search in the shorter row. */
export function adjacent(graph: RegionGraph, u: number, v: number): boolean {
	const { offsets, targets } = graph;
	if (offsets[u + 1] - offsets[u] > offsets[v + 1] - offsets[v]) return adjacent(graph, v, u);
	let low = offsets[u];
	let high = offsets[u + 1];
	while (low < high) {
		const middle = (low + high) >> 1;
		if (targets[middle] < v) low = middle + 1;
		else high = middle;
	}
	return low < offsets[u + 1] && targets[low] === v;
}
