import { boxAround, isFree, isBorder, isWithSame, type Ground } from './ground.ts';
import type { Pole } from './pole.ts';
import { paper, type RegionRaster } from './region-raster.ts';
import type { TextBox } from './text-box.ts';

/** Distance of a label from the coast it stands off, in parts of its size. */
const off = 0.45;
/** Part of that distance kept clear all round. */
const clear = 0.7;

/** Directions, and how far a name that goes past the end is moved back along the coast. */
const sides = [
	[1, 0],
	[-1, 0],
	[0, -1],
	[0, 1],
];
/** Along the coast from the place opposite the pole, in parts of the name's size across. */
const along = [0, 0.35, -0.35];

/** Cells from the pole to the first that is not the region's, going one way. */
function shore(raster: RegionRaster, region: number, pole: Pole, dx: number, dy: number): number {
	const { cell, columns, rows, owner } = raster;
	let column = Math.floor((pole.x - raster.x) / cell);
	let row = Math.floor((pole.y - raster.y) / cell);
	const isOwn = (cellOwner: number) => cellOwner === region || isBorder(cellOwner);
	let steps = 0;
	while (
		column >= 0 &&
		row >= 0 &&
		column < columns &&
		row < rows &&
		(isOwn(owner[row * columns + column]) || steps === 0)
	) {
		column += dx;
		row += dy;
		steps++;
	}
	return steps * cell;
}

/**
 * The centre of a label set on empty paper next to its region: right, left, above, below, in this
 * order, straight opposite its middle before somewhat along the coast. Null where other regions, other
 * labels, the frame of an inset or the edge of the map are in the way. Source for the order of places: Imhof 1975,
 * "Positioning names on maps", for point-like features.
 */
export function spotBeside(
	ground: Ground,
	region: number,
	pole: Pole,
	box: TextBox,
): { x: number; y: number } | null {
	const gap = box.size * off;
	const pad = gap * clear;
	const { width, height } = box;
	const coasts = sides.map(([dx, dy]) => shore(ground.raster, region, pole, dx, dy));
	for (const shift of along) {
		for (const [side, [dx, dy]] of sides.entries()) {
			for (const gaps of [1, 2, 3]) {
				const out = coasts[side] + gap * gaps;
				const x = pole.x + dx * (out + width / 2) + (dy ? shift * width : 0);
				const y = pole.y + dy * (out + height / 2) + (dx ? shift * height * 2 : 0);
				const around = boxAround(x, y, width + 2 * pad, height + 2 * pad);
				if (isFree(ground, around, paper) && isWithSame(ground, pole, around)) return { x, y };
			}
		}
	}
	return null;
}
