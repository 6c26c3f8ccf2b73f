import type { Coverage } from '../geometry/coverage.ts';
import { geodesicMetres } from '../geometry/ellipsoid.ts';
import type { PairTally } from './pair-tally.ts';

const near = 1e-6;

/** A stretch of meridian with a region on one side. */
interface Stretch {
	region: number;
	south: number;
	north: number;
}

/**
 * A map that goes right round the world is cut at the 180th meridian: lines that lie on one edge of it
 * and on the other are the same line. Adds the pairs that meet there, over the latitudes they share.
 */
export function addSeamLines(coverage: Coverage, tally: PairTally): void {
	const west: Stretch[] = [];
	const east: Stretch[] = [];
	const { arcPoints: p, arcStarts, arcLeft, arcRight } = coverage;
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (arcLeft[arc] >= 0 && arcRight[arc] >= 0) continue;
		for (let i = arcStarts[arc]; i + 1 < arcStarts[arc + 1]; i++) {
			const x = p[2 * i];
			if (Math.abs(Math.abs(x) - 180) > near || Math.abs(x - p[2 * i + 2]) > near) continue;
			const [y1, y2] = [p[2 * i + 1], p[2 * i + 3]];
			const region = Math.max(arcLeft[arc], arcRight[arc]);
			const stretch = { region, south: Math.min(y1, y2), north: Math.max(y1, y2) };
			(x < 0 ? west : east).push(stretch);
		}
	}
	for (const a of west) {
		for (const b of east) {
			const south = Math.max(a.south, b.south);
			const north = Math.min(a.north, b.north);
			if (north - south < near || a.region === b.region) continue;
			const metres = geodesicMetres(180, south, 180, north);
			tally.add(a.region, b.region, 0, metres, 180, (south + north) / 2);
		}
	}
}

/** Places at a pole are one place, and 180 degrees east and west are one meridian. */
export function placeOf(x: number, y: number): [number, number] {
	if (Math.abs(y) > 90 - near) return [0, Math.sign(y) * 90];
	return [Math.abs(x + 180) < near ? x + 360 : x, y];
}
