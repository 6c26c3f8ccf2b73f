import type { Draft } from '../../engines/editions/draft.ts';
import type { Trx } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';
import type { FileStore } from '../files/index.ts';
import type { ReadOutcome } from '../jobs/read.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { insertBoundarySet } from '../repositories/boundaries.repository.ts';
import { insertLevels } from '../repositories/display-levels.repository.ts';
import { holdClaim, type Claim } from '../repositories/claims.repository.ts';
import { moveIntake } from '../repositories/intakes.repository.ts';
import { insertColouring, insertDraft, insertSheet } from '../repositories/sheets.repository.ts';
import { record, type Actor } from './activity.service.ts';
import { checkedOutcome } from './outcome-of-colouring.ts';
import { dropUnused } from './stored-files.ts';

type Accepted = Extract<ReadOutcome, { status: 'accepted' }>;
type Refused = Extract<ReadOutcome, { status: 'refused' }>;

/** Why an intake ended without a sheet, as its page shows it. */
export type RefusalNote = Pick<Refused, 'code' | 'message' | 'findings'>;

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
		await insertLevels(trx, boundarySetId, read.levels);
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
		});
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

const storeBoundaries = (trx: Trx, intake: Intake, read: Accepted): Promise<string> =>
	insertBoundarySet(
		trx,
		{
			team_id: intake.team_id,
			file_name: intake.file_name,
			file_digest: intake.file_digest as string,
			file_bytes: intake.file_bytes,
			source: JSON.stringify(read.source),
			columns: read.attributeColumns,
			region_count: read.columns.regions.key.length,
			geometry: Buffer.from(read.geometry),
			planar: read.planar,
			found: JSON.stringify(read.found),
			options: JSON.stringify(intake.options),
			planar_witness: read.planarWitness && JSON.stringify(read.planarWitness),
			created_by: intake.created_by,
		},
		read.columns,
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

/** Notes why a file was refused and forgets its bytes; false when the claim no longer holds. */
export const refuseIntake = (
	shop: Pick<Workshop, 'db' | 'files'>,
	claim: Claim,
	refusal: RefusalNote,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const intake = await holdClaim(trx, 'intakes', claim);
		if (!intake) return false;
		await moveIntake(trx, intake.id, ['reading'], {
			state: 'refused',
			step: '',
			share: 0,
			refusal: JSON.stringify(refusal),
			file_digest: null,
		});
		const detail = { code: refusal.code };
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
