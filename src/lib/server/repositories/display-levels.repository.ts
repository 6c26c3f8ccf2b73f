import type { Db } from '../database/connection.ts';
import type { PackedLevel } from '../jobs/display-levels.work.ts';

/** One statement a level: their geometries may be large. */
export async function insertLevels(
	trx: Db,
	boundarySetId: string,
	levels: readonly PackedLevel[],
): Promise<void> {
	for (const { level, toleranceMetres, points, geometry } of levels) {
		await trx
			.insertInto('display_levels')
			.values({
				boundary_set_id: boundarySetId,
				level,
				tolerance_metres: toleranceMetres,
				points,
				geometry: Buffer.from(geometry.buffer, geometry.byteOffset, geometry.byteLength),
			})
			.execute();
	}
}

/** Levels of a boundary set, coarsest first, without their geometry; none for sets read before there were any. */
export const listLevels = (db: Db, boundarySetId: string) =>
	db
		.selectFrom('display_levels')
		.select(['level', 'tolerance_metres as toleranceMetres', 'points'])
		.where('boundary_set_id', '=', boundarySetId)
		.orderBy('level')
		.execute();

export async function readLevel(
	db: Db,
	boundarySetId: string,
	level: number,
): Promise<Buffer | undefined> {
	const row = await db
		.selectFrom('display_levels')
		.select('geometry')
		.where('boundary_set_id', '=', boundarySetId)
		.where('level', '=', level)
		.executeTakeFirst();
	return row?.geometry;
}
