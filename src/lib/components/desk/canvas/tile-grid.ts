import type { Area } from '$lib/engines/sheet';

/** Pixels along the side of a tile. */
export const tileSize = 512;

/** How the paper lies under the frame, in pixels of the canvas. */
export interface Sight {
	/** where the paper's top left corner lies */
	x: number;
	y: number;
	/** pixels to a hundredth of a millimetre */
	scale: number;
	/** of the frame */
	width: number;
	height: number;
}

/** A square of the paper at one size; the last column and row end with the paper. */
export interface Spot {
	key: string;
	scale: number;
	column: number;
	row: number;
	width: number;
	height: number;
}

/** Width and height in hundredths of a millimetre. */
export interface Paper {
	width: number;
	height: number;
}

/**
 * Tiles of the size `scale` that lie in sight, and as far as `margin` pixels around it, nearest to the
 * middle first.
 */
export function spotsInSight(sight: Sight, scale: number, paper: Paper, margin = 0): Spot[] {
	const across = Math.ceil(paper.width * scale);
	const down = Math.ceil(paper.height * scale);
	const by = scale / sight.scale;
	const range = (offset: number, seen: number, whole: number) => [
		Math.max(0, Math.floor(((-offset - margin) * by) / tileSize)),
		Math.min(Math.ceil(whole / tileSize), Math.ceil(((seen + margin - offset) * by) / tileSize)),
	];
	const [left, right] = range(sight.x, sight.width, across);
	const [top, bottom] = range(sight.y, sight.height, down);
	const spots: Spot[] = [];
	for (let row = top; row < bottom; row++)
		for (let column = left; column < right; column++)
			spots.push({
				key: `${scale}/${column}/${row}`,
				...{ scale, column, row },
				width: Math.min(tileSize, across - column * tileSize),
				height: Math.min(tileSize, down - row * tileSize),
			});
	const away = ({ column, row }: Spot) =>
		Math.hypot(
			(column + 0.5) * tileSize - (sight.width / 2 - sight.x) * by,
			(row + 0.5) * tileSize - (sight.height / 2 - sight.y) * by,
		);
	return spots.sort((a, b) => away(a) - away(b));
}

/** The part of the paper on a tile. */
export function areaOf({ scale, column, row, width, height }: Spot): Area {
	const [left, top] = [(column * tileSize) / scale, (row * tileSize) / scale];
	return { left, top, right: left + width / scale, bottom: top + height / scale };
}

/** Where a tile lies on the canvas: whole pixels, so that neighbours meet without a seam. */
export function placeOf({ scale, column, row, width, height }: Spot, sight: Sight) {
	const by = sight.scale / scale;
	const left = Math.round(sight.x + column * tileSize * by);
	const top = Math.round(sight.y + row * tileSize * by);
	const right = Math.round(sight.x + (column * tileSize + width) * by);
	const bottom = Math.round(sight.y + (row * tileSize + height) * by);
	return { left, top, width: right - left, height: bottom - top };
}

/** The part of the paper in sight. */
export const areaInSight = ({ x, y, scale, width, height }: Sight): Area => ({
	left: -x / scale,
	top: -y / scale,
	right: (width - x) / scale,
	bottom: (height - y) / scale,
});
