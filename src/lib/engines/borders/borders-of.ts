import type { Coverage } from '../geometry/coverage.ts';
import type { BorderList } from './border-list.ts';
import { addLines } from './lines.ts';
import { PairTally } from './pair-tally.ts';
import { addTouches } from './touches.ts';

export interface BordersOptions {
	/** pairs up to this far apart with nothing between are borders across water; none unless given */
	acrossWaterKm?: number;
}

/**
 * Who touches whom in a coverage, how, and over how many geodesic metres on the WGS 84 ellipsoid.
 * Guarantees: one entry a pair, a < b, sorted; a pair with a line is never listed as a point.
 */
export function bordersOf(coverage: Coverage, _options: BordersOptions = {}): BorderList {
	const tally = new PairTally(coverage.keys.length);
	addLines(coverage, tally);
	addTouches(coverage, tally);
	return tally.list();
}
