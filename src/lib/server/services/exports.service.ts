import type { AskExport, DeskExport, ExportNote } from '../../schemas/export.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	exportsNumbered,
	findExport,
	listExports,
	type ExportRow,
} from '../repositories/exports.repository.ts';
import { holdSheet } from '../repositories/sheets.repository.ts';
import { askIn, isNumber, mostOpenExports, noteOf } from './ask-export.ts';
import { sheetOf } from './draft.service.ts';
import type { EditionFile } from './edition.service.ts';
import { optionsFor, requireReader } from './export-options.ts';
import { mayStopExport } from './export-rights.ts';
import { Conflict, NotFound } from './outcomes.ts';

/** Told of a sheet: files of drafts never push out those of editions, which are kept for good. */
const most = { edition: 1_000, draft: 200 };

/**
 * Asks for a file of an edition or of the present draft. What was asked for before in the same words is
 * answered with what is there: the file, or the job that makes it. With the revision of the draft that was
 * looked at, no other is taken.
 */
export async function askForExport(
	shop: Pick<Workshop, 'db' | 'queue'>,
	member: Member,
	number: number,
	asked: AskExport,
	revision?: number,
): Promise<ExportNote> {
	requireAccess(member, 'files.download');
	requireAccess(member, 'sheet.read');
	requireReader(asked.kind, asked.reader);
	optionsFor(asked.kind, asked.options);
	return shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, isNumber(number) ? number : 0);
		if (!sheet) throw new NotFound('sheet');
		if (asked.edition === null && (revision ?? sheet.revision) !== sheet.revision) {
			const stale = 'The draft was saved again since; load the page again to look at it first.';
			throw new Conflict('stale', stale);
		}
		const note = await askIn(shop, trx, member, sheet, asked);
		if (note) return note;
		const message = `${mostOpenExports} files of the team are being made already. Wait for some of them.`;
		throw new Conflict('too-many-open', message);
	});
}

/** The files that were asked for of a sheet, the newest first. */
export const sheetExports = async (
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<ExportNote[]> => (await exportRows(shop, member, number)).map(noteOf);

/** The same for its page: all, or those of these numbers, for asking again and again. */
export const deskExports = async (
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	of?: readonly number[],
): Promise<DeskExport[]> =>
	(await exportRows(shop, member, number, of)).map((row) => ({
		...noteOf(row),
		mayStop: mayStopExport(member, row),
	}));

async function exportRows(
	{ db }: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	of?: readonly number[],
): Promise<ExportRow[]> {
	requireAccess(member, 'files.download');
	requireAccess(member, 'sheet.read');
	const { id } = await sheetOf(db, member, number);
	if (of) return exportsNumbered(db, id, of);
	const editions = await listExports(db, id, 'edition', most.edition);
	const drafts = await listExports(db, id, 'draft', most.draft);
	return [...editions, ...drafts].sort((a, b) => b.number - a.number);
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
