import type { Coverage } from '../geometry/coverage.ts';
import type { PairTally } from './pair-tally.ts';

/** More regions than this around one place are no map; listing their pairs would never end. */
export const mostAroundAPlace = 1000;

/** The first place where more regions meet than can be listed in pairs, or null. */
export function crowdedPlace(places: Meeting[]): [number, number] | null {
	const crowded = places.find(({ arcs }) => arcs.length > mostAroundAPlace);
	return crowded ? [crowded.x, crowded.y] : null;
}

/** Point touches: regions around a place where four or more arcs end and that share no line anywhere. */
export function addTouches(coverage: Coverage, places: Meeting[], tally: PairTally): void {
	const { arcLeft, arcRight } = coverage;
	for (const { x, y, arcs } of places) {
		if (arcs.length < 4 || arcs.length > mostAroundAPlace) continue;
		const around = new Set<number>();
		for (const arc of arcs) around.add(arcLeft[arc]).add(arcRight[arc]);
		around.delete(-1);
		const regions = [...around].sort((a, b) => a - b);
		for (let i = 0; i < regions.length; i++) {
			for (let j = i + 1; j < regions.length; j++) {
				if (!tally.has(regions[i], regions[j])) tally.add(regions[i], regions[j], 1, 0, x, y);
			}
		}
	}
}

/** A place where arcs end. */
export interface Meeting {
	x: number;
	y: number;
	arcs: number[];
}

/** Places where arcs end, with one entry for each end (a closed arc has two). */
export function meetings(coverage: Coverage): Meeting[] {
	const { arcPoints, arcStarts } = coverage;
	const places = new Map<number, Meeting[]>();
	const all: Meeting[] = [];
	const end = (arc: number, point: number) => {
		const x = arcPoints[2 * point];
		const y = arcPoints[2 * point + 1];
		const code = x * 733.7 + y;
		const near = places.get(code);
		let place = near?.find((known) => known.x === x && known.y === y);
		if (!place) {
			place = { x, y, arcs: [] };
			all.push(place);
			if (near) near.push(place);
			else places.set(code, [place]);
		}
		place.arcs.push(arc);
	};
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		end(arc, arcStarts[arc]);
		end(arc, arcStarts[arc + 1] - 1);
	}
	return all;
}
