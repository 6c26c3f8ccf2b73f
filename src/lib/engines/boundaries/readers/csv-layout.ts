import type { ByteSource } from '../options.ts';
import { parseRows, type CsvForm } from './csv-rows.ts';
import { decoded } from './decoded.ts';
import { looksLikeArea, looksLikeWkt } from './wkt.ts';

/** How a table is written, and where its geometry stands. */
export interface CsvLayout extends CsvForm {
	columns: string[];
	/** the columns that hold well-known text; the first is read */
	geometry: number[];
	/** whether the first row holds the names of the columns */
	header: boolean;
}

const delimiters = [',', ';', '\t', '|'];
const usualCharacters = 256 * 1024;
const mostCharacters = 64 * 1024 * 1024;
/** rows that are looked at */
const mostRows = 50;

/**
 * Finds out from the first rows how a table is written: its delimiter and geometry column are those by
 * which a column holds well-known text in most rows. Null where no column does.
 */
export async function csvLayout(source: ByteSource, encoding: string): Promise<CsvLayout | null> {
	let text = '';
	let enough = usualCharacters;
	for await (const piece of decoded(source, encoding)) {
		text += piece;
		if (text.length < enough) continue;
		const found = layoutOf(text, encoding, false);
		if (found !== 'too short') return found;
		enough *= 4;
		if (enough > mostCharacters) return null;
	}
	const found = layoutOf(text, encoding, true);
	return found === 'too short' ? null : found;
}

function layoutOf(text: string, encoding: string, isAll: boolean): CsvLayout | null | 'too short' {
	const newline = text.includes('\n') || !text.includes('\r') ? '\n' : '\r';
	const readings = delimiters.map((delimiter) => {
		const form = { encoding, delimiter, newline } as const;
		return { form, rows: parseRows(text, form, isAll, mostRows).rows };
	});
	if (!isAll && readings.every(({ rows }) => rows.length < 2)) return 'too short';
	for (const isWhole of [true, false]) {
		const layouts = readings.flatMap(({ form, rows }) => layoutIn(rows, form, isWhole) ?? []);
		layouts.sort((p, q) => q.columns.length - p.columns.length);
		if (layouts.length) return layouts[0];
	}
	return null;
}

/** `isWhole`: the well-known text must also end as such, which it does not by the wrong delimiter. */
function layoutIn(rows: string[][], form: CsvForm, isWhole: boolean): CsvLayout | null {
	if (rows.length === 0) return null;
	const header = !rows[0].some(looksLikeWkt);
	const values = rows.slice(header ? 1 : 0);
	const isGeometry = (c: number) => {
		const filled = values.map((row) => (row[c] ?? '').trim()).filter((value) => value !== '');
		const shapes = filled.filter((v) => looksLikeWkt(v) && (!isWhole || isClosed(v)));
		return shapes.length > filled.length / 2;
	};
	const geometry = [...rows[0].keys()].filter(isGeometry);
	if (geometry.length === 0) return null;
	const holdsAreas = (c: number) => values.some((row) => looksLikeArea(row[c] ?? ''));
	geometry.sort((p, q) => +holdsAreas(q) - +holdsAreas(p) || p - q);
	return {
		...form,
		header,
		geometry,
		columns: columnNames(header ? rows[0] : rows[0].map(() => '')),
	};
}

const isClosed = (text: string): boolean => /\)$|EMPTY$/i.test(text);

/** Names that tell all columns apart: a nameless one is called by its place, a second one is counted. */
function columnNames(header: string[]): string[] {
	const names: string[] = [];
	header.forEach((written, c) => {
		const name = written.trim() || `column ${c + 1}`;
		let free = name;
		for (let n = 2; names.includes(free); n++) free = `${name} (${n})`;
		names.push(free);
	});
	return names;
}
