import type { RegionGraph } from '../graph/region-graph.ts';

export type TwoColouring =
	{ sides: Int32Array; oddCycle: null } | { sides: null; oddCycle: number[] };

/**
 * The two sides of a bipartite graph (the lowest vertex of each component on side 0), or an odd cycle
 * in ring order. Breadth first, linear time; the cycle joins two tree paths by the offending edge.
 */
export function twoColouring(graph: RegionGraph): TwoColouring {
	const { count, offsets, targets } = graph;
	const sides = new Int32Array(count).fill(-1);
	const parent = new Int32Array(count).fill(-1);
	const queue = new Uint32Array(count);
	for (let root = 0; root < count; root++) {
		if (sides[root] >= 0) continue;
		let tail = 0;
		sides[root] = 0;
		queue[tail++] = root;
		for (let head = 0; head < tail; head++) {
			const v = queue[head];
			for (let i = offsets[v]; i < offsets[v + 1]; i++) {
				const w = targets[i];
				if (sides[w] === sides[v]) return { sides: null, oddCycle: closeCycle(parent, v, w) };
				if (sides[w] >= 0) continue;
				sides[w] = 1 - sides[v];
				parent[w] = v;
				queue[tail++] = w;
			}
		}
	}
	return { sides, oddCycle: null };
}

/** Both vertices lie in the same layer, so their tree paths meet after equally many steps. */
function closeCycle(parent: Int32Array, v: number, w: number): number[] {
	const left = [v];
	const right = [w];
	while (v !== w) {
		v = parent[v];
		w = parent[w];
		left.push(v);
		right.push(w);
	}
	right.pop();
	return [...left, ...right.reverse()];
}
