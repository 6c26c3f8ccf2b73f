import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

/**
 * Counts one more use of a key in the current window of so many seconds.
 * @returns the uses so far, this one included, and the seconds until the window ends
 */
export async function countUse(
	db: Db,
	key: string,
	seconds: number,
): Promise<{ hits: number; endsIn: number }> {
	const now = sql`extract(epoch from clock_timestamp())`;
	const { rows } = await sql<{ hits: number; endsIn: number }>`
		insert into rate_limits as kept (key, window_start, hits)
		values (${key}, to_timestamp(floor(${now} / ${seconds}) * ${seconds}), 1)
		on conflict (key, window_start) do update set hits = kept.hits + 1
		returning hits, (extract(epoch from window_start) + ${seconds} - ${now})::float8 as "endsIn"
	`.execute(db);
	const [row] = rows;
	if (!row) throw new Error('counting a use returned no row');
	return row;
}

export async function forgetUses(db: Db, key: string): Promise<void> {
	await db.deleteFrom('rate_limits').where('key', '=', key).execute();
}

export async function removeOldUses(db: Db): Promise<void> {
	await db
		.deleteFrom('rate_limits')
		.where('window_start', '<', sql<Date>`now() - interval '2 days'`)
		.execute();
}
