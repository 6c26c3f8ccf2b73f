import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

/** The other sheets of a team, with the latest edition of each and the draft that it was issued from. */
export async function otherSheets(db: Db, teamId: string, sheetId: string) {
	const { rows } = await sql<{
		id: string;
		number: number;
		name: string;
		boundary_set_id: string;
		revision: number;
		edition: number | null;
		edition_revision: number | null;
	}>`
		select s.id, s.number, s.name, s.boundary_set_id, s.revision,
			e.number as edition, e.revision as edition_revision
		from sheets s
		left join lateral (
			select number, revision from editions where sheet_id = s.id order by number desc limit 1
		) e on true
		where s.team_id = ${teamId} and s.id <> ${sheetId}
		order by s.number
	`.execute(db);
	return rows;
}
export type OtherSheet = Awaited<ReturnType<typeof otherSheets>>[number];

export interface BorderExtent {
	set: string;
	/** west, south, east, north of the places at which borders are marked */
	box: [number, number, number, number];
}

/** How far the borders of boundary sets reach: a little less than the sets themselves. */
export async function borderExtents(db: Db, sets: string[]): Promise<BorderExtent[]> {
	if (sets.length === 0) return [];
	const { rows } = await sql<{ set: string; box: [number, number, number, number] }>`
		select boundary_set_id as set,
			array[min(at_lon), min(at_lat), max(at_lon), max(at_lat)] as box
		from borders where boundary_set_id = any(${sets}) group by boundary_set_id
	`.execute(db);
	return rows;
}
