import type { RegionGraph } from '../graph/region-graph.ts';
import { inducedSubgraph } from '../graph/subgraph.ts';
import { Sat } from '../solver/sat.ts';
import { mayTake, type Board } from './board.ts';
import { keptAt, outvotedAt, type Wishes } from './changes.ts';
import { keepMost } from './keep-most.ts';
import { addBorders, addLists } from './list-colouring.ts';

/** Vertices whose inks are decided together. Outside them nothing is heeded: its cost is a bound. */
export interface Cluster {
	vertices: Set<number>;
	/** its inks by vertex once solved */
	inks: Map<number, number> | null;
	/** fewest changes within, or a bound on them while open */
	cost: number;
	open: boolean;
	conflicts: number;
}

/** Solves a cluster on its own borders; with `held`, its neighbours outside keep their inks. */
export function solveCluster(
	board: Board,
	wishes: Wishes,
	cluster: Cluster,
	held: Int32Array | null,
	cancelled?: () => boolean,
): void {
	const vertices = [...cluster.vertices];
	const outside = held ? vertices.map((v) => inksOutside(board.graph, v, cluster, held)) : null;
	const lists = {
		inks: board.inks,
		allowed: (i: number, ink: number) => mayTake(board, vertices[i], ink) && !outside?.[i].has(ink),
		hint: (i: number) => wishes.old[vertices[i]],
	};
	const sat = new Sat();
	const part = inducedSubgraph(board.graph, vertices);
	cluster.open = true;
	if (!addLists(sat, part.count, lists) || !addBorders(sat, part, lists)) return;
	if (wishes.kept) addOneInkEach(sat, part.count, board.inks);
	const wanted = new Map<number, number>();
	vertices.forEach((v, i) => {
		for (const [ink, regions] of keptAt(wishes, v)) wanted.set(i * board.inks + ink + 1, regions);
	});
	const outvoted = vertices.reduce((sum, v) => sum + outvotedAt(wishes, v), 0);
	const answer = keepMost(sat, wanted, { conflicts: cluster.conflicts, cancelled });
	cluster.open = answer.status === 'open';
	cluster.cost = answer.status === 'open' ? Math.max(answer.lowerBound, outvoted) : answer.cost;
	if (answer.status === 'open') return;
	cluster.inks = new Map(vertices.map((v, i) => [v, wishedInk(sat, i, board.inks, wishes.old[v])]));
}

/** Where the regions of one vertex wish for several inks, it must not count as having them all. */
function addOneInkEach(sat: Sat, count: number, inks: number): void {
	for (let i = 0; i < count; i++) {
		for (let c = 0; c < inks; c++) {
			for (let d = 0; d < c; d++) sat.addClause([-(i * inks + c + 1), -(i * inks + d + 1)]);
		}
	}
}

/** The old ink if it is one of those set true, else the lowest of them. */
function wishedInk(sat: Sat, i: number, inks: number, old: number): number {
	if (old >= 0 && sat.value(i * inks + old + 1)) return old;
	let ink = 0;
	while (!sat.value(i * inks + ink + 1)) ink++;
	return ink;
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
