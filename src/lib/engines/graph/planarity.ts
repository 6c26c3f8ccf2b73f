import type { KuratowskiWitness } from './kuratowski-check.ts';
import { findWitness } from './kuratowski-search.ts';
import { isPlanar } from './left-right-test.ts';
import type { RegionGraph } from './region-graph.ts';

export type Planarity = { planar: true } | { planar: false; witness: KuratowskiWitness };

/**
 * Whether the graph can be drawn without crossings, and if not, a short subdivision of K5 or K3,3 that
 * shows it (see `checkKuratowski`). Only for a planar graph is it a theorem that four inks suffice
 * (K. Appel, W. Haken 1977; N. Robertson et al. 1997).
 */
export function planarity(graph: RegionGraph): Planarity {
	if (isPlanar(graph)) return { planar: true };
	return { planar: false, witness: findWitness(graph) };
}
