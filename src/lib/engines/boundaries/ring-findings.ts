import type { Finding } from './finding.ts';
import type { Naming } from './keys.ts';
import type { RingRepairs } from './outlines-of.ts';

/** One finding for each kind of mend made while the rings were taken over. */
export function ringFindings(repairs: RingRepairs, naming: Naming, format: string): Finding[] {
	const findings: Finding[] = [];
	const note = (
		code: string,
		severity: Finding['severity'],
		features: Iterable<number>,
		said: string,
		at: Finding['at'] = null,
	) => {
		const regions = regionsOf(features, naming);
		if (regions.length) findings.push({ code, severity, message: said, regions, at });
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
		'corner-doubled',
		'note',
		repairs.doubled.keys(),
		'Corners written twice in a row, or within a centimetre of each other, were taken once.',
		[...repairs.doubled.values()][0],
	);
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
	const regions = regionsOf(features, naming);
	if (regions.length === 0) return [];
	return [
		{
			code: 'antimeridian',
			severity: 'note',
			message: 'Outlines that cross the 180th meridian were put together across it.',
			regions,
			at: null,
		},
	];
}

/** Keys of the regions of features, each once; a feature that was left out has none. */
function regionsOf(features: Iterable<number>, naming: Naming): string[] {
	const regions = new Set<string>();
	for (const f of features) {
		if (naming.regionOf[f] >= 0) regions.add(naming.keys[naming.regionOf[f]]);
	}
	return [...regions];
}
