import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

/** Parts of regions that do not simply lie among their neighbours in one piece, as columns. */
export interface PieceColumns {
	region: number[];
	part: number[];
	kind: ('main' | 'exclave' | 'island')[];
	areaKm2: number[];
	lon: number[];
	lat: number[];
	/** the region in whose hole it lies, or -1 */
	within: number[];
}

const chunk = 5_000;

export async function insertPieces(trx: Db, setId: string, all: PieceColumns): Promise<void> {
	for (let from = 0; from < all.region.length; from += chunk) {
		const part = <T>(column: T[]) => column.slice(from, from + chunk);
		await sql`
			insert into pieces (boundary_set_id, ordinal, region, part, kind, area_km2, lon, lat, within)
			select ${setId}::uuid, ${from}::integer + place - 1, region, part, kind, area, lon, lat,
				nullif(inside, -1)
			from unnest(
				${part(all.region)}::integer[], ${part(all.part)}::integer[], ${part(all.kind)}::text[],
				${part(all.areaKm2)}::float8[], ${part(all.lon)}::float8[], ${part(all.lat)}::float8[],
				${part(all.within)}::integer[]
			) with ordinality as given (region, part, kind, area, lon, lat, inside, place)
		`.execute(trx);
	}
}

/** In order; none for sets read before they were kept. */
export const readPieces = (db: Db, setId: string) =>
	db
		.selectFrom('pieces')
		.select(['region', 'part', 'kind', 'area_km2', 'lon', 'lat', 'within'])
		.where('boundary_set_id', '=', setId)
		.orderBy('ordinal')
		.execute();
