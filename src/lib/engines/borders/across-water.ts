import { crossing } from '../geometry/crossing.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { nearestOnSegment } from '../geometry/near.ts';
import type { SegmentBlocks } from '../geometry/segment-blocks.ts';
import { kindCode } from './border-list.ts';
import type { PairTally } from './pair-tally.ts';
import { gapsUpTo, type Gap } from './water-gaps.ts';

/** Nearer than this to a corner is touching it, in metres. */
const touching = 0.02;

/** Looks at pairs of coast runs; some ten seconds' work. */
export const mostGapSteps = 200_000_000;

/**
 * Adds to a tally the pairs it does not have whose nearest places lie within `km` and whose shortest
 * connection crosses no third region; answers up to which width all are found. Widths are geodesic (Karney
 * 2013), to a millionth. The nearest places of two outlines always include a corner of one of them, so
 * corners of coasts are measured against segments.
 */
export function addAcrossWater(
	coverage: Coverage,
	blocks: SegmentBlocks,
	km: number,
	tally: PairTally,
	steps = mostGapSteps,
): number {
	const isKnown = (a: number, b: number) => tally.has(a, b);
	const { gaps, within } = gapsUpTo(coverage, km * 1000, isKnown, steps);
	for (const gap of gaps) {
		if ([0, 360, -360].some((turn) => isCrossed(gap, turn, coverage, blocks))) continue;
		const x = (gap.from[0] + gap.to[0]) / 2;
		const y = (gap.from[1] + gap.to[1]) / 2;
		tally.add(
			gap.a,
			gap.b,
			kindCode('water'),
			gap.metres,
			Math.abs(x) > 180 ? x - 360 * Math.sign(x) : x,
			y,
		);
	}
	return within / 1000;
}

/** The straight connection must not pass through another region, nor along its outline. */
function isCrossed(gap: Gap, turn: number, coverage: Coverage, blocks: SegmentBlocks): boolean {
	const { arcLeft, arcRight, arcPoints } = coverage;
	const line = Float64Array.of(gap.from[0] + turn, gap.from[1], gap.to[0] + turn, gap.to[1]);
	const [x1, y1, x2, y2] = line;
	const isThird = (region: number) => region >= 0 && region !== gap.a && region !== gap.b;
	let crossed = blocks.regionsAt((x1 + x2) / 2, (y1 + y2) / 2).some(isThird);
	const box = [Math.min(x1, x2), Math.min(y1, y2), Math.max(x1, x2), Math.max(y1, y2)] as const;
	blocks.search(...box, (arc, j) => {
		if (crossed || !(isThird(arcLeft[arc]) || isThird(arcRight[arc]))) return;
		const corner = nearestOnSegment(arcPoints[2 * j], arcPoints[2 * j + 1], x1, y1, x2, y2);
		if (corner.metres < touching || crossing(line, 0, arcPoints, j)) crossed = true;
	});
	return crossed;
}
