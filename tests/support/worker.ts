import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as pause } from 'node:timers/promises';
import type { TestWorkshop } from './workshop.ts';

/** The worker process as it runs in use, on a test's own database and folder. */
export function startWorker({ url, data }: TestWorkshop): ChildProcess {
	return spawn(process.execPath, ['--import', 'tsx', 'src/workers/worker.ts'], {
		env: {
			...process.env,
			DATABASE_URL: url,
			MERESTONE_DATA: data,
			AUTH_SECRET: 'a secret for tests only, of enough length',
			LOG_LEVEL: 'warn',
		},
		stdio: ['ignore', 'inherit', 'inherit'],
	});
}

/** Ends a worker and waits until it is gone. */
export async function endWorker(worker: ChildProcess, signal: NodeJS.Signals): Promise<void> {
	if (worker.exitCode !== null || worker.signalCode !== null) return;
	const gone = once(worker, 'exit');
	worker.kill(signal);
	await gone;
}

/** Asks again and again until the answer holds. */
export async function until<T>(
	ask: () => Promise<T>,
	holds: (answer: T) => boolean,
	seconds: number,
): Promise<T> {
	const end = Date.now() + seconds * 1000;
	for (;;) {
		const answer = await ask();
		if (holds(answer)) return answer;
		if (Date.now() > end) throw new Error(`not within ${seconds} s: ${JSON.stringify(answer)}`);
		await pause(50);
	}
}
