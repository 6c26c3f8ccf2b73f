import { lonStep } from './extent.ts';
import type { LonLat } from './ring-lonlat.ts';

/** Degrees: suppliers' files stop short of 180 by rounding, and of the poles by a little more. */
const lonSlack = 0.001;
const latSlack = 0.1;

export const nearSeam = (lon: number): boolean =>
	Math.abs(Math.abs(lonStep(0, lon)) - 180) < lonSlack;
export const nearPole = (lat: number): boolean => Math.abs(lat) > 90 - latSlack;

const onSeam = (a: LonLat, b: LonLat): boolean =>
	(nearSeam(a[0]) && nearSeam(b[0])) || (nearPole(a[1]) && nearPole(b[1]));

/**
 * An outer edge without the stretches that lie along 180 degrees or on a pole. There the supplier's
 * file was cut, not the land; drawn, they would look like a coast. Null where there are none.
 */
export function withoutSeams(points: LonLat[]): LonLat[][] | null {
	const pieces: LonLat[][] = [];
	let piece: LonLat[] = [points[0]];
	let found = false;
	for (let i = 1; i < points.length; i++) {
		if (onSeam(points[i - 1], points[i])) {
			found = true;
			if (piece.length > 1) pieces.push(piece);
			piece = [];
		}
		piece.push(points[i]);
	}
	if (piece.length > 1) pieces.push(piece);
	return found ? pieces : null;
}
