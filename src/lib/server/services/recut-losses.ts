import { isDeepStrictEqual } from 'node:util';
import type { Db } from '../database/connection.ts';
import { readMeasures } from '../repositories/measures.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { documentOf, draftOf } from './draft.service.ts';
import { figuresDigest, type Before } from './recut-before.ts';
import { territoriesIn, territoryDraftOf } from './territory-state.ts';

/** What was done since a re-cut was applied, and would not be there once it is put back; in sentences. */
export const losses = async (db: Db, sheet: SheetRecord, before: Before): Promise<string[]> => [
	...(await draftLosses(db, sheet, before)),
	...(await territoryLosses(db, sheet, before)),
	...(await figureLosses(db, sheet, before)),
];

async function draftLosses(db: Db, sheet: SheetRecord, { wrote }: Before): Promise<string[]> {
	const document = async (revision: number) => documentOf(await draftOf(db, sheet.id, revision));
	const saved = sheet.revision - wrote.draft;
	if (saved === 0) return [];
	if (isDeepStrictEqual(await document(sheet.revision), await document(wrote.draft))) return [];
	return [`The draft was saved ${times(saved)} since; it goes back to how it was before.`];
}

async function territoryLosses(db: Db, sheet: SheetRecord, { wrote }: Before): Promise<string[]> {
	const document = async (revision: number) =>
		territoriesIn(await territoryDraftOf(db, sheet.id, revision));
	const saved = sheet.territory_revision - wrote.territories;
	if (saved === 0) return [];
	const [now, then] = [await document(sheet.territory_revision), await document(wrote.territories)];
	if (isDeepStrictEqual(now, then)) return [];
	return [
		`The territories were saved ${times(saved)} since; they go back to how they were before.`,
	];
}

const times = (count: number) => (count === 1 ? 'once' : `${count} times`);

async function figureLosses(
	db: Db,
	sheet: SheetRecord,
	{ measures, wrote }: Before,
): Promise<string[]> {
	const present = (await readMeasures(db, sheet.id)).filter(
		(row) => row.boundary_set_id === sheet.boundary_set_id,
	);
	const carried = new Map(measures.map(({ id, table }) => [id, table]));
	const isCarried = ({ id, table_id }: (typeof present)[number]) => carried.get(id) === table_id;
	const changed = present.filter(
		(row) => isCarried(row) && figuresDigest(row) !== wrote.measures[row.id],
	);
	const joined = present.filter((row) => !isCarried(row));
	return [
		...told('Figures changed since go back to what they were', changed),
		...told('Figures joined since have to be joined again', joined),
	];
}

function told(words: string, rows: { name: string }[]): string[] {
	if (rows.length === 0) return [];
	const names = rows.slice(0, 5).map(({ name }) => name);
	const more = rows.length > 5 ? ` and ${rows.length - 5} more` : '';
	return [`${words}: ${names.join(', ')}${more}.`];
}
