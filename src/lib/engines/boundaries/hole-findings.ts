import { areaText } from './area-text.ts';
import type { Finding } from './finding.ts';
import type { Hole } from './holes.ts';

/** Narrower than this on average, in metres, a hole is a sliver: borders that were drawn twice. */
const sliverMetres = 50;
/** Above either of these a hole is taken for a lake or other land that is left out on purpose. */
const gapMetres = 1000;
const gapKm2 = 10;
/** so many of a kind are told one by one */
const most = 200;

/** A finding for each sliver and each small gap between regions, largest first. */
export function holeFindings(holes: Hole[], keys: string[]): Finding[] {
	const slivers = holes.filter((hole) => hole.meanMetres < sliverMetres);
	const gaps = holes.filter(
		(hole) => hole.meanMetres >= sliverMetres && hole.meanMetres < gapMetres && hole.km2 < gapKm2,
	);
	const between = (hole: Hole) => {
		const names = hole.regions.map((region) => keys[region]);
		return `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
	};
	return [
		...told('sliver', 'warning', slivers, keys, (hole) => {
			const width = `${hole.meanMetres.toPrecision(2)} m wide on average, under ${sliverMetres} m`;
			return `A sliver of ${areaText(hole.km2)} between ${between(hole)} belongs to nobody (${width}).`;
		}),
		...told('gap', 'note', gaps, keys, (hole) => {
			const limits = `a hole under ${gapKm2} km² and ${gapMetres} m wide on average`;
			return `A gap of ${areaText(hole.km2)} between ${between(hole)} belongs to nobody (${limits}); it may be water.`;
		}),
	];
}

function told(
	code: string,
	severity: Finding['severity'],
	holes: Hole[],
	keys: string[],
	message: (hole: Hole) => string,
): Finding[] {
	const finding = (said: string, all: Hole[]): Finding => {
		const regions = new Set(all.flatMap((hole) => hole.regions));
		return {
			code,
			severity,
			message: said,
			regions: [...regions].map((region) => keys[region]),
			at: all[0].at,
		};
	};
	const findings = holes.slice(0, most).map((hole) => finding(message(hole), [hole]));
	const rest = holes.slice(most);
	if (rest.length) findings.push(finding(`There are ${rest.length} smaller ones like this.`, rest));
	return findings;
}
