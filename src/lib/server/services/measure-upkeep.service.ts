import { Readable } from 'node:stream';
import type { TableReading } from '../../schemas/measure-forms.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { lockDigest } from '../repositories/files.repository.ts';
import {
	changeMeasureTable,
	deleteMeasure,
	deleteMeasuresOfTable,
	insertMeasureTable,
	listMeasures,
	measuresInWishes,
	retireEmptyTables,
} from '../repositories/measures.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { sheetOf } from './draft.service.ts';
import { firstOptions, keptDigest, optionsOf, storedOptions } from './measure-options.ts';
import { holdTable, isStale, requireOpen, tableOf } from './measure-table.ts';
import { readBytes } from './measure-entry.ts';
import { Conflict, NotFound, Refused } from './outcomes.ts';
import { dropUnused } from './stored-files.ts';

/** Reads the kept file of a table under review once more, in another way; what was decided begins anew. */
export async function rereadTable(
	shop: Workshop,
	member: Member,
	number: number,
	table: number,
	reading: TableReading,
): Promise<void> {
	requireAccess(member, 'measures.edit');
	const before = await tableOf(shop.db, await sheetOf(shop.db, member, number), table);
	requireOpen(before);
	const file = await shop.files.local(before.file_digest);
	const read = await readBytes(shop, file.path, before.file_name, reading).finally(file.release);
	const compact = await shop.files.receive(Readable.from([Buffer.from(read.kept)]));
	try {
		await shop.db.transaction().execute(async (trx) => {
			const { sheet, row } = await holdTable(trx, member, number, table);
			await lockDigest(trx, compact.digest);
			const changed = await changeMeasureTable(trx, row.id, ['open'], {
				options: storedOptions(firstOptions(reading)),
				source: JSON.stringify({ ...read.source, kept: compact.digest }),
				row_count: read.source.rows,
			});
			if (!changed) requireOpen(row);
			const subject = { kind: 'measure-table', id: row.id };
			const detail = { sheet: sheet.number, table: row.number, reading };
			await record(trx, member, 'measures.read-again', subject, detail);
			await compact.keep();
			if (keptDigest(row) !== compact.digest) await dropUnused(trx, shop.files, keptDigest(row));
		});
	} finally {
		await compact.discard();
	}
}

/**
 * Joins a table to the present regions of its sheet, from the kept file and with the decisions made before.
 * One that was taken over stays as it is until the new one, under review, takes its place.
 * @returns the number of the table to review
 */
export async function joinAgain(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	table: number,
): Promise<number> {
	requireAccess(member, 'measures.edit');
	return shop.db.transaction().execute(async (trx) => {
		const { sheet, row } = await holdTable(trx, member, number, table);
		if (!isStale(sheet, row)) {
			throw new Conflict('not-stale', 'The table is joined to the present regions already.');
		}
		const subject = { kind: 'measure-table', id: row.id };
		const detail = { sheet: sheet.number, table: row.number };
		await record(trx, member, 'measures.joined-again', subject, detail);
		if (row.state === 'open') {
			await changeMeasureTable(trx, row.id, ['open'], { boundary_set_id: sheet.boundary_set_id });
			return row.number;
		}
		const { digests, ...copy } = {
			digests: [row.file_digest, keptDigest(row)].sort(),
			...{ sheet_id: sheet.id, name: row.name, boundary_set_id: sheet.boundary_set_id },
			...{ file_name: row.file_name, file_digest: row.file_digest, file_bytes: row.file_bytes },
			...{ row_count: row.row_count, confidential: row.confidential, created_by: member.userId },
		};
		for (const digest of digests) await lockDigest(trx, digest);
		const entered = await insertMeasureTable(trx, {
			...copy,
			state: 'open',
			options: storedOptions(optionsOf(row)),
			source: JSON.stringify(row.source),
		});
		return entered.number;
	});
}

/** Drops a table, the measures that it still holds, and its file. */
export async function dropTable(
	shop: Pick<Workshop, 'db' | 'files'>,
	member: Member,
	number: number,
	table: number,
): Promise<void> {
	requireAccess(member, 'measures.edit');
	await shop.db.transaction().execute(async (trx) => {
		const { sheet, row } = await holdTable(trx, member, number, table);
		const measures = (await listMeasures(trx, sheet.id)).filter(
			({ table_id }) => table_id === row.id,
		);
		await requireUnwished(trx, sheet, measures);
		await deleteMeasuresOfTable(trx, row.id);
		await changeMeasureTable(trx, row.id, ['open', 'taken', 'replaced'], { state: 'dropped' });
		await record(
			trx,
			member,
			'measures.table-dropped',
			{ kind: 'measure-table', id: row.id },
			{
				...{ sheet: sheet.number, table: row.number, name: row.name },
				measures: measures.map(({ name }) => name),
			},
		);
		for (const digest of [row.file_digest, keptDigest(row)]) {
			await dropUnused(trx, shop.files, digest);
		}
	});
}

/** Drops one measure; a table that has none left counts as replaced. */
export async function dropMeasure(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	table: number,
	measure: string,
): Promise<void> {
	requireAccess(member, 'measures.edit');
	await shop.db.transaction().execute(async (trx) => {
		const { sheet, row } = await holdTable(trx, member, number, table);
		const found = (await listMeasures(trx, sheet.id)).find(
			({ id, table_id }) => id === measure && table_id === row.id,
		);
		if (!found) throw new NotFound('measure');
		await requireUnwished(trx, sheet, [found]);
		await deleteMeasure(trx, sheet.id, found.id);
		await retireEmptyTables(trx, sheet.id);
		const subject = { kind: 'measure', id: found.id };
		const detail = { sheet: sheet.number, table: row.number, name: found.name };
		await record(trx, member, 'measures.measure-dropped', subject, detail);
	});
}

/** What the wishes for territories name stays until they no longer do. */
async function requireUnwished(
	db: Db,
	sheet: SheetRecord,
	measures: { id: string; name: string }[],
): Promise<void> {
	const wished = await measuresInWishes(db, sheet.id);
	const used = measures.filter(({ id }) => wished.has(id)).map(({ name }) => name);
	if (used.length === 0) return;
	throw new Refused(
		`The wishes for territories use ${used.join(', ')}: as a tolerance or as what a move costs. Take that out of the wishes first.`,
	);
}
