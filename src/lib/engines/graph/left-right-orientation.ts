import type { RegionGraph } from './region-graph.ts';

/**
 * The first half of the left-right planarity test: a depth-first forest, for every oriented edge how
 * low its return edges reach, and the order in which each vertex takes its edges in the second half.
 * An edge is named by its place in `targets`, at the end it starts from. Iterative.
 *
 * Source: U. Brandes, The left-right planarity test, 2009; H. de Fraysseix, P. Ossona de Mendez,
 * P. Rosenstiehl, Trémaux trees and planarity, Int. J. Found. Comput. Sci. 17 (2006).
 */
export interface Orientation {
	roots: number[];
	height: Int32Array;
	/** the tree edge into each vertex, -1 for a root */
	parentEdge: Int32Array;
	lowpoint: Int32Array;
	/** oriented edges by start, in the order of their nesting: rows of `nestingStart` */
	nested: Int32Array;
	nestingStart: Int32Array;
}

export function orient(graph: RegionGraph): Orientation {
	return new Orienting(graph).run();
}

class Orienting {
	private readonly roots: number[] = [];
	private readonly height: Int32Array;
	private readonly parentEdge: Int32Array;
	private readonly parent: Int32Array;
	private readonly lowpoint: Int32Array;
	private readonly second: Int32Array;
	/** where each vertex stands in its row */
	private readonly cursor: Uint32Array;
	/** nesting depth, -1 for an edge oriented the other way */
	private readonly depth: Int32Array;

	constructor(private readonly graph: RegionGraph) {
		const edges = graph.targets.length;
		this.height = new Int32Array(graph.count).fill(-1);
		this.parentEdge = new Int32Array(graph.count).fill(-1);
		this.parent = new Int32Array(graph.count).fill(-1);
		this.lowpoint = new Int32Array(edges);
		this.second = new Int32Array(edges);
		this.cursor = new Uint32Array(graph.count);
		this.depth = new Int32Array(edges).fill(-1);
	}

	run(): Orientation {
		for (let root = 0; root < this.graph.count; root++) {
			if (this.height[root] >= 0) continue;
			this.height[root] = 0;
			this.roots.push(root);
			this.explore(root);
		}
		const { roots, height, parentEdge, lowpoint } = this;
		return { roots, height, parentEdge, lowpoint, ...this.nesting() };
	}

	private explore(root: number): void {
		const { offsets, targets } = this.graph;
		const { height, parent, lowpoint, second } = this;
		const next = this.cursor;
		let v = root;
		next[v] = offsets[v];
		while (v >= 0) {
			if (next[v] === offsets[v + 1]) {
				const e = this.parentEdge[v];
				v = parent[v];
				if (v >= 0) this.settle(v, e);
				continue;
			}
			const e = next[v]++;
			const w = targets[e];
			if (height[w] >= 0 && (w === parent[v] || height[w] > height[v])) continue;
			lowpoint[e] = second[e] = height[v];
			if (height[w] >= 0) {
				lowpoint[e] = height[w];
				this.settle(v, e);
				continue;
			}
			height[w] = height[v] + 1;
			this.parentEdge[w] = e;
			parent[w] = v;
			next[w] = offsets[w];
			v = w;
		}
	}

	/** Edge e from v is done: its depth, and what it means for the tree edge into v. */
	private settle(v: number, e: number): void {
		const { lowpoint, second } = this;
		this.depth[e] = 2 * lowpoint[e] + (second[e] < this.height[v] ? 1 : 0);
		const into = this.parentEdge[v];
		if (into < 0) return;
		if (lowpoint[e] < lowpoint[into]) {
			second[into] = Math.min(lowpoint[into], second[e]);
			lowpoint[into] = lowpoint[e];
		} else if (lowpoint[e] > lowpoint[into]) {
			second[into] = Math.min(second[into], lowpoint[e]);
		} else {
			second[into] = Math.min(second[into], second[e]);
		}
	}

	/** Sorts all oriented edges by depth at once, then deals them out to the rows of their starts. */
	private nesting(): { nested: Int32Array; nestingStart: Int32Array } {
		const { count, offsets } = this.graph;
		const { depth } = this;
		const byDepth = sortedByDepth(depth, 2 * count + 2);
		const startOf = new Int32Array(depth.length);
		const nestingStart = new Int32Array(count + 1);
		for (let v = 0; v < count; v++) {
			nestingStart[v + 1] = nestingStart[v];
			for (let e = offsets[v]; e < offsets[v + 1]; e++) {
				startOf[e] = v;
				if (depth[e] >= 0) nestingStart[v + 1]++;
			}
		}
		const fill = nestingStart.slice();
		const nested = new Int32Array(byDepth.length);
		for (const e of byDepth) nested[fill[startOf[e]]++] = e;
		return { nested, nestingStart };
	}
}

/** The edges of depth 0 and more, ascending, by counting. */
function sortedByDepth(depth: Int32Array, most: number): Int32Array {
	const start = new Int32Array(most + 1);
	for (const d of depth) if (d >= 0) start[d + 1]++;
	for (let d = 0; d < most; d++) start[d + 1] += start[d];
	const sorted = new Int32Array(start[most]);
	for (let e = 0; e < depth.length; e++) if (depth[e] >= 0) sorted[start[depth[e]]++] = e;
	return sorted;
}
