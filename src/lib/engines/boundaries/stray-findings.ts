import type { Coverage } from '../geometry/coverage.ts';
import { areaText } from './area-text.ts';
import { metresAlong, ringsOfPart } from './coverage-parts.ts';
import type { Finding } from './finding.ts';
import { insidePlace } from '../geometry/inside-place.ts';
import { lengthText } from './length-text.ts';
import type { MendOffer } from './mends/mend.ts';
import { ringKm2 } from './ring-area.ts';
import { toldEach } from './told-each.ts';

/** A part beside another region that is below both of these is probably a crumb of drawing. */
const strayKm2 = 1;
const strayShare = 0.01;

interface Stray {
	region: number;
	km2: number;
	at: [number, number];
	/** metres along each neighbour, longest first */
	along: [number, number][];
	metres: number;
}

/**
 * A note for each small part that lies apart from the main one and has a line with another region,
 * largest first. Islands, which touch nobody, are no strays, and enclaves of some size are none either.
 */
export function strayFindings(coverage: Coverage): Finding[] {
	const { keys, areasKm2 } = coverage;
	const strays = [...straysOf(coverage)].sort((p, q) => q.km2 - p.km2);
	return toldEach(strays, (stray) => {
		const [key, size] = [keys[stray.region], areaText(stray.km2)];
		const share = `${((100 * stray.km2) / areasKm2[stray.region]).toPrecision(1)} %`;
		return {
			code: 'stray-part',
			severity: 'note',
			message: `A part of ${key} of ${size} (${share} of it) lies apart beside ${keys[stray.along[0][0]]}; it may be a crumb of the drawing, or an exclave.`,
			regions: [key, ...stray.along.map(([other]) => keys[other])],
			at: stray.at,
			offers: offersFor(stray, keys),
		};
	});
}

function* straysOf(coverage: Coverage): Generator<Stray> {
	const { regionParts, partRings, areasKm2 } = coverage;
	for (let region = 0; region < coverage.keys.length; region++) {
		for (let part = regionParts[region] + 1; part < regionParts[region + 1]; part++) {
			const beside = metresAlong(coverage, partRings[part]);
			const metres = [...beside.values()].reduce((sum, length) => sum + length, 0);
			beside.delete(-1);
			if (beside.size === 0) continue;
			const rings = ringsOfPart(coverage, part);
			const km2 = rings.reduce((sum, ring) => sum + ringKm2(ring), 0);
			if (km2 >= strayKm2 || km2 >= strayShare * areasKm2[region]) continue;
			const along = [...beside].sort((p, q) => q[1] - p[1] || p[0] - q[0]);
			yield { region, km2, at: insidePlace(rings), along, metres };
		}
	}
}

function offersFor({ region, km2, at, along, metres }: Stray, keys: string[]): MendOffer[] {
	const key = keys[region];
	const given = along.map(([other, length], i): MendOffer => {
		const words = `Give the ${areaText(km2)} to ${keys[other]}, which shares ${lengthText(length)} of its ${lengthText(metres)} outline.`;
		return { mend: { kind: 'part', key, at, into: keys[other] }, words, usual: i === 0 };
	});
	const words = `Leave the ${areaText(km2)} out of ${key}.`;
	return [...given, { mend: { kind: 'part', key, at, into: null }, words, usual: false }];
}
