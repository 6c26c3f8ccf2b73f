import { availableParallelism } from 'node:os';
import type PgBoss from 'pg-boss';
import { config } from '../config.ts';
import { database } from '../database/connection.ts';
import { fileStore } from '../files/index.ts';
import { log } from '../log.ts';
import { runExport, wakeSilentExports } from './export.job.ts';
import { runIntake, wakeSilentIntakes } from './intake.job.ts';
import { createPool } from './pool.ts';
import { jobNames, openBoss, queueOf, type JobData, type JobName } from './queue.ts';
import { runRebalance, wakeSilentRebalances } from './rebalance.job.ts';
import { runSearch, wakeSilentSearches } from './search.job.ts';
import { runRecut, wakeSilentRecuts } from './recut.job.ts';
import type { Workshop } from './workshop.ts';

type Handler<N extends JobName> = (
	shop: Workshop,
	data: JobData[N],
	shutdown: AbortSignal,
) => Promise<void>;

/** Who does each job; every name has one. */
export const handlers: { [N in JobName]: Handler<N> } = {
	export: (shop, { exportId }, shutdown) => runExport(shop, exportId, shutdown),
	intake: (shop, { intakeId }, shutdown) => runIntake(shop, intakeId, shutdown),
	rebalance: (shop, { proposalId }, shutdown) => runRebalance(shop, proposalId, shutdown),
	recut: (shop, { recutId }, shutdown) => runRecut(shop, recutId, shutdown),
	search: (shop, { searchId }, shutdown) => runSearch(shop, searchId, shutdown),
};

const wakeMilliseconds = 5_000;

/**
 * Starts taking every kind of job.
 * @returns stops taking them, once those at work are finished or handed back
 */
export async function startJobs(): Promise<() => Promise<void>> {
	const boss = await openBoss(config().databaseUrl, true);
	const queue = queueOf(boss);
	const pool = createPool({ threads: availableParallelism(), warm: 1 });
	const checks = createPool({ threads: loopsFor('search') });
	const shop: Workshop = { db: database(), files: fileStore(), queue, pool, checks };
	const shutdown = new AbortController();
	const atWork = new Set<Promise<void>>();
	const take = <N extends JobName>(name: N) =>
		takeJobs(boss, name, (data) => {
			const work = handlers[name](shop, data, shutdown.signal);
			atWork.add(work);
			return work.finally(() => atWork.delete(work));
		});
	for (const name of jobNames) await take(name);
	await shop.files.tidy();
	const timer = setInterval(() => void wake(shop), wakeMilliseconds);
	return async () => {
		clearInterval(timer);
		shutdown.abort();
		await Promise.allSettled(atWork);
		await boss.stop({ graceful: false });
		await Promise.all([pool.close(), checks.close()]);
	};
}

/** Searches may take hours, so they leave cores to what people wait for, as far as there are any. */
const loopsFor = (name: JobName): number =>
	name === 'search' ? Math.max(1, Math.floor(availableParallelism() / 2)) : availableParallelism();

/** One loop a core: each takes a job, finishes it, and looks for the next. */
async function takeJobs<N extends JobName>(
	boss: PgBoss,
	name: N,
	work: (data: JobData[N]) => Promise<void>,
): Promise<void> {
	const options = { pollingIntervalSeconds: 0.5, batchSize: 1 };
	for (let loop = 0; loop < loopsFor(name); loop++) {
		await boss.work<JobData[N]>(name, options, async ([job]) => work(job.data));
	}
}

const wake = (shop: Workshop) =>
	Promise.all([
		...[wakeSilentIntakes(shop), wakeSilentRebalances(shop)],
		...[wakeSilentRecuts(shop), wakeSilentSearches(shop), wakeSilentExports(shop)],
	]).catch((error: unknown) =>
		log.warn({ error: String(error) }, 'could not look for work left lying'),
	);
