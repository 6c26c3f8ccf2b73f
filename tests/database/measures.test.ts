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
			...{ count: 2, missing: 2, stale: 0 },
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
