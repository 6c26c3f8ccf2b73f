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
import { arrangedDraft, colourDraftAs, type DraftColouring } from './draft-colouring.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { changedParts, changesColouring, rightsFor, signDraft } from './draft-rights.ts';
import {
	deskColouring,
	deskOutcome,
	storedResult,
	type Names,
	type Outcome,
} from './outcome-of-colouring.ts';
import { NotFound } from './outcomes.ts';
import { nameOfMember, personName } from './people.ts';
import { requireThemeMeasures } from './theme-on-sheet.ts';

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
 * locks collide is saved too, with the explanation in place of a colouring. Inks that the sender shows are
 * taken over if they hold, also where nothing else changed. When somebody else saved first nothing is
 * written and the answer tells what they saved. Each part that changed needs its own right.
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
	if (parts.includes('theme') && after.theme) {
		// limits set by hand would tell figures to whoever moves them
		requireAccess(member, 'measures.read');
		await requireThemeMeasures(shop.db, sheet.id, after.theme);
	}
	const shown = sent.inks;
	const other = shown !== undefined && !isDeepStrictEqual(shown, current.inks);
	if (other) requireAccess(member, 'colours.edit');
	const view = await boundaryView(shop.db, sheet.boundary_set_id);
	const colouring = changesColouring(parts)
		? await colouredAfresh(shop, { sheet, view, current, after, parts, shown })
		: other
			? await arrangedDraft(shop, { view, current, after, shown })
			: null;
	if (parts.length === 0 && !colouring) {
		return { status: 'saved', saved: savedNote(view, current) };
	}
	return store(shop, member, { sheet, view, current, after, colouring, parts });
}

async function colouredAfresh(
	shop: Workshop,
	{ sheet, view, current, after, parts, shown }: Omit<Change, 'colouring'> & { shown?: number[] },
): Promise<DraftColouring> {
	// another seed asks for another arrangement, so nothing is held to the colouring before
	const previous = parts.includes('seed') ? null : await inksBefore(shop.db, sheet.id, current);
	return colourDraftAs(shop, view, after, { previous, shown, earlier: storedResult(current) });
}

/** The colouring of a draft or, where its rules collide, the one that stood before them. */
export const inksBefore = async (db: Db, sheetId: string, draft: DraftRow) =>
	draft.inks ?? (await latestInks(db, sheetId));

interface Change {
	sheet: SheetRecord;
	view: BoundaryView;
	current: DraftRow;
	after: Draft;
	/** null: it stays as it is */
	colouring: DraftColouring | null;
	parts: (keyof Draft)[];
}

const store = (shop: Workshop, member: Member, change: Change): Promise<SaveResult> =>
	shop.db.transaction().execute(async (trx) => {
		const { current, after, view, parts } = change;
		const { outcome = null, arranged = false } = change.colouring ?? {};
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
		const verb = parts.length > 0 ? 'saved' : 'arranged';
		const detail = {
			sheet: sheet.number,
			revision,
			...(parts.length > 0 && { parts }),
			...(arranged && { arranged }),
		};
		await record(trx, member, `draft.${verb}`, subject, detail);
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

/** Lays the fields of a layout over whatever the draft is now; what they do not say stays as it is. */
export async function saveLayout(
	shop: Workshop,
	member: Member,
	number: number,
	fields: Partial<Draft['layout']>,
): Promise<SaveResult> {
	requireAccess(member, 'layout.edit');
	const { id, revision } = await sheetOf(shop.db, member, number);
	const document = documentOf(await draftOf(shop.db, id, revision));
	const layout = { ...document.layout, ...fields };
	return saveDraft(shop, member, number, { revision, document: { ...document, layout } });
}
