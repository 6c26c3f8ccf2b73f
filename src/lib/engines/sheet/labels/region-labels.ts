import type { DrawnText } from '../drawing.ts';
import { spotBeside } from './beside.ts';
import { spotInside, type Spot } from './inside.ts';
import { linesOfName } from './lines-of-name.ts';
import type { Pole } from './pole.ts';
import { take, type RegionRaster } from './region-raster.ts';
import { setAt, textBox, type TextBox } from './text-box.ts';
import { textWidth } from '../type/text-width.ts';

export interface Labelled {
	texts: DrawnText[];
	/** region numbers, in order */
	unplaced: number[];
}

export interface LabelGround {
	raster: RegionRaster;
	/** from `headroom` */
	room: Uint16Array;
	poles: (Pole | null)[];
	/** regions from the largest to the smallest */
	order: number[];
}

const face = 'serif';

/** The name in one, two or three lines inside its region, whichever keeps nearest to the pole. */
function bestInside(ground: LabelGround, region: number, pole: Pole, boxes: TextBox[]) {
	let best: { box: TextBox; spot: Spot } | null = null;
	for (const box of boxes) {
		const { raster, room } = ground;
		const spot = spotInside(raster, room, region, pole, box.width, box.height);
		// a second line is worth its while only if it brings the name well nearer to the middle
		if (spot && (!best || spot.away < best.spot.away - box.size)) best = { box, spot };
	}
	return best;
}

/**
 * Region names at one size: inside the region, else on empty paper beside it, else not at all. No two
 * names overlap and none lies over another region. `ground.raster` is not changed.
 */
export function labelRegions(ground: LabelGround, names: string[], size: number): Labelled {
	const raster = { ...ground.raster, owner: ground.raster.owner.slice() };
	const texts: DrawnText[] = [];
	const homeless: { region: number; pole: Pole; boxes: TextBox[] }[] = [];
	const unplaced: number[] = [];
	for (const region of ground.order) {
		const pole = ground.poles[region];
		if (!pole || names[region] === '') {
			unplaced.push(region);
			continue;
		}
		const width = (text: string) => textWidth(face, size, text);
		const boxes = linesOfName(names[region], width).map((lines) => textBox(lines, face, size));
		const found = bestInside(ground, region, pole, boxes);
		if (!found) homeless.push({ region, pole, boxes });
		else {
			const rest = { layer: 'label', hex: '#000000', region, onFill: true } as const;
			texts.push(...setAt(found.box, found.spot.x, found.spot.y, rest));
		}
	}
	for (const { region, pole, boxes } of homeless) {
		const found = besides(raster, region, pole, boxes);
		if (found) texts.push(...found);
		else unplaced.push(region);
	}
	return { texts, unplaced: unplaced.sort((a, b) => a - b) };
}

function besides(raster: RegionRaster, region: number, pole: Pole, boxes: TextBox[]) {
	for (const box of boxes) {
		const spot = spotBeside(raster, region, pole, box);
		if (!spot) continue;
		const { width, height } = box;
		take(raster, { x: spot.x - width / 2, y: spot.y - height / 2, width, height });
		return setAt(box, spot.x, spot.y, { layer: 'label', hex: '#000000', region });
	}
	return null;
}
