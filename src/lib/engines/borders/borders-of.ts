import type { Coverage } from '../geometry/coverage.ts';
import type { BorderList } from './border-list.ts';
import { surveyOf, type BordersOptions } from './survey.ts';

/**
 * Who touches whom in a coverage, how, and over how many geodesic metres on the WGS 84 ellipsoid.
 * Guarantees: one entry a pair, a < b, sorted; a pair with a line is never listed as a point; regions
 * that overlap by more than the tolerance have a line, with half the outline of the overlap as metres.
 */
export function bordersOf(coverage: Coverage, options: BordersOptions = {}): BorderList {
	return surveyOf(coverage, options).borders;
}
