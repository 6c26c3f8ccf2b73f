import { DatabaseError } from 'pg';
import type { Db } from '../database/connection.ts';
import type { PaletteInk } from '../database/palette-tables.ts';
import type { Row } from '../database/schema.ts';

export type PaletteRow = Row<'palettes'>;

export const listPalettes = (db: Db, teamId: string) =>
	db.selectFrom('palettes').selectAll().where('team_id', '=', teamId).orderBy('name').execute();

const one = (db: Db, teamId: string, id: string) =>
	db.selectFrom('palettes').selectAll().where('team_id', '=', teamId).where('id', '=', id);

export const findPalette = (db: Db, teamId: string, id: string): Promise<PaletteRow | undefined> =>
	one(db, teamId, id).executeTakeFirst();

/** The same, held until the transaction ends: nobody changes it meanwhile. */
export const holdPalette = (trx: Db, teamId: string, id: string): Promise<PaletteRow | undefined> =>
	one(trx, teamId, id).forUpdate().executeTakeFirst();

export const paletteNames = async (db: Db, teamId: string): Promise<Set<string>> => {
	const rows = await db
		.selectFrom('palettes')
		.select('name')
		.where('team_id', '=', teamId)
		.execute();
	return new Set(rows.map(({ name }) => name));
};

export const countPalettes = async (db: Db, teamId: string): Promise<number> => {
	const { count } = await db
		.selectFrom('palettes')
		.where('team_id', '=', teamId)
		.select(({ fn }) => fn.countAll<number>().as('count'))
		.executeTakeFirstOrThrow();
	return Number(count);
};

/** Adds a palette; undefined when the team has one of this name already. */
export const insertPalette = (
	trx: Db,
	palette: {
		teamId: string;
		name: string;
		inks: readonly PaletteInk[];
		source?: string | null;
		licence?: string | null;
		createdBy: string | null;
	},
) =>
	trx
		.insertInto('palettes')
		.values({
			team_id: palette.teamId,
			name: palette.name,
			inks: JSON.stringify(palette.inks),
			source: palette.source ?? null,
			licence: palette.licence ?? null,
			created_by: palette.createdBy,
		})
		.onConflict((conflict) => conflict.columns(['team_id', 'name']).doNothing())
		.returning('id')
		.executeTakeFirst();

/** Changes a palette; false, and the transaction is lost, when the team has another of this name. */
export async function updatePalette(
	trx: Db,
	id: string,
	{ name, inks, source }: { name: string; inks: readonly PaletteInk[]; source: string | null },
): Promise<boolean> {
	try {
		await trx
			.updateTable('palettes')
			.set(({ eb }) => ({
				...{ name, source },
				inks: JSON.stringify(inks),
				revision: eb('revision', '+', 1),
				updated_at: new Date(),
			}))
			.where('id', '=', id)
			.execute();
		return true;
	} catch (problem) {
		// two may take a name at once, so that only the table itself can tell
		if (problem instanceof DatabaseError && problem.code === uniqueViolation) return false;
		throw problem;
	}
}

/** SQLSTATE, PostgreSQL manual, appendix A */
const uniqueViolation = '23505';

export async function deletePalette(trx: Db, teamId: string, id: string): Promise<boolean> {
	const { numDeletedRows } = await trx
		.deleteFrom('palettes')
		.where('team_id', '=', teamId)
		.where('id', '=', id)
		.executeTakeFirst();
	return numDeletedRows > 0n;
}
