import { existsSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import path from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { Progress, TaskInput, TaskName, TaskOutput } from './tasks.ts';

/** Threads for whatever would hold up a process that also answers people. */
export interface Pool {
	/**
	 * Runs one task in a thread. Rejects with `PoolBusy` when too many wait already, with an AbortError when
	 * `signal` fires (the thread is ended), and with whatever the task throws.
	 */
	run<N extends TaskName>(
		name: N,
		input: TaskInput<N>,
		options?: RunOptions,
	): Promise<TaskOutput<N>>;
	/** has threads ready before they are needed, as many as `PoolOptions.warm` says */
	warm(): void;
	close(): Promise<void>;
}

export interface RunOptions {
	signal?: AbortSignal;
	progress?: (progress: Progress) => void;
}

export class PoolBusy extends Error {
	constructor() {
		super('too many computations are waiting; try again in a moment');
	}
}

/** Whether a task was stopped by its signal: whoever asked went away, or it took too long. */
export const wasStopped = (problem: unknown): boolean =>
	problem instanceof Error && problem.name === 'AbortError';

export interface PoolOptions {
	threads?: number;
	/** threads that are kept ready */
	warm?: number;
	/** tasks that may wait for a thread */
	queue?: number;
	/** heap of a thread; typed arrays lie outside it */
	heapMb?: number;
}

export function createPool(options: PoolOptions = {}): Pool {
	const piscina = new Piscina({
		filename: entry(),
		minThreads: options.warm ?? 0,
		maxThreads: options.threads ?? Math.max(1, availableParallelism() - 1),
		maxQueue: options.queue ?? 200,
		idleTimeout: 60_000,
		resourceLimits: { maxOldGenerationSizeMb: options.heapMb ?? 2_048 },
	});
	return {
		run: (name, input, how) => run(piscina, name, input, how),
		// the threads that are kept ready start with the pool
		warm: () => undefined,
		close: () => piscina.destroy(),
	};
}

/** The bundled thread where the product was built, else the source itself. */
function entry(): string {
	const built = path.resolve('build/workers/engine.thread.js');
	const bundled = process.env.NODE_ENV === 'production' && existsSync(built);
	return bundled ? built : path.resolve('src/workers/from-source.mjs');
}

async function run<N extends TaskName>(
	piscina: Piscina,
	name: N,
	input: TaskInput<N>,
	{ signal, progress }: RunOptions = {},
): Promise<TaskOutput<N>> {
	if (piscina.needsDrain && piscina.queueSize >= piscina.options.maxQueue) throw new PoolBusy();
	if (!progress) return piscina.run({ name, input }, { signal });
	const { port1, port2 } = new MessageChannel();
	port1.on('message', progress);
	try {
		return await piscina.run({ name, input, port: port2 }, { signal, transferList: [port2] });
	} finally {
		port1.close();
	}
}
