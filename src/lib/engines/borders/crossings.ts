import type { Coverage } from '../geometry/coverage.ts';
import { crossing } from '../geometry/crossing.ts';
import type { SegmentBlocks } from '../geometry/segment-blocks.ts';

/** Up to so many points, shared lines are looked up everywhere too, and not only along themselves. */
const mostEverywhere = 400_000;
/** How many segments further on along a shared line it is looked for crossing itself. */
const ahead = 8;

type Found = (arc: number, other: number, at: [number, number]) => void;

/**
 * Calls `found` for places where lines cross. Lines with nobody on one side are compared with all others.
 * Shared lines can only cross where a region is folded over itself, mostly by a corner digitised out of
 * order: in a large coverage they are compared with what follows along the same line.
 */
export function eachCrossing(coverage: Coverage, blocks: SegmentBlocks, found: Found): void {
	const { arcLeft, arcRight, arcPoints: p } = coverage;
	const isShared = (arc: number) => arcLeft[arc] >= 0 && arcRight[arc] >= 0;
	const look = (arc: number, i: number, other: number, j: number) => {
		const shares = crossing(p, i, p, j);
		if (!shares) return;
		const x = p[2 * i] + shares[0] * (p[2 * i + 2] - p[2 * i]);
		const y = p[2 * i + 1] + shares[0] * (p[2 * i + 3] - p[2 * i + 1]);
		found(arc, other, [x, y]);
	};
	if (p.length <= 2 * mostEverywhere) return blocks.eachPair(() => true, look);
	blocks.eachPair((arc) => !isShared(arc), look);
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (isShared(arc)) lookAlong(coverage, arc, look);
	}
}

function lookAlong(
	{ arcPoints: p, arcStarts }: Coverage,
	arc: number,
	look: (arc: number, i: number, other: number, j: number) => void,
): void {
	const last = arcStarts[arc + 1] - 1;
	for (let i = arcStarts[arc]; i < last; i++) {
		const end = Math.min(last, i + ahead + 1);
		for (let j = i + 2; j < end; j++) if (boxesMeet(p, 2 * i, 2 * j)) look(arc, i, arc, j);
	}
}

/** Whether two segments, by the places of their first points, have boxes that meet. */
function boxesMeet(p: Float64Array, i: number, j: number): boolean {
	const isApart = (axis: number) => {
		const [a, b, c, d] = [p[i + axis], p[i + 2 + axis], p[j + axis], p[j + 2 + axis]];
		return (a < c && a < d && b < c && b < d) || (a > c && a > d && b > c && b > d);
	};
	return !isApart(0) && !isApart(1);
}
