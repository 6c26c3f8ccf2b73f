import type { GeoProjection } from 'd3-geo';
import type { Coverage } from '../../boundaries/coverage.ts';
import { lonStep } from './extent.ts';

/** Projected arcs in radii of the sphere: x, y interleaved, with the first point of each arc. */
export interface PlaneArcs {
	points: Float64Array;
	starts: Uint32Array;
}

/** Degrees above which a straight line of the file may look bent on paper and is looked into. */
const longSegment = 0.5;
const deepest = 7;

/**
 * Projects every arc point. Straight lines in longitude and latitude (RFC 7946, section 3.1.1) are
 * bent where the projection bends them: points are added until a line is off by less than `slack`
 * radii at its middle.
 */
export function projectArcs(
	{ arcPoints, arcStarts }: Pick<Coverage, 'arcPoints' | 'arcStarts'>,
	projection: GeoProjection,
	slack: number,
): PlaneArcs {
	const points: number[] = [];
	const starts = new Uint32Array(arcStarts.length);

	const project = (lon: number, lat: number) => projection([lon, lat])!;

	function bend(a: Place, b: Place, depth: number): void {
		const lon = a.lon + lonStep(a.lon, b.lon) / 2;
		const lat = (a.lat + b.lat) / 2;
		const [x, y] = project(lon, lat);
		const off = Math.hypot(x - (a.x + b.x) / 2, y - (a.y + b.y) / 2);
		if (off <= slack || depth === deepest) return;
		const middle = { lon, lat, x, y };
		bend(a, middle, depth + 1);
		points.push(x, y);
		bend(middle, b, depth + 1);
	}

	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		starts[arc] = points.length / 2;
		let last: Place | null = null;
		for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
			const [lon, lat] = [arcPoints[2 * point], arcPoints[2 * point + 1]];
			const [x, y] = project(lon, lat);
			const here = { lon, lat, x, y };
			if (last && isLong(last, here)) bend(last, here, 0);
			points.push(x, y);
			last = here;
		}
	}
	starts[arcStarts.length - 1] = points.length / 2;
	return { points: Float64Array.from(points), starts };
}

interface Place {
	lon: number;
	lat: number;
	x: number;
	y: number;
}

function isLong(a: Place, b: Place): boolean {
	// 180 and -180 are one meridian: a seam there is straight on every map that is cut along it
	const width = Math.abs(lonStep(a.lon, b.lon));
	return width > longSegment || Math.abs(a.lat - b.lat) > 4 * longSegment;
}
