import type { Question } from '../../engines/boundaries/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import type { Trx } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';
import type { FileStore } from '../files/index.ts';
import type { KnownAnswer } from '../jobs/read-answered.ts';
import type { RefusedReading } from '../jobs/read-ground.ts';
import type { ReadOutcome } from '../jobs/read.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdClaim, type Claim } from '../repositories/claims.repository.ts';
import { moveIntake } from '../repositories/intakes.repository.ts';
import { insertColouring, insertDraft, insertSheet } from '../repositories/sheets.repository.ts';
import { record, type Actor } from './activity.service.ts';
import { storeBoundarySet } from './boundary-store.ts';
import { checkedOutcome } from './outcome-of-colouring.ts';
import { rememberColumns, rememberedNote } from './reading-answers.service.ts';
import { dropUnused } from './stored-files.ts';

type Accepted = Extract<ReadOutcome, { status: 'accepted' }>;

/** Why an intake ended without a sheet, as its page shows it. */
export type RefusalNote = Pick<RefusedReading, 'code' | 'message' | 'findings'>;

/**
 * Stores an accepted file whole: boundary set, regions, borders, findings, sheet and first coloured draft,
 * all or nothing, and only while the claim holds. Answers false when somebody else has it now.
 */
export async function acceptIntake(
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	read: Accepted,
): Promise<boolean> {
	const outcome = checkedOutcome(read.colouring);
	return shop.db.transaction().execute(async (trx) => {
		const intake = await holdClaim(trx, 'intakes', claim);
		if (!intake?.file_digest) return false;
		const boundarySetId = await storeBoundaries(trx, intake, read);
		const sheet = await insertSheet(trx, {
			teamId: intake.team_id,
			name: intake.sheet_name,
			boundarySetId,
			createdBy: intake.created_by,
		});
		const colouring =
			outcome.colouring && (await insertColouring(trx, sheet.id, outcome.colouring));
		await storeFirstDraft(trx, sheet.id, read.draft, colouring, outcome.explanation, intake);
		await moveIntake(trx, intake.id, ['reading'], {
			state: 'done',
			step: '',
			share: 1,
			boundary_set_id: boundarySetId,
			sheet_id: sheet.id,
			remembered: notesOf(read.taken),
		});
		await rememberColumns(
			trx,
			{ ...givenBy(intake), likeness: read.found.likeness },
			intake.options,
		);
		const detail = { sheet: sheet.number, regions: read.columns.regions.key.length };
		await record(trx, actorOf(intake), 'sheet.created', { kind: 'sheet', id: sheet.id }, detail);
		return true;
	});
}

type Intake = Row<'intakes'>;

/** What a job does is written down under the one who asked for it. */
const actorOf = (intake: Intake): Actor => ({
	team: { id: intake.team_id, slug: '', name: '' },
	userId: intake.created_by,
	tokenId: null,
});

const notesOf = (taken: KnownAnswer[]): string => JSON.stringify(taken.map(rememberedNote));

const givenBy = (intake: Intake) => ({
	teamId: intake.team_id,
	userId: intake.created_by,
	fileName: intake.file_name,
});

const storeBoundaries = (trx: Trx, intake: Intake, read: Accepted): Promise<string> =>
	storeBoundarySet(
		trx,
		{
			teamId: intake.team_id,
			createdBy: intake.created_by,
			name: intake.file_name,
			bytes: intake.file_bytes,
			digest: intake.file_digest as string,
		},
		read,
	);

const storeFirstDraft = (
	trx: Trx,
	sheetId: string,
	document: Draft,
	colouringId: string | null,
	explanation: unknown,
	intake: Intake,
): Promise<Date> =>
	insertDraft(trx, {
		sheetId,
		revision: 1,
		document,
		colouringId,
		explanation,
		savedBy: intake.created_by,
	});

/** Keeps the file and asks what it does not say; false when the claim no longer holds. */
export const askIntake = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	question: Question,
	taken: KnownAnswer[],
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const intake = await holdClaim(trx, 'intakes', claim);
		if (!intake) return false;
		return moveIntake(trx, intake.id, ['reading'], {
			...{ state: 'asking', step: '', share: 0, attempts: 0 },
			question: JSON.stringify(question),
			remembered: notesOf(taken),
		});
	});

/** Notes why a file was refused and forgets its bytes; false when the claim no longer holds. */
export const refuseIntake = (
	shop: Pick<Workshop, 'db' | 'files'>,
	claim: Claim,
	{ code, message, findings }: RefusalNote,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const intake = await holdClaim(trx, 'intakes', claim);
		if (!intake) return false;
		await moveIntake(trx, intake.id, ['reading'], {
			state: 'refused',
			step: '',
			share: 0,
			refusal: JSON.stringify({ code, message, findings } satisfies RefusalNote),
			file_digest: null,
		});
		const detail = { code };
		const subject = { kind: 'intake', id: intake.id };
		await record(trx, actorOf(intake), 'boundaries.refused', subject, detail);
		await forget(trx, shop.files, intake.file_digest);
		return true;
	});

const forget = async (trx: Trx, files: FileStore, digest: string | null): Promise<void> => {
	if (digest) await dropUnused(trx, files, digest);
};

/** Gives up on an intake in sight of everybody; its file stays, so that it can be read again on demand. */
export const failIntake = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	message: string,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const intake = await holdClaim(trx, 'intakes', claim);
		if (!intake) return false;
		const refusal: RefusalNote = { code: 'reading-failed', message, findings: [] };
		return moveIntake(trx, intake.id, ['reading'], {
			state: 'failed',
			step: '',
			share: 0,
			refusal: JSON.stringify(refusal),
		});
	});
