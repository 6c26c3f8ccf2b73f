import type { Coverage } from '../geometry/coverage.ts';
import { geodesicMetres } from '../geometry/ellipsoid.ts';
import type { PairTally } from './pair-tally.ts';

const near = 1e-6;

/** A stretch of the 180th meridian, or a single place on it, where a region lies beside it. */
interface Stretch {
	region: number;
	south: number;
	north: number;
}

type Pairs = [a: number, b: number, at: [number, number]][];

/**
 * A map that goes right round the world is cut at the 180th meridian: lines that lie on one edge of it
 * and on the other are the same line, and all places at a pole are one. Adds the pairs that meet there by
 * a line, over the latitudes they share, and answers those that meet in a point at least.
 */
export function addSeamLines(coverage: Coverage, tally: PairTally): Pairs {
	const [west, east] = stretches(coverage);
	const points = polePairs(coverage);
	eachMeeting(west, east, (a, b, south, north) => {
		const at: [number, number] = [180, (south + north) / 2];
		if (north - south < near) points.push([a, b, at]);
		else tally.add(a, b, 0, geodesicMetres(180, south, 180, north), ...at);
	});
	return points;
}

/** What lies on the meridian at the west and the east edge of the map, from south to north. */
function stretches(coverage: Coverage): [Stretch[], Stretch[]] {
	const west: Stretch[] = [];
	const east: Stretch[] = [];
	const { arcPoints: p, arcStarts, arcLeft, arcRight } = coverage;
	for (let arc = 0; arc < arcLeft.length; arc++) {
		const sides = [arcLeft[arc], arcRight[arc]].filter((region) => region >= 0);
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++) {
			const x = p[2 * i];
			const y = p[2 * i + 1];
			if (Math.abs(Math.abs(x) - 180) > near) continue;
			const list = x < 0 ? west : east;
			for (const region of sides) list.push({ region, south: y, north: y });
			const isEnd = i + 1 === arcStarts[arc + 1];
			if (isEnd || sides.length > 1 || Math.abs(x - p[2 * i + 2]) > near) continue;
			const next = p[2 * i + 3];
			list.push({ region: sides[0], south: Math.min(y, next), north: Math.max(y, next) });
		}
	}
	for (const list of [west, east]) list.sort((a, b) => a.south - b.south);
	return [west, east];
}

/** Calls `found` for every stretch on one side that shares latitudes with one on the other. */
function eachMeeting(
	west: Stretch[],
	east: Stretch[],
	found: (a: number, b: number, south: number, north: number) => void,
): void {
	let [open, opposite]: [Stretch[], Stretch[]] = [[], []];
	let [i, j] = [0, 0];
	while (i < west.length || j < east.length) {
		const isWest = j === east.length || (i < west.length && west[i].south <= east[j].south);
		const next = isWest ? west[i++] : east[j++];
		const isOpen = (stretch: Stretch) => stretch.north > next.south - near;
		[open, opposite] = [open.filter(isOpen), opposite.filter(isOpen)];
		for (const other of isWest ? opposite : open) {
			if (other.region === next.region) continue;
			found(next.region, other.region, next.south, Math.min(next.north, other.north));
		}
		(isWest ? open : opposite).push(next);
	}
}

function polePairs(coverage: Coverage): Pairs {
	const pairs: Pairs = [];
	for (const pole of [-90, 90]) {
		const regions = [...regionsAtLatitude(coverage, pole)].sort((a, b) => a - b);
		regions.forEach((a, i) => {
			for (const b of regions.slice(i + 1)) pairs.push([a, b, [0, pole]]);
		});
	}
	return pairs;
}

function regionsAtLatitude(coverage: Coverage, lat: number): Set<number> {
	const { arcPoints, arcStarts, arcLeft, arcRight } = coverage;
	const found = new Set<number>();
	for (let arc = 0; arc < arcLeft.length; arc++) {
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++) {
			if (Math.abs(arcPoints[2 * i + 1] - lat) > near) continue;
			found.add(arcLeft[arc]).add(arcRight[arc]);
		}
	}
	found.delete(-1);
	return found;
}
