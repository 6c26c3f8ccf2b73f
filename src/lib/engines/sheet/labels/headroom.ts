import type { RegionRaster } from './region-raster.ts';

/**
 * For every cell, how many cells straight up (itself included) belong to the same region and are free,
 * at most 65,535: a box of `h` rows standing on a cell lies in the region in that column if this is `h`
 * or more. 0 where the cell itself is taken.
 */
export function headroom({ owner, columns }: RegionRaster, busy?: Uint8Array): Uint16Array {
	const room = new Uint16Array(owner.length);
	for (let i = 0; i < owner.length; i++) {
		if (busy?.[i]) continue;
		const above = i - columns;
		const same = above >= 0 && owner[above] === owner[i];
		room[i] = same ? Math.min(65_535, room[above] + 1) : 1;
	}
	return room;
}
