/**
 * Lettering of the map: which level is named, at which size, and where each name stands. One size for
 * a level, because a size that follows the room would look like rank. A level is lettered where at
 * least 60 % of it fits; else the level above is, and the regions are listed beside the map.
 */
import type { ArcSides } from '../lines.ts';
import type { Box } from '../plane/fit.ts';
import type { SheetArcs } from '../plane/quantise.ts';
import { textWidth } from '../type/text-width.ts';
import { labelGroups } from './group-labels.ts';
import { headroom } from './headroom.ts';
import { linesOfName } from './lines-of-name.ts';
import { poleOf } from './pole.ts';
import { labelFace, labelRegions, type Labelled, type LabelGround } from './region-labels.ts';
import { smallerSide } from '../smaller-side.ts';
import { rasterise } from './region-raster.ts';

/** Type sizes on A4, hundredths of a millimetre: 9, 8, 7 and 6 point, and 5 if it must be. */
const sizes = [318, 282, 247, 212];
const smallest = 176;
/** For the level above: 10, 9, 8 and 7 point. */
const groupSizes = [353, 318, 282, 247];
/** A larger size may cost this share of the names that fit at the smallest. */
const worth = 0.03;
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

function coastalOf({ sides, names }: LabelInput): Uint8Array {
	const coastal = new Uint8Array(names.length);
	sides.arcLeft.forEach((left, arc) => {
		const right = sides.arcRight[arc];
		if (left < 0 && right >= 0) coastal[right] = 1;
		if (right < 0 && left >= 0) coastal[left] = 1;
	});
	return coastal;
}

function groundOf(input: LabelInput): LabelGround {
	const { arcs, rings, names, areas, box, scale } = input;
	const raster = rasterise(arcs, rings, box);
	const coastal = coastalOf(input);
	// no pole is sought where no name could stand anyway
	const hopeless = (list: Int32Array[], region: number) =>
		!coastal[region] && smallerSide(arcs, list) < smallest * scale;
	return {
		raster,
		room: headroom(raster),
		poles: rings.map((list, region) => (hopeless(list, region) ? null : poleOf(arcs, list))),
		ways: names.map((name) =>
			name ? linesOfName(name, (text) => textWidth(labelFace, 1000, text)) : [],
		),
		coastal,
		order: names.map((_, region) => region).sort((a, b) => areas[b] - areas[a] || a - b),
	};
}

export function labelSheet(input: LabelInput): Labelled {
	const { names, groups, scale } = input;
	const ground = groundOf(input);
	// a name at the end of a leader counts half: better smaller and in its place
	const share = ({ unplaced, leaders }: Labelled) =>
		1 - (unplaced.length + leaders.length / 2) / Math.max(1, names.length);
	const least = labelRegions(ground, Math.round(smallest * scale));
	const grouped = new Set(groups.filter((group) => group !== null)).size > 1;
	if (share(least) >= (grouped ? enough : enoughAlone)) {
		for (const size of sizes) {
			const found = labelRegions(ground, Math.round(size * scale));
			if (share(found) >= share(least) - worth) return found;
		}
		return least;
	}
	const unplaced = names.map((_, region) => region);
	if (!grouped) return { texts: [], leaders: [], unplaced };
	const scaled = groupSizes.map((size) => Math.round(size * scale));
	return { texts: labelGroups(input, scaled), leaders: [], unplaced };
}
