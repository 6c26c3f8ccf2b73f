import type { Overlap } from '../borders/overlap.ts';
import type { Survey } from '../borders/survey.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { areaText } from './area-text.ts';
import type { Finding } from './finding.ts';
import type { MendOffer } from './mends/mend.ts';
import { toldEach } from './told-each.ts';

/** A finding for each overlap, pair with the same outline and outline that crosses itself, worst first. */
export function surveyFindings(survey: Survey, coverage: Coverage): Finding[] {
	const { keys } = coverage;
	const overlaps = [...survey.overlaps].sort((p, q) => q.km2 - p.km2);
	const told = (code: string, overlap: Overlap, said: string, offers: MendOffer[]): Finding => {
		const both = [keys[overlap.a], keys[overlap.b]];
		const message = `${both.join(' and ')} ${said}; they count as neighbours.`;
		return { code, severity: 'warning', message, regions: both, at: overlap.at, offers };
	};
	const twice = 'have the same outline, so that one is probably there twice';
	const same = overlaps.filter((overlap) => overlap.same);
	const partial = overlaps.filter((overlap) => !overlap.same);
	return [
		...toldEach(same, (overlap) =>
			told('duplicate-region', overlap, twice, dropOffers(overlap, coverage)),
		),
		...toldEach(partial, (overlap) =>
			told(
				'overlap',
				overlap,
				`overlap by ${areaText(overlap.km2)}`,
				overlapOffers(overlap, coverage),
			),
		),
		...toldEach(
			survey.crossings.filter(({ doubled }) => !doubled),
			({ region, at }) => tangled(coverage, region, at, 'self-crossing'),
		),
		...toldEach(
			survey.crossings.filter(({ doubled }) => doubled),
			({ region, at }) => tangled(coverage, region, at, 'parts-overlap'),
		),
	];
}

function tangled(
	{ keys, areasKm2 }: Coverage,
	region: number,
	at: Finding['at'],
	code: 'self-crossing' | 'parts-overlap',
): Finding {
	const [key, size] = [keys[region], areaText(Math.abs(areasKm2[region]))];
	const isCrossing = code === 'self-crossing';
	const message = isCrossing
		? `The outline of ${key} crosses itself, so that its area of ${size} is uncertain.`
		: `Parts of ${key} lie on each other, so that its area of ${size} counts land twice.`;
	const words = isCrossing
		? `Cut the outline of ${key} where it crosses itself, and count its ${size} again.`
		: `Make one of the parts of ${key} that lie on each other, and count its ${size} again.`;
	const offers: MendOffer[] = [{ mend: { kind: 'untangle', key }, words, usual: true }];
	return { code, severity: 'warning', message, regions: [key], at, offers };
}

/** The second of two in the file goes, unless the other is asked for. */
function dropOffers({ a, b, km2 }: Overlap, { keys }: Coverage): MendOffer[] {
	return [b, a].map((gone, i) => ({
		mend: { kind: 'drop', key: keys[gone] },
		words: `Leave out ${keys[gone]}; its ${areaText(km2)} stay with ${keys[gone === a ? b : a]}.`,
		usual: i === 0,
	}));
}

/** Covered by more than this share, a region has nothing left to keep. */
const whole = 0.999;

/**
 * The smaller region keeps what both cover, since the larger loses less by it; a region covered whole by
 * another may also be left out. Of two that are nearly the same the first in the file stays.
 */
function overlapOffers({ a, b, km2 }: Overlap, { keys, areasKm2 }: Coverage): MendOffer[] {
	const isFirstSmaller =
		areasKm2[a] < areasKm2[b] || (areasKm2[a] === areasKm2[b] && keys[a] < keys[b]);
	const isNearlyBoth = km2 >= whole * Math.max(areasKm2[a], areasKm2[b]);
	const order = isFirstSmaller || isNearlyBoth ? [a, b] : [b, a];
	const offers = order.map((kept): MendOffer => {
		const [keep, lost] = [keys[kept], keys[kept === a ? b : a]];
		const left = areasKm2[kept === a ? b : a] - km2;
		if (km2 >= whole * areasKm2[kept === a ? b : a]) {
			const words = `Leave out ${lost}; ${keep} covers all of its ${areaText(km2)}.`;
			return { mend: { kind: 'drop', key: lost }, words, usual: false };
		}
		return {
			mend: { kind: 'settle', a: keys[a], b: keys[b], keep },
			words: `Leave the ${areaText(km2)} with ${keep} and cut it from ${lost}, which keeps ${areaText(left)}.`,
			usual: false,
		};
	});
	offers[0].usual = true;
	return offers;
}
