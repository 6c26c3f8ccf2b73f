import type { Coverage } from '../geometry/coverage.ts';
import { boxOf, ringPoints } from '../geometry/coverage-rings.ts';
import type { SegmentBlocks } from '../geometry/segment-blocks.ts';
import { eachCrossing } from './crossings.ts';
import type { Meeting } from './touches.ts';

/** Pairs that may overlap, and places where a region's own outline crosses itself. */
export interface Suspects {
	pairs: Map<number, [number, number]>;
	/** regions whose own parts may lie on each other */
	doubtful: Set<number>;
	crossings: SelfCrossing[];
}

/** A place where a region's own outline crosses itself, or where its parts lie on each other. */
export interface SelfCrossing {
	region: number;
	at: [number, number];
	doubled?: boolean;
}

/**
 * Finds every pair that could overlap. Regions overlap only where an unmatched outline crosses another
 * line, where around a meeting place two neighbouring lines disagree about what lies between them, or
 * where a separate piece of the map lies inside a region. When any of this is found, the parts around
 * are looked up too, since a large region laid over many covers some it does not touch.
 */
export function suspects(coverage: Coverage, blocks: SegmentBlocks, places: Meeting[]): Suspects {
	const found: Suspects = { pairs: new Map(), doubtful: new Set(), crossings: [] };
	noteCrossings(coverage, blocks, found);
	for (const place of places) {
		if (place.arcs.length > 2 && disagrees(coverage, place)) {
			const around = place.arcs.flatMap((arc) => [coverage.arcLeft[arc], coverage.arcRight[arc]]);
			pairUp(around, around, coverage, found);
		}
	}
	lookUp(piecePlaces(coverage, places), coverage, blocks, found);
	if (found.pairs.size > 0) lookUp(partsNear(coverage, found), coverage, blocks, found);
	return found;
}

type Place = [x: number, y: number, region: number];

function lookUp(
	places: Iterable<Place>,
	coverage: Coverage,
	blocks: SegmentBlocks,
	found: Suspects,
): void {
	for (const [x, y, region] of places) {
		const regions = blocks.regionsAt(x, y);
		pairUp([region], regions, coverage, found);
		// covered an even number of times: the parts of the region may lie on each other there
		if (!regions.includes(region)) found.doubtful.add(region);
	}
}

function pairUp(these: number[], those: number[], coverage: Coverage, found: Suspects): void {
	for (const a of these) {
		for (const b of those) {
			if (a < 0 || b < 0 || a === b) continue;
			const [low, high] = a < b ? [a, b] : [b, a];
			found.pairs.set(low * coverage.keys.length + high, [low, high]);
		}
	}
}

/** Regions on both lines cross themselves there; each is told once. */
function noteCrossings(coverage: Coverage, blocks: SegmentBlocks, found: Suspects): void {
	const { arcLeft, arcRight } = coverage;
	const crossed = new Set<number>();
	eachCrossing(coverage, blocks, (arc, other, at) => {
		const mine = [arcLeft[arc], arcRight[arc]];
		const theirs = [arcLeft[other], arcRight[other]];
		pairUp(mine, theirs, coverage, found);
		for (const region of mine) {
			if (region < 0 || crossed.has(region) || !theirs.includes(region)) continue;
			crossed.add(region);
			found.crossings.push({ region, at });
		}
	});
}

/** Goes round a place from line to line: what is left of one must be right of the next. */
function disagrees(coverage: Coverage, place: Meeting): boolean {
	const ends = place.arcs.map((arc, i) => {
		const isStart = startsHere(coverage, place, i);
		const near = isStart ? coverage.arcStarts[arc] + 1 : coverage.arcStarts[arc + 1] - 2;
		const { arcPoints: p, arcLeft, arcRight } = coverage;
		return {
			angle: Math.atan2(p[2 * near + 1] - place.y, p[2 * near] - place.x),
			left: isStart ? arcLeft[arc] : arcRight[arc],
			right: isStart ? arcRight[arc] : arcLeft[arc],
		};
	});
	ends.sort((a, b) => a.angle - b.angle);
	return ends.some((end, i) => {
		const next = ends[(i + 1) % ends.length];
		return end.left !== next.right || (i + 1 < ends.length && end.angle === next.angle);
	});
}

/** A closed arc is listed twice: first its start, then its end. */
function startsHere(coverage: Coverage, place: Meeting, i: number): boolean {
	const arc = place.arcs[i];
	const first = coverage.arcStarts[arc];
	const { arcPoints: p } = coverage;
	return p[2 * first] === place.x && p[2 * first + 1] === place.y && place.arcs.indexOf(arc) === i;
}

/** A place slightly inside every part that lies within the box of a region already suspected. */
function* partsNear(coverage: Coverage, found: Suspects): Generator<Place> {
	const suspected = new Set([...found.pairs.values()].flat());
	const boxes = [...suspected].map((r) => ({ r, box: boxOfRegion(coverage, r) }));
	for (let r = 0; r < coverage.keys.length; r++) {
		for (let part = coverage.regionParts[r]; part < coverage.regionParts[r + 1]; part++) {
			const edge = firstEdge(coverage, coverage.partRings[part]);
			const [x, y] = besideEdge(edge, 1);
			const isNear = boxes.some(
				(b) => b.r !== r && x >= b.box[0] && y >= b.box[1] && x <= b.box[2] && y <= b.box[3],
			);
			if (isNear) yield [x, y, r];
		}
	}
}

function boxOfRegion(coverage: Coverage, region: number): [number, number, number, number] {
	const boxes: number[][] = [];
	for (let part = coverage.regionParts[region]; part < coverage.regionParts[region + 1]; part++) {
		boxes.push(boxOf(ringPoints(coverage, coverage.partRings[part])));
	}
	const side = (i: number, pick: typeof Math.min) => pick(...boxes.map((box) => box[i]));
	return [side(0, Math.min), side(1, Math.min), side(2, Math.max), side(3, Math.max)];
}

/** The first two points of a ring. */
function firstEdge(coverage: Coverage, ring: number): Float64Array {
	const { arcPoints: p, arcStarts, ringArcs, ringStarts } = coverage;
	const half = ringArcs[ringStarts[ring]];
	if (half >= 0) return p.subarray(2 * arcStarts[half], 2 * arcStarts[half] + 4);
	const last = 2 * (arcStarts[~half + 1] - 1);
	return Float64Array.of(p[last], p[last + 1], p[last - 2], p[last - 1]);
}

/** One such place for every connected piece of the map. */
function* piecePlaces(coverage: Coverage, places: Meeting[]): Generator<Place> {
	const group = groupsOfArcs(coverage, places);
	const seen = new Set<number>();
	for (let arc = 0; arc < coverage.arcLeft.length; arc++) {
		if (seen.has(group[arc])) continue;
		seen.add(group[arc]);
		const first = 2 * coverage.arcStarts[arc];
		const points = coverage.arcPoints.subarray(first, first + 4);
		const isLeft = coverage.arcLeft[arc] >= 0;
		const region = isLeft ? coverage.arcLeft[arc] : coverage.arcRight[arc];
		const place = isLeft ? besideEdge(points, 1) : besideEdge(points, -1);
		yield [...place, region];
	}
}

function groupsOfArcs(coverage: Coverage, places: Meeting[]): Int32Array {
	const group = Int32Array.from(coverage.arcLeft, (_, arc) => arc);
	const find = (arc: number): number => {
		let root = arc;
		while (group[root] !== root) root = group[root] = group[group[root]];
		return root;
	};
	for (const { arcs } of places) for (const arc of arcs) group[find(arc)] = find(arcs[0]);
	for (let arc = 0; arc < group.length; arc++) group[arc] = find(arc);
	return group;
}

/** A ten-thousandth of an edge to its left (1) or right (-1), half way along. */
function besideEdge(points: Float64Array, side: number): [number, number] {
	const dx = points[2] - points[0];
	const dy = points[3] - points[1];
	const away = side * 1e-4;
	return [points[0] + dx / 2 - dy * away, points[1] + dy / 2 + dx * away];
}
