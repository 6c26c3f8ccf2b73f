import type { ArcSides } from '../lines.ts';
import type { Box } from '../plane/fit.ts';
import type { SheetArcs } from '../plane/quantise.ts';

/** Rows in which a corner is looked at. */
const rows = 48;
/** A legend may touch this share of its box, a headland or a speck of an island. */
const mostCovered = 0.01;

export interface Corner {
	box: Box;
	/** share of the box that regions cover */
	covered: number;
}

/**
 * The corner of the map where a box of a size covers least of the regions, the upper right one first where
 * several cover nothing. In: the outlines on the paper, the map's box, the size, and boxes that are taken.
 * Out: null where every corner is taken, by regions or by those boxes.
 */
export function emptyCorner(
	arcs: SheetArcs,
	sides: ArcSides,
	map: Box,
	size: { width: number; height: number },
	takenBoxes: readonly Box[],
): Corner | null {
	const right = map.x + map.width - size.width;
	const bottom = map.y + map.height - size.height;
	const corners = [
		[right, map.y],
		[map.x, map.y],
		[right, bottom],
		[map.x, bottom],
	].map(([x, y]) => ({ ...size, x: Math.round(x), y: Math.round(y) }));
	const free = corners.filter((box) => !takenBoxes.some((taken) => overlap(box, taken)));
	const measured = free.map((box) => ({ box, covered: coveredShare(arcs, sides, box) }));
	const best = measured.reduce<Corner | null>(
		(least, one) => (!least || one.covered < least.covered ? one : least),
		null,
	);
	return best && best.covered <= mostCovered ? best : null;
}

const overlap = (a: Box, b: Box): boolean =>
	a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;

/** By scan lines over the outer edges of all regions together, even and odd. */
function coveredShare({ arcPoints: p, arcStarts }: SheetArcs, sides: ArcSides, box: Box): number {
	const crossings: number[][] = Array.from({ length: rows }, () => []);
	const step = box.height / rows;
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		if (sides.arcLeft[arc] < 0 === sides.arcRight[arc] < 0) continue;
		for (let i = arcStarts[arc]; i + 1 < arcStarts[arc + 1]; i++) {
			const [x0, y0, x1, y1] = [p[2 * i], p[2 * i + 1], p[2 * i + 2], p[2 * i + 3]];
			if (y0 === y1) continue;
			const first = Math.max(0, Math.ceil((Math.min(y0, y1) - box.y) / step - 0.5));
			const last = Math.min(rows - 1, Math.ceil((Math.max(y0, y1) - box.y) / step - 0.5) - 1);
			for (let row = first; row <= last; row++) {
				const y = box.y + (row + 0.5) * step;
				crossings[row].push(x0 + ((x1 - x0) * (y - y0)) / (y1 - y0));
			}
		}
	}
	const covered = crossings.reduce((sum, along) => sum + lengthWithin(along, box), 0);
	return covered / (rows * box.width);
}

function lengthWithin(along: number[], { x, width }: Box): number {
	along.sort((a, b) => a - b);
	const held = (at: number) => Math.max(x, Math.min(x + width, at));
	let sum = 0;
	for (let i = 0; i + 1 < along.length; i += 2) sum += held(along[i + 1]) - held(along[i]);
	return sum;
}
