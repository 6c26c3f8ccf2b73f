/** Where no name may stand because of the map's frame. */
import type { OnPaper } from '../place-on-paper.ts';
import type { Box } from '../plane/fit.ts';

/** Half the width of the band along a frame, hundredths of a millimetre on A4. */
const band = 30;
/** Rows into which the ground beside the globe is parted. */
const rows = 60;

/** Boxes along the frames of insets, over and under what stands in them, and beside the globe. */
export function frameObstacles(placed: OnPaper, scale: number): Box[] {
	const half = Math.round(band * scale);
	const insets = placed.insets.filter(({ ratio }) => ratio > 0);
	return [
		...insets.flatMap(({ outer: { x, y, width, height }, inner }): Box[] => [
			{ x, y, width, height: inner.y - y },
			{ x, y: inner.y + inner.height, width, height: y + height - inner.y - inner.height },
			{ x: x - half, y, width: 2 * half, height },
			{ x: x + width - half, y, width: 2 * half, height },
			{ x, y: y - half, width, height: 2 * half },
			{ x, y: y + height - half, width, height: 2 * half },
		]),
		...(placed.globe ? besideGlobe(placed.globe, placed.box) : []),
	];
}

/** Rows of boxes left and right of a closed outline that bulges nowhere inwards. */
function besideGlobe(outline: Int32Array, box: Box): Box[] {
	const high = box.height / rows;
	return Array.from({ length: rows }, (_, row) => box.y + row * high).flatMap((y): Box[] => {
		const span = spanWithin(outline, y, y + high);
		if (!span) return [{ x: box.x, y, width: box.width, height: high }];
		const [left, right] = span;
		return [
			{ x: box.x, y, width: Math.max(0, left - box.x), height: high },
			{ x: right, y, width: Math.max(0, box.x + box.width - right), height: high },
		];
	});
}

/** Narrowest span of the outline over a row: what lies inside it all the way. */
function spanWithin(outline: Int32Array, top: number, bottom: number): [number, number] | null {
	const spans = [top, bottom].map((y) => {
		let [left, right] = [Infinity, -Infinity];
		for (let i = 0, j = outline.length - 2; i < outline.length; j = i, i += 2) {
			const [x0, y0, x1, y1] = [outline[j], outline[j + 1], outline[i], outline[i + 1]];
			if (y0 > y === y1 > y) continue;
			const x = x0 + ((x1 - x0) * (y - y0)) / (y1 - y0);
			[left, right] = [Math.min(left, x), Math.max(right, x)];
		}
		return [left, right];
	});
	const [left, right] = [Math.max(spans[0][0], spans[1][0]), Math.min(spans[0][1], spans[1][1])];
	return left < right && Number.isFinite(left) ? [left, right] : null;
}
