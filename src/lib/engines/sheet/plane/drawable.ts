/**
 * A coverage made ready for drawing: the coverage's own arcs, and after them arcs that only this map
 * needs, where regions run across the cut of the map or the supplier cut them along 180 degrees. The
 * coverage is not changed.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import { cutLine, cutRing } from './cut-open.ts';
import { arcLonLat, ringLonLat, type LonLat } from './ring-lonlat.ts';
import { nearPole, nearSeam, withoutSeams } from './seams.ts';

export interface Drawable {
	arcPoints: Float64Array;
	arcStarts: Uint32Array;
	/** sides of the line to draw; -1 on both sides where the arc is not drawn as a line */
	arcLeft: Int32Array;
	arcRight: Int32Array;
	/** rings of every region as signed arcs */
	rings: Int32Array[][];
}

interface ExtraArc {
	points: LonLat[];
	left: number;
	right: number;
}

/** In: `crossed` as in `Extent`: whether the map is cut along 180 degrees and regions lie across. */
export function drawable(coverage: Coverage, crossed: boolean): Drawable {
	const arcs = coverage.arcStarts.length - 1;
	const [left, right] = [coverage.arcLeft.slice(), coverage.arcRight.slice()];
	const extra: ExtraArc[] = [];
	const across = new Uint8Array(arcs);
	for (let arc = 0; arc < arcs; arc++) {
		if (crossed && isAcross(coverage, arc)) across[arc] = 1;
		const pieces = linePieces(coverage, arc, across[arc] === 1);
		if (!pieces) continue;
		for (const points of pieces) extra.push({ points, left: left[arc], right: right[arc] });
		left[arc] = right[arc] = -1;
	}
	const rings = coverage.keys.map((_, region) =>
		ringsOf(coverage, region).flatMap((ring) => {
			if (!ring.some((signed) => across[signed < 0 ? ~signed : signed])) return [ring];
			return cutRing(ringLonLat(coverage, ring)).map((points) => {
				extra.push({ points, left: -1, right: -1 });
				return Int32Array.of(arcs + extra.length - 1);
			});
		}),
	);
	return { ...withExtra(coverage, left, right, extra), rings };
}

/** What is drawn of an arc in its stead, or null where it is drawn as it is. */
function linePieces(coverage: Coverage, arc: number, across: boolean): LonLat[][] | null {
	const outer = coverage.arcLeft[arc] < 0 || coverage.arcRight[arc] < 0;
	const cut = across ? cutLine(arcLonLat(coverage, arc)) : null;
	if (!outer || !touchesSeam(coverage, arc)) return cut;
	const pieces = cut ?? [arcLonLat(coverage, arc)];
	const open = pieces.map(withoutSeams);
	if (!cut && open[0] === null) return null;
	return pieces.flatMap((piece, i) => open[i] ?? [piece]);
}

function touchesSeam({ arcPoints, arcStarts }: Coverage, arc: number): boolean {
	for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
		if (nearSeam(arcPoints[2 * point]) || nearPole(arcPoints[2 * point + 1])) return true;
	}
	return false;
}

/** Whether an arc leaves -180 to 180, or jumps from one end of it to the other. */
function isAcross({ arcPoints, arcStarts }: Coverage, arc: number): boolean {
	for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
		const lon = arcPoints[2 * point];
		if (lon > 180 || lon < -180) return true;
		if (point > arcStarts[arc] && Math.abs(lon - arcPoints[2 * point - 2]) > 180) return true;
	}
	return false;
}

function ringsOf({ ringArcs, ringStarts, partRings, regionParts }: Coverage, region: number) {
	const rings: Int32Array[] = [];
	const last = partRings[regionParts[region + 1]];
	for (let ring = partRings[regionParts[region]]; ring < last; ring++) {
		rings.push(ringArcs.subarray(ringStarts[ring], ringStarts[ring + 1]));
	}
	return rings;
}

function withExtra(coverage: Coverage, left: Int32Array, right: Int32Array, extra: ExtraArc[]) {
	const { arcPoints, arcStarts } = coverage;
	if (!extra.length) return { arcPoints, arcStarts, arcLeft: left, arcRight: right };
	const ends: number[] = [];
	let end = arcStarts[arcStarts.length - 1];
	for (const { points } of extra) ends.push((end += points.length));
	return {
		arcPoints: Float64Array.from([...arcPoints, ...extra.flatMap(({ points }) => points.flat())]),
		arcStarts: Uint32Array.from([...arcStarts, ...ends]),
		arcLeft: Int32Array.from([...left, ...extra.map((one) => one.left)]),
		arcRight: Int32Array.from([...right, ...extra.map((one) => one.right)]),
	};
}
