import { randomUUID } from 'node:crypto';
import { disconnect } from '../lib/server/database/connection.ts';
import { startJobs } from '../lib/server/jobs/index.ts';
import { log } from '../lib/server/log.ts';
import { startHeartbeat } from '../lib/server/services/health.service.ts';
import { startHousekeeping } from '../lib/server/services/housekeeping.service.ts';

/** The worker process: takes jobs until it is told to end, then finishes or hands back what it holds. */
async function main(): Promise<void> {
	const id = randomUUID();
	const stopJobs = await startJobs();
	const stopHeartbeat = await startHeartbeat(id);
	const stopHousekeeping = startHousekeeping();
	log.info({ worker: id }, 'the worker takes jobs');
	const end = async (signal: string) => {
		log.info({ worker: id, signal }, 'the worker ends');
		stopHousekeeping();
		await stopJobs();
		await stopHeartbeat();
		await disconnect();
		process.exit(0);
	};
	process.once('SIGTERM', (signal) => void end(signal));
	process.once('SIGINT', (signal) => void end(signal));
}

main().catch((error: unknown) => {
	log.fatal({ error: error instanceof Error ? error.stack : String(error) }, 'the worker failed');
	process.exit(1);
});
