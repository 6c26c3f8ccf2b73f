import type { DrawnText } from '../drawing.ts';
import type { Box } from '../plane/fit.ts';
import { spotBeside } from './beside.ts';
import { spotInside, type Spot } from './inside.ts';
import { spotByLeader, type Leader } from './leader.ts';
import type { Pole } from './pole.ts';
import { paint, paintLine, paper, taken, type RegionRaster } from './region-raster.ts';
import { setAt, textBox, type TextBox } from './text-box.ts';

export interface Labelled {
	texts: DrawnText[];
	leaders: Leader[];
	/** region numbers, in order */
	unplaced: number[];
}

export interface LabelGround {
	raster: RegionRaster;
	/** from `headroom` */
	room: Uint16Array;
	poles: (Pole | null)[];
	/** each name in one, two or three lines; none where it is empty */
	ways: string[][][];
	/** 1 for regions that border on nothing somewhere: only their names can stand outside */
	coastal: Uint8Array;
	/** regions from the largest to the smallest */
	order: number[];
}

export const labelFace = 'serif';

/** Distance of a name from the borders left and right of it, in parts of its size; half above and below. */
const inset = 0.2;

/** The name in one, two or three lines inside its region, whichever keeps nearest to the pole. */
function bestInside(ground: LabelGround, region: number, pole: Pole, boxes: TextBox[]) {
	let best: { box: TextBox; spot: Spot } | null = null;
	for (const box of boxes) {
		const { raster, room } = ground;
		const air = box.size * inset;
		const spot = spotInside(raster, room, region, pole, box.width + 2 * air, box.height + air);
		// a second line is worth its while only if it brings the name well nearer to the middle
		if (spot && (!best || spot.away < best.spot.away - box.size)) best = { box, spot };
	}
	return best;
}

interface Homeless {
	region: number;
	pole: Pole;
	boxes: TextBox[];
}

/**
 * Region names at one size: inside the region, else on empty paper beside it, else on empty paper
 * with a leader, else not at all. No two names overlap and none lies over another region.
 */
export function labelRegions(ground: LabelGround, size: number): Labelled {
	const texts: DrawnText[] = [];
	const homeless: Homeless[] = [];
	const unplaced: number[] = [];
	for (const region of ground.order) {
		const pole = ground.poles[region];
		const boxes = ground.ways[region].map((lines) => textBox(lines, labelFace, size));
		if (!pole || !boxes.length) {
			unplaced.push(region);
			continue;
		}
		const found = bestInside(ground, region, pole, boxes);
		if (!found && !ground.coastal[region]) unplaced.push(region);
		else if (!found) homeless.push({ region, pole, boxes });
		else {
			const rest = { layer: 'label', hex: '#000000', region, onFill: true } as const;
			texts.push(...setAt(found.box, found.spot.x, found.spot.y, rest));
		}
	}
	const outside = labelOutside(ground.raster, homeless);
	return {
		texts: [...texts, ...outside.texts],
		leaders: outside.leaders,
		unplaced: [...unplaced, ...outside.unplaced].sort((a, b) => a - b),
	};
}

/** Names that find no room at home; those that can stand close by go first. */
function labelOutside(raster: RegionRaster, homeless: Homeless[]): Labelled {
	const found: Labelled = { texts: [], leaders: [], unplaced: [] };
	const boxes: Box[] = [];
	const place = ({ region }: Homeless, box: TextBox, x: number, y: number) => {
		boxes.push({
			x: x - box.width / 2,
			y: y - box.height / 2,
			width: box.width,
			height: box.height,
		});
		paint(raster, boxes[boxes.length - 1], paper, taken);
		found.texts.push(...setAt(box, x, y, { layer: 'label', hex: '#000000', region }));
	};
	const further = homeless.filter((one) => {
		const box = one.boxes.find((each) => spotBeside(raster, one.region, one.pole, each));
		if (!box) return true;
		const spot = spotBeside(raster, one.region, one.pole, box)!;
		place(one, box, spot.x, spot.y);
		return false;
	});
	for (const one of further) {
		const spot = spotByLeader(raster, one.region, one.pole, one.boxes[0]);
		if (!spot) found.unplaced.push(one.region);
		else {
			place(one, one.boxes[0], spot.x, spot.y);
			found.leaders.push(spot.leader);
			paintLine(raster, spot.leader, paper, taken);
		}
	}
	// the raster is handed back as it was
	for (const box of boxes) paint(raster, box, taken, paper);
	for (const leader of found.leaders) paintLine(raster, leader, taken, paper);
	return found;
}
