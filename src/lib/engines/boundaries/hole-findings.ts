import { areaText } from './area-text.ts';
import type { Finding } from './finding.ts';
import type { Hole } from './holes.ts';
import { lengthText } from './length-text.ts';
import type { MendOffer } from './mends/mend.ts';
import { toldEach } from './told-each.ts';
import { listed } from './words.ts';

/** Narrower than this on average, in metres, a hole is a sliver: borders that were drawn twice. */
export const sliverMetres = 50;
/** Above either of these a hole is taken for a lake or other land that is left out on purpose. */
const gapMetres = 1000;
const gapKm2 = 10;
/** regions that a hole is offered to */
const mostOffers = 6;

/** A finding for each sliver and each small gap between regions, largest first. */
export function holeFindings(holes: Hole[], keys: string[]): Finding[] {
	const slivers = holes.filter((hole) => hole.meanMetres < sliverMetres);
	const gaps = holes.filter(
		(hole) => hole.meanMetres >= sliverMetres && hole.meanMetres < gapMetres && hole.km2 < gapKm2,
	);
	const between = (hole: Hole) => listed(hole.regions.map((region) => keys[region]));
	const told = (code: string, severity: Finding['severity'], hole: Hole, message: string) => ({
		...{ code, severity, message, at: hole.at },
		regions: hole.regions.map((region) => keys[region]),
		offers: fillOffers(hole, keys),
	});
	return [
		...toldEach(slivers, (hole) => {
			const width = `${hole.meanMetres.toPrecision(2)} m wide on average, under ${sliverMetres} m`;
			const message = `A sliver of ${areaText(hole.km2)} between ${between(hole)} belongs to nobody (${width}).`;
			return told('sliver', 'warning', hole, message);
		}),
		...toldEach(gaps, (hole) => {
			const limits = `a hole under ${gapKm2} km² and ${gapMetres} m wide on average`;
			const message = `A gap of ${areaText(hole.km2)} between ${between(hole)} belongs to nobody (${limits}); it may be water.`;
			return told('gap', 'note', hole, message);
		}),
	];
}

/** To each region around, the one with the longest line of it first and as the usual one. */
function fillOffers(hole: Hole, keys: string[]): MendOffer[] {
	const order = hole.regions.map((region, i) => ({ key: keys[region], metres: hole.shares[i] }));
	order.sort((p, q) => q.metres - p.metres || (p.key < q.key ? -1 : 1));
	return order.slice(0, mostOffers).map(({ key, metres }, i) => ({
		mend: { kind: 'fill', at: hole.at, into: key },
		words: `Give the ${areaText(hole.km2)} to ${key}, which shares ${lengthText(metres)} of its ${lengthText(hole.metres)} outline.`,
		usual: i === 0,
	}));
}
