/** The region graph: how it is stored, ordered, split and looked at. */
export type { RegionGraph } from './region-graph.ts';
export { adjacent } from './adjacent.ts';
export { breadthFirstOrder } from './breadth-first.ts';
export { buildGraph } from './build-graph.ts';
export { components } from './components.ts';
export { checkKuratowski, type KuratowskiWitness } from './kuratowski-check.ts';
export { isPlanar } from './left-right-test.ts';
export { planarity, type Planarity } from './planarity.ts';
export { renumber } from './renumber.ts';
export { smallestLastOrder } from './smallest-last.ts';
export { splittingSet, type PartedGraph, type Splitting } from './splitting-set.ts';
export { inducedSubgraph } from './subgraph.ts';
