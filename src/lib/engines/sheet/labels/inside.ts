import type { Pole } from './pole.ts';
import type { RegionRaster } from './region-raster.ts';

/** Where a box of text goes: its centre, and how far that is from the pole. */
export interface Spot {
	x: number;
	y: number;
	away: number;
}

/**
 * The place nearest to the pole where a box of `width` by `height` lies wholly in the region, found
 * by looking along every row of cells. Null where there is none. Text keeps half a cell's distance
 * from every border.
 */
export function spotInside(
	raster: RegionRaster,
	room: Uint16Array,
	region: number,
	pole: Pole,
	width: number,
	height: number,
): Spot | null {
	const { cell, columns, owner, spans } = raster;
	const [left, right, top, bottom] = spans.subarray(4 * region, 4 * region + 4);
	// one more than the box itself, for a box that straddles cells
	const [wide, high] = [Math.ceil(width / cell) + 1, Math.ceil(height / cell) + 1];
	let best: Spot | null = null;
	if (right - left + 1 < wide || bottom - top + 1 < high) return null;
	for (let row = top + high - 1; row <= bottom; row++) {
		const y = raster.y + (row + 1 - high / 2) * cell;
		if (best && Math.abs(y - pole.y) >= best.away) continue;
		let start = -1;
		for (let column = left; column <= right + 1; column++) {
			const i = row * columns + column;
			const fits = column <= right && owner[i] === region && room[i] >= high;
			if (fits && start < 0) start = column;
			if (fits || start < 0) continue;
			if (column - start >= wide) {
				const least = raster.x + (start + wide / 2) * cell;
				const most = raster.x + (column - wide / 2) * cell;
				const x = Math.min(most, Math.max(least, pole.x));
				const away = Math.hypot(x - pole.x, y - pole.y);
				if (!best || away < best.away) best = { x, y, away };
			}
			start = -1;
		}
	}
	return best;
}
