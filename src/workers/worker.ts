import { randomUUID } from 'node:crypto';
import { disconnect } from '../lib/server/database/connection.ts';
import { startJobs } from '../lib/server/jobs/index.ts';
import { log } from '../lib/server/log.ts';
import { startHeartbeat } from '../lib/server/services/health.service.ts';
import { startHousekeeping } from '../lib/server/services/housekeeping.service.ts';

/**
 * The worker process: takes jobs until it is told to end, then finishes or hands back what it holds. It
 * listens before it takes the first job, so that whenever it is told, nothing is left lying.
 */
async function main(): Promise<void> {
	const id = randomUUID();
	const started = start(id);
	const end = async (signal: string) => {
		log.info({ worker: id, signal }, 'the worker ends');
		const stop = await started;
		await stop();
		process.exit(0);
	};
	process.once('SIGTERM', (signal) => void end(signal));
	process.once('SIGINT', (signal) => void end(signal));
	await started;
}

/** @returns ends everything in order */
async function start(id: string): Promise<() => Promise<void>> {
	const stopJobs = await startJobs();
	const stopHeartbeat = await startHeartbeat(id);
	const stopHousekeeping = startHousekeeping();
	log.info({ worker: id }, 'the worker takes jobs');
	return async () => {
		stopHousekeeping();
		await stopJobs();
		await stopHeartbeat();
		await disconnect();
	};
}

main().catch((error: unknown) => {
	log.fatal({ error: error instanceof Error ? error.stack : String(error) }, 'the worker failed');
	process.exit(1);
});
