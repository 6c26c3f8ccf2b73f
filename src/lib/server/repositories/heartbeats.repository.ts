import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

/** Notes that this worker is alive, and forgets those not seen for a day. */
export async function beat(db: Db, id: string): Promise<void> {
	await db
		.insertInto('worker_heartbeats')
		.values({ id })
		.onConflict((oc) => oc.column('id').doUpdateSet({ seen_at: sql`now()` }))
		.execute();
	await db
		.deleteFrom('worker_heartbeats')
		.where('seen_at', '<', sql<Date>`now() - interval '1 day'`)
		.execute();
}

export async function removeHeartbeat(db: Db, id: string): Promise<void> {
	await db.deleteFrom('worker_heartbeats').where('id', '=', id).execute();
}

/** How many workers were seen within the last so many seconds. */
export async function liveWorkers(db: Db, seconds: number): Promise<number> {
	const { count } = await db
		.selectFrom('worker_heartbeats')
		.select((eb) => eb.fn.countAll<number>().as('count'))
		.where('seen_at', '>', sql<Date>`now() - make_interval(secs => ${seconds})`)
		.executeTakeFirstOrThrow();
	return count;
}
