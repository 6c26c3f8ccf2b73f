import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { allows, roles } from '../../src/lib/server/access/roles.ts';
import {
	chooseColumns,
	decideRows,
	readTableReview,
	sweepRows,
} from '../../src/lib/server/services/measure-review.service.ts';
import { takeTable } from '../../src/lib/server/services/measure-taking.service.ts';
import {
	dropMeasure,
	dropTable,
	joinAgain,
	rereadTable,
} from '../../src/lib/server/services/measure-upkeep.service.ts';
import { deskMeasures, measureTables } from '../../src/lib/server/services/measures.service.ts';
import { NotFound } from '../../src/lib/server/services/outcomes.ts';
import { deskSheet, removeSheet } from '../../src/lib/server/services/sheet.service.ts';
import { csv, squaresSheet, upload, xlsx } from '../support/measure-tables.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let analyst: Member;
let sheet: number;
beforeAll(async () => {
	shop = await createWorkshop();
	const cartographer = await createMember(shop.db, 'figures', 'cartographer');
	analyst = await createMember(shop.db, 'figures', 'analyst');
	sheet = await squaresSheet(shop, cartographer);
});
afterAll(() => shop.close());

const reviewOf = async (table: number, page = { page: 1, find: '' }) => {
	const { review } = await readTableReview(shop, analyst, sheet, table, page);
	if (!review?.join) throw new Error('the table is not joined');
	return { ...review, join: review.join };
};
const log = async (action: string) =>
	shop.db.selectFrom('activity').selectAll().where('action', '=', action).execute();

describe('a table with errors', () => {
	let table: number;
	it('is joined as far as it can be, and says what is left', async () => {
		// the zeros were eaten, one name is misspelt, one row is a total, one region stands twice
		const rows = [
			['District', 'Accounts', 'Hours [h]', 'Rep'],
			['Ashby', 10, 1.5, 'Mara'],
			['Belmoor', 20, 2.5, 'Mara'],
			['Corran', 30, 'n/a', 'Tove'],
			['Corran', 5, 1, 'Tove'],
			['Dunwick', -4, 4, 'Tove'],
			['Elan', 50, 5, 'Ivo'],
			['Total', 111, 14, ''],
		];
		table = await upload(shop, analyst, sheet, 'accounts.xlsx', await xlsx({ Figures: rows }));
		const { join, outcome, source } = await reviewOf(table);
		expect(source).toMatchObject({ format: 'xlsx', sheet: 'Figures', headingRow: 1 });
		expect(join).toMatchObject({ choice: { column: 0, by: 'name' }, joined: 5, open: 2 });
		expect(join.counts).toMatchObject({ exact: 4, folded: 1 });
		expect(
			join.list.rows.map(({ fileRow, text, offers }) => [fileRow, text, offers[0]?.key]),
		).toEqual([
			[3, 'Belmoor', '02'],
			[8, 'Total', undefined],
		]);
		expect(join.doubled).toMatchObject({ all: 1, regions: [{ key: '03', rows: [4, 5] }] });
		expect(join.missing.regions.map(({ key }) => key)).toEqual(['02', '06']);
		const accounts = outcome.find(({ choice }) => choice.name === 'Accounts');
		// sums by hand: 10+20+30+5-4+50+111 in the file, 20+111 of it in rows without a region
		expect(accounts?.sums).toMatchObject({ file: 222, joined: 91, lost: 131, lostRows: 2 });
		expect(accounts?.refusals.join(' ')).toMatch(/below zero.*6/);
		const hours = outcome.find(({ choice }) => choice.name === 'Hours');
		expect(hours?.choice).toMatchObject({ unit: 'h', notNumber: 'missing' });
	});

	it('is not taken over while anything is open or refused', async () => {
		await expect(takeTable(shop, analyst, sheet, table, true)).rejects.toMatchObject({
			code: 'rows-open',
		});
		expect((await deskMeasures(shop, analyst, sheet)).measures).toEqual([]);
	});

	it('takes decisions on rows, by name or key, and says where it cannot', async () => {
		await expect(
			decideRows(shop, analyst, sheet, table, [{ row: 1, region: 'Nowhere' }]),
		).rejects.toMatchObject({ field: 'other-1' });
		await decideRows(shop, analyst, sheet, table, [
			{ row: 1, region: 'bellmoor' },
			{ row: 6, region: null },
		]);
		const { join } = await reviewOf(table);
		expect(join).toMatchObject({ joined: 6, open: 0, leftOut: 1 });
		expect(join.decided.rows.map(({ region }) => region?.key ?? null)).toEqual(['02', null]);
		await expect(takeTable(shop, analyst, sheet, table, true)).rejects.toMatchObject({
			code: 'not-taken',
		});
	});

	it('is taken over once every doubt has a rule', async () => {
		const { outcome, columns } = await reviewOf(table);
		const choices = outcome.map(({ choice }) => ({ ...choice, negative: 'keep' as const }));
		const rep = { ...columns[3].proposal, name: 'Rep', doubled: 'first' as const };
		await chooseColumns(shop, analyst, sheet, table, {
			columns: [...choices, rep],
			existing: 'replace',
		});
		await takeTable(shop, analyst, sheet, table, true);
		const { measures, textColumns } = await deskMeasures(shop, analyst, sheet);
		expect(measures).toMatchObject([
			{
				name: 'Accounts',
				values: [10, 20, 35, -4, 50, null],
				missing: 1,
				total: 111,
				stale: false,
			},
			{ name: 'Hours', unit: 'h', values: [1.5, 2.5, 1, 4, 5, null], confidential: true },
		]);
		expect(textColumns).toMatchObject([
			{ name: 'Rep', texts: ['Mara', 'Mara', 'Tove', 'Tove', 'Ivo', null] },
		]);
		expect((await deskSheet(shop, analyst, sheet)).measures).toEqual({
			...{ count: 2, missing: 2, stale: 0, open: 0 },
		});
		expect(await measureTables(shop, analyst, sheet)).toMatchObject([
			{ number: table, state: 'taken', matched: 6, rows: 7, takenBy: 'analyst of figures' },
		]);
		expect(await log('measures.taken')).toMatchObject([
			{ detail: { sheet, table, measures: ['Accounts', 'Hours', 'Rep'] } },
		]);
	});

	it('is not taken over twice', async () => {
		await expect(takeTable(shop, analyst, sheet, table, true)).rejects.toMatchObject({
			code: 'not-open',
		});
	});
});

/** Uploads a plain table, takes it over with the columns proposed, and answers its number. */
async function take(rows: (string | number)[][], existing: 'replace' | 'add' = 'replace') {
	const table = await upload(shop, analyst, sheet, 'plain.csv', csv(rows));
	const { outcome } = await reviewOf(table);
	const columns = outcome.map(({ choice }) => choice);
	await chooseColumns(shop, analyst, sheet, table, { columns, existing });
	const taken = await takeTable(shop, analyst, sheet, table, true);
	return { table, taken };
}
const measure = async (name: string) => {
	const found = (await deskMeasures(shop, analyst, sheet)).measures.find(
		(one) => one.name === name,
	);
	if (!found) throw new Error(`no measure ${name}`);
	return found;
};
const measureCount = async () => {
	const { measures, textColumns } = await deskMeasures(shop, analyst, sheet);
	return measures.length + textColumns.length;
};
const stateOf = async (number: number) =>
	(await measureTables(shop, analyst, sheet)).find((one) => one.number === number)?.state;

describe('a later table', () => {
	const first = [
		['Key', 'Visits'],
		['01', 10],
		['02', 20],
		['03', 30],
		['04', 40],
	];
	let before: { table: number; id: string };

	it('shows what it changes before it is taken over', async () => {
		const { table } = await take(first);
		before = { table, id: (await measure('Visits')).id };
		const later = await upload(
			shop,
			analyst,
			sheet,
			'later.csv',
			csv([
				['Key', 'Visits'],
				['01', 10],
				['02', 25],
				['03', 18],
				['06', 60],
			]),
		);
		const { outcome } = await reviewOf(later);
		// by hand: 02 and 03 change (most 03, by 12), 06 is new, 04 goes; 100 before, 113 after
		expect(outcome[0].change).toMatchObject({
			...{ mode: 'replace', changed: 2, added: 1, removed: 1, before: 100, after: 113 },
			largest: { region: { key: '03', name: 'Corran' }, before: 30, after: 18 },
		});
		await takeTable(shop, analyst, sheet, later, true);
		expect(await measure('Visits')).toMatchObject({
			...{ id: before.id, values: [10, 25, 18, null, null, 60], total: 113 },
		});
		const { changes } = await readTableReview(shop, analyst, sheet, later);
		expect(changes.sentences?.[0]).toContain('Largest change: Corran, 30 to 18');
	});

	it('takes the place of the one before, of which nothing is left', async () => {
		expect(await stateOf(before.table)).toBe('replaced');
	});

	it('can be added to what is there, with the same unit only', async () => {
		const { table, taken } = await take(
			[
				['Key', 'Visits'],
				['01', 1],
				['04', 4],
			],
			'add',
		);
		expect(taken.measures).toEqual([before.id]);
		expect((await measure('Visits')).values).toEqual([11, 25, 18, 4, null, 60]);
		expect(await stateOf(table)).toBe('taken');
		await expect(
			take(
				[
					['Key', 'Visits [h]'],
					['01', 1],
					['02', 3],
				],
				'add',
			),
		).rejects.toMatchObject({ code: 'not-taken', message: /only the same unit/ });
	});

	it('keeps its own name when it holds words where numbers are', async () => {
		const table = await upload(
			shop,
			analyst,
			sheet,
			'words.csv',
			csv([
				['Key', 'Visits'],
				['01', 'few'],
				['02', 'many'],
			]),
		);
		const { columns } = await reviewOf(table);
		const choice = { columns: [columns[1].proposal], existing: 'replace' as const };
		await chooseColumns(shop, analyst, sheet, table, choice);
		await expect(takeTable(shop, analyst, sheet, table, true)).rejects.toMatchObject({
			message: /a column of numbers called so already/,
		});
	});
});

describe('many rows at once', () => {
	it('are given the nearest region, or left out, and taken back', async () => {
		const names = ['Ashbi', 'Belmoor', 'Coran', 'Dunwik', 'Zzz'];
		const rows = [['Name', 'Stops'], ...names.map((name, at) => [name, at + 1])];
		// enough right names for the column to be found by itself
		const right = ['Ashby', 'Bellmoor', 'Corran', 'Dunwick', 'Fairlea'].map((name) => [name, 0]);
		const table = await upload(shop, analyst, sheet, 'many.csv', csv([...rows, ...right]));
		expect((await reviewOf(table)).join.open).toBe(5);
		await sweepRows(shop, analyst, sheet, table, { what: 'take-first' });
		const { join } = await reviewOf(table);
		expect(join).toMatchObject({ open: 1, counts: { 'by-hand': 4 } });
		expect(join.decided.rows.map(({ region }) => region?.name)).toEqual([
			...['Ashby', 'Bellmoor', 'Corran', 'Dunwick'],
		]);
		await sweepRows(shop, analyst, sheet, table, { what: 'leave-out-rest' });
		expect((await reviewOf(table)).join).toMatchObject({ open: 0, leftOut: 1 });
		await sweepRows(shop, analyst, sheet, table, { what: 'take-back-all' });
		expect((await reviewOf(table)).join).toMatchObject({ open: 5, leftOut: 0 });
		const page = await reviewOf(table, { page: 1, find: 'dunw' });
		expect(page.join.list).toMatchObject({ found: 1, rows: [{ text: 'Dunwik' }] });
	});

	it('can be read another way from the kept file', async () => {
		const text = 'Code;Turnover;Note\n01;1.234,5;a\n02;2.000,5;b\n03;3,25;c';
		const table = await upload(shop, analyst, sheet, 'comma.csv', text);
		const turnover = async () =>
			(await reviewOf(table)).outcome.find(({ choice }) => choice.name === 'Turnover');
		// 1234.5 + 2000.5 + 3.25
		expect((await turnover())?.sums?.file).toBe(3238.25);
		await rereadTable(shop, analyst, sheet, table, { delimiter: ';', decimal: '.' });
		expect((await turnover())?.sums?.file).not.toBe(3238.25);
		await rereadTable(shop, analyst, sheet, table, { decimal: ',' });
		expect((await turnover())?.sums?.file).toBe(3238.25);
		const beyond = rereadTable(shop, analyst, sheet, table, { headingRow: 900 });
		await expect(beyond).rejects.toMatchObject({ code: 'no-such-row' });
		expect((await turnover())?.sums?.file).toBe(3238.25);
		await dropTable(shop, analyst, sheet, table);
	});
});

describe('what is dropped', () => {
	it('is not what the wishes for territories use', async () => {
		const { id } = await measure('Visits');
		const { id: sheetId } = await deskSheet(shop, analyst, sheet);
		const wishes = { tolerances: { [id]: 0.1 }, cost: 'units' };
		await shop.db
			.insertInto('territory_drafts')
			.values({ sheet_id: sheetId, revision: 1, document: JSON.stringify({ wishes }) })
			.execute();
		await shop.db.updateTable('sheets').set({ territory_revision: 1 }).execute();
		const table = (await measureTables(shop, analyst, sheet)).find(({ measures }) =>
			measures.some((one) => one.id === id),
		);
		const number = table?.number ?? 0;
		await expect(dropMeasure(shop, analyst, sheet, number, id)).rejects.toThrow(/wishes/);
		await expect(dropTable(shop, analyst, sheet, number)).rejects.toThrow(/use Visits/);
		await shop.db.updateTable('sheets').set({ territory_revision: 0 }).execute();
	});

	it('goes with its figures and its file, and says so in the log', async () => {
		const rows = [
			['Key', 'Passing'],
			['01', 123456],
			['02', 2],
		];
		const stored = await shop.stored();
		const { table } = await take(rows);
		expect((await shop.stored()).length).toBe(stored.length + 2);
		await dropTable(shop, analyst, sheet, table);
		expect((await shop.stored()).sort()).toEqual(stored.sort());
		await expect(measure('Passing')).rejects.toThrow('no measure');
		await expect(readTableReview(shop, analyst, sheet, table)).rejects.toThrow(NotFound);
		expect(await log('measures.table-dropped')).toContainEqual(
			expect.objectContaining({ detail: expect.objectContaining({ measures: ['Passing'] }) }),
		);
	});

	it('may be one measure of several', async () => {
		const { table } = await take([
			['Key', 'One', 'Two'],
			['01', 1, 2],
			['02', 3, 4],
		]);
		await dropMeasure(shop, analyst, sheet, table, (await measure('One')).id);
		expect(await stateOf(table)).toBe('taken');
		await dropMeasure(shop, analyst, sheet, table, (await measure('Two')).id);
		expect(await stateOf(table)).toBe('replaced');
	});
});

describe('boundaries replaced meanwhile', () => {
	it('are told everywhere, and nothing is taken over before it is joined again', async () => {
		const open = await upload(
			shop,
			analyst,
			sheet,
			'open.csv',
			csv([
				['Key', 'Late'],
				['01', 1],
				['03', 3],
				['9', 9],
			]),
		);
		await decideRows(shop, analyst, sheet, open, [{ row: 2, region: '05' }]);
		// the same sheet on other boundaries: 05 is gone, the order is another, 07 is new
		const cartographer = await createMember(shop.db, 'figures', 'cartographer', 'admin');
		const other = await squaresSheet(shop, cartographer, [
			...(
				[
					['07', 'Gorse'],
					['03', 'Corran'],
					['02', 'Bellmoor'],
					['01', 'Ashby'],
				] as const
			).map(([key, name]): [string, string] => [key, name]),
		]);
		const moved = await deskSheet(shop, cartographer, other);
		await shop.db
			.updateTable('sheets')
			.set({ boundary_set_id: moved.boundarySet.id })
			.where('number', '=', sheet)
			.execute();

		const tables = await measureTables(shop, analyst, sheet);
		expect(tables.every(({ stale }) => stale)).toBe(true);
		expect((await measure('Visits')).stale).toBe(true);
		const told = (await deskSheet(shop, analyst, sheet)).measures;
		expect(told?.stale).toBe(await measureCount());
		await expect(takeTable(shop, analyst, sheet, open, true)).rejects.toMatchObject({
			code: 'stale',
		});

		expect(await joinAgain(shop, analyst, sheet, open)).toBe(open);
		const { join } = await reviewOf(open);
		// the row decided for 05 is open again, because there is no such region any more
		expect(join).toMatchObject({ joined: 2, open: 1 });
		await sweepRows(shop, analyst, sheet, open, { what: 'leave-out-rest' });
		await takeTable(shop, analyst, sheet, open, true);
		expect(await measure('Late')).toMatchObject({ values: [null, 3, null, 1], stale: false });
	});

	it('a table taken over before stays until it is joined again and taken over in its place', async () => {
		const { id } = await measure('Visits');
		const old = (await measureTables(shop, analyst, sheet)).find(({ measures }) =>
			measures.some((one) => one.id === id),
		);
		const again = await joinAgain(shop, analyst, sheet, old?.number ?? 0);
		expect(again).not.toBe(old?.number);
		// it had been added to what is there, which cannot be done across boundaries
		const { outcome } = await reviewOf(again);
		expect(outcome[0].refusals.join(' ')).toMatch(/earlier boundaries/);
		const columns = outcome.map(({ choice }) => choice);
		await chooseColumns(shop, analyst, sheet, again, { columns, existing: 'replace' });
		await sweepRows(shop, analyst, sheet, again, { what: 'leave-out-rest' });
		await takeTable(shop, analyst, sheet, again, true);
		expect(await measure('Visits')).toMatchObject({ id, values: [null, null, null, 1] });
		expect(await stateOf(old?.number ?? 0)).toBe('replaced');
	});
});

describe('rights', () => {
	it.each(roles)('of a %s', async (role) => {
		const member = await createMember(shop.db, 'figures', role, 'designer');
		const seen = await deskSheet(shop, member, sheet);
		expect(seen.measures === null).toBe(!allows([role], 'measures.read'));
		const read = deskMeasures(shop, member, sheet);
		if (allows([role], 'measures.read')) await read;
		else await expect(read).rejects.toThrow(Forbidden);
		const sent = upload(
			shop,
			member,
			sheet,
			'own.csv',
			csv([
				['Key', 'Own'],
				['01', 1],
				['02', 2],
			]),
		);
		if (allows([role], 'measures.edit')) await sent;
		else await expect(sent).rejects.toThrow(Forbidden);
	});

	it('end at the team: another team’s sheet is not there', async () => {
		const stranger = await createMember(shop.db, 'elsewhere', 'analyst', 'planner');
		await expect(deskMeasures(shop, stranger, sheet)).rejects.toThrow(NotFound);
		await expect(measureTables(shop, stranger, sheet)).rejects.toThrow(NotFound);
		await expect(readTableReview(shop, stranger, sheet, 1)).rejects.toThrow(NotFound);
		await expect(takeTable(shop, stranger, sheet, 1, true)).rejects.toThrow(NotFound);
		await expect(dropTable(shop, stranger, sheet, 1)).rejects.toThrow(NotFound);
		await expect(upload(shop, stranger, sheet, 'x.csv', 'Key,A\n01,1\n02,2')).rejects.toThrow(
			NotFound,
		);
	});
});

describe('a sheet that is deleted', () => {
	it('takes its tables and their files along', async () => {
		const admin = await createMember(shop.db, 'gone', 'cartographer', 'analyst', 'admin');
		const number = await squaresSheet(shop, admin, [
			['a', 'Ayre'],
			['b', 'Brae'],
		]);
		const stored = await shop.stored();
		await upload(
			shop,
			admin,
			number,
			'gone.csv',
			csv([
				['Key', 'N'],
				['a', 71],
				['b', 72],
			]),
		);
		await removeSheet(shop, admin, number);
		expect((await shop.stored()).sort()).toEqual(stored.sort());
	});
});
