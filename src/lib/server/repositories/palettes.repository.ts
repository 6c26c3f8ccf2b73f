import type { Db } from '../database/connection.ts';

export const listPalettes = (db: Db, teamId: string) =>
	db.selectFrom('palettes').selectAll().where('team_id', '=', teamId).orderBy('name').execute();

/** Adds a palette; undefined when the team has one of this name already. */
export const insertPalette = (
	trx: Db,
	palette: {
		teamId: string;
		name: string;
		inks: { name: string; hex: string }[];
		createdBy: string | null;
	},
) =>
	trx
		.insertInto('palettes')
		.values({
			team_id: palette.teamId,
			name: palette.name,
			inks: JSON.stringify(palette.inks),
			created_by: palette.createdBy,
		})
		.onConflict((conflict) => conflict.columns(['team_id', 'name']).doNothing())
		.returning('id')
		.executeTakeFirst();

export async function deletePalette(trx: Db, teamId: string, id: string): Promise<boolean> {
	const { numDeletedRows } = await trx
		.deleteFrom('palettes')
		.where('team_id', '=', teamId)
		.where('id', '=', id)
		.executeTakeFirst();
	return numDeletedRows > 0n;
}
