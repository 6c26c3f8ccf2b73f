import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow, Row } from '../database/schema.ts';

/** The whole of an accepted file, in columns: one entry a region, a border, a finding. */
export interface BoundaryColumns {
	regions: {
		key: string[];
		name: string[];
		parts: number[];
		areaKm2: number[];
		/** -1 for none */
		enclaveOf: number[];
		/** one JSON object a region */
		attributes: string[];
	};
	borders: {
		a: number[];
		b: number[];
		kind: string[];
		metres: number[];
		lon: number[];
		lat: number[];
	};
	findings: {
		code: string;
		severity: 'error' | 'warning' | 'note';
		message: string;
		regions: string[];
		at: [number, number] | null;
		offers?: object[];
		toleranceMetres?: number;
	}[];
}

/** Rows a statement: large enough to be quick, small enough for one message to the server. */
const chunk = 5_000;

export async function insertBoundarySet(
	trx: Db,
	set: NewRow<'boundary_sets'>,
	columns: BoundaryColumns,
): Promise<string> {
	const { id } = await trx
		.insertInto('boundary_sets')
		.values(set)
		.returning('id')
		.executeTakeFirstOrThrow();
	await insertRegions(trx, id, columns.regions);
	await insertBorders(trx, id, columns.borders);
	if (columns.findings.length > 0) await insertFindings(trx, id, columns.findings);
	return id;
}

async function insertRegions(trx: Db, id: string, all: BoundaryColumns['regions']): Promise<void> {
	for (let from = 0; from < all.key.length; from += chunk) {
		const part = <T>(column: T[]) => column.slice(from, from + chunk);
		await sql`
			insert into regions (boundary_set_id, ordinal, key, name, parts, area_km2, enclave_of, attributes)
			select ${id}::uuid, ${from}::integer + place - 1, key, name, parts, area, nullif(enclave, -1),
				attributes::jsonb
			from unnest(
				${part(all.key)}::text[], ${part(all.name)}::text[], ${part(all.parts)}::integer[],
				${part(all.areaKm2)}::float8[], ${part(all.enclaveOf)}::integer[],
				${part(all.attributes)}::text[]
			) with ordinality as given (key, name, parts, area, enclave, attributes, place)
		`.execute(trx);
	}
}

async function insertBorders(trx: Db, id: string, all: BoundaryColumns['borders']): Promise<void> {
	for (let from = 0; from < all.a.length; from += chunk) {
		const part = <T>(column: T[]) => column.slice(from, from + chunk);
		await sql`
			insert into borders (boundary_set_id, a, b, kind, metres, at_lon, at_lat)
			select ${id}::uuid, * from unnest(
				${part(all.a)}::integer[], ${part(all.b)}::integer[], ${part(all.kind)}::text[],
				${part(all.metres)}::float8[], ${part(all.lon)}::float8[], ${part(all.lat)}::float8[]
			)
		`.execute(trx);
	}
}

async function insertFindings(
	trx: Db,
	id: string,
	findings: BoundaryColumns['findings'],
): Promise<void> {
	const rows = findings.map(({ at, offers, toleranceMetres, ...finding }) => ({
		...finding,
		tolerance_metres: toleranceMetres ?? null,
		offers: offers ? JSON.stringify(offers) : null,
		boundary_set_id: id,
		lon: at?.[0] ?? null,
		lat: at?.[1] ?? null,
	}));
	await trx.insertInto('findings').values(rows).execute();
}

export type BoundarySetNote = Omit<Row<'boundary_sets'>, 'geometry'>;

const noteColumns = [
	'id',
	'team_id',
	'file_name',
	'file_digest',
	'file_bytes',
	'source',
	'columns',
	'region_count',
	'planar',
	'planar_witness',
	'found',
	'options',
	'gaps_km',
	'created_by',
	'created_at',
] as const;

export const findBoundarySet = (db: Db, id: string): Promise<BoundarySetNote | undefined> =>
	db.selectFrom('boundary_sets').select(noteColumns).where('id', '=', id).executeTakeFirst();

export async function readGeometry(db: Db, id: string): Promise<Buffer | undefined> {
	const row = await db
		.selectFrom('boundary_sets')
		.select('geometry')
		.where('id', '=', id)
		.executeTakeFirst();
	return row?.geometry;
}

export interface StoredColumns {
	key: string[];
	name: string[];
	parts: number[];
	areaKm2: number[];
	enclaveOf: number[];
	a: number[];
	b: number[];
	kind: string[];
	metres: number[];
	lon: number[];
	lat: number[];
}

/** Regions and borders as columns, in order; one JSON value a column is far quicker than rows. */
export async function readColumns(db: Db, id: string): Promise<StoredColumns> {
	const regions = await sql<{ columns: string | null }>`
		select json_build_object(
			'key', json_agg(key order by ordinal), 'name', json_agg(name order by ordinal),
			'parts', json_agg(parts order by ordinal), 'areaKm2', json_agg(area_km2 order by ordinal),
			'enclaveOf', json_agg(coalesce(enclave_of, -1) order by ordinal)
		)::text as columns from regions where boundary_set_id = ${id}
	`.execute(db);
	const borders = await sql<{ columns: string | null }>`
		select json_build_object(
			'a', coalesce(json_agg(a order by a, b), '[]'), 'b', coalesce(json_agg(b order by a, b), '[]'),
			'kind', coalesce(json_agg(kind order by a, b), '[]'),
			'metres', coalesce(json_agg(metres order by a, b), '[]'),
			'lon', coalesce(json_agg(at_lon order by a, b), '[]'),
			'lat', coalesce(json_agg(at_lat order by a, b), '[]')
		)::text as columns from borders where boundary_set_id = ${id}
	`.execute(db);
	return {
		...JSON.parse(regions.rows[0]?.columns ?? '{}'),
		...JSON.parse(borders.rows[0]?.columns ?? '{}'),
	};
}

/** One column of the attribute table, in region order, as text. */
export async function readAttribute(
	db: Db,
	id: string,
	column: string,
): Promise<(string | null)[]> {
	const { rows } = await sql<{ values: string | null }>`
		select json_agg(attributes ->> ${column} order by ordinal)::text as values
		from regions where boundary_set_id = ${id}
	`.execute(db);
	return JSON.parse(rows[0]?.values ?? '[]');
}

/** The attribute table in region order, as the text of one JSON array. */
export async function readAttributesText(db: Db, id: string): Promise<string> {
	const { rows } = await sql<{ values: string | null }>`
		select json_agg(attributes order by ordinal)::text as values
		from regions where boundary_set_id = ${id}
	`.execute(db);
	return rows[0]?.values ?? '[]';
}

export const readFindings = (db: Db, id: string) =>
	db
		.selectFrom('findings')
		.leftJoin('User', 'User.id', 'findings.accepted_by')
		.selectAll('findings')
		.select(['User.name as accepted_name', 'User.email as accepted_email'])
		.where('boundary_set_id', '=', id)
		.orderBy('findings.id')
		.execute();

/** Marks a finding of this set as accepted; false when there is none such still open. */
export async function acceptFinding(
	trx: Db,
	set: string,
	finding: number,
	userId: string | null,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('findings')
		.set({ accepted_by: userId, accepted_at: sql`now()` })
		.where('id', '=', finding)
		.where('boundary_set_id', '=', set)
		.where('accepted_at', 'is', null)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Removes a set that no sheet, draft, table, proposal or re-cut uses any more; false when one still does. */
export async function deleteUnusedBoundarySet(trx: Db, id: string): Promise<boolean> {
	const { numDeletedRows } = await trx
		.deleteFrom('boundary_sets')
		.where('id', '=', id)
		.where(({ and, not, exists, selectFrom }) =>
			and([
				...(['sheets', 'measure_tables', 'proposals', 'drafts'] as const).map((table) =>
					not(
						exists(selectFrom(table).select('boundary_set_id').where('boundary_set_id', '=', id)),
					),
				),
				...(['from_set', 'to_set'] as const).map((column) =>
					not(exists(selectFrom('recuts').select('id').where(column, '=', id))),
				),
			]),
		)
		.executeTakeFirst();
	return numDeletedRows > 0n;
}
