import type { JoinChoice } from '../../engines/measures/index.ts';
import type { Decision, Sweep } from '../../schemas/measure-forms.ts';
import type { ColumnChoice, TableOptions, TableReview } from '../../schemas/measure-review.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { StoredSource } from '../jobs/measures.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	changeMeasureTable,
	listMeasures,
	measuresInWishes,
	readMeasures,
	type MeasureTableRow,
} from '../repositories/measures.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { sheetOf } from './draft.service.ts';
import { optionsOf, storedOptions } from './measure-options.ts';
import { holdTable, isStale, regionsOf, requireOpen, tableOf, withKept } from './measure-table.ts';
import { inThread } from './measure-thread.ts';
import { standingOf } from './measures-of.ts';
import { noteOf } from './measures.service.ts';
import { Refused } from './outcomes.ts';
import { regionByWords } from './region-by-words.ts';

type Page = { page: number; find: string };

/** A table with everything its page shows; rows are joined for a table under review alone. */
export async function readTableReview(
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	page: Page = { page: 1, find: '' },
) {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await tableOf(shop.db, sheet, table);
	const wished = await measuresInWishes(shop.db, sheet.id);
	const measures = await listMeasures(shop.db, sheet.id);
	const own = measures.filter(({ table_id }) => table_id === row.id);
	return {
		sheet: { number: sheet.number, name: sheet.name },
		table: noteOf(row, own, sheet),
		measures: own.map(({ id, name, unit, kind, missing, total }) => ({
			...{ id, name, unit, kind, total },
			missing: Number(missing),
			wished: wished.has(id),
		})),
		/** names that the sheet has measures of already */
		names: measures.map(({ name }) => name),
		options: optionsOf(row),
		changes: row.changes as { sentences?: string[] },
		review: row.state === 'open' ? await review(shop, sheet, row, page) : null,
		regions: await offeredRegions(shop, row),
	};
}

/** Regions to choose from by typing; left out where there are too many for a list. */
async function offeredRegions(shop: Workshop, row: MeasureTableRow) {
	if (row.state !== 'open') return [];
	const { keys, names } = await regionsOf(shop.db, row);
	return keys.length > 3_500 ? [] : keys.map((key, region) => ({ key, name: names[region] }));
}

async function review(
	shop: Workshop,
	sheet: SheetRecord,
	row: MeasureTableRow,
	{ page, find }: Page,
): Promise<TableReview> {
	const view = await regionsOf(shop.db, row);
	const standing = isStale(sheet, row)
		? []
		: standingOf(await readMeasures(shop.db, sheet.id), row);
	const shown = await withKept(shop, row, view, (input) =>
		inThread('Joining the table', (signal) =>
			shop.pool.run('reviewMeasureTable', { ...input, page, find, standing }, { signal }),
		),
	);
	return { source: sourceNote(row.source as unknown as StoredSource), ...shown };
}

const sourceNote = (source: StoredSource): TableReview['source'] => ({
	...{ format: source.format, delimiter: source.delimiter, encoding: source.encoding },
	...{ decimal: source.decimal, sheets: source.sheets, sheet: source.sheet },
	...{ headingRow: source.headingRow, notes: source.notes.map(({ message }) => message) },
});

/** Changes what has been decided about a table under review. */
async function decide(
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	what: string,
	change: (options: TableOptions, row: MeasureTableRow) => Promise<TableOptions>,
): Promise<void> {
	requireAccess(member, 'measures.edit');
	await shop.db.transaction().execute(async (trx) => {
		const { sheet, row } = await holdTable(trx, member, number, table);
		requireOpen(row);
		const options = await change(optionsOf(row), row);
		await changeMeasureTable(trx, row.id, ['open'], { options: storedOptions(options) });
		const subject = { kind: 'measure-table', id: row.id };
		await record(trx, member, 'measures.reviewed', subject, {
			...{ sheet: sheet.number, table: row.number, what },
		});
	});
}

/** Says which column names the regions; decisions on single rows stay, since they name rows and regions. */
export const chooseJoin = (
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	join: JoinChoice,
): Promise<void> =>
	decide(shop, member, number, table, 'join', async (options, row) => {
		const held = (row.source as unknown as StoredSource).columns;
		if (join.column >= held) throw new Refused('There is no such column.', 'column');
		return { ...options, join };
	});

/** Assigns rows to regions, by key or by name, or leaves them out. */
export const decideRows = (
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	decisions: Decision[],
): Promise<void> =>
	decide(shop, member, number, table, 'rows', async (options, row) => {
		const { keys, names } = await regionsOf(shop.db, row);
		const amends = new Map(options.amends);
		for (const { row: at, region } of decisions) {
			if (at >= row.row_count) throw new Refused('There is no such row.', `other-${at}`);
			if (region === null) amends.set(at, null);
			else amends.set(at, regionByWords(keys, names, region, `other-${at}`));
		}
		return { ...options, amends: [...amends] };
	});

/** Decides many rows at once, or takes decisions back. */
export async function sweepRows(
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	{ what, row: at }: Sweep,
): Promise<void> {
	if (what === 'take-first') return takeFirst(shop, member, number, table);
	await decide(shop, member, number, table, what, async (options) => {
		if (what === 'leave-out-rest') return { ...options, leaveOutRest: true };
		if (what === 'take-back-all') return { ...options, amends: [], leaveOutRest: false };
		return { ...options, amends: options.amends.filter(([row]) => row !== at) };
	});
}

/** Every open row gets the region nearest to what it says, where one is nearer than all others. */
async function takeFirst(shop: Workshop, member: Member, number: number, table: number) {
	requireAccess(member, 'measures.edit');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await tableOf(shop.db, sheet, table);
	const view = await regionsOf(shop.db, row);
	const nearest = await withKept(shop, row, view, (input) =>
		inThread('Joining the table', (signal) => shop.pool.run('nearestRegions', input, { signal })),
	);
	await decide(shop, member, number, table, 'take-first', async (options) => ({
		...options,
		amends: [...new Map([...nearest, ...options.amends])],
	}));
}

/** Says which columns to take and how. */
export const chooseColumns = (
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	{ columns, existing }: { columns: ColumnChoice[]; existing: TableOptions['existing'] },
): Promise<void> =>
	decide(shop, member, number, table, 'columns', async (options, row) => {
		const held = (row.source as unknown as StoredSource).columns;
		const beyond = columns.find(({ column }) => column >= held);
		if (beyond) throw new Refused('There is no such column.', `name-${beyond.column}`);
		return { ...options, columns, existing };
	});
