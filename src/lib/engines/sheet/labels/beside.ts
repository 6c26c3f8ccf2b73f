import type { Pole } from './pole.ts';
import { allOwnedBy, outline, paper, type RegionRaster } from './region-raster.ts';
import type { TextBox } from './text-box.ts';

/** Distance of a label from the coast it stands off, in parts of its size. */
const off = 0.45;
/** Part of that distance kept clear all round. */
const clear = 0.7;

const sides = [
	[1, 0],
	[-1, 0],
	[0, -1],
	[0, 1],
];

/** Cells from the pole to the first that is not the region's, going one way. */
function shore(raster: RegionRaster, region: number, pole: Pole, dx: number, dy: number): number {
	const { cell, columns, rows, owner } = raster;
	let column = Math.floor((pole.x - raster.x) / cell);
	let row = Math.floor((pole.y - raster.y) / cell);
	const isOwn = (cellOwner: number) => cellOwner === region || cellOwner === outline;
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
 * order. Null where other regions, other labels or the edge of the map are in the way. Source for the
 * order of places: Imhof 1975, "Positioning names on maps", for point-like features.
 */
export function spotBeside(
	raster: RegionRaster,
	region: number,
	pole: Pole,
	box: TextBox,
): { x: number; y: number } | null {
	const gap = box.size * off;
	const { width, height } = box;
	for (const [dx, dy] of sides) {
		const coast = shore(raster, region, pole, dx, dy);
		for (const gaps of [1, 2, 3]) {
			const x = pole.x + dx * (coast + gap * gaps + width / 2);
			const y = pole.y + dy * (coast + gap * gaps + height / 2);
			const pad = gap * clear;
			const around = {
				x: x - width / 2 - pad,
				y: y - height / 2 - pad,
				width: width + 2 * pad,
				height: height + 2 * pad,
			};
			if (allOwnedBy(raster, around, paper)) return { x, y };
		}
	}
	return null;
}
