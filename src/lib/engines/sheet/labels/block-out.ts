import type { Box } from '../plane/fit.ts';
import { taken, type RegionRaster } from './region-raster.ts';

/** Marks every cell that a box touches as taken, so that no name is set there. */
export function blockOut(raster: RegionRaster, boxes: readonly Box[]): void {
	const { cell, columns, rows, owner } = raster;
	for (const box of boxes) {
		const left = Math.max(0, Math.floor((box.x - raster.x) / cell));
		const right = Math.min(columns, Math.ceil((box.x + box.width - raster.x) / cell));
		const top = Math.max(0, Math.floor((box.y - raster.y) / cell));
		const bottom = Math.min(rows, Math.ceil((box.y + box.height - raster.y) / cell));
		for (let row = top; row < bottom; row++)
			if (right > left) owner.fill(taken, row * columns + left, row * columns + right);
	}
}
