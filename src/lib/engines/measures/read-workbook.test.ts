import { strToU8, zipSync } from 'fflate';
import readXlsxFile from 'read-excel-file/universal';
import { describe, expect, it } from 'vitest';
import writeXlsxFile from 'write-excel-file/universal';
import { codes, read, refusal, rowsOf } from '../../../../tests/support/tables.ts';
import { handMade, sheetData } from '../../../../tests/support/workbook.ts';
import { typeColumns } from './index.ts';

const bytesOf = async (blob: Blob) => new Uint8Array(await blob.arrayBuffer());
const figures = sheetData([
	['Key', 'Visits'],
	['01', 5],
	['02', 6],
]);

describe('the sheet', () => {
	const notes = sheetData([['Please read this first'], ['It is a note']]);
	const book = handMade({
		sheets: { 'Read me': notes, Empty: '<sheetData/>', Figures: figures, Old: figures },
	});

	it('is the first that looks like a table; all are listed', async () => {
		const { table, source } = await read(book);
		expect(table).toMatchObject({ sheet: 'Figures', rows: 2, headings: ['Key', 'Visits'] });
		expect(source.sheets).toEqual([
			{ name: 'Read me', rows: 2 },
			{ name: 'Empty', rows: 0 },
			{ name: 'Figures', rows: 3 },
			{ name: 'Old', rows: 3 },
		]);
		expect(codes(source)).toEqual(['sheet-chosen']);
	});

	it('is the one that was told, even where that is the wrong one', async () => {
		expect((await read(book, { sheet: 'Old' })).table.sheet).toBe('Old');
		expect((await read(book, { sheet: 'Read me' })).table.headings).toEqual([
			'Please read this first',
		]);
		expect(await refusal(book, { sheet: 'Empty' })).toBe('no-rows');
		expect(await refusal(book, { sheet: 'Gone' })).toBe('no-such-sheet');
	});
});

describe('cells', () => {
	it('are read as they were saved: numbers, texts, errors, formulas by their values', async () => {
		const cells =
			'<sheetData><row r="3"><c r="B3" t="s"><v>0</v></c><c r="C3" t="s"><v>1</v></c><c r="D3" t="s"><v>2</v></c><c r="E3" t="inlineStr"><is><t>Note</t></is></c></row>' +
			'<row r="5"><c r="B5" t="s"><v>3</v></c><c r="C5"><f>1+1</f><v>2</v></c><c r="D5" t="e"><f>1/0</f><v>#DIV/0!</v></c><c r="E5" t="b"><v>1</v></c></row>' +
			'<row r="6"><c r="B6" t="str"><f>"a"&amp;"b"</f><v>ab</v></c><c r="C6"><f>1+1</f></c><c r="D6"><v>1E-3</v></c><c r="E6" t="d"><v>2026-05-01</v></c></row></sheetData>';
		const strings =
			'<si><t>Key</t></si><si><r><t>Vis</t></r><r><t>its</t></r></si><si><t>Rate</t><rPh sb="0" eb="1"><t>reading</t></rPh></si><si><t>=1+_x0041_</t></si>';
		const { table, source } = await read(handMade({ sheets: { S: cells }, strings }));
		expect(table).toMatchObject({ headingRow: 3, firstRow: 5, fileRows: [5, 6] });
		expect(table.headings).toEqual(['Column 1', 'Key', 'Visits', 'Rate', 'Note']);
		expect(rowsOf(table)).toEqual([
			[null, '=1+A', 2, '#DIV/0!', true],
			[null, 'ab', null, 0.001, '2026-05-01'],
		]);
		expect(source.notes).toMatchObject([{ code: 'formula-unsaved', row: 6 }]);
	});

	it('with dates become ISO dates, percents are known', async () => {
		const cells =
			'<sheetData><row><c t="inlineStr"><is><t>Key</t></is></c><c t="inlineStr"><is><t>Day</t></is></c><c t="inlineStr"><is><t>When</t></is></c><c t="inlineStr"><is><t>Share</t></is></c><c t="inlineStr"><is><t>Took</t></is></c><c t="inlineStr"><is><t>EUR</t></is></c></row>' +
			'<row><c><v>1001</v></c><c s="1"><v>46023</v></c><c s="2"><v>46023.75</v></c><c s="3"><v>0.12</v></c><c s="4"><v>1.104166666666667</v></c><c s="5"><v>46023</v></c></row></sheetData>';
		const formats = {
			codes: { 164: 'dd/mm/yyyy\\ h:mm', 165: '[h]:mm', 166: '#,##0.00\\ "days"' },
			cells: [0, 14, 164, 10, 165, 166],
		};
		const { table, source } = await read(handMade({ sheets: { S: cells }, formats }));
		expect(rowsOf(table)).toEqual([
			[1001, '2026-01-01', '2026-01-01T18:00:00', 0.12, '26:30:00', 46023],
		]);
		const kinds = typeColumns(table, source).map(({ kind, percent }) => [kind, percent]);
		expect(kinds).toEqual([
			['number', false],
			['date', false],
			['date', false],
			['number', true],
			['text', false],
			['number', false],
		]);
		const later = await read(handMade({ sheets: { S: cells }, formats, from1904: true }));
		expect(later.table.cells[1]).toEqual(['2030-01-02']);
	});

	it('with prefixes and in UTF-16 are read too', async () => {
		const main = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
		const xml = `\ufeff<x:worksheet xmlns:x="${main}"><x:sheetData><x:row><x:c t="inlineStr"><x:is><x:t>Käy</x:t></x:is></x:c><x:c t="inlineStr"><x:is><x:t>V</x:t></x:is></x:c></x:row><x:row><x:c><x:v>1</x:v></x:c><x:c><x:v>2</x:v></x:c></x:row></x:sheetData></x:worksheet>`;
		const wide = new Uint8Array(Uint16Array.from(xml, (c) => c.charCodeAt(0)).buffer);
		const book = handMade({ sheets: { S: '' }, parts: { 'xl/worksheets/s0.xml': wide } });
		expect((await read(book)).table).toMatchObject({ headings: ['Käy', 'V'], cells: [[1], [2]] });
	});
});

describe('merged cells', () => {
	it('in the heading make names of both rows', async () => {
		const label = (value: string, columnSpan?: number, rowSpan?: number) => ({
			value,
			type: String,
			columnSpan,
			rowSpan,
		});
		const blob = await writeXlsxFile([
			[label('Visits of the field', 5), null, null, null, null],
			[label('Key', 1, 2), label('Visits', 2), null, label('Potential', 2), null],
			[null, '2025', '2026', 'EUR', 'h'],
			['01', 5, 6, 7, 8],
			['02', 5, 6, 7, 8],
		]).toBlob();
		const { table, source } = await read(await bytesOf(blob));
		expect(table.headings).toEqual([
			'Key',
			'Visits, 2025',
			'Visits, 2026',
			'Potential, EUR',
			'Potential, h',
		]);
		expect(table).toMatchObject({ headingRow: 2, firstRow: 4, rows: 2 });
		expect(codes(source)).toEqual(['rows-above', 'heading-merged']);
	});

	it('of a title make none', async () => {
		const merged = `${sheetData([
			['Visits of the field', null, null],
			['Key', 'A', 'B'],
			['1', 2, 3],
			['2', 3, 4],
		])}<mergeCells><mergeCell ref="A1:B1"/></mergeCells>`;
		const { table } = await read(handMade({ sheets: { S: merged } }));
		expect(table).toMatchObject({ headings: ['Key', 'A', 'B'], headingRow: 2, rows: 2 });
	});

	it('over several rows of data are told', async () => {
		const merged = `${sheetData([
			['Key', 'A'],
			['1', 2],
			[null, 3],
			['2', 3],
		])}<mergeCells><mergeCell ref="A2:A3"/></mergeCells>`;
		const { source } = await read(handMade({ sheets: { S: merged } }));
		expect(source.notes).toMatchObject([{ code: 'rows-merged', row: 2 }]);
	});
});

describe('what is no workbook that can be read', () => {
	const book = handMade({ sheets: { S: figures } });

	it('is refused with a sentence', async () => {
		const zip = (parts: Record<string, string>) =>
			zipSync(
				Object.fromEntries(Object.entries(parts).map(([name, text]) => [name, strToU8(text)])),
			);
		const damaged = book.slice();
		const sheet = Buffer.from(damaged).indexOf('xl/worksheets/s0.xml');
		damaged.fill(0xff, sheet + 40, sheet + 60);
		const part = (xml: string) =>
			handMade({ sheets: { S: '' }, parts: { 'xl/worksheets/s0.xml': strToU8(xml) } });
		const cases: [string, Uint8Array][] = [
			['workbook-damaged', book.subarray(0, book.length - 30)],
			['workbook-damaged', damaged],
			['workbook-damaged', part('<worksheet><sheetData>')],
			['workbook-damaged', part('<!DOCTYPE x [<!ENTITY a "b">]><worksheet>&a;</worksheet>')],
			[
				'workbook-damaged',
				part('<worksheet><sheetData><row r="2"/><row r="2"/></sheetData></worksheet>'),
			],
			[
				'workbook-damaged',
				part('<worksheet><sheetData><row><c r="ZZZZ1"/></row></sheetData></worksheet>'),
			],
			[
				'workbook-damaged',
				part('<worksheet><sheetData><row><c t="s"><v>7</v></c></row></sheetData></worksheet>'),
			],
			['workbook-damaged', part(`${'<a>'.repeat(200)}${'</a>'.repeat(200)}`)],
			[
				'workbook-damaged',
				part(`<worksheet><sheetData>${' '.repeat(16_000_000)}</sheetData></worksheet>`),
			],
			[
				'workbook-damaged',
				part(`<worksheet><sheetData><row>${'<c/>'.repeat(20_000)}</row></sheetData></worksheet>`),
			],
			['binary-workbook', zip({ 'xl/workbook.bin': 'x' })],
			['open-document', zip({ 'META-INF/manifest.xml': 'x', 'content.xml': 'x' })],
			['not-a-workbook', zip({ 'figures.csv': 'Key,Visits\n1,2\n' })],
			['no-rows', handMade({ sheets: { S: '<sheetData/>' } })],
			['no-rows', handMade({ sheets: { S: sheetData([['Key', 'Visits']]) } })],
		];
		for (const [index, [code, file]] of cases.entries()) {
			expect([index, await refusal(file)]).toEqual([index, code]);
		}
	});

	it('is refused before it is unpacked where it would be too large', async () => {
		expect(await refusal(book, { limits: { unpackedBytes: 1000 } })).toBe('too-large-unpacked');
		const blanks = handMade({
			sheets: { S: '' },
			parts: { 'xl/blanks.xml': new Uint8Array(80 * 1024 ** 2) },
		});
		expect(blanks.length).toBeLessThan(200_000);
		expect(await refusal(blanks)).toBe('too-large-unpacked');
	});

	it('is refused where a part unpacks to more than was declared', async () => {
		const lying = handMade({
			sheets: { S: sheetData(Array.from({ length: 5000 }, () => ['Key', 1])) },
		});
		const view = new DataView(lying.buffer, lying.byteOffset);
		let changed = 0;
		for (let at = 0; at + 46 < lying.length; at++) {
			if (view.getUint32(at, true) !== 0x02014b50 || view.getUint32(at + 24, true) < 50_000)
				continue;
			view.setUint32(at + 24, 1000, true);
			changed++;
		}
		expect(changed).toBe(1);
		expect(await refusal(lying)).toBe('too-large-unpacked');
	});
});

it('reads what another reader reads', async () => {
	const rows = Array.from({ length: 300 }, (_, i) => [
		`0${i}`,
		i / 7,
		{
			value: new Date(Date.UTC(1999 + (i % 40), i % 12, 1 + (i % 28))),
			type: Date,
			format: 'yyyy-mm-dd',
		},
		i % 3 ? `Größe & <${i}>` : null,
		i % 2 === 0,
	]);
	const blob = await writeXlsxFile([['Key', 'Visits', 'Day', 'Note', 'Open'], ...rows]).toBlob();
	const { table } = await read(await bytesOf(blob));
	const [{ data }] = await readXlsxFile(blob);
	const dated = data.map((row) =>
		row.map((cell) => (cell instanceof Date ? cell.toISOString().slice(0, 10) : cell)),
	);
	expect([table.headings, ...rowsOf(table)]).toEqual(dated);
});

it('reads 200,000 rows of a workbook', async () => {
	const row = (i: number) =>
		`<row r="${i + 2}"><c r="A${i + 2}" t="inlineStr"><is><t>K${i}</t></is></c><c r="B${i + 2}"><v>${i / 4}</v></c></row>`;
	const data = Array.from({ length: 200_000 }, (_, i) => row(i)).join('');
	const heading =
		'<row r="1"><c r="A1" t="inlineStr"><is><t>Key</t></is></c><c r="B1" t="inlineStr"><is><t>Visits</t></is></c></row>';
	const { table } = await read(
		handMade({ sheets: { S: `<sheetData>${heading}${data}</sheetData>` } }),
	);
	expect(table.rows).toBe(200_000);
	expect(rowsOf(table).at(-1)).toEqual(['K199999', 199_999 / 4]);
});
