import { surveyOf, type Survey } from '../borders/survey.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { buildCoverage } from './build-coverage.ts';
import type { Finding } from './finding.ts';
import { joinWithin } from './join-within.ts';
import { gainedAndLost, joinedFinding, toleranceFinding } from './match-findings.ts';
import { nodeOutlines, type Noded } from './node-outlines.ts';
import { noiseMetres } from './options.ts';
import type { Outlines } from './outlines.ts';
import { settleParallel } from './settle-parallel.ts';

export interface Matched {
	coverage: Coverage;
	survey: Survey;
	findings: Finding[];
}

/** Regions of which nothing is left once spikes and outlines of no width are gone. */
export interface Vanished {
	vanished: number[];
}

/**
 * Outlines -> coverage and borders: noise of 2 cm and T-junctions always, then whatever lies within the
 * tolerance the user chose, with every pair gained and lost by that told.
 */
export function matchOutlines(
	outlines: Outlines,
	keys: string[],
	names: string[],
	options: { toleranceMetres?: number; acrossWaterKm?: number },
): Matched | Vanished {
	const tolerance = options.toleranceMetres ?? noiseMetres;
	const noded = nodeOutlines(outlines);
	settleParallel(noded.segments);
	const vanished = withoutSegments(noded, keys.length);
	if (vanished.length) return { vanished };
	const findings = joinedFinding(noded.joined, keys);
	const coverage = buildCoverage(noded.outlines, noded.segments, keys, names);
	const survey = surveyOf(coverage, options);
	if (tolerance <= noiseMetres) return { coverage, survey, findings };

	noded.joined = { regions: new Set(), places: 0, at: null };
	const joined = joinWithin(noded, tolerance, keys);
	if (joined === noded) return { coverage, survey, findings };
	settleParallel(joined.segments);
	const gone = withoutSegments(joined, keys.length);
	if (gone.length) return { vanished: gone };
	const after = buildCoverage(joined.outlines, joined.segments, keys, names);
	const surveyAfter = surveyOf(after, options);
	findings.push(
		...toleranceFinding(joined.joined, keys, tolerance),
		...gainedAndLost(survey.borders, surveyAfter.borders, keys, tolerance),
	);
	return { coverage: after, survey: surveyAfter, findings };
}

function withoutSegments({ segments }: Noded, regions: number): number[] {
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
