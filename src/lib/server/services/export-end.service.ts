import type { FileStore, Received } from '../files/index.ts';
import { Forbidden, requireAccess, type Member } from '../access/member.ts';
import type { Db, Trx } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdClaim, type Claim } from '../repositories/claims.repository.ts';
import {
	endExport,
	expiredExports,
	holdExport,
	removeExpired,
} from '../repositories/exports.repository.ts';
import { lockDigest } from '../repositories/files.repository.ts';
import { findSheetById } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { sheetOf } from './draft.service.ts';
import { daysFromNow } from './ask-export.ts';
import { mayStopExport } from './export-rights.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { dropUnused } from './stored-files.ts';

/** A file that was made and has come in, not yet part of the store. */
export interface MadeFile {
	received: Received;
	mediaType: string;
	/** what whoever takes it should know */
	notes: string[];
}

/** One that came to nothing is told of for so long. */
const daysTold = 2;

/** Keeps the file, only while the claim holds; else the bytes are let go. */
export async function keepExport(
	shop: Pick<Workshop, 'db' | 'files'>,
	claim: Claim,
	{ received, mediaType, notes }: MadeFile,
): Promise<boolean> {
	const { digest, bytes } = received;
	try {
		const kept = await shop.db.transaction().execute(async (trx) => {
			const row = await holdClaim(trx, 'exports', claim);
			if (!row) return false;
			await lockDigest(trx, digest);
			await received.keep();
			await endExport(trx, row.id, {
				...{ state: 'done', file_digest: digest, file_bytes: bytes, media_type: mediaType },
				sentence: notes.join(' '),
			});
			await note(trx, row, 'made', { bytes });
			return true;
		});
		if (!kept) await forget(shop, received);
		return kept;
	} catch (error) {
		await forget(shop, received);
		throw error;
	}
}

/** Nothing came of it: bytes that are already in their place go again, unless another row has them. */
async function forget(shop: Pick<Workshop, 'db' | 'files'>, received: Received): Promise<void> {
	await received.discard();
	await shop.db.transaction().execute((trx) => dropUnused(trx, shop.files, received.digest));
}

/** Gives up on a file in sight of everybody. */
export const failExport = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	sentence: string,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const row = await holdClaim(trx, 'exports', claim);
		if (!row) return false;
		const expires_at = daysFromNow(daysTold);
		await endExport(trx, row.id, { state: 'failed', sentence, expires_at });
		await note(trx, row, 'failed', {});
		return true;
	});

/** Writes it down under the one who asked. */
async function note(
	trx: Trx,
	row: Row<'exports'>,
	verb: string,
	detail: Record<string, unknown>,
): Promise<void> {
	const sheet = await findSheetById(trx, row.sheet_id);
	const team = { id: row.team_id, slug: '', name: '' };
	const actor = { team, userId: row.created_by, tokenId: null };
	const { number, kind, edition } = row;
	const subject = { kind: 'export', id: row.id };
	const said = { sheet: sheet?.number, number, kind, edition, ...detail };
	await record(trx, actor, `export.${verb}`, subject, said);
}

/** Stops one that waits or is being made; it can be asked for again. */
export async function stopExport(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	one: number,
): Promise<void> {
	requireAccess(member, 'files.download');
	requireAccess(member, 'sheet.read');
	const { id } = await sheetOf(shop.db, member, number);
	await shop.db.transaction().execute(async (trx) => {
		const known = Number.isSafeInteger(one) && one > 0 && one < 2 ** 31;
		const row = known ? await holdExport(trx, id, one) : undefined;
		if (!row) throw new NotFound('file');
		if (!mayStopExport(member, row)) throw new Forbidden('team.manage');
		const end = { state: 'cancelled', sentence: 'It was stopped.' } as const;
		if (!(await endExport(trx, row.id, { ...end, expires_at: daysFromNow(daysTold) }))) {
			throw new Conflict('not-open', 'It has ended already.');
		}
		const detail = { sheet: number, number: row.number, kind: row.kind };
		await record(trx, member, 'export.stopped', { kind: 'export', id: row.id }, detail);
	});
}

/** Drops drafts' files whose time is over, and what is left of those that came to nothing. */
export async function endExpiredExports(db: Db, files: FileStore): Promise<void> {
	for (const { id } of await expiredExports(db)) {
		await db.transaction().execute(async (trx) => {
			const gone = await removeExpired(trx, id);
			if (gone?.file_digest) await dropUnused(trx, files, gone.file_digest);
		});
	}
}
