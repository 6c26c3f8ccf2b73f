import type { Coverage } from './coverage.ts';

type Cut = Pick<Coverage, 'arcPoints' | 'arcStarts' | 'ringArcs' | 'ringStarts'>;

/** Points of a ring, interleaved, its first point not repeated at the end. */
export function ringPoints(coverage: Cut, ring: number): Float64Array {
	const { arcPoints, arcStarts, ringArcs, ringStarts } = coverage;
	let length = 0;
	for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
		const a = ringArcs[i] >= 0 ? ringArcs[i] : ~ringArcs[i];
		length += arcStarts[a + 1] - arcStarts[a] - 1;
	}
	const points = new Float64Array(2 * length);
	let at = 0;
	for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
		const half = ringArcs[i];
		const a = half >= 0 ? half : ~half;
		const first = arcStarts[a];
		const last = arcStarts[a + 1] - 1;
		for (let k = 0; k < last - first; k++) {
			const p = 2 * (half >= 0 ? first + k : last - k);
			points[at++] = arcPoints[p];
			points[at++] = arcPoints[p + 1];
		}
	}
	return points;
}

/** West, south, east, north of interleaved points. */
export function boxOf(points: Float64Array): [number, number, number, number] {
	let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = 0; i < points.length; i += 2) {
		if (points[i] < west) west = points[i];
		if (points[i] > east) east = points[i];
		if (points[i + 1] < south) south = points[i + 1];
		if (points[i + 1] > north) north = points[i + 1];
	}
	return [west, south, east, north];
}
