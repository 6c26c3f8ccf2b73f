import { strFromU8, unzipSync } from 'fflate';
import fc from 'fast-check';
import Papa from 'papaparse';
import readXlsxFile from 'read-excel-file/universal';
import { SaxesParser } from 'saxes';
import { describe, expect, it, vi } from 'vitest';
import { exportTableCsv, type DataTable } from './data-table.ts';
import { exportWorkbook } from './workbook.ts';

const moves: DataTable = {
	name: 'Moves',
	columns: [
		{ heading: 'unit', kind: 'text' },
		{ heading: 'visits', unit: 'hours a year', kind: 'number' },
		{ heading: 'from', kind: 'date' },
	],
	rows: [
		['0101', 117.5, '2027-02-28'],
		['=HYPERLINK("http://evil.example")', -3, ''],
		['Lœvendal & <sons>', null, '2027-03-01'],
	],
};

const read = (bytes: Uint8Array) => readXlsxFile(new Blob([bytes.slice()]));

/** Cells of a worksheet by a parser of XML, so that nothing of the writer or the reader is believed. */
function cellsOf(xml: string): Record<string, string>[] {
	const found: Record<string, string>[] = [];
	const parser = new SaxesParser();
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('opentag', ({ name, attributes }) => {
		found.push({ ...(attributes as Record<string, string>), element: name });
	});
	parser.write(xml).close();
	return found;
}

describe('a workbook', () => {
	it('is read again by read-excel-file 9.3.17 as it was given', async () => {
		const [{ sheet, data }] = await read(await exportWorkbook([moves]));
		expect(sheet).toBe('Moves');
		expect(data).toEqual([
			['unit', 'visits (hours a year)', 'from'],
			['0101', 117.5, new Date('2027-02-28T00:00:00Z')],
			['=HYPERLINK("http://evil.example")', -3, null],
			['Lœvendal & <sons>', null, new Date('2027-03-01T00:00:00Z')],
		]);
	});

	it('has no formula and keeps the headings in sight, by saxes 6.0.0', async () => {
		// ECMA-376 part 1: 18.3.1.40 f (formula), 18.3.1.66 pane, 18.3.1.4 c with type s or n
		const parts = unzipSync(await exportWorkbook([moves]));
		const elements = cellsOf(strFromU8(parts['xl/worksheets/sheet1.xml']));
		expect(elements.filter(({ element }) => element === 'f')).toEqual([]);
		const pane = elements.find(({ element }) => element === 'pane');
		expect(pane).toMatchObject({ ySplit: '1', state: 'frozen' });
		const cell = (at: string) => elements.find(({ r, element }) => element === 'c' && r === at);
		expect(cell('A3')?.t).toBe('s');
		expect(cell('B2')?.t ?? 'n').toBe('n');
	});

	it('is the same bytes on another day', async () => {
		const first = await exportWorkbook([moves]);
		vi.useFakeTimers({ now: new Date('2031-07-04T05:06:07Z'), toFake: ['Date'] });
		try {
			expect(Buffer.compare(await exportWorkbook([moves]), first)).toBe(0);
		} finally {
			vi.useRealTimers();
		}
	});

	it('keeps every text a text, whatever it begins with', async () => {
		const start = fc.constantFrom('=', '+', '-', '@', '\t', '\r', '');
		const rest = fc.string({ unit: fc.constantFrom(...'=+@1a"\'<&>;,| é測') });
		await fc.assert(
			fc.asyncProperty(start, rest, async (first, more) => {
				const text = `${first}x${more}x`;
				const columns = [{ heading: 'a', kind: 'text' as const }];
				const bytes = await exportWorkbook([{ name: 'T', columns, rows: [[text]] }]);
				const [{ data }] = await read(bytes);
				expect(typeof data[1][0]).toBe('string');
				// XML reads a carriage return as a line feed (XML 1.0, 2.11), and the reader trims
				expect(data[1][0]).toBe(text.replace(/\r/g, '\n').trim());
				expect(strFromU8(unzipSync(bytes)['xl/worksheets/sheet1.xml'])).not.toContain('<f>');
			}),
			{ numRuns: 60 },
		);
	});

	it('keeps names that programs mistake for their own, and leaves out what XML forbids', async () => {
		const texts = [
			'__proto__',
			'constructor',
			'toString',
			'\ue000constructor',
			'\ue000x',
			'a\u0000b\ud800c',
		];
		const columns = [{ heading: 'valueOf', kind: 'text' as const }];
		const [{ data }] = await read(
			await exportWorkbook([{ name: 'T', columns, rows: texts.map((text) => [text]) }]),
		);
		expect(data.flat()).toEqual(['valueOf', ...texts.slice(0, 5), 'abc']);
		const long = await exportWorkbook([{ name: 'T', columns, rows: [['ж'.repeat(40_000)]] }]);
		// 32,767 signs is what the applications take in one cell (from memory, as they document it)
		expect(String((await read(long))[0].data[1][0]).length).toBeLessThanOrEqual(32_767);
	});

	it('leaves out a number that is none', async () => {
		const rows = [[Number.NaN], [Infinity], [4]];
		const columns = [{ heading: 'n', kind: 'number' as const }];
		const [{ data }] = await read(await exportWorkbook([{ name: 'N', columns, rows }]));
		expect(data.at(-1)).toEqual([4]);
		expect(data.flat().filter((cell) => typeof cell === 'number')).toEqual([4]);
	});
});

describe('the same table as text', () => {
	it('is read again by papaparse 5.7.1, formulas led by an apostrophe', () => {
		const text = new TextDecoder().decode(exportTableCsv(moves));
		const { data, errors } = Papa.parse<string[]>(text, { skipEmptyLines: true });
		expect(errors).toEqual([]);
		expect(data).toEqual([
			['unit', 'visits (hours a year)', 'from'],
			['0101', '117.5', '2027-02-28'],
			[`'=HYPERLINK("http://evil.example")`, '-3', ''],
			['Lœvendal & <sons>', '', '2027-03-01'],
		]);
	});
});
