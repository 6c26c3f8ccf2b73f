import { kindCode, type BorderList } from './border-list.ts';
import { PairTally } from './pair-tally.ts';

/** Gaps as they were measured: one entry a pair. */
export type GapList = Pick<BorderList, 'a' | 'b' | 'metres' | 'at'>;

/**
 * The borders of a coverage with the gaps that were measured after it was read, in order; a pair that
 * has a border keeps it as it is.
 */
export function withGaps(regions: number, borders: BorderList, gaps: GapList): BorderList {
	if (gaps.a.length === 0) return borders;
	const tally = new PairTally(regions);
	const { a, b, kind, metres, at } = borders;
	a.forEach((from, i) => tally.add(from, b[i], kind[i], metres[i], at[2 * i], at[2 * i + 1]));
	gaps.a.forEach((from, i) => {
		if (tally.has(from, gaps.b[i])) return;
		const [x, y] = [gaps.at[2 * i], gaps.at[2 * i + 1]];
		tally.add(from, gaps.b[i], kindCode('gap'), gaps.metres[i], x, y);
	});
	return tally.list();
}
