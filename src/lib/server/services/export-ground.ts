import { thawTheme, type EditionContent } from '../../engines/editions/index.ts';
import type { FurtherValues } from '../../engines/exports/index.ts';
import type { SheetTheme } from '../../engines/sheet/index.ts';
import { wholeDraft, type Draft } from '../../engines/editions/draft.ts';
import type { Db } from '../database/connection.ts';
import { findEdition, listEditions } from '../repositories/editions.repository.ts';
import type { DraftRow, SheetRecord } from '../repositories/sheets.repository.ts';
import { boundariesDigest } from './boundaries-digest.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { documentOf, draftOf } from './draft.service.ts';
import { issuedFurther, presentFurther } from './further-values.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { territoriesOnSheet } from './territories-on-sheet.ts';
import { themeOnSheet } from './theme-on-sheet.ts';

/** What an export is made from, found again at any time: an edition's own content, or one revision. */
export interface ExportGround {
	view: BoundaryView;
	draft: Draft;
	/** in region order; null while nothing is coloured */
	inks: number[] | null;
	/** the classes shown in place of the colouring: those issued, or of a draft those of today's figures */
	theme: SheetTheme | null;
	/** territories and figures for the tables, issued or of today like the classes */
	further: FurtherValues;
	/** when it was issued, or the draft was saved */
	at: Date;
	/** the last edition issued of this draft or an earlier one, 0 for none */
	lastEdition: number;
	/** over the edition's content; null for a draft */
	digest: string | null;
	/** over the boundaries that were issued; null for a draft */
	boundaries: string | null;
}

export async function exportGround(
	db: Db,
	sheet: Pick<SheetRecord, 'id'>,
	taken: { edition: number | null; revision: number },
): Promise<ExportGround> {
	return taken.edition === null
		? draftGround(db, sheet.id, taken.revision)
		: editionGround(db, sheet.id, taken.edition);
}

async function draftGround(db: Db, sheetId: string, revision: number): Promise<ExportGround> {
	const row = await draftOf(db, sheetId, revision);
	const editions = await listEditions(db, sheetId);
	const view = await boundaryView(db, row.boundary_set_id);
	const draft = documentOf(row);
	const theme = await themeOnSheet(db, sheetId, view, draft.theme);
	const territories = await territoriesOnSheet(db, sheetId, view);
	return {
		view,
		theme: theme?.shown ?? null,
		further: presentFurther(view.keys, theme, territories),
		...{ draft, inks: row.inks, at: row.saved_at, digest: null, boundaries: null },
		lastEdition: editions.find((one) => one.revision <= revision)?.number ?? 0,
	};
}

/**
 * An edition is drawn from what was issued, on the boundaries it was issued with: those of the draft it was
 * issued from, which stay when the sheet is re-cut.
 */
async function editionGround(db: Db, sheetId: string, edition: number): Promise<ExportGround> {
	const row = await findEdition(db, sheetId, edition);
	if (!row) throw new NotFound('edition');
	const content = row.content as unknown as EditionContent;
	const draft: DraftRow = await draftOf(db, sheetId, row.revision);
	const view = await boundaryView(db, draft.boundary_set_id);
	return {
		...{ view, draft: wholeDraft(content.draft), at: row.issued_at, digest: row.digest },
		inks: view.keys.map((key) => content.colouring[key]),
		theme: content.theme ? thawTheme(view.keys, content.theme) : null,
		further: issuedFurther(view.keys, content),
		...{ lastEdition: edition, boundaries: content.boundaries.digest },
	};
}

/** Throws unless the stored boundaries are, byte for byte, those that the edition was issued with. */
export async function requireSameBoundaries(
	db: Db,
	{ view, boundaries }: ExportGround,
): Promise<void> {
	if (boundaries === null || (await boundariesDigest(db, view.set.id)) === boundaries) return;
	const message = 'The stored boundaries are not those that this edition was issued with.';
	throw new Conflict('other-boundaries', message);
}
