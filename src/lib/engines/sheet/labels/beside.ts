import type { Pole } from './pole.ts';
import { allOwnedBy, paper, type RegionRaster } from './region-raster.ts';
import type { TextBox } from './text-box.ts';

/** Distance of a label from the coast it stands off, in parts of its size. */
const off = 0.35;

/** Cells from the pole to the first that is not the region's, going one way. */
function shore(raster: RegionRaster, region: number, pole: Pole, dx: number, dy: number): number {
	const { cell, columns, rows, owner } = raster;
	let column = Math.floor((pole.x - raster.x) / cell);
	let row = Math.floor((pole.y - raster.y) / cell);
	let steps = 0;
	while (
		column >= 0 &&
		row >= 0 &&
		column < columns &&
		row < rows &&
		(owner[row * columns + column] === region || steps === 0)
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
	for (const [dx, dy] of [
		[1, 0],
		[-1, 0],
		[0, -1],
		[0, 1],
	]) {
		const away = shore(raster, region, pole, dx, dy) + gap;
		const x = pole.x + dx * (away + box.width / 2);
		const y = pole.y + dy * (away + box.height / 2);
		const { width, height } = box;
		const around = {
			x: x - width / 2 - gap / 2,
			y: y - height / 2 - gap / 2,
			width: width + gap,
			height: height + gap,
		};
		if (allOwnedBy(raster, around, paper)) return { x, y };
	}
	return null;
}
