import type { Coverage } from '../../boundaries/coverage.ts';
import { lonStep } from './extent.ts';

export type LonLat = [number, number];

/** The points of an arc in longitude and latitude, walked either way, longitudes running on past 180. */
export function arcLonLat(
	{ arcPoints, arcStarts }: Pick<Coverage, 'arcPoints' | 'arcStarts'>,
	signed: number,
): LonLat[] {
	const arc = signed < 0 ? ~signed : signed;
	const points: LonLat[] = [];
	for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
		points.push([arcPoints[2 * point], arcPoints[2 * point + 1]]);
	}
	return runOn(signed < 0 ? points.reverse() : points);
}

/** The same places with longitudes that never jump: each the short way from the one before. */
export function runOn(points: LonLat[]): LonLat[] {
	for (let i = 1; i < points.length; i++) {
		points[i][0] = points[i - 1][0] + lonStep(points[i - 1][0], points[i][0]);
	}
	return points;
}

/** A whole ring, running on, its first place repeated at the end (360 degrees on, if it goes round). */
export function ringLonLat(coverage: Coverage, arcs: Int32Array): LonLat[] {
	const points: LonLat[] = [];
	for (const signed of arcs) {
		const line = arcLonLat(coverage, signed);
		points.push(...(points.length ? line.slice(1) : line));
	}
	return runOn(points);
}
