import { zipSync, strToU8 } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { createPool, type Pool } from '../../src/lib/server/jobs/pool.ts';
import {
	chooseColumns,
	readTableReview,
	sweepRows,
} from '../../src/lib/server/services/measure-review.service.ts';
import { takeTable } from '../../src/lib/server/services/measure-taking.service.ts';
import { inThread } from '../../src/lib/server/services/measure-thread.ts';
import { deskMeasures, measureTables } from '../../src/lib/server/services/measures.service.ts';
import { csv, parishes, squaresSheet, upload, xlsx } from '../support/measure-tables.ts';
import { handMade, sheetData } from '../support/workbook.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let small: Pool;
let member: Member;
let sheet: number;
let stored: string[];
beforeAll(async () => {
	shop = await createWorkshop();
	// a quarter of what a thread has in use
	small = createPool({ threads: 1, heapMb: 512 });
	member = await createMember(shop.db, 'hostile', 'cartographer', 'analyst');
	sheet = await squaresSheet(shop, member);
	stored = await shop.stored();
});
afterAll(async () => {
	await small.close();
	await shop.close();
});

const reviewOf = async (table: number) => {
	const { review } = await readTableReview(shop, member, sheet, table);
	if (!review?.join) throw new Error('the table is not joined');
	return { ...review, join: review.join };
};

const blank = ' '.repeat(70_000_000);
const bomb = () => handMade({ sheets: { A: `<sheetData>${blank}</sheetData>` } });
const nested = '['.repeat(200_000);

const refused: [string, string, () => string | Uint8Array | Promise<Uint8Array>, RegExp][] = [
	['nothing at all', 'a.csv', () => '', /empty-file/],
	['a heading alone', 'a.csv', () => 'Key,Visits', /no-rows/],
	['a picture', 'a.csv', () => new Uint8Array([137, 80, 78, 71, 13, 10, 26, 10]), /not-text/],
	['a page', 'a.csv', () => '<!doctype html><p>no table', /web-page/],
	['a map', 'a.xlsx', () => '<?xml version="1.0"?><kml/>', /xml/],
	['a zip of something else', 'a.xlsx', () => zipSync({ 'a.txt': strToU8('x') }), /not-a-workbook/],
	['a workbook that unpacks to much more', 'bomb.xlsx', bomb, /too-large-unpacked/],
	[
		'a workbook cut off',
		'cut.xlsx',
		async () => (await xlsx({ A: [['Key'], ['01']] })).slice(0, 300),
		/workbook-damaged|not-a-workbook/,
	],
];

describe('what is no table', () => {
	it.each(refused)(
		'%s: says why, and leaves no row and no byte',
		async (_case, name, make, code) => {
			const problem = await upload(shop, member, sheet, name, await make()).then(
				() => null,
				(error: unknown) => error,
			);
			expect(problem).toMatchObject({ code: expect.stringMatching(code) });
			expect((problem as Error).message).toMatch(/^[\p{Lu}"].*\.$/su);
			expect(await measureTables(shop, member, sheet)).toEqual([]);
			expect((await shop.stored()).sort()).toEqual(stored.sort());
		},
	);

	it('the wrong sheet of a workbook: names the right ones', async () => {
		const book = await xlsx({
			Notes: [['about']],
			Figures: [
				['Key', 'A'],
				['01', 1],
			],
		});
		const wrong = upload(shop, member, sheet, 'a.xlsx', book, { sheet: 'Sums' });
		await expect(wrong).rejects.toMatchObject({ code: 'no-such-sheet', message: /Figures/ });
	});

	it('a table of something else is taken in, told as not joined, and cannot be taken over', async () => {
		const table = await upload(shop, member, sheet, 'deep.csv', `Item,Depth\n${nested},71\nb,92`);
		const { review } = await readTableReview(shop, member, sheet, table);
		expect(review?.join).toBeNull();
		await expect(takeTable(shop, member, sheet, table, true)).rejects.toMatchObject({
			code: 'nothing-joined',
		});
	});

	it('a form field that is not known, or a way of reading that does not exist', async () => {
		for (const fields of [{ owner: 'me' }, { delimiter: 'x' }, { headingRow: '-2' }]) {
			const sent = upload(shop, member, sheet, 'a.csv', 'Key,A\n01,1', fields as never);
			await expect(sent).rejects.toMatchObject({ code: 'malformed' });
		}
	});
});

describe('hostile names', () => {
	it('stay text: in headings, cells, units and regions', async () => {
		const heading = '=HYPERLINK("http://x.example","Visits")';
		const script = '<script>alert(1)</script>';
		const rows = [
			['Key', heading, script],
			['01', 1, '=1+1'],
			['02', 2, script],
		];
		const table = await upload(shop, member, sheet, '../../etc/x.xlsx', await xlsx({ A: rows }));
		const { outcome, columns } = await reviewOf(table);
		const named = [...outcome.map(({ choice }) => choice), columns[2].proposal];
		await chooseColumns(shop, member, sheet, table, { columns: named, existing: 'replace' });
		await takeTable(shop, member, sheet, table, true);
		const { measures, textColumns } = await deskMeasures(shop, member, sheet);
		expect(measures.at(-1)).toMatchObject({ name: heading, total: 3 });
		expect(textColumns.at(-1)).toMatchObject({
			name: script,
			texts: ['=1+1', script, null, null, null, null],
		});
		expect((await measureTables(shop, member, sheet))[0].fileName).toBe('x.xlsx');
	});

	it('a formula counts by the value it was saved with, and is never computed', async () => {
		const cells =
			'<sheetData><row><c t="inlineStr"><is><t>Key</t></is></c><c t="inlineStr"><is><t>Made</t></is></c></row>' +
			'<row><c t="inlineStr"><is><t>01</t></is></c><c><f>1+1</f><v>7</v></c></row></sheetData>';
		const table = await upload(shop, member, sheet, 'f.xlsx', handMade({ sheets: { A: cells } }));
		expect((await reviewOf(table)).outcome[0].sums?.file).toBe(7);
	});
});

describe('200,000 rows', () => {
	const most = 200_000;
	const rowOf = (at: number): (string | number)[] =>
		at % 2 ? [parishes[at % 6][0], at, 'x'] : [`unknown ${at}`, 1, 'y'];
	const rows = () => [
		['Key', 'Load', 'Note'],
		...Array.from({ length: most }, (_, at) => rowOf(at)),
	];
	// every odd number below 200,000 is joined: their sum is 100,000 squared
	const joined = 100_000 ** 2;

	it.each([
		['CSV', 'big.csv', () => csv(rows())],
		['a workbook', 'big.xlsx', () => handMade({ sheets: { A: sheetData(rows()) } })],
	])(
		'of %s are read, reviewed and taken over in a thread with little memory',
		async (_c, name, make) => {
			const bench = { ...shop, pool: small };
			const table = await upload(bench, member, sheet, name, make());
			const { review } = await readTableReview(bench, member, sheet, table);
			expect(review?.join).toMatchObject({ joined: most / 2, open: most / 2 });
			expect(review?.join?.list.rows).toHaveLength(50);
			expect(review?.outcome[0].sums).toMatchObject({ joined, lost: most / 2, lostRows: most / 2 });
			await sweepRows(bench, member, sheet, table, { what: 'leave-out-rest' });
			await takeTable(bench, member, sheet, table, false);
			const { measures } = await deskMeasures(bench, member, sheet);
			expect(measures.find((one) => one.name === 'Load')).toMatchObject({ total: joined });
		},
	);
});

describe('a step that takes too long', () => {
	it('is stopped, and the sentence says so', async () => {
		const slow = new TextEncoder().encode(
			JSON.stringify({ inks: Array(24).fill('#808080'), mend: true }),
		);
		const work = (signal: AbortSignal) => small.run('checkPaletteJson', slow, { signal });
		await expect(inThread('Reading the table', work, 0.001)).rejects.toThrow(
			/^Reading the table took more than 0.001 seconds and was stopped\. Nothing was changed\./,
		);
	});
});
