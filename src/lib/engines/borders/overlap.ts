import type { Coverage } from '../geometry/coverage.ts';
import { sweptKm2 } from '../geometry/areas.ts';
import { boxOf } from '../geometry/coverage-rings.ts';
import { crossing } from '../geometry/crossing.ts';
import { geodesicMetres } from '../geometry/ellipsoid.ts';
import { nearestOnSegment } from '../geometry/near.ts';
import { SegmentBlocks } from '../geometry/segment-blocks.ts';

/** What two regions have in common. */
export interface Overlap {
	a: number;
	b: number;
	km2: number;
	/** half the outline of the common area */
	metres: number;
	/** inside what they have in common */
	at: [number, number];
	/** their outlines are the same, corner for corner */
	same: boolean;
}

/** On the line: closer than this, in metres. */
const onLine = 1e-3;
/** How far beside a piece it is looked up, in degrees: a tenth of a millimetre. */
const aside = 1e-9;

/**
 * The common area of two regions. Its outline is made of pieces of theirs; length and area (by Green's
 * theorem) are summed over these pieces, so no clipped polygon is ever built.
 */
export function overlapOf(coverage: Coverage, a: number, b: number): Overlap {
	const lineA = outlineOf(coverage, a);
	const lineB = outlineOf(coverage, b);
	const sum: Sum = { km2: 0, metres: 0, longest: 0, at: [NaN, NaN] };
	addPieces(lineA, lineB, true, sum);
	addPieces(lineB, lineA, false, sum);
	const most = (sum.metres / 1000) ** 2 / (4 * Math.PI);
	const km2 = Math.min(Math.abs(sum.km2), most);
	return { a, b, km2, metres: sum.metres / 2, at: sum.at, same: false };
}

interface Outline {
	points: Float64Array;
	/** runs of points; every run has the region on its left */
	starts: Uint32Array;
	blocks: SegmentBlocks;
	/** west, south, east, north */
	box: [number, number, number, number];
}

/** The arcs of a region, walked with it on the left, as an outline with an index of its own. */
function outlineOf(coverage: Coverage, region: number): Outline {
	const first = coverage.ringStarts[coverage.partRings[coverage.regionParts[region]]];
	const end = coverage.ringStarts[coverage.partRings[coverage.regionParts[region + 1]]];
	const starts = new Uint32Array(end - first + 1);
	const points: number[] = [];
	for (let i = first; i < end; i++) {
		const half = coverage.ringArcs[i];
		const arc = half >= 0 ? half : ~half;
		const [from, to] = [coverage.arcStarts[arc], coverage.arcStarts[arc + 1] - 1];
		for (let k = 0; k <= to - from; k++) {
			const p = 2 * (half >= 0 ? from + k : to - k);
			points.push(coverage.arcPoints[p], coverage.arcPoints[p + 1]);
		}
		starts[i - first + 1] = points.length / 2;
	}
	const arcPoints = Float64Array.from(points);
	const none = new Int32Array(end - first).fill(-1);
	const arcLeft = new Int32Array(end - first);
	const blocks = new SegmentBlocks({ arcPoints, arcStarts: starts, arcLeft, arcRight: none });
	return { points: arcPoints, starts, blocks, box: boxOf(arcPoints) };
}

interface Sum {
	/** the latitude that areas are counted from, near the overlap so that rounding stays small */
	origin?: number;
	km2: number;
	metres: number;
	longest: number;
	at: [number, number];
}

/**
 * Adds the pieces of `line` that bound the common area: exactly one side of them is inside both. That is
 * told by looking, not by the direction of the walk, so outlines that cross themselves count right too
 * (even-odd). What lies along the other line is counted from the first line only.
 */
function addPieces(line: Outline, other: Outline, isFirst: boolean, sum: Sum): void {
	const piece = new Float64Array(4);
	const { box } = other;
	for (let run = 0; run + 1 < line.starts.length; run++) {
		for (let i = line.starts[run]; i + 1 < line.starts[run + 1]; i++) {
			if (isApart(line.points, i, box)) continue;
			const shares = cutsOf(line.points, i, [line, other]);
			for (let k = 0; k + 1 < shares.length; k++) {
				between(line.points, i, shares[k], shares[k + 1], piece);
				const side = commonSide(piece, line, other, isFirst);
				if (side !== 0) addPiece(piece, side, sum);
			}
		}
	}
}

function isApart(points: Float64Array, i: number, box: Outline['box']): boolean {
	const [x1, y1, x2, y2] = points.subarray(2 * i, 2 * i + 4);
	return (
		Math.max(x1, x2) < box[0] ||
		Math.max(y1, y2) < box[1] ||
		Math.min(x1, x2) > box[2] ||
		Math.min(y1, y2) > box[3]
	);
}

/** Where a segment is met by the outlines, its own too, as shares of the way along. */
function cutsOf(points: Float64Array, i: number, outlines: Outline[]): number[] {
	const [x1, y1, x2, y2] = points.subarray(2 * i, 2 * i + 4);
	const shares = [0, 1];
	const box = [Math.min(x1, x2), Math.min(y1, y2), Math.max(x1, x2), Math.max(y1, y2)] as const;
	for (const outline of outlines) {
		outline.blocks.search(...box, (_, j) => {
			const shared = crossing(points, i, outline.points, j);
			if (shared) shares.push(shared[0]);
			for (const end of [2 * j, 2 * j + 2]) {
				const [px, py] = outline.points.subarray(end, end + 2);
				const { share, metres } = nearestOnSegment(px, py, x1, y1, x2, y2);
				if (metres <= onLine && share > 0 && share < 1) shares.push(share);
			}
		});
	}
	return shares.sort((p, q) => p - q);
}

function between(points: Float64Array, i: number, from: number, to: number, piece: Float64Array) {
	for (let axis = 0; axis < 2; axis++) {
		const start = points[2 * i + axis];
		const end = points[2 * i + 2 + axis];
		piece[axis] = from === 0 ? start : start + from * (end - start);
		piece[2 + axis] = to === 1 ? end : start + to * (end - start);
	}
}

/** 1 when only the left of a piece is in both regions, -1 when only the right is, 0 when both or none. */
function commonSide(piece: Float64Array, line: Outline, other: Outline, isFirst: boolean): number {
	const x = (piece[0] + piece[2]) / 2;
	const y = (piece[1] + piece[3]) / 2;
	const length = Math.hypot(piece[2] - piece[0], piece[3] - piece[1]);
	if (length === 0 || (!isFirst && liesOn(x, y, other))) return 0;
	const dx = (-(piece[3] - piece[1]) / length) * aside;
	const dy = ((piece[2] - piece[0]) / length) * aside;
	const left = isInBoth(x + dx, y + dy, line, other);
	const right = isInBoth(x - dx, y - dy, line, other);
	return Number(left) - Number(right);
}

const isInBoth = (x: number, y: number, line: Outline, other: Outline) =>
	other.blocks.regionsAt(x, y).length > 0 && line.blocks.regionsAt(x, y).length > 0;

function liesOn(x: number, y: number, other: Outline): boolean {
	let found = false;
	const reach = 1e-7;
	other.blocks.search(x - reach, y - reach, x + reach, y + reach, (_, j) => {
		const [ux, uy, vx, vy] = other.points.subarray(2 * j, 2 * j + 4);
		if (nearestOnSegment(x, y, ux, uy, vx, vy).metres <= onLine) found = true;
	});
	return found;
}

function addPiece(piece: Float64Array, side: number, sum: Sum): void {
	const metres = geodesicMetres(piece[0], piece[1], piece[2], piece[3]);
	sum.origin ??= piece[1];
	const below = Float64Array.of(piece[0], sum.origin, piece[2], sum.origin);
	sum.km2 += side * (sweptKm2(piece, 0, 1) - sweptKm2(below, 0, 1));
	sum.metres += metres;
	if (metres <= sum.longest) return;
	sum.longest = metres;
	const reach = (side * aside) / Math.hypot(piece[2] - piece[0], piece[3] - piece[1]);
	sum.at = [
		(piece[0] + piece[2]) / 2 - (piece[3] - piece[1]) * reach,
		(piece[1] + piece[3]) / 2 + (piece[2] - piece[0]) * reach,
	];
}
