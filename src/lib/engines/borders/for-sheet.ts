import { kindCode, type BorderList } from './border-list.ts';
import { PairTally } from './pair-tally.ts';
import { standingUnder, type CountingRule, type Standing } from './standing.ts';

/** What people decided about the borders of a sheet; regions by key. */
export interface SheetBorderRules extends CountingRule {
	struck: { a: string; b: string }[];
	added: { a: string; b: string }[];
}

const [hand, water, gap] = [kindCode('hand'), kindCode('water'), kindCode('gap')];

/**
 * Whether each border of the list counts on the sheet, or why not: struck out by hand, else by the
 * sheet's rule. Rules about keys that the coverage does not have are passed over.
 */
export function standingsForSheet(
	keys: readonly string[],
	borders: BorderList,
	rules: CountingRule & Pick<SheetBorderRules, 'struck'>,
): Standing[] {
	const struck = new PairTally(keys.length);
	for (const [a, b] of pairsOf(rules.struck, keys)) struck.add(a, b, 0, 0, 0, 0);
	return Array.from(borders.a, (a, i) =>
		struck.has(a, borders.b[i])
			? 'struck'
			: standingUnder(rules, borders.kind[i], borders.metres[i]),
	);
}

/**
 * The borders that count on a sheet: those that its rule counts, without those struck out, with those
 * added by hand (unless the pair has a border that counts; one struck and added counts as added). A gap
 * that counts is across water like any other. Rules about keys that the coverage does not have are
 * passed over.
 */
export function bordersForSheet(
	keys: readonly string[],
	borders: BorderList,
	rules: SheetBorderRules,
): BorderList {
	const tally = new PairTally(keys.length);
	const standing = standingsForSheet(keys, borders, rules);
	for (let i = 0; i < borders.a.length; i++) {
		if (standing[i] !== 'counts') continue;
		const kind = borders.kind[i] === gap ? water : borders.kind[i];
		const [x, y] = [borders.at[2 * i], borders.at[2 * i + 1]];
		tally.add(borders.a[i], borders.b[i], kind, borders.metres[i], x, y);
	}
	for (const [a, b] of pairsOf(rules.added, keys)) {
		if (!tally.has(a, b)) tally.add(a, b, hand, 0, NaN, NaN);
	}
	return tally.list();
}

function* pairsOf(
	pairs: readonly { a: string; b: string }[],
	keys: readonly string[],
): Generator<[number, number]> {
	if (pairs.length === 0) return;
	const numbers = new Map(keys.map((key, r) => [key, r]));
	for (const pair of pairs) {
		const a = numbers.get(pair.a);
		const b = numbers.get(pair.b);
		if (a !== undefined && b !== undefined && a !== b) yield [a, b];
	}
}
