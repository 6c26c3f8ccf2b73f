import type { Coverage } from '../geometry/coverage.ts';
import { SegmentBlocks } from '../geometry/segment-blocks.ts';
import { addAcrossWater, mostGapSteps } from './across-water.ts';
import { kindCode, type BorderList } from './border-list.ts';
import { bordersOf } from './borders-of.ts';
import { emptyList, PairTally } from './pair-tally.ts';

/** Pairs with a gap between them: kind `gap`, its width as metres, its middle as the place. */
export interface WaterGaps extends BorderList {
	/** all gaps up to this width are there; less than was asked for when the work ran out */
	withinKm: number;
}

/**
 * The gaps up to `km` wide between regions that have no line and no point, by the same criterion as pairs
 * across water found while reading. Input: a coverage; km up to 500; the borders it was read with, which
 * are found anew when not given (pairs across water or by hand among them are measured like others).
 * `steps` bounds the work, some ten seconds unless given.
 */
export function gapsWithin(
	coverage: Coverage,
	km: number,
	touch: BorderList = bordersOf(coverage),
	steps = mostGapSteps,
): WaterGaps {
	const tally = new PairTally(coverage.keys.length);
	touch.a.forEach((a, i) => {
		const { kind, b, metres, at } = touch;
		const touches = kind[i] === kindCode('line') || kind[i] === kindCode('point');
		if (touches) tally.add(a, b[i], kind[i], metres[i], at[2 * i], at[2 * i + 1]);
	});
	const withinKm = addAcrossWater(coverage, new SegmentBlocks(coverage), km, tally, steps);
	return { ...gapsOf(tally.list()), withinKm };
}

function gapsOf(all: BorderList): BorderList {
	const across = [...all.kind.keys()].filter((i) => all.kind[i] === kindCode('water'));
	const gaps = emptyList(across.length);
	across.forEach((i, place) => {
		gaps.a[place] = all.a[i];
		gaps.b[place] = all.b[i];
		gaps.kind[place] = kindCode('gap');
		gaps.metres[place] = all.metres[i];
		gaps.at.set(all.at.subarray(2 * i, 2 * i + 2), 2 * place);
	});
	return gaps;
}
