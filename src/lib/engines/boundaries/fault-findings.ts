import type { Finding } from './finding.ts';
import { holeFindings } from './hole-findings.ts';
import type { Matched } from './match.ts';
import { noiseMetres, type BoundaryOptions } from './options.ts';
import { strayFindings } from './stray-findings.ts';
import { surveyFindings } from './survey-findings.ts';
import { unmatchedFindings } from './unmatched-findings.ts';

/** What is doubtful about a matched map, with the mends that are offered. */
export function faultFindings(
	matched: Matched,
	{ toleranceMetres = noiseMetres, acrossWaterKm = 0 }: BoundaryOptions,
): Finding[] {
	const { coverage, survey, holes } = matched;
	return [
		...surveyFindings(survey, coverage),
		...holeFindings(holes, coverage.keys),
		...strayFindings(coverage),
		...unmatchedFindings(matched, toleranceMetres),
		...waterFinding(survey.waterKm, acrossWaterKm),
	];
}

/** Told when looking for gaps was given up before all were found. */
function waterFinding(found: number | null, asked: number): Finding[] {
	if (found === null || found >= asked) return [];
	const message = `Neighbours across water were looked for up to ${asked} km; the map has so much coast that only those up to ${Number(found.toPrecision(3))} km were found.`;
	return [{ code: 'water-incomplete', severity: 'warning', message, regions: [], at: null }];
}
