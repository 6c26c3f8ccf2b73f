import {
	borderKinds,
	bordersForSheet,
	isAcross,
	sheetBorderRows,
	type BorderKind,
	type BorderList,
	type ReasonedRules,
	type Standing,
} from '../borders/index.ts';
import { exportTableCsv, type DataTable } from './data-table.ts';
import { plainLine } from './plain-line.ts';

export interface BordersOut {
	/** name of the sheet */
	title: string;
	/** in region order */
	keys: readonly string[];
	names: readonly string[];
	/** as found, gaps among them */
	borders: BorderList;
	rules: ReasonedRules;
}

const kinds: Record<BorderKind, string> = {
	line: 'line',
	point: 'point',
	water: 'water',
	gap: 'water',
	hand: 'by hand',
};

const whyNot: Record<Standing, string | null> = {
	counts: null,
	'point-not-counted': 'point touches do not count',
	'too-short': 'shorter than the shortest line that counts',
	'too-far': 'wider than the widest gap that counts',
	'water-not-counted': 'across water does not count',
	struck: 'struck out by hand',
};

const text = (heading: string) => ({ heading, kind: 'text' as const });
const metres = (heading: string) => ({ heading, unit: 'm', kind: 'number' as const });

/**
 * Every pair of a sheet as a table: RFC 4180, UTF-8, in region order, metres to the centimetre; whether
 * the pair counts, why not, and what was decided by hand with its reason. Byte for byte repeatable.
 */
export const exportBordersCsv = (out: BordersOut): Uint8Array => exportTableCsv(borderTable(out));

/** The same table, for a workbook. */
export function borderTable({ keys, names, borders, rules }: BordersOut): DataTable {
	const rows = sheetBorderRows(keys, borders, rules).map((row) => {
		const gap = isAcross(row.kind);
		const far = Math.round(row.metres * 100) / 100;
		return [
			...[keys[row.a], names[row.a], keys[row.b], names[row.b]],
			...[kinds[borderKinds[row.kind]], gap ? null : far, gap ? far : null],
			...[row.standing === 'counts' ? 'yes' : 'no', whyNot[row.standing]],
			...[row.hand?.what ?? null, row.hand?.reason ?? null],
			...[row.hand?.by ?? null, row.hand?.at?.slice(0, 10) ?? null],
		];
	});
	const columns = [
		...['region', 'name', 'other region', 'other name', 'kind'].map(text),
		...[metres('shared line'), metres('gap')],
		...['counts', 'why not', 'by hand', 'reason', 'by', 'on'].map(text),
	];
	return { name: 'Borders', columns, rows };
}

/**
 * The borders that count as a graph in the DIMACS .col form (D. S. Johnson and M. A. Trick, Cliques,
 * Coloring, and Satisfiability, 1996): `p edge regions borders`, then `e i j` with regions from 1 in
 * region order; comment lines tell which number is which key, as JSON strings. Byte for byte repeatable.
 */
export function exportBordersCol({ title, keys, names, borders, rules }: BordersOut): Uint8Array {
	const { a, b } = bordersForSheet(keys, borders, rules);
	const lines = [
		`c Borders that count on the sheet ${plainLine(title)}`,
		'c region number, key, name',
		...keys.map((key, region) => `c ${region + 1} ${plainLine(key)} ${plainLine(names[region])}`),
		`p edge ${keys.length} ${a.length}`,
		...Array.from(a, (from, border) => `e ${from + 1} ${b[border] + 1}`),
	];
	return new TextEncoder().encode(lines.map((line) => `${line}\n`).join(''));
}
