/**
 * A coverage made ready for drawing: the coverage's own arcs, and after them arcs that only this map
 * needs, where regions run across the cut of the map or the supplier cut them along 180 degrees. The
 * coverage is not changed.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import { cutLine, cutRing } from './cut-open.ts';
import { wrapLon } from './extent.ts';
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
	/** for each arc that was added the arc of the coverage that it stands for, or one of its ring */
	addedFor: number[];
}

interface ExtraArc {
	points: LonLat[];
	left: number;
	right: number;
	from: number;
}

/** Degrees kept clear of the cut, a tenth of a metre, so that rounding carries no place across it. */
const clear = 1e-6;

/**
 * In: `cut`, the meridian along which the map is open, or null; `within`, the arcs that are drawn on
 * that map (all unless given).
 */
export function drawable(
	coverage: Coverage,
	cut: number | null,
	within: (arc: number) => boolean = () => true,
): Drawable {
	const arcs = coverage.arcStarts.length - 1;
	const [left, right] = [coverage.arcLeft.slice(), coverage.arcRight.slice()];
	const extra: ExtraArc[] = [];
	const across = new Uint8Array(arcs);
	for (let arc = 0; arc < arcs; arc++) {
		if (cut !== null && within(arc) && isAcross(coverage, arc, cut)) across[arc] = 1;
		const pieces = linePieces(coverage, arc, across[arc] ? cut : null);
		if (!pieces) continue;
		for (const points of pieces)
			extra.push({ points, left: left[arc], right: right[arc], from: arc });
		left[arc] = right[arc] = -1;
	}
	const rings = coverage.keys.map((_, region) =>
		ringsOf(coverage, region).flatMap((ring) => {
			const from = ring[0] < 0 ? ~ring[0] : ring[0];
			if (cut === null || !ring.some((signed) => across[signed < 0 ? ~signed : signed]))
				return [ring];
			return cutRing(turned(ringLonLat(coverage, ring), cut)).map((points) => {
				extra.push({ points: turnedBack(points, cut), left: -1, right: -1, from });
				return Int32Array.of(arcs + extra.length - 1);
			});
		}),
	);
	const addedFor = extra.map(({ from }) => from);
	return { ...withExtra(coverage, left, right, extra), rings, addedFor };
}

/** Places with the cut brought to 180 degrees, for the cutters, and back again. */
const turned = (points: LonLat[], cut: number): LonLat[] =>
	points.map(([lon, lat]) => [lon - cut + 180, lat]);
const turnedBack = (points: LonLat[], cut: number): LonLat[] =>
	points.map(([lon, lat]) => [Math.min(180 - clear, Math.max(clear - 180, lon)) + cut - 180, lat]);

/** What is drawn of an arc in its stead, or null where it is drawn as it is. */
function linePieces(coverage: Coverage, arc: number, cut: number | null): LonLat[][] | null {
	const outer = coverage.arcLeft[arc] < 0 || coverage.arcRight[arc] < 0;
	const parted =
		cut === null
			? null
			: cutLine(turned(arcLonLat(coverage, arc), cut)).map((piece) => turnedBack(piece, cut));
	if (!outer || !touchesSeam(coverage, arc)) return parted;
	const pieces = parted ?? [arcLonLat(coverage, arc)];
	const open = pieces.map(withoutSeams);
	if (!parted && open[0] === null) return null;
	return pieces.flatMap((piece, i) => open[i] ?? [piece]);
}

function touchesSeam({ arcPoints, arcStarts }: Coverage, arc: number): boolean {
	for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
		if (nearSeam(arcPoints[2 * point]) || nearPole(arcPoints[2 * point + 1])) return true;
	}
	return false;
}

/** Whether an arc runs from one side of the cut to the other. */
function isAcross({ arcPoints, arcStarts }: Coverage, arc: number, cut: number): boolean {
	const side = (lon: number) => {
		const from = lon - cut + 180;
		return Math.abs(from) <= 180 ? from : wrapLon(from);
	};
	let before = side(arcPoints[2 * arcStarts[arc]]);
	for (let point = arcStarts[arc] + 1; point < arcStarts[arc + 1]; point++) {
		const here = side(arcPoints[2 * point]);
		if (Math.abs(here - before) > 180) return true;
		before = here;
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
