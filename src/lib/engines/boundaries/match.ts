import { surveyOf, type Survey } from '../borders/survey.ts';
import { mostAroundAPlace } from '../borders/touches.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { buildCoverage } from './build-coverage.ts';
import { doubledParts } from './doubled-parts.ts';
import type { Finding } from './finding.ts';
import { holesBetween, type Hole } from './holes.ts';
import { joinWithin } from './join-within.ts';
import { gainedAndLost, joinedFinding, toleranceFinding } from './match-findings.ts';
import { looseHoles } from './loose-holes.ts';
import type { Noded } from './node-outlines.ts';
import { noiseMetres } from './options.ts';
import { Refusal } from './refusal.ts';
import { settleParallel } from './settle-parallel.ts';

export interface Matched {
	coverage: Coverage;
	survey: Survey;
	holes: Hole[];
	/** the outlines it was cut from */
	noded: Noded;
	findings: Finding[];
}

/** Regions of which nothing is left once borders are joined within the tolerance. */
export interface Vanished {
	vanished: number[];
}

interface Options {
	toleranceMetres?: number;
	acrossWaterKm?: number;
}

/**
 * Noded outlines -> coverage, borders and holes, then whatever lies within the tolerance the user chose,
 * with every pair gained and lost by that told.
 */
export function matchOutlines(
	noded: Noded,
	keys: string[],
	names: string[],
	options: Options,
): Matched | Vanished {
	const tolerance = options.toleranceMetres ?? noiseMetres;
	const findings = joinedFinding(noded.joined, keys);
	const first = cut(noded, keys, names, options);
	if (tolerance <= noiseMetres) return { ...first, holes: first.holes(), noded, findings };

	noded.joined = { regions: new Set(), places: 0, at: null };
	const joined = joinWithin(noded, tolerance, keys);
	if (joined === noded) return { ...first, holes: first.holes(), noded, findings };
	settleParallel(joined.segments);
	const vanished = withoutSegments(joined, keys.length);
	if (vanished.length) return { vanished };
	const after = cut(joined, keys, names, options);
	findings.push(
		...toleranceFinding(joined.joined, keys, tolerance),
		...gainedAndLost(first.survey.borders, after.survey.borders, keys, tolerance),
	);
	return { ...after, holes: after.holes(), noded: joined, findings };
}

/** Noded outlines -> coverage, borders and holes, with nothing more joined. */
export function matchNoded(
	noded: Noded,
	keys: string[],
	names: string[],
	options: Options,
): Matched {
	const after = cut(noded, keys, names, options);
	return { ...after, holes: after.holes(), noded, findings: [] };
}

function cut(noded: Noded, keys: string[], names: string[], options: Options) {
	const { outlines, segments, room } = noded;
	const { coverage, arcs } = buildCoverage({ outlines, segments, room }, keys, names);
	const survey = surveyOf(coverage, options);
	if (survey.crowded) throw new Refusal('bad-coordinate', crowdMessage(survey.crowded));
	const crossed = new Set(survey.crossings.map(({ region }) => region));
	const others = [...looseHoles(coverage), ...doubledParts(coverage, segments, survey.doubtful)];
	survey.crossings.push(...others.filter(({ region }) => !crossed.has(region)));
	const holes = () => holesBetween(coverage, arcs, survey.overlaps.length > 0);
	return { coverage, survey, holes };
}

const crowdMessage = ([lon, lat]: [number, number]) =>
	`More than ${mostAroundAPlace / 2} outlines meet at longitude ${lon.toFixed(5)}, latitude ${lat.toFixed(5)}, which no map of regions does.`;

/** Regions (or features) that have no segment with themselves on one side only. */
export function withoutSegments({ segments }: Noded, regions: number): number[] {
	const has = new Uint8Array(regions);
	for (let s = 0; s < segments.count; s++) {
		const left = segments.left[s];
		const right = segments.right[s];
		if (left === right) continue;
		if (left >= 0) has[left] = 1;
		if (right >= 0) has[right] = 1;
	}
	return [...has.keys()].filter((r) => !has[r]);
}

/** The region of a segment that has one on one side only. */
export const regionOfSegment = ({ left, right }: Noded['segments'], s: number) =>
	Math.max(left[s], right[s]);
