import type { BorderList } from './border-list.ts';
import { PairTally } from './pair-tally.ts';

/** What people decided about the borders of a sheet; regions by key. */
export interface SheetBorderRules {
	/** whether regions that meet in a point only must differ */
	pointTouches: boolean;
	struck: { a: string; b: string }[];
	added: { a: string; b: string }[];
}

const point = 1;
const hand = 3;

/**
 * The borders that count on a sheet: point touches only where the sheet asks for them, without those
 * struck out, with those added by hand (unless the pair has a border already; one struck and added
 * counts as added). Rules about keys that the coverage does not have are passed over.
 */
export function bordersForSheet(
	keys: string[],
	borders: BorderList,
	rules: SheetBorderRules,
): BorderList {
	const numbers = new Map(keys.map((key, r) => [key, r]));
	const tally = new PairTally(keys.length);
	const struck = new PairTally(keys.length);
	for (const [a, b] of pairsOf(rules.struck, numbers)) struck.add(a, b, 0, 0, 0, 0);
	for (let i = 0; i < borders.a.length; i++) {
		const [a, b] = [borders.a[i], borders.b[i]];
		if (borders.kind[i] === point && !rules.pointTouches) continue;
		if (struck.has(a, b)) continue;
		tally.add(a, b, borders.kind[i], borders.metres[i], borders.at[2 * i], borders.at[2 * i + 1]);
	}
	for (const [a, b] of pairsOf(rules.added, numbers)) {
		if (!tally.has(a, b)) tally.add(a, b, hand, 0, NaN, NaN);
	}
	return tally.list();
}

function* pairsOf(
	pairs: { a: string; b: string }[],
	numbers: Map<string, number>,
): Generator<[number, number]> {
	for (const pair of pairs) {
		const a = numbers.get(pair.a);
		const b = numbers.get(pair.b);
		if (a !== undefined && b !== undefined && a !== b) yield [a, b];
	}
}
