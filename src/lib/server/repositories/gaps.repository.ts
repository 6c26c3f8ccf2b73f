import { sql } from 'kysely';
import type { Db, Trx } from '../database/connection.ts';

/** Gaps across water of a boundary set, one entry a pair, `a < b`. */
export interface StoredGaps {
	a: number[];
	b: number[];
	metres: number[];
	lon: number[];
	lat: number[];
}

/** How far across water the gaps of a set have been measured; undefined where there is no such set. */
export async function findGapsKm(db: Db, id: string): Promise<number | undefined> {
	const row = await db
		.selectFrom('boundary_sets')
		.select('gaps_km')
		.where('id', '=', id)
		.executeTakeFirst();
	return row?.gaps_km;
}

/** In order; one JSON value a column is far quicker than rows. */
export async function readGaps(db: Db, id: string): Promise<StoredGaps> {
	const { rows } = await sql<{ columns: string }>`
		select json_build_object(
			'a', coalesce(json_agg(a order by a, b), '[]'), 'b', coalesce(json_agg(b order by a, b), '[]'),
			'metres', coalesce(json_agg(metres order by a, b), '[]'),
			'lon', coalesce(json_agg(at_lon order by a, b), '[]'),
			'lat', coalesce(json_agg(at_lat order by a, b), '[]')
		)::text as columns from gaps where boundary_set_id = ${id}
	`.execute(db);
	return JSON.parse(rows[0].columns);
}

/**
 * Keeps gaps that were measured up to `km` in place of those measured less far; false, and nothing is
 * changed, when they have been measured as far by now.
 */
export async function replaceGaps(
	trx: Trx,
	id: string,
	km: number,
	gaps: StoredGaps,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('boundary_sets')
		.set({ gaps_km: km })
		.where('id', '=', id)
		.where('gaps_km', '<', km)
		.executeTakeFirst();
	if (numUpdatedRows === 0n) return false;
	await trx.deleteFrom('gaps').where('boundary_set_id', '=', id).execute();
	const { a, b, metres, lon, lat } = gaps;
	await sql`
		insert into gaps (boundary_set_id, a, b, metres, at_lon, at_lat)
		select ${id}::uuid, * from unnest(
			${a}::integer[], ${b}::integer[], ${metres}::float8[], ${lon}::float8[], ${lat}::float8[]
		)
	`.execute(trx);
	return true;
}
