import type { RegionGraph } from './region-graph.ts';

/** The graph on the given distinct vertices alone; vertex i of it is `vertices[i]`. */
export function inducedSubgraph(graph: RegionGraph, vertices: ArrayLike<number>): RegionGraph {
	const count = vertices.length;
	const local = new Map<number, number>();
	for (let i = 0; i < count; i++) local.set(vertices[i], i);
	const offsets = new Uint32Array(count + 1);
	const targets: number[] = [];
	for (let i = 0; i < count; i++) {
		const row: number[] = [];
		for (let e = graph.offsets[vertices[i]]; e < graph.offsets[vertices[i] + 1]; e++) {
			const w = local.get(graph.targets[e]);
			if (w !== undefined) row.push(w);
		}
		row.sort((p, q) => p - q);
		for (const w of row) targets.push(w);
		offsets[i + 1] = targets.length;
	}
	return { count, offsets, targets: Uint32Array.from(targets) };
}
