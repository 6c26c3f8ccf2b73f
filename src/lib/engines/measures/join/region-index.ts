import type { Cell } from '../table.ts';
import { fold, withoutZeros } from './fold.ts';
import type { Match, Regions } from './join.ts';

/** Regions by the ways their keys or names can be written. */
export interface RegionIndex {
	by: 'key' | 'name';
	exact: Map<string, number[]>;
	folded: Map<string, number[]>;
	/** without zeros at the front; keys only, since names are no numbers */
	bare: Map<string, number[]>;
}

export type Found =
	| { is: 'found'; region: number; how: Match }
	| { is: 'ambiguous'; candidates: number[] }
	| { is: 'unknown' };

export function indexRegions(regions: Regions, by: 'key' | 'name'): RegionIndex {
	const index: RegionIndex = { by, exact: new Map(), folded: new Map(), bare: new Map() };
	const labels = by === 'key' ? regions.keys : regions.names;
	labels.forEach((label, region) => {
		add(index.exact, label, region);
		const folded = fold(label);
		if (folded) add(index.folded, folded, region);
		const bare = by === 'key' ? withoutZeros(folded) : null;
		if (bare !== null) add(index.bare, bare, region);
	});
	return index;
}

function add(map: Map<string, number[]>, text: string, region: number): void {
	const there = map.get(text);
	if (there) there.push(region);
	else map.set(text, [region]);
}

/** The text that a cell is looked up by. */
export const labelOf = (cell: Cell): string => (cell === null ? '' : String(cell));

/**
 * The region that a cell means: the very text first, else the folded one, else without zeros at the front.
 * The first way that finds any decides; where it finds several, none is taken.
 */
export function findRegion(index: RegionIndex, cell: Cell): Found {
	const text = labelOf(cell);
	const exact = index.exact.get(text);
	if (exact) return one(exact, 'exact');
	// folding would make 15 of the number 1.5
	if (typeof cell === 'number' && !Number.isInteger(cell)) return { is: 'unknown' };
	const folded = fold(text);
	const alike = folded ? index.folded.get(folded) : undefined;
	if (alike) return one(alike, 'folded');
	const bare = index.by === 'key' ? withoutZeros(folded) : null;
	const zeros = bare === null ? undefined : index.bare.get(bare);
	return zeros ? one(zeros, 'zeros') : { is: 'unknown' };
}

const one = (candidates: number[], how: Match): Found =>
	candidates.length === 1
		? { is: 'found', region: candidates[0], how }
		: { is: 'ambiguous', candidates: [...candidates] };
