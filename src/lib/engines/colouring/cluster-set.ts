import type { RegionGraph } from '../graph/region-graph.ts';
import type { Cluster } from './change-cluster.ts';

/** Clusters that never share a vertex: those that would are joined. */
export class ClusterSet {
	readonly all = new Set<Cluster>();
	private readonly of = new Map<number, Cluster>();

	constructor(
		private readonly graph: RegionGraph,
		private readonly conflicts: number,
	) {}

	clusterOf(v: number): Cluster | undefined {
		return this.of.get(v);
	}

	/** A cluster that holds the vertex and its neighbours. */
	addAround(v: number): void {
		const { offsets, targets } = this.graph;
		this.join([v, ...targets.subarray(offsets[v], offsets[v + 1])]);
	}

	/** Puts the vertices, with all of the clusters they are in, into the largest of these, to be solved. */
	join(vertices: number[]): Cluster {
		const met = new Set(vertices.map((v) => this.of.get(v)).filter((cluster) => !!cluster));
		const [largest, ...others] = [...met].sort((a, b) => b.vertices.size - a.vertices.size);
		const { conflicts } = this;
		const none = { inks: null, cost: 0, open: true, conflicts, search: null };
		const into: Cluster = largest ?? { vertices: new Set(), ...none };
		this.all.add(into);
		for (const other of others) {
			into.cost += other.cost;
			this.all.delete(other);
			for (const v of other.vertices) this.put(into, v);
		}
		for (const v of vertices) this.put(into, v);
		into.inks = null;
		into.open = true;
		return into;
	}

	/** The sum of what the clusters cost: no colouring changes less. */
	bound(): number {
		let sum = 0;
		for (const cluster of this.all) sum += cluster.cost;
		return sum;
	}

	private put(into: Cluster, v: number): void {
		into.vertices.add(v);
		this.of.set(v, into);
	}
}
