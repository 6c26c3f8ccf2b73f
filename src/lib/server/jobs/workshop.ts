import { availableParallelism } from 'node:os';
import { config } from '../config.ts';
import { database, type Db } from '../database/connection.ts';
import { fileStore, type FileStore } from '../files/index.ts';
import { createPool, type Pool, type PoolOptions } from './pool.ts';
import { openBoss, queueOf, type Queue } from './queue.ts';

/** What a service works with; each process has one, each test may bring its own. */
export interface Workshop {
	db: Db;
	files: FileStore;
	queue: Queue;
	/** for what somebody at a desk waits for */
	pool: Pool;
	/** for checks that programs ask for: however long they take, nobody at a desk waits behind them */
	checks: Pool;
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
		pool: lazyPool({ warm: 1 }),
		checks: lazyPool({ threads: Math.max(1, Math.floor(availableParallelism() / 2)) }),
	});

/** Starts what the first one at a desk would otherwise wait for. */
export const warmUp = (): void => void workshop().pool.warm();

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

function lazyPool(options: PoolOptions): Pool {
	let opened: Pool | undefined;
	const pool = () => (opened ??= createPool(options));
	return {
		run: (name, input, how) => pool().run(name, input, how),
		warm: () => void pool(),
		close: async () => opened?.close(),
	};
}

/** Ends what was opened. */
export async function closeWorkshop(): Promise<void> {
	await Promise.allSettled([shared?.queue.stop(), shared?.pool.close(), shared?.checks.close()]);
	shared = undefined;
}
