import { sql } from 'kysely';
import type { PieceColumns } from '../../schemas/pieces.ts';
import type { Db, Trx } from '../database/connection.ts';

/** Pieces of the regions of a boundary set, in order; null where none are kept. */
export async function readPieces(db: Db, id: string): Promise<PieceColumns | null> {
	const { rows } = await sql<{ columns: string; found: boolean }>`
		select count(*) > 0 as found, json_build_object(
			'region', json_agg(region order by ordinal), 'part', json_agg(part order by ordinal),
			'kind', json_agg(kind order by ordinal), 'areaKm2', json_agg(area_km2 order by ordinal),
			'lon', json_agg(lon order by ordinal), 'lat', json_agg(lat order by ordinal),
			'within', json_agg(coalesce(within, -1) order by ordinal)
		)::text as columns from pieces where boundary_set_id = ${id}
	`.execute(db);
	return rows[0].found ? JSON.parse(rows[0].columns) : null;
}

/** Keeps the pieces of a set; whoever worked them out at the same time has kept the very same. */
export async function insertPieces(trx: Trx, id: string, all: PieceColumns): Promise<void> {
	const { region, part, kind, areaKm2, lon, lat, within } = all;
	await sql`
		insert into pieces (boundary_set_id, ordinal, region, part, kind, area_km2, lon, lat, within)
		select ${id}::uuid, place - 1, region, part, kind, area, lon, lat, nullif(within, -1)
		from unnest(
			${region}::integer[], ${part}::integer[], ${kind}::text[], ${areaKm2}::float8[],
			${lon}::float8[], ${lat}::float8[], ${within}::integer[]
		) with ordinality as given (region, part, kind, area, lon, lat, within, place)
		on conflict do nothing
	`.execute(trx);
}
