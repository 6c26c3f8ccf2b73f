import type { RegionGraph } from '../graph/region-graph.ts';
import { largestClique } from './clique.ts';
import { oddWheel } from './odd-wheel.ts';
import type { Proof } from './problem.ts';
import { twoColouring } from './two-colouring.ts';

/** A number of inks that no colouring goes below, and what shows it. */
export interface Bound {
	inks: number;
	proof: Proof;
	/** a largest clique found */
	clique: number[];
	/** the two sides when the graph is bipartite: the colouring is then at hand */
	sides: Int32Array | null;
}

/**
 * The best lower bound that needs no search over colourings: nothing, one edge, an odd cycle, a clique
 * or an odd wheel. `order` is smallest-last. Cliques are searched for only up to `enough`.
 */
export function structuralBound(
	graph: RegionGraph,
	order: Uint32Array,
	{ enough, steps }: { enough: number; steps: number },
): Bound {
	const sure = (inks: number, kind: Proof['kind'], regions: number[]) => ({
		inks,
		proof: { kind, regions },
		clique: regions,
		sides: null,
	});
	if (graph.targets.length === 0) return sure(Math.min(1, graph.count), 'none-needed', []);
	const { sides, oddCycle } = twoColouring(graph);
	if (sides) return { ...sure(2, 'edge', firstEdge(graph)), sides };
	const { clique } = largestClique(graph, order, { enough, steps });
	if (clique.length > 3) return sure(clique.length, 'clique', clique);
	const wheel = oddWheel(graph, steps);
	if (wheel) return { ...sure(4, 'odd-wheel', wheel), clique };
	return { ...sure(3, 'odd-cycle', oddCycle), clique };
}

function firstEdge({ offsets, targets }: RegionGraph): number[] {
	let v = 0;
	while (offsets[v + 1] === 0) v++;
	return [v, targets[0]];
}
