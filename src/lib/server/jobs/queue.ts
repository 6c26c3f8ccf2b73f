import PgBoss from 'pg-boss';
import { CompiledQuery } from 'kysely';
import type { Db } from '../database/connection.ts';
import { log } from '../log.ts';

/** The jobs there are. Each has a handler in `index.ts`. */
export const jobNames = ['export', 'intake', 'rebalance', 'recut', 'search'] as const;
export type JobName = (typeof jobNames)[number];

export interface JobData {
	export: { exportId: string };
	intake: { intakeId: string };
	rebalance: { proposalId: string };
	recut: { recutId: string };
	search: { searchId: string };
}

export interface Queue {
	/** Asks for a job as part of the caller's transaction: if that fails, nobody ever asked. */
	send<N extends JobName>(trx: Db, name: N, data: JobData[N]): Promise<void>;
	stop(): Promise<void>;
}

/**
 * Opens the queue. The processes that answer people only send; the worker also keeps house (`supervise`).
 * Job tables live in a schema of their own beside the product's.
 */
export async function openBoss(url: string, supervise: boolean): Promise<PgBoss> {
	const boss = new PgBoss({ connectionString: url, max: 2, supervise, schedule: false });
	boss.on('error', (error) => log.error({ error: error.message }, 'the queue reported a fault'));
	await boss.start();
	for (const name of jobNames) {
		await boss.createQueue(name, { name, retryLimit: 5, retryDelay: 5, expireInHours: 3 });
	}
	return boss;
}

/** What services need of it. */
export const queueOf = (boss: PgBoss): Queue => ({
	async send(trx, name, data) {
		await boss.send(name, data, { db: sqlOf(trx) });
	},
	stop: () => boss.stop({ graceful: false }),
});

/** The queue speaks in plain SQL; this lets it speak within a transaction of ours. */
const sqlOf = (trx: Db) => ({
	async executeSql(text: string, values: unknown[]) {
		const { rows } = await trx.executeQuery(CompiledQuery.raw(text, values));
		return { rows };
	},
});
