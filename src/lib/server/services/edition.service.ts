import { Readable } from 'node:stream';
import type { Proof } from '../../engines/colouring/index.ts';
import type { DeskEdition } from '../../schemas/desk.ts';
import type { AskExport } from '../../schemas/export.ts';
import { mayDo, requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Received } from '../files/index.ts';
import type { SheetFile } from '../jobs/paint.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	findEditionFile,
	insertEdition,
	nextEditionNumber,
} from '../repositories/editions.repository.ts';
import { lockDigest } from '../repositories/files.repository.ts';
import { holdSheet, type DraftRow, type SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { boundariesDigest } from './boundaries-digest.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { dayInWords } from './day-in-words.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { fileStem, paintInput } from './drawing.service.ts';
import { askIn } from './ask-export.ts';
import { frozenParts, type FrozenParts } from './frozen-parts.ts';
import { CheckFailed } from './outcome-of-colouring.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { editionsOf } from './sheet.service.ts';
import { dropUnused } from './stored-files.ts';

/**
 * Issues the draft of this revision as the sheet's next edition: content, digest and files together, all
 * or nothing. The sheet is held meanwhile, so that two who issue at once get numbers one after the other.
 * The colouring is checked once more, and the digest is computed twice, from what is about to be stored.
 */
export async function issueEdition(
	shop: Workshop,
	member: Member,
	number: number,
	revision: number,
	note: string,
): Promise<{ number: number; digest: string }> {
	requireAccess(member, 'edition.issue');
	const received: Received[] = [];
	try {
		return await shop.db.transaction().execute(async (trx) => {
			const sheet = await holdSheet(trx, member.team.id, number);
			if (!sheet) throw new NotFound('sheet');
			if (sheet.revision !== revision) {
				throw new Conflict(
					'stale',
					'The draft has been saved again since; look at it before you issue.',
				);
			}
			return issue(shop, trx, member, sheet, note, received);
		});
	} catch (error) {
		await forget(shop, received);
		throw error;
	}
}

/** Nothing was issued: files that are already in their place go again, unless another edition has them. */
async function forget(shop: Workshop, received: Received[]): Promise<void> {
	for (const file of received) {
		await file.discard();
		await shop.db.transaction().execute((trx) => dropUnused(trx, shop.files, file.digest));
	}
}

async function issue(
	shop: Workshop,
	trx: Trx,
	member: Member,
	sheet: SheetRecord,
	note: string,
	received: Received[],
): Promise<{ number: number; digest: string }> {
	const draft = await draftOf(trx, sheet.id, sheet.revision);
	const view = await boundaryView(trx, sheet.boundary_set_id);
	const inks = await checkedInks(shop, view, draft);
	const document = documentOf(draft);
	const { content, shown, further } = await frozenParts(trx, sheet.id, view, document.theme);
	const { digest, stored } = await seal(shop, trx, view, draft, inks, content);
	const number = await nextEditionNumber(trx, sheet.id);
	const issuedAt = new Date();
	const words = `Edition ${number}, ${dayInWords(issuedAt)}`;
	const input = await paintInput(trx, view, document, inks, 'typical', words, shown);
	const files = await shop.pool.run('renderFiles', { ...input, further });
	const stem = `${fileStem(sheet.name)}-edition-${number}`;
	const kept = await keepFiles(shop, trx, files, stem, received);
	await insertEdition(
		trx,
		{
			sheet_id: sheet.id,
			number,
			digest,
			content: stored,
			revision: sheet.revision,
			note,
			issued_by: member.userId,
			issued_at: issuedAt,
		},
		kept,
	);
	// large sheets take seconds in print: made meanwhile, and there when somebody looks for it
	if (mayDo(member, 'files.download')) await askIn(shop, trx, member, sheet, printFile(number));
	const subject = { kind: 'sheet', id: sheet.id };
	await record(trx, member, 'edition.issued', subject, { sheet: sheet.number, number, digest });
	return { number, digest };
}

const printFile = (edition: number): AskExport => ({
	...{ kind: 'pdf', edition, reader: 'typical', options: {} },
});

/** The draft's colouring, looked over by the checker once more. */
async function checkedInks(shop: Workshop, view: BoundaryView, draft: DraftRow): Promise<number[]> {
	const { inks, inks_used: inksUsed, lower_bound: lowerBound } = draft;
	if (!inks || inksUsed === null || lowerBound === null) {
		throw new Conflict('not-coloured', 'Only a coloured draft can be issued.');
	}
	const document = documentOf(draft);
	if (inksUsed > document.palette.inks.length) {
		const has = document.palette.inks.length;
		const lacks = `The colouring uses ${inksUsed} inks and the palette has ${has}.`;
		throw new Conflict('palette-too-short', lacks);
	}
	const { keys, borders } = view;
	const result = {
		status: 'coloured',
		colouring: Int32Array.from(inks),
		proof: draft.proof as unknown as Proof,
		...{ inksUsed, lowerBound },
	} as const;
	const faults = await shop.pool.run('recheck', { keys, borders, draft: document, result });
	if (faults.length > 0) throw new CheckFailed(faults.join(' '));
	return inks;
}

async function seal(
	shop: Workshop,
	trx: Trx,
	view: BoundaryView,
	draft: DraftRow,
	colouring: number[],
	frozen: FrozenParts['content'],
): Promise<{ digest: string; stored: string }> {
	const sealed = await shop.pool.run('sealEdition', {
		boundariesDigest: await boundariesDigest(trx, view.set.id),
		keys: view.keys,
		draft: documentOf(draft),
		colouring,
		lowerBound: draft.lower_bound ?? 0,
		proof: proofByKey(view, draft.proof as unknown as Proof),
		...frozen,
	});
	if (sealed.status === 'complete') return sealed;
	throw new Conflict(
		sealed.reason,
		'Only a draft in which every region is coloured can be issued.',
	);
}

const proofByKey = ({ keys }: BoundaryView, proof: Proof) => ({
	...proof,
	regions: proof.regions.map((region) => keys[region]),
	...(proof.borders ? { borders: proof.borders.map(([a, b]) => [keys[a], keys[b]]) } : {}),
});

async function keepFiles(
	shop: Workshop,
	trx: Trx,
	files: SheetFile[],
	stem: string,
	received: Received[],
) {
	const kept = [];
	for (const { extension, mediaType, bytes } of files) {
		const file = await shop.files.receive(Readable.from([Buffer.from(bytes)]));
		received.push(file);
		await lockDigest(trx, file.digest);
		await file.keep();
		kept.push({
			name: `${stem}.${extension}`,
			media_type: mediaType,
			digest: file.digest,
			bytes: file.bytes,
		});
	}
	return kept;
}

export interface EditionFile {
	name: string;
	mediaType: string;
	digest: string;
	bytes: number;
	open(): Promise<Readable>;
}

/** A file of an issued edition: the very bytes that were issued. */
export async function editionFile(
	shop: Pick<Workshop, 'db' | 'files'>,
	member: Member,
	number: number,
	edition: number,
	name: string,
): Promise<EditionFile> {
	requireAccess(member, 'files.download');
	const sheet = await sheetOf(shop.db, member, number);
	const row = isNumber(edition) && (await findEditionFile(shop.db, sheet.id, edition, name));
	if (!row) throw new NotFound('file');
	return {
		name: row.name,
		mediaType: row.media_type,
		digest: row.digest,
		bytes: row.bytes,
		open: async () => (await shop.files.open(row.digest)).stream,
	};
}

/** The sheet's editions, the newest first. */
export async function sheetEditions(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<DeskEdition[]> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	return editionsOf(shop.db, sheet.id);
}

export async function readEdition(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	edition: number,
): Promise<DeskEdition> {
	const editions = await sheetEditions(shop, member, number);
	const found = editions.find((one) => one.number === edition);
	if (!found) throw new NotFound('edition');
	return found;
}

const isNumber = (value: number) => Number.isSafeInteger(value) && value > 0 && value < 2 ** 31;
