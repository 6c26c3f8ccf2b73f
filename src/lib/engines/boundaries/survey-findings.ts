import type { Survey } from '../borders/survey.ts';
import type { Finding } from './finding.ts';

/** A finding for each overlap, worst first, and one for the outlines that cross themselves. */
export function surveyFindings(survey: Survey, keys: string[]): Finding[] {
	const overlaps = [...survey.overlaps].sort((p, q) => q.km2 - p.km2);
	const findings = overlaps.map(({ a, b, km2, at }): Finding => {
		return {
			code: 'overlap',
			severity: 'warning',
			message: `${keys[a]} and ${keys[b]} overlap by ${areaText(km2)}; they count as neighbours.`,
			regions: [keys[a], keys[b]],
			at,
		};
	});
	const { crossings } = survey;
	if (crossings.length) {
		findings.push({
			code: 'self-crossing',
			severity: 'warning',
			message: 'Outlines cross themselves; the area of these regions is uncertain there.',
			regions: crossings.map(({ region }) => keys[region]),
			at: crossings[0].at,
		});
	}
	return findings;
}

function areaText(km2: number): string {
	if (km2 >= 10) return `${Math.round(km2)} km²`;
	return km2 >= 0.01 ? `${km2.toPrecision(2)} km²` : `${(km2 * 1e6).toPrecision(2)} m²`;
}
