import Flatbush from 'flatbush';
import type { Coverage } from '../geometry/coverage.ts';
import { boxOf } from '../geometry/coverage-rings.ts';
import { insidePlace } from '../geometry/inside-place.ts';
import { doubleArea, sideOfRing } from '../geometry/rings.ts';
import { SegmentBlocks } from '../geometry/segment-blocks.ts';
import { traceRings, type ArcRing } from './arc-rings.ts';
import type { Arcs } from './arcs.ts';
import { ringKm2 } from './ring-area.ts';
import { pointsOf } from './traced-ring.ts';

/** Nobody's land enclosed by two or more regions. */
export interface Hole {
	/** regions around it */
	regions: number[];
	/** metres of its outline along each of them */
	shares: number[];
	/** metres of its whole outline, that of land inside it too */
	metres: number;
	km2: number;
	/** twice the area by the length of its outline */
	meanMetres: number;
	at: [number, number];
	/** its outline, anticlockwise, then that of land inside it, clockwise; first points not repeated */
	rings: Float64Array[];
	/** whose line each edge of the outline is, from its first point on */
	owners: Int32Array;
}

/**
 * The holes of a coverage that lie between regions, largest first: arcs with nobody on one side, walked
 * with nobody on the left, that come round anticlockwise. With `overlapping`, what another region covers
 * is none.
 */
export function holesBetween(coverage: Coverage, arcs: Arcs, overlapping: boolean): Hole[] {
	const blocks = overlapping ? new SegmentBlocks(coverage) : null;
	const holes: Hole[] = [];
	for (const { ring, points, islands } of facesOfNobody(arcs)) {
		const regions = [...new Set(ring.map((half) => ownerOf(arcs, half)))].sort((a, b) => a - b);
		if (regions.length < 2) continue;
		const inner = islands.map((island) => pointsOf(island, arcs));
		const place = insidePlace([points, ...inner]);
		if (blocks && blocks.regionsAt(...place).length > 0) continue;
		const shares = regions.map((region) =>
			metresOf(coverage, [ring], (half) => ownerOf(arcs, half) === region),
		);
		const km2 = [points, ...inner].reduce((sum, line) => sum + ringKm2(line), 0);
		const metres = metresOf(coverage, [ring, ...islands]);
		holes.push({
			...{ regions, shares, metres, km2 },
			meanMetres: (2e6 * km2) / metres,
			at: place,
			rings: [points, ...inner],
			owners: ownersOfEdges(ring, arcs),
		});
	}
	return holes.sort((a, b) => b.km2 - a.km2);
}

interface Face {
	ring: ArcRing;
	points: Float64Array;
	/** rings of land inside that touches nothing around */
	islands: ArcRing[];
}

/** Every enclosed face with nobody in it, with the outlines of the land that lies free inside. */
function facesOfNobody(arcs: Arcs): Face[] {
	const halves: number[] = [];
	for (let a = 0; a < arcs.left.length; a++) {
		if (arcs.left[a] < 0) halves.push(a);
		else if (arcs.right[a] < 0) halves.push(~a);
	}
	const faces: Face[] = [];
	const outsides: { ring: ArcRing; box: [number, number, number, number] }[] = [];
	for (const ring of traceRings(Int32Array.from(halves), arcs)) {
		const points = pointsOf(ring, arcs);
		const turn = doubleArea(points, 0, points.length / 2);
		if (turn > 0) faces.push({ ring, points, islands: [] });
		else if (turn < 0) outsides.push({ ring, box: boxOf(points) });
	}
	if (faces.length === 0) return faces;
	const sizes = faces.map(({ points }) => doubleArea(points, 0, points.length / 2));
	const index = new Flatbush(faces.length);
	for (const { points } of faces) index.add(...boxOf(points));
	index.finish();
	for (const { ring, box } of outsides) {
		const around = index.search(...box, (_, x0, y0, x1, y1) => {
			return x0 <= box[0] && y0 <= box[1] && x1 >= box[2] && y1 >= box[3];
		});
		if (around.length === 0) continue;
		const points = pointsOf(ring, arcs);
		const holders = around.filter((face) => surrounds(faces[face].points, points));
		holders.sort((p, q) => sizes[p] - sizes[q]);
		if (holders.length) faces[holders[0]].islands.push(ring);
	}
	return faces;
}

/** Decided by the first point that is not on the outer line itself. */
function surrounds(outer: Float64Array, points: Float64Array): boolean {
	for (let i = 0; i < points.length; i += 2) {
		const side = sideOfRing(outer, 0, outer.length / 2, points[i], points[i + 1]);
		if (side !== 0) return side > 0;
	}
	return false;
}

const numberOf = (half: number) => (half >= 0 ? half : ~half);

const ownerOf = (arcs: Arcs, half: number) => (half >= 0 ? arcs.right[half] : arcs.left[~half]);

function metresOf(coverage: Coverage, rings: ArcRing[], counts = (_half: number) => true): number {
	const halves = rings.flat().filter(counts);
	return halves.reduce((sum, half) => sum + coverage.arcMetres[numberOf(half)], 0);
}

function ownersOfEdges(ring: ArcRing, arcs: Arcs): Int32Array {
	const owners: number[] = [];
	for (const half of ring) {
		const edges = arcs.starts[numberOf(half) + 1] - arcs.starts[numberOf(half)] - 1;
		for (let k = 0; k < edges; k++) owners.push(ownerOf(arcs, half));
	}
	return Int32Array.from(owners);
}
