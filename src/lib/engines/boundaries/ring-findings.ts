import type { Finding } from './finding.ts';
import type { Naming } from './keys.ts';
import type { RingRepairs } from './outlines-of.ts';

/** One finding for each kind of mend made while the rings were taken over. */
export function ringFindings(repairs: RingRepairs, naming: Naming, format: string): Finding[] {
	const findings: Finding[] = [];
	const note = (
		code: string,
		severity: Finding['severity'],
		features: Set<number>,
		said: string,
	) => {
		if (features.size === 0) return;
		const regions = new Set<string>();
		for (const f of features) regions.add(naming.keys[naming.regionOf[f]]);
		findings.push({ code, severity, message: said, regions: [...regions], at: null });
	};
	note(
		'ring-closed',
		'warning',
		repairs.closed,
		'Outlines that did not end where they began were closed with a straight line.',
	);
	if (format === 'GeoJSON') {
		note(
			'ring-turned',
			'note',
			repairs.turned,
			'Outlines walked the other way round than RFC 7946 asks were turned; the shape is unchanged.',
		);
	}
	note(
		'ring-collapsed',
		'warning',
		repairs.collapsed,
		'Outlines with fewer than three different corners were left out.',
	);
	return findings;
}

/** Outlines that step over the 180th meridian. */
export function crossingFinding(features: Set<number>, naming: Naming): Finding[] {
	const regions = new Set<string>();
	for (const f of features)
		if (naming.regionOf[f] >= 0) regions.add(naming.keys[naming.regionOf[f]]);
	if (regions.size === 0) return [];
	return [
		{
			code: 'antimeridian',
			severity: 'note',
			message: 'Outlines that cross the 180th meridian were put together across it.',
			regions: [...regions],
			at: null,
		},
	];
}
