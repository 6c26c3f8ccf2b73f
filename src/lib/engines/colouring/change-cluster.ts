import type { RegionGraph } from '../graph/region-graph.ts';
import type { Board } from './board.ts';
import { ChangeSearch } from './change-search.ts';
import { outvotedAt, type Wishes } from './changes.ts';

/** Vertices whose inks are decided together. Outside them nothing is heeded: its cost is a bound. */
export interface Cluster {
	vertices: Set<number>;
	/** its inks by vertex once solved */
	inks: Map<number, number> | null;
	/** fewest changes within, or a bound on them while open */
	cost: number;
	open: boolean;
	conflicts: number;
	/** what is known of some of its vertices, from when it was smaller or not done */
	search: ChangeSearch | null;
}

/** Solves a cluster on its own borders; with `held`, its neighbours outside keep their inks. */
export function solveCluster(
	board: Board,
	wishes: Wishes,
	cluster: Cluster,
	held: Int32Array | null,
	cancelled?: () => boolean,
): void {
	const search = (cluster.search ??= new ChangeSearch(board, wishes));
	cluster.open = true;
	const taken = held ? (v: number) => inksOutside(board.graph, v, cluster, held) : undefined;
	if (!search.take(cluster.vertices, taken)) return;
	const answer = search.search({ conflicts: cluster.conflicts, cancelled });
	cluster.open = answer.status === 'open';
	if (answer.status === 'open') {
		let outvoted = 0;
		for (const v of cluster.vertices) outvoted += outvotedAt(wishes, v);
		cluster.cost = Math.max(cluster.cost, answer.lowerBound, outvoted);
		return;
	}
	cluster.cost = answer.cost;
	cluster.inks = new Map([...cluster.vertices].map((v) => [v, search.inkOf(v)]));
}

function inksOutside(
	{ offsets, targets }: RegionGraph,
	v: number,
	{ vertices }: Cluster,
	held: Int32Array,
): Set<number> {
	const inks = new Set<number>();
	for (let e = offsets[v]; e < offsets[v + 1]; e++) {
		if (!vertices.has(targets[e]) && held[targets[e]] >= 0) inks.add(held[targets[e]]);
	}
	return inks;
}
