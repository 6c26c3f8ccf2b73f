import { isDeepStrictEqual } from 'node:util';
import { wholeDraft, type Draft } from '../../engines/editions/draft.ts';
import { draftDocument, type SaveDraft } from '../../schemas/draft.ts';
import type { DeskColouring, DraftSaved, DraftStale } from '../../schemas/desk.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	findDraft,
	findSheet,
	holdSheet,
	insertColouring,
	insertDraft,
	latestInks,
	type DraftRow,
	type SheetRecord,
} from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { changedParts, changesColouring, rightsFor, signDraft } from './draft-rights.ts';
import {
	checkedOutcome,
	deskColouring,
	deskOutcome,
	type Names,
	type Outcome,
} from './outcome-of-colouring.ts';
import { NotFound, Unfit } from './outcomes.ts';
import { nameOfMember, personName } from './people.ts';

export type SaveResult =
	{ status: 'saved'; saved: DraftSaved } | { status: 'stale'; stale: DraftStale };

/** A sheet of this team, or `NotFound`. */
export async function sheetOf(db: Db, member: Member, number: number): Promise<SheetRecord> {
	const known = Number.isSafeInteger(number) && number > 0 && number < 2 ** 31;
	const sheet = known ? await findSheet(db, member.team.id, number) : undefined;
	if (!sheet) throw new NotFound('sheet');
	return sheet;
}

export async function draftOf(db: Db, sheetId: string, revision: number): Promise<DraftRow> {
	const known = Number.isSafeInteger(revision) && revision > 0 && revision < 2 ** 31;
	const draft = known ? await findDraft(db, sheetId, revision) : undefined;
	if (!draft) throw new NotFound('draft');
	return draft;
}

/** The document of a stored draft; what is stored was checked when it was saved. */
export const documentOf = (draft: Pick<DraftRow, 'document'>): Draft =>
	wholeDraft(draft.document as unknown as Draft);

/**
 * Saves a draft as the next revision, coloured and checked here whatever the sender showed. A draft whose
 * locks collide is saved too, with the explanation in place of a colouring. When somebody else saved first
 * nothing is written and the answer tells what they saved. Each part that changed needs its own right.
 */
export async function saveDraft(
	shop: Workshop,
	member: Member,
	number: number,
	sent: SaveDraft,
): Promise<SaveResult> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const current = await draftOf(shop.db, sheet.id, sheet.revision);
	if (sent.revision !== sheet.revision) return { status: 'stale', stale: staleNote(current) };
	const before = documentOf(current);
	const by = await nameOfMember(shop.db, member);
	const after = signDraft(before, sent.document, by, new Date().toISOString());
	const parts = changedParts(before, after);
	for (const right of rightsFor(parts)) requireAccess(member, right);
	const view = await boundaryView(shop.db, sheet.boundary_set_id);
	if (parts.length === 0) return { status: 'saved', saved: savedNote(view, current) };
	// another seed asks for another arrangement, so nothing is held to the colouring before
	const from = parts.includes('seed') ? null : await inksBefore(shop.db, sheet.id, current);
	const outcome = changesColouring(parts) ? await colourDraft(shop, view, after, from) : null;
	return store(shop, member, { sheet, view, current, after, outcome, parts });
}

/** The colouring of a draft or, where its rules collide, the one that stood before them. */
export const inksBefore = async (db: Db, sheetId: string, draft: DraftRow) =>
	draft.inks ?? (await latestInks(db, sheetId));

/** Colours a draft in a thread, as near as can be to the colouring before, and has the result checked. */
export async function colourDraft(
	shop: Pick<Workshop, 'pool'>,
	view: BoundaryView,
	draft: Draft,
	previous: number[] | null,
): Promise<Outcome> {
	const { keys, borders } = view;
	const coloured = await shop.pool.run('colourDraft', { keys, borders, draft, previous });
	if (!('unfit' in coloured)) return checkedOutcome(coloured);
	const { code, message, details } = coloured.unfit;
	throw new Unfit(code, message, details);
}

interface Change {
	sheet: SheetRecord;
	view: BoundaryView;
	current: DraftRow;
	after: Draft;
	/** null: the colouring stays as it is */
	outcome: Outcome | null;
	parts: (keyof Draft)[];
}

const store = (shop: Workshop, member: Member, change: Change): Promise<SaveResult> =>
	shop.db.transaction().execute(async (trx) => {
		const { current, after, outcome, view, parts } = change;
		const sheet = await holdSheet(trx, member.team.id, change.sheet.number);
		if (!sheet) throw new NotFound('sheet');
		if (sheet.revision !== current.revision) {
			return { status: 'stale', stale: staleNote(await draftOf(trx, sheet.id, sheet.revision)) };
		}
		const revision = sheet.revision + 1;
		const savedAt = await insertDraft(trx, {
			sheetId: sheet.id,
			revision,
			document: after,
			colouringId: outcome ? await keep(trx, sheet.id, current, outcome) : current.colouring_id,
			explanation: outcome ? outcome.explanation : current.explanation,
			savedBy: member.userId,
		});
		const subject = { kind: 'sheet', id: sheet.id };
		await record(trx, member, 'draft.saved', subject, { sheet: sheet.number, revision, parts });
		const colouring = outcome
			? deskOutcome(namesIn(view, after), outcome)
			: standingColouring(view, current);
		return {
			status: 'saved',
			saved: { revision, savedAt: savedAt.toISOString(), document: after, colouring },
		};
	});

/** Stores the new colouring, or points to the one before when it came out the same. */
async function keep(
	trx: Db,
	sheetId: string,
	current: DraftRow,
	{ colouring }: Outcome,
): Promise<string | null> {
	if (!colouring) return null;
	const same =
		current.inks !== null &&
		isDeepStrictEqual(current.inks, Array.from(colouring.inks)) &&
		current.lower_bound === colouring.lowerBound &&
		current.inks_used === colouring.inksUsed &&
		isDeepStrictEqual(current.proof, JSON.parse(JSON.stringify(colouring.proof)));
	return same ? current.colouring_id : insertColouring(trx, sheetId, colouring);
}

/** What numbers stand for in this draft's sentences. */
export const namesIn = (view: BoundaryView, draft: Draft): Names => ({
	regions: view.names,
	inks: draft.palette.inks,
});

/** What a stored draft is coloured with, or why not: one of the two was stored with it. */
function standingColouring(view: BoundaryView, draft: DraftRow): DeskColouring {
	const colouring = deskColouring(namesIn(view, documentOf(draft)), draft);
	if (!colouring) throw new Error(`draft ${draft.revision} has neither colouring nor explanation`);
	return colouring;
}

const savedNote = (view: BoundaryView, draft: DraftRow): DraftSaved => ({
	revision: draft.revision,
	savedAt: draft.saved_at.toISOString(),
	document: documentOf(draft),
	colouring: standingColouring(view, draft),
});

const staleNote = (draft: DraftRow): DraftStale => ({
	revision: draft.revision,
	savedBy: personName(draft),
	savedAt: draft.saved_at.toISOString(),
	document: documentOf(draft),
	boundarySetId: draft.boundary_set_id,
});

/** An earlier or the current draft, whole. */
export async function readDraft(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	revision: number,
) {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const draft = await draftOf(shop.db, sheet.id, revision);
	const view = await boundaryView(shop.db, draft.boundary_set_id);
	return {
		...staleNote(draft),
		document: draftDocument.parse(documentOf(draft)),
		colouring: standingColouring(view, draft),
	};
}

/** Saves a new layout on top of whatever the draft is now. */
export async function saveLayout(
	shop: Workshop,
	member: Member,
	number: number,
	layout: Draft['layout'],
): Promise<SaveResult> {
	requireAccess(member, 'layout.edit');
	const { id, revision } = await sheetOf(shop.db, member, number);
	const document = documentOf(await draftOf(shop.db, id, revision));
	return saveDraft(shop, member, number, { revision, document: { ...document, layout } });
}
