import { kindCode, type BorderList } from './border-list.ts';
import { standingsForSheet, type SheetBorderRules } from './for-sheet.ts';
import type { Standing } from './standing.ts';

/** A pair decided by hand, with its reason. */
export interface ReasonedPair {
	a: string;
	b: string;
	reason: string;
	by?: string;
	at?: string;
}

export type ReasonedRules = SheetBorderRules & { struck: ReasonedPair[]; added: ReasonedPair[] };

/** One pair of a sheet: how it meets, whether it counts or why not, and what was decided by hand. */
export interface SheetBorderRow {
	a: number;
	b: number;
	/** number in the list of borders, -1 for a pair that only a hand has put there */
	border: number;
	/** code of `borderKinds` */
	kind: number;
	metres: number;
	standing: Standing;
	/** what was decided by hand, and stands */
	hand: { what: 'struck' | 'added'; reason: string; by?: string; at?: string } | null;
}

/**
 * All pairs of a sheet in order of a then b: its borders, whether they count or not, and those added by
 * hand. Agrees with `bordersForSheet`: the rows that count are its pairs.
 */
export function sheetBorderRows(
	keys: readonly string[],
	borders: BorderList,
	rules: ReasonedRules,
): SheetBorderRow[] {
	const number = new Map(keys.map((key, region) => [key, region]));
	const code = (a: number, b: number) => Math.min(a, b) * keys.length + Math.max(a, b);
	const named = (pairs: readonly ReasonedPair[]) => {
		const found = new Map<number, ReasonedPair>();
		for (const pair of pairs) {
			const [a, b] = [number.get(pair.a), number.get(pair.b)];
			if (a === undefined || b === undefined || a === b) continue;
			if (!found.has(code(a, b))) found.set(code(a, b), pair);
		}
		return found;
	};
	const [struck, added] = [named(rules.struck), named(rules.added)];
	const standing = standingsForSheet(keys, borders, rules);
	const untouched = struck.size + added.size === 0;
	const rows = Array.from(borders.a, (a, border): SheetBorderRow => {
		const b = borders.b[border];
		const [kind, metres] = [borders.kind[border], borders.metres[border]];
		const row = { a, b, border, kind, metres, standing: standing[border], hand: null };
		if (untouched) return row;
		const [out, put] = [struck.get(code(a, b)), added.get(code(a, b))];
		added.delete(code(a, b));
		if (put && row.standing !== 'counts')
			return { ...row, standing: 'counts', hand: handOf('added', put) };
		return out && row.standing === 'struck' ? { ...row, hand: handOf('struck', out) } : row;
	});
	for (const [pair, put] of added) {
		const [a, b] = [Math.floor(pair / keys.length), pair % keys.length];
		const row = { a, b, border: -1, kind: kindCode('hand'), metres: 0 };
		rows.push({ ...row, standing: 'counts', hand: handOf('added', put) });
	}
	return added.size ? rows.sort((one, other) => one.a - other.a || one.b - other.b) : rows;
}

const handOf = (what: 'struck' | 'added', { reason, by, at }: ReasonedPair) => ({
	...{ what, reason },
	...(by ? { by } : {}),
	...(at ? { at } : {}),
});
