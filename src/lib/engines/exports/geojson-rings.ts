import type { Coverage } from '../boundaries/coverage.ts';
import { ringLonLat, type LonLat } from '../sheet/index.ts';
import { cutPart, span } from './cut-part.ts';

/** Seven decimals of a degree are about a centimetre; more would be noise. */
const rounded = (value: number): number => Number(value.toFixed(7)) || 0;

function leavesRange(ring: LonLat[]): boolean {
	const turn = Math.abs(ring[ring.length - 1][0] - ring[0][0]) > 180;
	return turn || ring.some(([lon]) => lon > 180 || lon < -180);
}

/** A ring's longitudes brought to where most of them are between -180 and 180. */
function settled(ring: LonLat[]): LonLat[] {
	const middle = (Math.min(...span(ring)) + Math.max(...span(ring))) / 2;
	const shift = 360 * Math.round(middle / 360);
	return shift ? ring.map(([lon, lat]) => [lon - shift, lat]) : ring;
}

/** Whether a ring comes to 180 degrees, or goes round a pole. */
export function reachesSeam(ring: LonLat[]): boolean {
	const turn = Math.abs(ring[ring.length - 1][0] - ring[0][0]) > 180;
	return turn || settled(ring).some(([lon]) => Math.abs(lon) >= 180 - 1e-9);
}

/**
 * The polygons of a region as RFC 7946 wants them: outer rings anticlockwise and holes clockwise
 * (3.1.6), as in the coverage; parts across 180 degrees cut there (3.1.9); rings closed.
 */
export function polygonsOf(coverage: Coverage, region: number): LonLat[][][] {
	const { ringArcs, ringStarts, partRings, regionParts } = coverage;
	const polygons: LonLat[][][] = [];
	for (let part = regionParts[region]; part < regionParts[region + 1]; part++) {
		const rings: LonLat[][] = [];
		for (let ring = partRings[part]; ring < partRings[part + 1]; ring++) {
			const arcs = ringArcs.subarray(ringStarts[ring], ringStarts[ring + 1]);
			rings.push(settled(ringLonLat(coverage, arcs)));
		}
		polygons.push(...(rings.some(leavesRange) ? cutPart(rings) : [rings]));
	}
	return polygons.map((rings) =>
		rings.map((ring) => ring.map(([lon, lat]): LonLat => [rounded(lon), rounded(lat)])),
	);
}
