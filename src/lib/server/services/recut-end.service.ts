import type { Question } from '../../engines/boundaries/index.ts';
import type { Trx } from '../database/connection.ts';
import type { KnownAnswer } from '../jobs/read-answered.ts';
import type { RefusedReading } from '../jobs/read-ground.ts';
import type { RecutOutcome } from '../jobs/recut.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdClaim, type Claim } from '../repositories/claims.repository.ts';
import { changeRecut, type HeldRecut } from '../repositories/recuts.repository.ts';
import { findSheetById } from '../repositories/sheets.repository.ts';
import type { Actor } from './activity.service.ts';
import { storeBoundarySet } from './boundary-store.ts';
import type { RefusalNote } from './intake-end.service.ts';
import { rememberedNote } from './reading-answers.service.ts';
import { recordRecut } from './recut-held.ts';
import { dropUnused } from './stored-files.ts';

type Accepted = Extract<RecutOutcome, { status: 'accepted' }>;

/**
 * Stores what was read, unused as yet, with the matching and everything that would change; all or nothing,
 * and only while the claim holds. Answers false when somebody else has it now.
 */
export async function readyRecut(
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	read: Accepted,
): Promise<boolean> {
	return held(shop, claim, async (trx, row) => {
		if (!row.file_digest) return;
		const file = {
			...{ teamId: row.team_id, createdBy: row.created_by, name: row.file_name },
			...{ bytes: row.file_bytes, digest: row.file_digest },
		};
		const toSet = await storeBoundarySet(trx, file, read);
		await changeRecut(trx, row.id, ['reading'], {
			...{ state: 'ready', step: '', share: 1, to_set: toSet, attempts: 0 },
			...{ question: null, refusal: null, remembered: notesOf(read.taken) },
			options: JSON.stringify(read.options),
			comparison: JSON.stringify(read.change),
			matching: JSON.stringify(read.matching),
			decisions: '[]',
			report: JSON.stringify(read.report),
		});
	});
}

/** Keeps the file and asks what it does not say. */
export const askRecut = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	question: Question,
	taken: KnownAnswer[],
): Promise<boolean> =>
	held(shop, claim, async (trx, row) => {
		await changeRecut(trx, row.id, ['reading'], {
			...{ state: 'asking', step: '', share: 0, attempts: 0 },
			question: JSON.stringify(question),
			remembered: notesOf(taken),
		});
	});

/** Notes why the boundaries were refused and forgets the file, unless something else refers to it. */
export const refuseRecut = (
	shop: Pick<Workshop, 'db' | 'files'>,
	claim: Claim,
	{ code, message, findings, taken }: RefusedReading,
): Promise<boolean> =>
	held(shop, claim, async (trx, row) => {
		await changeRecut(trx, row.id, ['reading'], {
			...{ state: 'refused', step: '', share: 0, file_digest: null, question: null },
			refusal: JSON.stringify({ code, message, findings } satisfies RefusalNote),
			remembered: notesOf(taken),
		});
		const sheet = await findSheetById(trx, row.sheet_id);
		await recordRecut(trx, actorOf(row), 'refused', sheet?.number ?? 0, row, { code });
		if (row.file_digest) await dropUnused(trx, shop.files, row.file_digest);
	});

/** Gives up in sight of everybody; the file stays, so that it can be read again on demand. */
export const failRecut = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	message: string,
): Promise<boolean> =>
	held(shop, claim, async (trx, row) => {
		const refusal: RefusalNote = { code: 'reading-failed', message, findings: [] };
		await changeRecut(trx, row.id, ['reading'], {
			...{ state: 'failed', step: '', share: 0 },
			refusal: JSON.stringify(refusal),
		});
	});

const notesOf = (taken: KnownAnswer[]): string => JSON.stringify(taken.map(rememberedNote));

/** What a job does is written down under the one who asked for it. */
const actorOf = (row: HeldRecut): Actor => ({
	team: { id: row.team_id, slug: '', name: '' },
	userId: row.created_by,
	tokenId: null,
});

const held = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	work: (trx: Trx, row: HeldRecut) => Promise<void>,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const row = await holdClaim(trx, 'recuts', claim);
		if (!row) return false;
		await work(trx, row);
		return true;
	});
