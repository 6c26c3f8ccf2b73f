import type { Survey } from '../borders/survey.ts';
import { areaText } from './area-text.ts';
import type { Finding } from './finding.ts';

/** A finding for each overlap or pair with the same outline, worst first, and one for the outlines that cross themselves. */
export function surveyFindings(survey: Survey, keys: string[]): Finding[] {
	const overlaps = [...survey.overlaps].sort((p, q) => q.km2 - p.km2);
	const findings = overlaps.map(({ a, b, km2, at, same }): Finding => {
		const both = `${keys[a]} and ${keys[b]}`;
		const message = same
			? `${both} have the same outline, so that one is probably there twice; they count as neighbours.`
			: `${both} overlap by ${areaText(km2)}; they count as neighbours.`;
		const code = same ? 'duplicate-region' : 'overlap';
		return { code, severity: 'warning', message, regions: [keys[a], keys[b]], at };
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
