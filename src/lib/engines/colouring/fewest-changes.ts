import { setInk, type Board } from './board.ts';
import { solveCluster } from './change-cluster.ts';
import { repairChanges } from './change-repair.ts';
import { oldBoard, outvotedAt, type Wishes } from './changes.ts';
import { ClusterSet } from './cluster-set.ts';

export interface ChangeSettings {
	/** solver conflicts for one cluster, before it is given up */
	conflicts: number;
	seed: number;
	cancelled?: () => boolean;
}

const firstConflicts = 500;

/**
 * Turns a proper board into one as close to the old inks as can be; returns a number of changes (by
 * region, without the compulsory ones) below which no colouring stays.
 *
 * Around every clash of the old inks a cluster of vertices is solved exactly on its own borders. Where
 * a solution clashes with the old inks outside, the cluster takes those vertices in. When nothing
 * clashes any more, the sum of the optima is both attained and a bound, as clusters are disjoint. When
 * the steps run out first, the old inks are repaired locally, and the sum is a bound only.
 */
export function fewestChanges(board: Board, wishes: Wishes, settings: ChangeSettings): number {
	const old = oldBoard(wishes, board);
	const clusters = new ClusterSet(board.graph, firstConflicts);
	for (const v of clashing(board, old)) clusters.addAround(v);
	if (settle(board, wishes, old, clusters, settings)) {
		const inks = assembled(old, clusters);
		for (let v = 0; v < inks.length; v++) setInk(board, v, inks[v]);
	} else repairChanges(board, wishes, old, settings);
	return clusters.bound() + outvotedOutside(wishes, clusters);
}

function outvotedOutside(wishes: Wishes, clusters: ClusterSet): number {
	let sum = 0;
	for (let v = 0; wishes.kept && v < wishes.old.length; v++) {
		if (!clusters.clusterOf(v)) sum += outvotedAt(wishes, v);
	}
	return sum;
}

/** Vertices that clash with a neighbour or have no old ink. */
export function clashing({ graph }: Board, old: Int32Array): number[] {
	const { offsets, targets } = graph;
	const found: number[] = [];
	for (let v = 0; v < graph.count; v++) {
		let clash = old[v] < 0;
		for (let e = offsets[v]; e < offsets[v + 1] && !clash; e++) clash = old[targets[e]] === old[v];
		if (clash) found.push(v);
	}
	return found;
}

/** Solves and widens until nothing clashes; false when the steps run out. */
function settle(
	board: Board,
	wishes: Wishes,
	old: Int32Array,
	clusters: ClusterSet,
	{ conflicts, cancelled }: ChangeSettings,
): boolean {
	for (;;) {
		let gaveUp = false;
		for (const cluster of clusters.all) {
			if (!cluster.open) continue;
			if (cluster.conflicts > conflicts || cancelled?.()) gaveUp = true;
			else solveCluster(board, wishes, cluster, null, cancelled);
			if (cluster.open) cluster.conflicts *= 2;
		}
		const widened = widen(board, old, clusters);
		if (widened) continue;
		if (gaveUp) return false;
		if ([...clusters.all].every((cluster) => !cluster.open)) return true;
	}
}

/** Takes in what the solved clusters clash with; whether there was anything. */
function widen({ graph }: Board, old: Int32Array, clusters: ClusterSet): boolean {
	const { offsets, targets } = graph;
	const inks = assembled(old, clusters);
	let widened = false;
	for (const cluster of [...clusters.all]) {
		if (!cluster.inks || !clusters.all.has(cluster)) continue;
		const ring: number[] = [];
		for (const [v, ink] of cluster.inks) {
			for (let e = offsets[v]; e < offsets[v + 1]; e++) {
				const w = targets[e];
				if (cluster.vertices.has(w) || clusters.clusterOf(w)?.open) continue;
				if (inks[w] === ink) ring.push(w);
			}
		}
		if (ring.length === 0) continue;
		clusters.join([...ring, cluster.vertices.values().next().value as number]);
		widened = true;
	}
	return widened;
}

function assembled(old: Int32Array, clusters: ClusterSet): Int32Array {
	const inks = old.slice();
	for (const cluster of clusters.all) {
		for (const [v, ink] of cluster.inks ?? []) inks[v] = ink;
	}
	return inks;
}
