import type { Finding } from './finding.ts';
import { sliverMetres } from './hole-findings.ts';
import type { Matched } from './match.ts';
import { parallelGaps, type ParallelGap } from './parallel-gaps.ts';
import { sliverGaps } from './sliver-gaps.ts';

/** so many pairs are named */
const mostNamed = 10;
/** widths this many times as large are told apart */
const jump = 3;

/**
 * Pairs whose borders run beside each other without meeting, with the tolerance that would join them: one
 * finding for each scale of widths. `tolerance`: what was joined already, in metres.
 */
export function unmatchedFindings(matched: Matched, tolerance: number): Finding[] {
	const { keys } = matched.coverage;
	const gaps = [...sliverGaps(matched.holes, sliverMetres), ...parallelGaps(matched, sliverMetres)];
	const open = gaps.filter((gap) => gap.width > tolerance);
	return scalesOf(open).map((scale) => {
		const widest = scale[scale.length - 1];
		const within = joinsWithin(widest.width);
		const pairs = new Map(scale.map((gap) => [pairText(gap, keys), gap]));
		const named = [...pairs.keys()].slice(0, mostNamed).join('; ');
		const more = pairs.size > mostNamed ? `; and ${pairs.size - mostNamed} more` : '';
		const subject =
			pairs.size === 1 ? 'The borders of one pair' : `The borders of ${pairs.size} pairs`;
		const them = pairs.size === 1 ? 'it' : 'them';
		const regions = new Set(scale.flatMap(({ a, b }) => [a, b]));
		return {
			code: 'unmatched-borders',
			severity: 'note',
			message: `${subject} run up to ${Number(widest.width.toPrecision(2))} m apart without meeting; a tolerance of ${within} m would join ${them}: ${named}${more}.`,
			regions: [...regions].sort((p, q) => p - q).map((r) => keys[r]),
			at: scale[0].at,
			toleranceMetres: within,
		};
	});
}

const pairText = ({ a, b }: ParallelGap, keys: string[]) => [keys[a], keys[b]].sort().join(' and ');

/** A little more than the width, in whole metres from one on. */
function joinsWithin(width: number): number {
	const metres = width * 1.01;
	return metres > 1 ? Math.ceil(metres) : Math.ceil(metres * 10) / 10;
}

/** Narrowest first, cut where the next is much wider. */
function scalesOf(gaps: ParallelGap[]): ParallelGap[][] {
	const scales: ParallelGap[][] = [];
	for (const gap of [...gaps].sort((p, q) => p.width - q.width || p.a - q.a || p.b - q.b)) {
		const last = scales[scales.length - 1];
		if (last && gap.width <= jump * last[0].width) last.push(gap);
		else scales.push([gap]);
	}
	return scales;
}
