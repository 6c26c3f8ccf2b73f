import type { AskExport, ExportNote } from '../../schemas/export.ts';
import type { Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findEdition } from '../repositories/editions.repository.ts';
import {
	countOpenExports,
	findExport,
	findStanding,
	insertExport,
	keepLonger,
	type ExportRow,
} from '../repositories/exports.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { exportGround } from './export-ground.ts';
import { optionsFor } from './export-options.ts';
import { aboutExport, requestDigest, type ExportRequest } from './export-request.ts';
import { exportFileName } from './export-words.ts';
import { NotFound } from './outcomes.ts';
import { personName } from './people.ts';

/** Files of one team that may wait or be made at once: each takes a thread for seconds. */
export const mostOpenExports = 24;
/** A draft's file is kept for so long after it was asked for last. */
export const daysKept = 7;
/**
 * Asks within a transaction that holds the sheet, for somebody who may. Answers what is there already, the
 * new job, or null where too many of the team's are open.
 */
export async function askIn(
	shop: Pick<Workshop, 'queue'>,
	trx: Trx,
	member: Member,
	sheet: SheetRecord,
	{ kind, edition, reader, options }: AskExport,
): Promise<ExportNote | null> {
	const revision = await revisionOf(trx, sheet, edition);
	const request = { edition, revision, kind, reader, options: optionsFor(kind, options) };
	const ground = await exportGround(trx, sheet, request);
	const about = aboutExport(member.team, sheet, ground, request);
	const digest = requestDigest(request, about, ground);
	const standing = await findStanding(trx, sheet.id, digest);
	if (standing) {
		await keepLonger(trx, standing.id, daysKept);
		// gone where its time was over and somebody tidied just now: then it is made again
		const kept = await findExport(trx, sheet.id, standing.number);
		if (kept) return noteOf(kept);
	}
	if ((await countOpenExports(trx, member.team.id)) >= mostOpenExports) return null;
	return insert(shop, trx, member, sheet, {
		request,
		digest,
		issue: about.issue,
		stem: about.stem,
	});
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
	const detail = {
		sheet: sheetNumber,
		number: made.number,
		kind,
		edition,
		revision: request.revision,
	};
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

export const isNumber = (number: number): boolean =>
	Number.isSafeInteger(number) && number > 0 && number < 2 ** 31;

export const noteOf = (row: ExportRow): ExportNote => ({
	...{ number: row.number, state: row.state, kind: row.kind, edition: row.edition },
	...{ revision: row.revision, reader: row.reader, options: row.options },
	...{ step: row.step, share: row.share, sentence: row.sentence },
	file: fileIn(row),
	createdAt: row.created_at.toISOString(),
	createdBy: personName(row),
	updatedAt: row.updated_at.toISOString(),
	expiresAt: row.expires_at?.toISOString() ?? null,
});

const fileIn = ({
	file_name,
	media_type,
	file_bytes,
	file_digest,
}: ExportRow): ExportNote['file'] =>
	file_digest === null || file_bytes === null || media_type === null
		? null
		: { name: file_name, mediaType: media_type, bytes: file_bytes, digest: file_digest };
