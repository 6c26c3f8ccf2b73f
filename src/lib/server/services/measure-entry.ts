import { Readable } from 'node:stream';
import type { TableReading } from '../../schemas/measure-forms.ts';
import type { TableOptions } from '../../schemas/measure-review.ts';
import type { Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Received } from '../files/index.ts';
import type { ReadTable } from '../jobs/measures.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { lockDigest } from '../repositories/files.repository.ts';
import { insertMeasureTable } from '../repositories/measures.repository.ts';
import { holdSheet } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { firstOptions, storedOptions } from './measure-options.ts';
import { inThread } from './measure-thread.ts';
import { NotFound, Unfit } from './outcomes.ts';
import { dropUnused } from './stored-files.ts';

export interface NewTable {
	fileName: string;
	file: Received;
	name: string;
	reading: TableReading;
	/** what came of reading it */
	read: ReadTable;
	options?: Partial<TableOptions>;
}

/** Reads a table that lies on this machine; one that cannot be read is told as such. */
export async function readBytes(
	shop: Pick<Workshop, 'pool'>,
	path: string,
	fileName: string,
	reading: TableReading,
): Promise<ReadTable> {
	const outcome = await inThread('Reading the table', (signal) =>
		shop.pool.run('readMeasureTable', { path, fileName, reading }, { signal }),
	);
	if (outcome.status === 'refused') throw new Unfit(outcome.code, outcome.message);
	return outcome;
}

/** Stores a table that was read, all or nothing. */
export async function enterTable(
	shop: Workshop,
	member: Member,
	number: number,
	table: NewTable,
): Promise<{ number: number; id: string }> {
	const compact = await shop.files.receive(Readable.from([Buffer.from(table.read.kept)]));
	try {
		return await shop.db.transaction().execute((trx) => store(trx, member, number, table, compact));
	} catch (error) {
		// what is already in its place goes again, unless another table has it
		for (const { digest } of [table.file, compact]) {
			await shop.db.transaction().execute((trx) => dropUnused(trx, shop.files, digest));
		}
		throw error;
	} finally {
		await compact.discard();
	}
}

async function store(
	trx: Trx,
	member: Member,
	number: number,
	table: NewTable,
	compact: Received,
): Promise<{ number: number; id: string }> {
	const sheet = await holdSheet(trx, member.team.id, number);
	if (!sheet) throw new NotFound('sheet');
	const { file, fileName, name, read, reading } = table;
	for (const digest of [file.digest, compact.digest].sort()) await lockDigest(trx, digest);
	const entered = await insertMeasureTable(trx, {
		sheet_id: sheet.id,
		name: name.slice(0, 200),
		boundary_set_id: sheet.boundary_set_id,
		file_name: fileName,
		file_digest: file.digest,
		file_bytes: file.bytes,
		options: storedOptions({ ...firstOptions(reading), ...table.options }),
		source: JSON.stringify({ ...read.source, kept: compact.digest }),
		row_count: read.source.rows,
		state: 'open',
		created_by: member.userId,
	});
	const subject = { kind: 'measure-table', id: entered.id };
	const detail = { sheet: sheet.number, table: entered.number, file: fileName, bytes: file.bytes };
	await record(trx, member, 'measures.uploaded', subject, detail);
	await file.keep();
	await compact.keep();
	return entered;
}
