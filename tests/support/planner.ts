import type { TerritoryDraft, Wishes } from '../../src/lib/engines/territories/territory-draft.ts';
import { firstWishes, noTerritories } from '../../src/lib/engines/territories/territory-draft.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Db } from '../../src/lib/server/database/connection.ts';
import type { Workshop } from '../../src/lib/server/jobs/workshop.ts';
import { newEntry } from '../../src/lib/server/services/territories-from-column.ts';
import { saveTerritories } from '../../src/lib/server/services/territories.service.ts';
import { createMember, ingest, type TestWorkshop } from './workshop.ts';

/** Sheets for planners: a plain of square fields, with one figure each. */

/** Key of the field in this row and column. */
export const fieldKey = (row: number, column: number) => `r${row}c${column}`;

/** Square fields by row and column, a tenth of a degree wide, named and with the half they lie in. */
export function fieldsGeoJson(rows: number, columns: number): string {
	const features = Array.from({ length: rows * columns }, (_, i) => {
		const [row, column] = [Math.floor(i / columns), i % columns];
		const [x, y] = [column / 10, row / 10];
		const ring = [
			[x, y],
			[x + 0.1, y],
			[x + 0.1, y + 0.1],
			[x, y + 0.1],
			[x, y],
		].map((point) => point.map((value) => Math.round(value * 10) / 10));
		return {
			type: 'Feature',
			properties: {
				code: fieldKey(row, column),
				name: `Field ${row}.${column}`,
				half: column < columns / 2 ? 'West' : 'East',
			},
			geometry: { type: 'Polygon', coordinates: [ring] },
		};
	});
	return JSON.stringify({ type: 'FeatureCollection', features });
}

export interface Plain {
	planner: Member;
	/** number of the sheet */
	sheet: number;
	sheetId: string;
	/** id of the measure */
	visits: string;
	keys: string[];
}

/** A sheet of fields in a team of its own, with a measure `Visits`: 1 in every field unless told. */
export async function plainOf(
	shop: TestWorkshop,
	slug: string,
	size: Size,
	values?: (number | null)[],
): Promise<Plain> {
	const cartographer = await createMember(shop.db, slug, 'cartographer');
	const planner = await createMember(shop.db, slug, 'planner');
	return plainFor(shop, { cartographer, planner }, size, values);
}

interface Size {
	rows: number;
	columns: number;
}

/** The same for people who are there already. */
export async function plainFor(
	shop: Workshop,
	{ cartographer, planner }: { cartographer: Member; planner: Member },
	size: Size,
	values?: (number | null)[],
): Promise<Plain> {
	const bytes = fieldsGeoJson(size.rows, size.columns);
	const fields = { keyField: 'code', nameField: 'name' };
	const { sheet } = await ingest(shop, cartographer, 'fields.geojson', bytes, fields);
	if (sheet === null) throw new Error('the fields were not taken in');
	const row = await shop.db
		.selectFrom('sheets')
		.selectAll()
		.where('team_id', '=', planner.team.id)
		.where('number', '=', sheet)
		.executeTakeFirstOrThrow();
	const keys = Array.from({ length: size.rows * size.columns }, (_, i) =>
		fieldKey(Math.floor(i / size.columns), i % size.columns),
	);
	const visits = await putMeasure(shop.db, row.id, 'Visits', values ?? keys.map(() => 1));
	return { planner, sheet, sheetId: row.id, visits, keys };
}

/** A measure as if a table had been joined. */
export async function putMeasure(
	db: Db,
	sheetId: string,
	name: string,
	values: (number | null)[],
): Promise<string> {
	const { boundary_set_id } = await db
		.selectFrom('sheets')
		.select('boundary_set_id')
		.where('id', '=', sheetId)
		.executeTakeFirstOrThrow();
	const before = await db
		.selectFrom('measure_tables')
		.select('id')
		.where('sheet_id', '=', sheetId)
		.execute();
	const table = await db
		.insertInto('measure_tables')
		.values({
			...{ sheet_id: sheetId, number: before.length + 1, name: `Table of ${name}` },
			...{ boundary_set_id, file_name: 'x.csv', file_digest: 'x', file_bytes: 1 },
			...{ options: '{}', source: null, changes: '{}', state: 'taken', created_by: null },
			taken_by: null,
		})
		.returning('id')
		.executeTakeFirstOrThrow();
	const measure = await db
		.insertInto('measures')
		.values({
			...{ sheet_id: sheetId, table_id: table.id, position: 0, name, kind: 'number' },
			...{ values, texts: null },
		})
		.returning('id')
		.executeTakeFirstOrThrow();
	return measure.id;
}

/** A draft in which each field goes to the territory that `of` names. */
export function territoriesOf(
	keys: readonly string[],
	of: (key: string, row: number, column: number) => string | null,
	changes: Partial<TerritoryDraft> = {},
): TerritoryDraft {
	const assignment: Record<string, string> = {};
	for (const key of keys) {
		const [row, column] = key.slice(1).split('c').map(Number);
		const territory = of(key, row, column);
		if (territory !== null) assignment[key] = territory;
	}
	const names = [...new Set(Object.values(assignment))];
	const territories = names.map((name) => ({ ...newEntry(name, new Set()), key: name }));
	return { ...noTerritories, territories, assignment, ...changes };
}

/** Saves territories on top of whatever there is. */
export async function saveOver(
	shop: Workshop,
	{ planner, sheet, sheetId }: Plain,
	document: TerritoryDraft,
) {
	const { territory_revision: revision } = await shop.db
		.selectFrom('sheets')
		.select('territory_revision')
		.where('id', '=', sheetId)
		.executeTakeFirstOrThrow();
	const result = await saveTerritories(shop, planner, sheet, { revision, document });
	if (result.status !== 'saved') throw new Error('not saved');
	return result.saved;
}

/** Wishes for one measure within a tolerance. */
export const within = (
	measure: string,
	tolerance: number,
	changes: Partial<Wishes> = {},
): Wishes => ({
	...firstWishes,
	effort: 'quick',
	tolerances: { [measure]: tolerance },
	...changes,
});
