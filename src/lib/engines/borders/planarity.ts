import { buildGraph, checkKuratowski, planarity, type KuratowskiWitness } from '../graph/index.ts';
import type { BorderList } from './border-list.ts';

/** Regions and borders that cannot be drawn in a plane: `paths` run from hub to hub. */
export interface CrossedBorders extends KuratowskiWitness {
	/** every region on it */
	regions: number[];
}

/**
 * Whether the regions 0..`regions`-1 and these borders can be drawn in a plane without crossing; if not,
 * five regions that each reach every other, or three that each reach three others, by ways that share
 * no region (Kuratowski 1930). A witness is checked before it is given; throws when it does not hold.
 */
export function crossedBorders(
	regions: number,
	{ a, b }: Pick<BorderList, 'a' | 'b'>,
): CrossedBorders | null {
	const graph = buildGraph(regions, a, b);
	const found = planarity(graph);
	if (found.planar) return null;
	const faults = checkKuratowski(graph, found.witness);
	if (faults.length > 0) throw new Error(`the witness does not hold: ${faults.join(' ')}`);
	return { ...found.witness, regions: [...new Set(found.witness.paths.flat())] };
}
