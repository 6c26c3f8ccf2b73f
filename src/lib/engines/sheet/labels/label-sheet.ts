/**
 * Lettering of the map: which level is named, at which size, and where each name stands. One size for
 * a level, because a size that follows the room would look like rank. A level is lettered where at
 * least 60 % of it fits; else the level above is, and the regions are listed beside the map.
 */
import type { ArcSides } from '../lines.ts';
import type { Box } from '../plane/fit.ts';
import type { SheetArcs } from '../plane/quantise.ts';
import { textWidth } from '../type/text-width.ts';
import { blockOut } from './block-out.ts';
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
	/** boxes on the paper where no name may stand: text blocks, a legend on the map; `Collar.obstacles` */
	obstacles: readonly Box[];
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

/** 1 for regions where some name might stand: inside, or, on a coast, beside them. */
function hopefulOf({ arcs, rings, scale }: LabelInput, coastal: Uint8Array): Uint8Array {
	return Uint8Array.from(rings, (list, region) =>
		coastal[region] || smallerSide(arcs, list) >= smallest * scale ? 1 : 0,
	);
}

function groundOf(input: LabelInput, coastal: Uint8Array, hopeful: Uint8Array): LabelGround {
	const { arcs, rings, names, areas, box, obstacles } = input;
	const raster = rasterise(arcs, rings, box);
	blockOut(raster, obstacles);
	return {
		raster,
		room: headroom(raster),
		// no pole is sought where no name could stand anyway
		poles: rings.map((list, region) => (hopeful[region] ? poleOf(arcs, list) : null)),
		ways: names.map((name) =>
			name ? linesOfName(name, (text) => textWidth(labelFace, 1000, text)) : [],
		),
		coastal,
		order: names.map((_, region) => region).sort((a, b) => areas[b] - areas[a] || a - b),
	};
}

export function labelSheet(input: LabelInput): Labelled {
	const { names, groups } = input;
	const grouped = new Set(groups.filter((group) => group !== null)).size > 1;
	const asked = grouped ? enough : enoughAlone;
	const coastal = coastalOf(input);
	const hopeful = hopefulOf(input, coastal);
	// a sheet of specks: not even looked at, for too few of its names could stand
	const possible = hopeful.reduce((sum, one) => sum + one, 0) / Math.max(1, names.length);
	const named = possible >= asked && nameRegions(input, groundOf(input, coastal, hopeful), asked);
	if (named) return named;
	const unplaced = names.map((_, region) => region);
	if (!grouped) return { texts: [], leaders: [], unplaced };
	const scaled = groupSizes.map((size) => Math.round(size * input.scale));
	return { texts: labelGroups(input, scaled), leaders: [], unplaced };
}

/** Names at the largest size that costs few of them; null where fewer than are asked for find room. */
function nameRegions(
	{ names, scale }: LabelInput,
	ground: LabelGround,
	asked: number,
): Labelled | null {
	// a name at the end of a leader counts half: better smaller and in its place
	const share = ({ unplaced, leaders }: Labelled) =>
		1 - (unplaced.length + leaders.length / 2) / Math.max(1, names.length);
	const least = labelRegions(ground, Math.round(smallest * scale));
	if (share(least) < asked) return null;
	for (const size of sizes) {
		const found = labelRegions(ground, Math.round(size * scale));
		if (share(found) >= share(least) - worth) return found;
	}
	return least;
}
