import { config } from '../config.ts';
import { database, type Db } from '../database/connection.ts';
import { fileStore, type FileStore } from '../files/index.ts';
import { createPool, type Pool } from './pool.ts';
import { openBoss, queueOf, type Queue } from './queue.ts';

/** What a service works with; each process has one, each test may bring its own. */
export interface Workshop {
	db: Db;
	files: FileStore;
	queue: Queue;
	pool: Pool;
}

let shared: Workshop | undefined;

/** This process's workshop. Nothing is opened before it is used: the build loads this file too. */
export const workshop = (): Workshop =>
	(shared ??= {
		get db() {
			return database();
		},
		get files() {
			return fileStore();
		},
		queue: lazyQueue(),
		pool: lazyPool(),
	});

function lazyQueue(): Queue {
	let opening: Promise<Queue> | undefined;
	const queue = () => {
		opening ??= openBoss(config().databaseUrl, false).then(queueOf);
		opening.catch(() => (opening = undefined));
		return opening;
	};
	return {
		send: async (trx, name, data) => (await queue()).send(trx, name, data),
		stop: async () => (await opening)?.stop(),
	};
}

function lazyPool(): Pool {
	let pool: Pool | undefined;
	return {
		run: (name, input, options) => (pool ??= createPool()).run(name, input, options),
		close: async () => pool?.close(),
	};
}

/** Ends what was opened. */
export async function closeWorkshop(): Promise<void> {
	await Promise.allSettled([shared?.queue.stop(), shared?.pool.close()]);
	shared = undefined;
}
