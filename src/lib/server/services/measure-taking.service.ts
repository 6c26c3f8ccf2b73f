import { requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { ReadyColumn, TakeOutcome } from '../jobs/measure-take.work.ts';
import type { Standing } from '../jobs/measure-outcome.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	changeMeasureTable,
	putMeasures,
	readMeasures,
	retireEmptyTables,
	type MeasureTableRow,
} from '../repositories/measures.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { holdTable, regionsOf, requireFresh, requireOpen, withKept } from './measure-table.ts';
import { inThread } from './measure-thread.ts';
import { standingOf } from './measures-of.ts';
import { CheckFailed } from './outcome-of-colouring.ts';
import { Unfit } from './outcomes.ts';

export interface Taken {
	/** ids of the measures, in the order of the columns */
	measures: string[];
	/** what changed in those that were there already */
	sentences: string[];
}

/**
 * Takes over the columns chosen of a table under review. The sheet is held meanwhile, so that what was shown
 * to change is what changes; everything is computed here once more and checked before it is stored.
 * Measures of the same name are replaced or added to and keep their ids.
 */
export async function takeTable(
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	confidential: boolean,
): Promise<Taken> {
	requireAccess(member, 'measures.edit');
	return shop.db.transaction().execute(async (trx) => {
		const { sheet, row } = await holdTable(trx, member, number, table);
		requireOpen(row);
		requireFresh(sheet, row);
		const standing = standingOf(await readMeasures(trx, sheet.id), row);
		const outcome = await compute(shop, trx, row, standing);
		requireTakeable(outcome);
		return keep(trx, member, { sheet, row, standing, outcome, confidential });
	});
}

async function compute(
	shop: Workshop,
	trx: Trx,
	row: MeasureTableRow,
	standing: Standing[],
): Promise<TakeOutcome> {
	const view = await regionsOf(trx, row);
	const outcome = await withKept(shop, row, view, (input) =>
		inThread('Taking the table over', (signal) =>
			shop.pool.run('takeMeasureTable', { ...input, standing }, { signal }),
		),
	);
	if (outcome.faults.length > 0) throw new CheckFailed(outcome.faults.join(' '));
	return outcome;
}

function requireTakeable({ columns, joined, open }: TakeOutcome): void {
	if (joined === 0) throw new Unfit('nothing-joined', 'No row is joined to a region yet.');
	if (columns.length === 0) throw new Unfit('no-columns', 'Choose at least one column to take.');
	if (open > 0) {
		const rows = open === 1 ? '1 row names' : `${open} rows name`;
		throw new Unfit('rows-open', `${rows} no region yet. Assign or leave out first.`, { open });
	}
	const refused = columns.filter(({ outcome }) => outcome.refusals.length > 0);
	if (refused.length === 0) return;
	const reasons = refused.flatMap(({ outcome: { choice, refusals } }) =>
		refusals.map((refusal) => `${choice.name}: ${refusal}`),
	);
	throw new Unfit('not-taken', reasons.join(' '), { columns: refused.length });
}

interface Taking {
	sheet: SheetRecord;
	row: MeasureTableRow;
	standing: Standing[];
	outcome: TakeOutcome;
	confidential: boolean;
}

async function keep(trx: Trx, member: Member, taking: Taking): Promise<Taken> {
	const { sheet, row, standing, outcome } = taking;
	const known = new Map(standing.map((one) => [one.name, one]));
	const measures = await putMeasures(
		trx,
		outcome.columns.map(({ outcome: { choice }, values, texts }, position) => ({
			...{ id: known.get(choice.name)?.id ?? null, sheet_id: sheet.id, table_id: row.id },
			...{ position, name: choice.name, unit: choice.unit, kind: choice.kind, values, texts },
		})),
	);
	const sentences = outcome.columns.flatMap(({ outcome: { choice, change } }) =>
		change ? `${choice.name}: ${change.sentence}` : [],
	);
	await changeMeasureTable(trx, row.id, ['open'], {
		state: 'taken',
		matched_count: outcome.joined,
		confidential: taking.confidential || addsToConfidential(outcome.columns, known),
		changes: JSON.stringify({ sentences, columns: outcome.columns.map((one) => one.outcome) }),
		taken_by: member.userId,
		taken_at: new Date(),
	});
	const retired = await retireEmptyTables(trx, sheet.id);
	await record(
		trx,
		member,
		'measures.taken',
		{ kind: 'measure-table', id: row.id },
		{
			...{ sheet: sheet.number, table: row.number, joined: outcome.joined, changes: sentences },
			measures: outcome.columns.map(({ outcome: { choice } }) => choice.name),
			replacedTables: retired.map((one) => one.number),
		},
	);
	return { measures, sentences };
}

/** What was confidential stays so when something is added to it. */
const addsToConfidential = (columns: ReadyColumn[], known: Map<string, Standing>): boolean =>
	columns.some(
		({ outcome: { choice, change } }) =>
			change?.mode === 'add' && known.get(choice.name)?.confidential === true,
	);
