import type { TerritoryGround } from '../../engines/territories/problem-of-draft.ts';
import { noTerritories, type TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import type { Db } from '../database/connection.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import {
	findTerritoryDraft,
	type TerritoryDraftRow,
} from '../repositories/territories.repository.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { measuresOf, type MeasureColumns } from './measures-of.ts';
import { NotFound } from './outcomes.ts';

/** The territories of a sheet with everything they stand on. */
export interface TerritoryState {
	sheet: SheetRecord;
	view: BoundaryView;
	/** null before the first save */
	row: TerritoryDraftRow | null;
	document: TerritoryDraft;
	columns: MeasureColumns;
	ground: TerritoryGround;
}

/** Reads the present revision of a sheet's territories, or an earlier one on the present ground. */
export async function territoryState(
	db: Db,
	sheet: SheetRecord,
	revision = sheet.territory_revision,
): Promise<TerritoryState> {
	const row = await territoryDraftOf(db, sheet.id, revision);
	const view = await boundaryView(db, sheet.boundary_set_id);
	const columns = await measuresOf(db, sheet.id);
	return {
		sheet,
		view,
		row,
		document: territoriesIn(row),
		columns,
		ground: groundOf(view, columns),
	};
}

/** A stored revision; null for revision 0, which nobody has saved yet. */
export async function territoryDraftOf(
	db: Db,
	sheetId: string,
	revision: number,
): Promise<TerritoryDraftRow | null> {
	if (revision === 0) return null;
	const row = await findTerritoryDraft(db, sheetId, revision);
	if (!row) throw new NotFound('revision of the territories');
	return row;
}

/** The document of a stored revision; what is stored was checked when it was saved. */
export const territoriesIn = (row: Pick<TerritoryDraftRow, 'document'> | null): TerritoryDraft =>
	row ? (row.document as unknown as TerritoryDraft) : noTerritories;

/** Figures that were joined to an earlier boundary set are in that set's order, so they do not count. */
export const groundOf = (
	{ keys, borders }: BoundaryView,
	{ measures }: MeasureColumns,
): TerritoryGround => ({
	...{ keys, borders },
	measures: measures
		.filter(({ stale }) => !stale)
		.map(({ id, name, values }) => ({ id, name, values })),
});
