import { meetings } from '../borders/touches.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { ringsOfPart } from './coverage-parts.ts';
import { surroundedBy } from './enclaves.ts';
import { insidePlace } from '../geometry/inside-place.ts';
import { ringKm2 } from './ring-area.ts';

/** One part of a region that does not simply lie among its neighbours in one piece. */
export interface Piece {
	region: number;
	/** which of the region's parts it is, in the order of the coverage from 0 */
	part: number;
	areaKm2: number;
	/** longitude and latitude of a place inside */
	at: [number, number];
	kind: 'main' | 'exclave' | 'island';
	/** the region in whose hole it lies (the smallest such hole), or -1 */
	within: number;
}

/**
 * Every part of the regions that have several parts, are islands or lie within another region; in the
 * order of regions, largest part first. The largest part is the main one. Of the others an exclave touches
 * another region, in a line or a point, and an island touches none; the only part of a region is an
 * island when it touches none. Input: a coverage whose invariants hold; overlaps do not count as touching.
 */
export function piecesOf(coverage: Coverage): Piece[] {
	const { keys, regionParts } = coverage;
	const within = surroundedBy(coverage);
	const touches = partsThatTouch(coverage);
	const pieces: Piece[] = [];
	for (let region = 0; region < keys.length; region++) {
		const [from, to] = [regionParts[region], regionParts[region + 1]];
		if (to - from === 1 && touches[from] && within[from] < 0) continue;
		const rows: Piece[] = [];
		for (let part = from; part < to; part++) {
			const rings = ringsOfPart(coverage, part);
			const areaKm2 = rings.reduce((sum, ring) => sum + ringKm2(ring), 0);
			const kind = touches[part] ? 'exclave' : 'island';
			rows.push({
				region,
				part: part - from,
				areaKm2,
				at: insidePlace(rings),
				kind,
				within: within[part],
			});
		}
		rows.sort((p, q) => q.areaKm2 - p.areaKm2);
		if (rows.length > 1 || touches[from]) rows[0].kind = 'main';
		pieces.push(...rows);
	}
	return pieces;
}

/** 1 for each part that shares a line or a point with another region. */
function partsThatTouch(coverage: Coverage): Uint8Array {
	const { arcLeft, arcRight, partRings, ringStarts, ringArcs } = coverage;
	const touches = new Uint8Array(partRings.length - 1);
	const meets = arcsAtOthers(coverage);
	for (let part = 0; part < touches.length; part++) {
		const end = ringStarts[partRings[part + 1]];
		for (let i = ringStarts[partRings[part]]; i < end && !touches[part]; i++) {
			const arc = ringArcs[i] >= 0 ? ringArcs[i] : ~ringArcs[i];
			if ((arcLeft[arc] >= 0 && arcRight[arc] >= 0) || meets[arc]) touches[part] = 1;
		}
	}
	return touches;
}

/** 1 for each arc that ends where lines of two or more regions meet. */
function arcsAtOthers(coverage: Coverage): Uint8Array {
	const { arcLeft, arcRight } = coverage;
	const meets = new Uint8Array(arcLeft.length);
	for (const { arcs } of meetings(coverage)) {
		const around = new Set(arcs.flatMap((arc) => [arcLeft[arc], arcRight[arc]]));
		around.delete(-1);
		if (around.size > 1) for (const arc of arcs) meets[arc] = 1;
	}
	return meets;
}
