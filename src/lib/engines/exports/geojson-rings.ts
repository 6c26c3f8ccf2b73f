import type { Coverage } from '../boundaries/coverage.ts';
import { cutRing, ringLonLat, type LonLat } from '../sheet/index.ts';

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

function span(ring: LonLat[]): [number, number] {
	let [west, east] = [Infinity, -Infinity];
	for (const [lon] of ring) [west, east] = [Math.min(west, lon), Math.max(east, lon)];
	return [west, east];
}

function encloses(ring: LonLat[], [x, y]: LonLat): boolean {
	let inside = false;
	ring.forEach(([x0, y0], i) => {
		const [x1, y1] = ring[(i || ring.length) - 1];
		if (y0 > y !== y1 > y && x < ((x1 - x0) * (y - y0)) / (y1 - y0) + x0) inside = !inside;
	});
	return inside;
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

/** Every piece of the outer ring with the pieces of holes that lie in it, cut at 180 degrees. */
export function cutPart([outer, ...holes]: LonLat[][]): LonLat[][][] {
	const cutHoles = holes.flatMap(cutRing);
	return cutRing(outer).map((piece) => [
		piece,
		...cutHoles.filter((hole) => encloses(piece, hole[Math.floor(hole.length / 2)])),
	]);
}
