import type { Db } from '../database/connection.ts';
import type { Standing } from '../jobs/recut-carry.ts';
import type { RecutInput } from '../jobs/recut.work.ts';
import { readFindings, readGeometry } from '../repositories/boundaries.repository.ts';
import { readMeasures, type MeasureRow } from '../repositories/measures.repository.ts';
import {
	findSheetById,
	type DraftRow,
	type SheetRecord,
} from '../repositories/sheets.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, inksBefore } from './draft.service.ts';
import { NotFound } from './outcomes.ts';
import { territoriesIn, territoryDraftOf } from './territory-state.ts';

/** Stored boundaries as a re-cut is compared with them. */
export async function standingSide(db: Db, setId: string): Promise<RecutInput['before']> {
	const geometry = await readGeometry(db, setId);
	if (!geometry) throw new NotFound('boundary set');
	const { asRead: borders } = await boundaryView(db, setId);
	const rows = await readFindings(db, setId);
	const findings = rows.map(({ code, severity, message, regions, lon, lat }) => ({
		...{ code, severity, message, regions },
		at: lon === null || lat === null ? null : ([lon, lat] as [number, number]),
	}));
	return { geometry, borders, findings };
}

/** What people decided on the present boundaries of a sheet, with the rows it was read from. */
export interface StandingRows {
	standing: Standing;
	draft: DraftRow;
	measures: MeasureRow[];
}

export async function standingRows(db: Db, sheet: SheetRecord): Promise<StandingRows> {
	const draft = await draftOf(db, sheet.id, sheet.revision);
	const territories = await territoryDraftOf(db, sheet.id, sheet.territory_revision);
	const measures = await presentMeasures(db, sheet);
	return {
		draft,
		measures,
		standing: {
			draft: documentOf(draft),
			inks: await inksBefore(db, sheet.id, draft),
			territories: territories && territoriesIn(territories),
			measures: measures.map(({ id, name, values, texts }) => ({ id, name, values, texts })),
		},
	};
}

/** Figures that are joined to the sheet's present boundaries; others are in another order of regions. */
export const presentMeasures = async (db: Db, sheet: SheetRecord): Promise<MeasureRow[]> =>
	(await readMeasures(db, sheet.id)).filter((row) => row.boundary_set_id === sheet.boundary_set_id);

/** The same for a job, which knows the sheet by its id. */
export async function standingOn(db: Db, sheetId: string): Promise<Standing> {
	const sheet = await findSheetById(db, sheetId);
	if (!sheet) throw new NotFound('sheet');
	return (await standingRows(db, sheet)).standing;
}
