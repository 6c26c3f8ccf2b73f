import type { Coverage } from '../geometry/coverage.ts';
import { crossing } from '../geometry/crossing.ts';
import { isApart, type SegmentBlocks } from '../geometry/segment-blocks.ts';

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
	for (let i = arcStarts[arc]; i + 2 < last; i++) {
		const end = Math.min(last, i + ahead + 1);
		const west = Math.min(p[2 * i], p[2 * i + 2]);
		const east = Math.max(p[2 * i], p[2 * i + 2]);
		const south = Math.min(p[2 * i + 1], p[2 * i + 3]);
		const north = Math.max(p[2 * i + 1], p[2 * i + 3]);
		for (let j = i + 2; j < end; j++) {
			if (!isApart(p, j, west, south, east, north)) look(arc, i, arc, j);
		}
	}
}
