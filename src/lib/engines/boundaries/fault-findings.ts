import type { Finding } from './finding.ts';
import { holeFindings } from './hole-findings.ts';
import type { Matched } from './match.ts';
import { strayFindings } from './stray-findings.ts';
import { surveyFindings } from './survey-findings.ts';
import { unmatchedFindings } from './unmatched-findings.ts';

/** What is doubtful about a matched map, with the mends that are offered. */
export function faultFindings(matched: Matched, tolerance: number): Finding[] {
	const { coverage, survey, holes } = matched;
	return [
		...surveyFindings(survey, coverage),
		...holeFindings(holes, coverage.keys),
		...strayFindings(coverage),
		...unmatchedFindings(matched, tolerance),
	];
}
