import type { RegionGraph } from '../graph/region-graph.ts';

/** Steps spent on a shorter rim once a wheel has been found. */
const polish = 200_000;

/**
 * An odd wheel, hub first and then its rim in ring order, or null when there is none or the steps run
 * out. A vertex is a hub exactly when its neighbours' own borders hold an odd cycle; each
 * neighbourhood is coloured with two inks breadth first. Of several wheels a short one is preferred:
 * where there is no clique of four, no rim is shorter than five.
 */
export function oddWheel(graph: RegionGraph, steps: number): number[] | null {
	const search = new WheelSearch(graph, steps);
	let best: number[] | null = null;
	for (let v = 0; v < graph.count && search.steps > 0; v++) {
		const rim = search.rimOf(v);
		if (!rim || (best && rim.length + 1 >= best.length)) continue;
		if (!best) search.steps = Math.min(search.steps, polish);
		best = [v, ...rim];
		if (rim.length <= 5) break;
	}
	return best;
}

class WheelSearch {
	/** 2 * hub + side + 1 when the vertex was reached from that hub */
	private readonly side: Float64Array;
	private readonly hubOf: Int32Array;
	private readonly parent: Int32Array;

	constructor(
		private readonly graph: RegionGraph,
		public steps: number,
	) {
		this.side = new Float64Array(graph.count);
		this.hubOf = new Int32Array(graph.count).fill(-1);
		this.parent = new Int32Array(graph.count);
	}

	rimOf(hub: number): number[] | null {
		const { offsets, targets } = this.graph;
		if (offsets[hub + 1] - offsets[hub] < 3) return null;
		for (let i = offsets[hub]; i < offsets[hub + 1]; i++) this.hubOf[targets[i]] = hub;
		for (let i = offsets[hub]; i < offsets[hub + 1]; i++) {
			const start = targets[i];
			if (this.side[start] > 2 * hub) continue;
			const rim = this.spread(hub, start);
			if (rim) return rim;
		}
		return null;
	}

	private spread(hub: number, start: number): number[] | null {
		const { offsets, targets } = this.graph;
		const { side, parent } = this;
		const queue = [start];
		side[start] = 2 * hub + 1;
		parent[start] = -1;
		for (let head = 0; head < queue.length; head++) {
			const v = queue[head];
			this.steps -= offsets[v + 1] - offsets[v];
			for (let i = offsets[v]; i < offsets[v + 1]; i++) {
				const w = targets[i];
				if (this.hubOf[w] !== hub) continue;
				if (side[w] === side[v]) return this.close(v, w);
				if (side[w] > 2 * hub) continue;
				side[w] = 4 * hub + 3 - side[v];
				parent[w] = v;
				queue.push(w);
			}
		}
		return null;
	}

	private close(v: number, w: number): number[] {
		const left = [v];
		const right = [w];
		while (v !== w) {
			v = this.parent[v];
			w = this.parent[w];
			left.push(v);
			right.push(w);
		}
		right.pop();
		return [...left, ...right.reverse()];
	}
}
