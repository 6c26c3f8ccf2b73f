import { ringDoubleArea, ringPoints } from '../fills.ts';
import type { SheetArcs } from '../plane/quantise.ts';
import { smallerSide } from '../smaller-side.ts';
import { countCells } from './cell-counts.ts';
import { headroom } from './headroom.ts';
import { occupy } from './ground.ts';
import type { LabelInput } from './label-sheet.ts';
import { nameWays } from './name-ways.ts';
import { nameOrder, neighbourCounts } from './order.ts';
import { poleOf } from './pole.ts';
import { edge, outline, rasterise } from './region-raster.ts';
import { labelFace, type NameTask } from './region-labels.ts';

/** 1 for regions that border on nothing somewhere. */
function coastalOf({ sides, names }: LabelInput): Uint8Array {
	const coastal = new Uint8Array(names.length);
	sides.arcLeft.forEach((left, arc) => {
		const right = sides.arcRight[arc];
		if (left < 0 && right >= 0) coastal[right] = 1;
		if (right < 0 && left >= 0) coastal[left] = 1;
	});
	return coastal;
}

/** Middle of the box of a region's largest part: near enough for one no larger than a letter. */
function middleOf(arcs: SheetArcs, rings: Int32Array[]): { x: number; y: number } | null {
	let largest: number[] | null = null;
	let most = -1;
	for (const ring of rings) {
		const points = ringPoints(arcs, ring);
		const area = Math.abs(ringDoubleArea(points));
		if (area > most) [largest, most] = [points, area];
	}
	if (!largest) return null;
	let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = 0; i < largest.length; i += 2) {
		[left, right] = [Math.min(left, largest[i]), Math.max(right, largest[i])];
		[top, bottom] = [Math.min(top, largest[i + 1]), Math.max(bottom, largest[i + 1])];
	}
	return { x: (left + right) / 2, y: (top + bottom) / 2 };
}

/**
 * All that placing names asks for, made once for all sizes; `hopeful` is how many names might stand at
 * the smallest: inside their region, or, on a coast, beside it.
 */
export function nameTask(input: LabelInput, smallest: number): { task: NameTask; hopeful: number } {
	const { arcs, rings, names, keys, box, lettering, groups, sides } = input;
	const groupAt = (region: number) => (region < 0 ? undefined : groups[region]);
	const isEdge = (arc: number) => groupAt(sides.arcLeft[arc]) !== groupAt(sides.arcRight[arc]);
	const raster = rasterise(arcs, rings, box, (arc) => (isEdge(arc) ? edge : outline));
	const fixed = new Uint8Array(raster.owner.length);
	for (const one of input.obstacles) occupy({ raster, busy: fixed }, one);
	const coastal = coastalOf(input);
	// no pole is sought where no name could stand anyway
	const poles = rings.map((list) =>
		smallerSide(arcs, list) >= smallest / 2 ? poleOf(arcs, list) : null,
	);
	const anchors = poles.map((pole, region) => pole ?? middleOf(arcs, rings[region]));
	poles.forEach((pole, region) => {
		const at = anchors[region];
		if (!pole && coastal[region] && at) poles[region] = { ...at, radius: 0 };
	});
	const numbers = new Map(keys.map((key, region) => [key, region]));
	const hidden = new Set(lettering.hidden);
	const known = (key: string) => numbers.get(key) ?? -1;
	const figure =
		lettering.priority === 'neighbours' ? neighbourCounts(sides, names.length) : input.areas;
	const first = lettering.first.map(known).filter((region) => region >= 0);
	const places = Object.entries(lettering.placed).filter(([key]) => !hidden.has(key));
	const hand = places.map(([key, place]) => [known(key), place] as const);
	return {
		task: {
			ground: {
				...{ raster, counts: countCells(raster), frames: input.frames },
				...{ busy: fixed.slice(), room: headroom(raster, fixed) },
			},
			...{ fixed, paperBox: input.paper, poles, anchors, coastal },
			ways: names.map((name, region) => {
				const { abbreviations } = lettering;
				const own = Object.hasOwn(abbreviations, keys[region]) ? abbreviations[keys[region]] : '';
				return nameWays(labelFace, name, own);
			}),
			order: nameOrder(first, figure, input.areas).filter((region) => !hidden.has(keys[region])),
			hand: new Map(hand.filter(([region]) => region >= 0).sort(([a], [b]) => a - b)),
		},
		hopeful: poles.reduce((sum, pole) => sum + (pole ? 1 : 0), 0),
	};
}
