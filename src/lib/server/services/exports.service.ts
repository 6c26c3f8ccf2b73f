import type { AskExport, ExportNote } from '../../schemas/export.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	countOpenExports,
	findExport,
	findStanding,
	insertExport,
	keepLonger,
	listExports,
	type ExportRow,
} from '../repositories/exports.repository.ts';
import { findEdition } from '../repositories/editions.repository.ts';
import { holdSheet, type SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { sheetOf } from './draft.service.ts';
import type { EditionFile } from './edition.service.ts';
import { exportGround } from './export-ground.ts';
import { optionsFor, requireReader } from './export-options.ts';
import { aboutExport, requestDigest, type ExportRequest } from './export-request.ts';
import { exportFileName } from './export-words.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { personName } from './people.ts';

/** Files of one team that may wait or be made at once: each takes a thread for seconds. */
export const mostOpenExports = 24;
/** A draft's file is kept for so long after it was asked for last. */
export const daysKept = 7;
/** Told of a sheet, the newest first. */
const mostListed = 200;

/**
 * Asks for a file of an edition or of the present draft. What was asked for before in the same words is
 * answered with what is there: the file, or the job that makes it.
 */
export async function askForExport(
	shop: Pick<Workshop, 'db' | 'queue'>,
	member: Member,
	number: number,
	asked: AskExport,
): Promise<ExportNote> {
	requireAccess(member, 'files.download');
	requireAccess(member, 'sheet.read');
	requireReader(asked.kind, asked.reader);
	optionsFor(asked.kind, asked.options);
	return shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, isNumber(number) ? number : 0);
		if (!sheet) throw new NotFound('sheet');
		return askIn(shop, trx, member, sheet, asked);
	});
}

/** The same within a transaction that holds the sheet. */
export async function askIn(
	shop: Pick<Workshop, 'queue'>,
	trx: Trx,
	member: Member,
	sheet: SheetRecord,
	{ kind, edition, reader, options }: AskExport,
): Promise<ExportNote> {
	const revision = await revisionOf(trx, sheet, edition);
	const request = { edition, revision, kind, reader, options: optionsFor(kind, options) };
	const ground = await exportGround(trx, sheet, request);
	const about = aboutExport(member.team, sheet, ground, request);
	const digest = requestDigest(request, about, ground.view.set.id);
	const standing = await findStanding(trx, sheet.id, digest);
	if (standing) {
		await keepLonger(trx, standing.id, daysKept);
		return noteOf(standing);
	}
	if ((await countOpenExports(trx, member.team.id)) >= mostOpenExports) {
		const message = `${mostOpenExports} files of the team are being made already. Wait for some of them.`;
		throw new Conflict('too-many-open', message);
	}
	return insert(shop, trx, member, sheet, { request, digest, issue: about.issue, stem: about.stem });
}

interface NewExport {
	request: ExportRequest;
	digest: string;
	issue: string;
	stem: string;
}

async function insert(
	shop: Pick<Workshop, 'queue'>,
	trx: Trx,
	member: Member,
	sheet: SheetRecord,
	{ request, digest, issue, stem }: NewExport,
): Promise<ExportNote> {
	const { options, kind, edition } = request;
	const made = await insertExport(trx, {
		...request,
		...{ team_id: member.team.id, sheet_id: sheet.id, issue, request_digest: digest },
		options: JSON.stringify(options),
		file_name: exportFileName(stem, kind),
		created_by: member.userId,
		expires_at: edition === null ? daysFromNow(daysKept) : null,
	});
	await shop.queue.send(trx, 'export', { exportId: made.id });
	const { number: sheetNumber } = sheet;
	const detail = { sheet: sheetNumber, number: made.number, kind, edition, revision: request.revision };
	await record(trx, member, 'export.asked', { kind: 'export', id: made.id }, detail);
	const row = await findExport(trx, sheet.id, made.number);
	if (!row) throw new Error('what was just inserted is not there');
	return noteOf(row);
}

async function revisionOf(trx: Trx, sheet: SheetRecord, edition: number | null): Promise<number> {
	if (edition === null) return sheet.revision;
	const issued = isNumber(edition) && (await findEdition(trx, sheet.id, edition));
	if (!issued) throw new NotFound('edition');
	return issued.revision;
}

export const daysFromNow = (days: number): Date => new Date(Date.now() + days * 86_400_000);

/** The files that were asked for of a sheet, the newest first: for its page, and for asking again and again. */
export async function sheetExports(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<ExportNote[]> {
	requireAccess(member, 'files.download');
	const sheet = await sheetOf(shop.db, member, number);
	return (await listExports(shop.db, sheet.id, mostListed)).map(noteOf);
}

export async function readExport(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	one: number,
): Promise<ExportNote> {
	return noteOf(await exportRow(shop, member, number, one));
}

/** The bytes of one that is done. */
export async function exportFileOf(
	shop: Pick<Workshop, 'db' | 'files'>,
	member: Member,
	number: number,
	one: number,
): Promise<EditionFile> {
	const note = noteOf(await exportRow(shop, member, number, one));
	const { file } = note;
	if (!file) throw new Conflict('not-done', note.sentence || 'The file is not made yet.');
	return { ...file, open: async () => (await shop.files.open(file.digest)).stream };
}

async function exportRow(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	one: number,
): Promise<ExportRow> {
	requireAccess(member, 'files.download');
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = isNumber(one) ? await findExport(shop.db, sheet.id, one) : undefined;
	if (!row) throw new NotFound('file');
	return row;
}

const isNumber = (number: number): boolean =>
	Number.isSafeInteger(number) && number > 0 && number < 2 ** 31;

const noteOf = (row: ExportRow): ExportNote => ({
	...{ number: row.number, state: row.state, kind: row.kind, edition: row.edition },
	...{ revision: row.revision, reader: row.reader, options: row.options },
	...{ step: row.step, share: row.share, sentence: row.sentence },
	file: fileIn(row),
	createdAt: row.created_at.toISOString(),
	createdBy: personName(row),
	updatedAt: row.updated_at.toISOString(),
	expiresAt: row.expires_at?.toISOString() ?? null,
});

const fileIn = ({ file_name, media_type, file_bytes, file_digest }: ExportRow): ExportNote['file'] =>
	file_digest === null || file_bytes === null || media_type === null
		? null
		: { name: file_name, mediaType: media_type, bytes: file_bytes, digest: file_digest };
