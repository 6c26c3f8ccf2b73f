import { ConflictStack } from './conflict-stack.ts';
import { orient, type Orientation } from './left-right-orientation.ts';
import type { RegionGraph } from './region-graph.ts';

/**
 * Whether a graph can be drawn without crossings: the left-right test, iterative, in linear time.
 * Sources: see left-right-orientation.
 */
export function isPlanar(graph: RegionGraph): boolean {
	const { count, targets } = graph;
	if (count > 2 && targets.length / 2 > 3 * count - 6) return false;
	if (targets.length / 2 < 9) return true;
	const test = new LeftRightTest(graph, orient(graph));
	return test.run();
}

class LeftRightTest {
	private readonly stack: ConflictStack;
	private readonly bottom: Int32Array;
	/** the lowest return edge of each edge */
	private readonly lowEdge: Int32Array;
	private readonly next: Int32Array;

	constructor(
		private readonly graph: RegionGraph,
		private readonly o: Orientation,
	) {
		const edges = graph.targets.length;
		this.stack = new ConflictStack(edges, o.lowpoint, graph.targets);
		this.bottom = new Int32Array(edges);
		this.lowEdge = new Int32Array(edges);
		this.next = o.nestingStart.slice();
	}

	run(): boolean {
		return this.o.roots.every((root) => this.explore(root));
	}

	private explore(root: number): boolean {
		const { nested, nestingStart, parentEdge } = this.o;
		const { targets } = this.graph;
		const path = [root];
		while (path.length > 0) {
			const v = path[path.length - 1];
			if (this.next[v] === nestingStart[v + 1]) {
				path.pop();
				if (path.length === 0) return true;
				const u = path[path.length - 1];
				this.stack.trim(u, this.o.height[u]);
				if (!this.integrate(u, parentEdge[v])) return false;
				continue;
			}
			const e = nested[this.next[v]++];
			this.bottom[e] = this.stack.size;
			if (parentEdge[targets[e]] === e) {
				path.push(targets[e]);
				continue;
			}
			this.lowEdge[e] = e;
			this.stack.push(-1, -1, e, e);
			if (!this.integrate(v, e)) return false;
		}
		return true;
	}

	/** Edge e from v has been explored: its return edges join those of v. */
	private integrate(v: number, e: number): boolean {
		const { lowpoint, height, nested, nestingStart, parentEdge } = this.o;
		if (lowpoint[e] >= height[v]) return true;
		const into = parentEdge[v];
		if (e === nested[nestingStart[v]]) {
			this.lowEdge[into] = this.lowEdge[e];
			return true;
		}
		return this.stack.constrain(e, into, this.bottom[e], this.lowEdge[into]);
	}
}
