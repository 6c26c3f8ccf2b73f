import fc from 'fast-check';
import Papa from 'papaparse';
import { expect, it } from 'vitest';
import writeXlsxFile from 'write-excel-file/universal';
import { read, rowsOf } from '../../../../tests/support/tables.ts';

/** Texts with all that CSV must quote; blank ones count as empty cells and are made elsewhere. */
const text = fc
	.string({
		unit: fc.constantFrom(...'aBz09 ,;|\t"\n\'=+-@äŒ€'.split('')),
		minLength: 1,
		maxLength: 8,
	})
	.filter((cell) => cell.trim() !== '');
const cell = fc.option(text, { freq: 4 });

/** A key first and a text last in every row, so that none is blank or ragged. */
const tables = fc.integer({ min: 2, max: 5 }).chain((columns) =>
	fc.array(
		fc.tuple(text, fc.array(cell, { minLength: columns - 2, maxLength: columns - 2 }), text),
		{
			minLength: 1,
			maxLength: 12,
		},
	),
);
const flat = (rows: [string, (string | null)[], string][]) => rows.map(([a, b, c]) => [a, ...b, c]);

/** Told apart from figures, years and each other, so that they are headings and nothing else. */
const headings = (columns: number) =>
	Array.from({ length: columns }, (_, c) => `Heading ${'abcde'[c]}`);

const encoded = {
	'utf-8': (csv: string) => new TextEncoder().encode(csv),
	'utf-8 marked': (csv: string) => new TextEncoder().encode(`\ufeff${csv}`),
	'utf-16le': (csv: string) =>
		new Uint8Array(Uint16Array.from(`\ufeff${csv}`, (c) => c.charCodeAt(0)).buffer),
	'windows-1252': (csv: string) =>
		Uint8Array.from(csv, (c) => ({ Œ: 0x8c, '€': 0x80 })[c] ?? c.charCodeAt(0)),
};

it('a table written as CSV reads back the same, whatever the delimiter, line end, quoting and encoding', async () => {
	await fc.assert(
		fc.asyncProperty(
			tables,
			fc.constantFrom(',', ';', '\t', '|'),
			fc.constantFrom('\r\n' as const, '\n' as const),
			fc.boolean(),
			fc.constantFrom(...Object.values(encoded)),
			async (made, delimiter, newline, quotes, encode) => {
				const rows = flat(made);
				const names = headings(rows[0].length);
				const csv = Papa.unparse([names, ...rows], { delimiter, newline, quotes });
				// the delimiter is told: a table of two columns can be read by several
				const { table } = await read(encode(csv), { delimiter, headingRow: 1, headingRows: 1 });
				expect(table.headings).toEqual(names);
				expect(rowsOf(table)).toEqual(rows);
			},
		),
		{ numRuns: 150 },
	);
});

it('finds delimiter, line end and heading of figures by itself', async () => {
	const figures = fc.array(
		fc.tuple(
			fc.string({ unit: fc.constantFrom(...'abc ;,"é'.split('')), minLength: 1, maxLength: 8 }),
			fc.integer({ min: -1e6, max: 1e6 }),
			fc.integer({ min: 0, max: 9999 }),
		),
		{ minLength: 3, maxLength: 12 },
	);
	await fc.assert(
		fc.asyncProperty(
			figures,
			fc.constantFrom(',', ';', '\t', '|'),
			fc.constantFrom('\r\n' as const, '\n' as const, '\r' as const),
			async (made, delimiter, newline) => {
				const rows = made.map(([name, a, b], i) => [`K${i} ${name}!`, String(a), String(b), 'z']);
				const names = ['Key', 'Visits', 'Hours', 'Note'];
				const csv = Papa.unparse([names, ...rows], { delimiter, newline, quotes: true });
				const { table, source } = await read(csv);
				expect(source.delimiter).toBe(delimiter);
				expect(table.headings).toEqual(names);
				expect(rowsOf(table)).toEqual(rows);
			},
		),
		{ numRuns: 150 },
	);
});

it('a table written as a workbook reads back the same', async () => {
	const value = fc.option(
		fc.oneof(text, fc.double({ noNaN: true, noDefaultInfinity: true }), fc.boolean()),
		{ freq: 5 },
	);
	const sheets = fc.array(fc.tuple(text, value, value, text), { minLength: 1, maxLength: 12 });
	await fc.assert(
		fc.asyncProperty(sheets, async (rows) => {
			const names = headings(4);
			const blob = await writeXlsxFile([names, ...rows]).toBlob();
			const bytes = new Uint8Array(await blob.arrayBuffer());
			const { table, source } = await read(bytes, { headingRow: 1, headingRows: 1 });
			expect(source.format).toBe('xlsx');
			expect(table.headings).toEqual(names);
			// 0 has no sign in a workbook
			expect(rowsOf(table)).toEqual(rows.map((row) => row.map((v) => (v === 0 ? 0 : v))));
		}),
		{ numRuns: 60 },
	);
});
