/**
 * Lettering of the map: which level is named, at which size, and where each name stands. One size for
 * a level, because a size that follows the room would look like rank. A level is lettered where at
 * least 60 % of it fits; else the level above is, and the regions are listed beside the map.
 */
import type { ArcSides } from '../lines.ts';
import type { SheetArcs } from '../plane/quantise.ts';
import type { Box } from '../plane/fit.ts';
import { labelGroups } from './group-labels.ts';
import { headroom } from './headroom.ts';
import { poleOf } from './pole.ts';
import { labelRegions, type Labelled } from './region-labels.ts';
import { rasterise } from './region-raster.ts';

/** Type sizes on A4, hundredths of a millimetre: 8, 7, 6 and 5 point. */
const sizes = [282, 247, 212, 176];
/** For the level above: 10, 9, 8 and 7 point. */
const groupSizes = [353, 318, 282, 247];
/** Smaller sizes are tried until this share of the names is placed. */
const wanted = 0.85;
const enough = 0.6;
/** Without a level above, a map with some names says more than a map with none. */
const enoughAlone = 0.2;

export interface LabelInput {
	arcs: SheetArcs;
	rings: Int32Array[][];
	sides: ArcSides;
	/** cleaned, in region order */
	names: string[];
	groups: (string | null)[];
	areas: Float64Array;
	box: Box;
	scale: number;
}

export function labelSheet(input: LabelInput): Labelled {
	const { arcs, rings, names, groups, areas, box, scale } = input;
	const raster = rasterise(arcs, rings, box);
	const order = names.map((_, region) => region).sort((a, b) => areas[b] - areas[a] || a - b);
	const poles = rings.map((list) => poleOf(arcs, list));
	const ground = { raster, room: headroom(raster), poles, order };
	let found: Labelled = { texts: [], unplaced: order };
	let share = 0;
	for (const size of sizes) {
		found = labelRegions(ground, names, Math.round(size * scale));
		share = 1 - found.unplaced.length / names.length;
		if (share >= wanted) return found;
	}
	const grouped = new Set(groups.filter((group) => group !== null)).size > 1;
	if (share >= (grouped ? enough : enoughAlone)) return found;
	const texts = grouped
		? labelGroups(
				input,
				groupSizes.map((size) => Math.round(size * scale)),
			)
		: [];
	return { texts, unplaced: names.map((_, region) => region) };
}
