import type { RegionGraph } from './region-graph.ts';

/** The connected components, numbered by their lowest vertex: `of[v]` is the component of v. */
export function components(graph: RegionGraph): { count: number; of: Uint32Array } {
	const { offsets, targets } = graph;
	const none = 0xffffffff;
	const of = new Uint32Array(graph.count).fill(none);
	const stack: number[] = [];
	let count = 0;
	for (let root = 0; root < graph.count; root++) {
		if (of[root] !== none) continue;
		of[root] = count;
		stack.push(root);
		while (stack.length > 0) {
			const v = stack.pop() as number;
			for (let i = offsets[v]; i < offsets[v + 1]; i++) {
				const w = targets[i];
				if (of[w] !== none) continue;
				of[w] = count;
				stack.push(w);
			}
		}
		count++;
	}
	return { count, of };
}
