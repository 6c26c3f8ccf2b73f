import type { RegionGraph } from './region-graph.ts';

/**
 * Every vertex once, component after component, each in breadth-first order from its lowest vertex.
 * Renumbering by it puts neighbours close together in memory.
 */
export function breadthFirstOrder(graph: RegionGraph): Uint32Array {
	const { count, offsets, targets } = graph;
	const order = new Uint32Array(count);
	const seen = new Uint8Array(count);
	let tail = 0;
	let head = 0;
	for (let root = 0; root < count; root++) {
		if (seen[root]) continue;
		seen[root] = 1;
		order[tail++] = root;
		while (head < tail) {
			const v = order[head++];
			for (let i = offsets[v]; i < offsets[v + 1]; i++) {
				const w = targets[i];
				if (seen[w]) continue;
				seen[w] = 1;
				order[tail++] = w;
			}
		}
	}
	return order;
}
