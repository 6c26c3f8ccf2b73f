import { database } from '../database/connection.ts';
import { log } from '../log.ts';
import { beat, liveWorkers, removeHeartbeat } from '../repositories/heartbeats.repository.ts';

const BEAT_SECONDS = 3;
/** Several beats may be missed on a busy machine before the worker counts as gone. */
const GONE_AFTER_SECONDS = 20;

export interface Health {
	status: 'ok' | 'failing';
	database: 'ok' | 'unreachable';
	worker: 'ok' | 'missing' | 'unknown';
}

export async function health(): Promise<Health> {
	try {
		const workers = await liveWorkers(database(), GONE_AFTER_SECONDS);
		return workers > 0
			? { status: 'ok', database: 'ok', worker: 'ok' }
			: { status: 'failing', database: 'ok', worker: 'missing' };
	} catch (error) {
		log.warn({ error: String(error) }, 'health: the database does not answer');
		return { status: 'failing', database: 'unreachable', worker: 'unknown' };
	}
}

/**
 * Keeps saying that this worker is alive; a database that is away for a while is only noted.
 * @returns ends the beat and takes the worker off the list
 */
export async function startHeartbeat(id: string): Promise<() => Promise<void>> {
	await beat(database(), id);
	const timer = setInterval(() => {
		beat(database(), id).catch((error: unknown) =>
			log.warn({ error: String(error) }, 'the heartbeat could not be written'),
		);
	}, BEAT_SECONDS * 1000);
	return async () => {
		clearInterval(timer);
		await removeHeartbeat(database(), id);
	};
}
