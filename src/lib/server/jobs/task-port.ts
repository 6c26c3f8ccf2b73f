import type { MessagePort } from 'node:worker_threads';
import type { Progress } from './tasks.ts';

/** What every task in a thread is handed. */
export interface Task<Input> {
	input: Input;
	/** where to say how far it is; absent when nobody asked */
	port?: MessagePort;
}

/** Says how far a task is; told at most ten times a second, and always when the step changes. */
export function teller(port: MessagePort | undefined): (step: string, share: number) => void {
	let last = '';
	let told = -Infinity;
	return (step, share) => {
		const now = performance.now();
		if (!port || (step === last && now - told < 100)) return;
		[last, told] = [step, now];
		port.postMessage({ step, share } satisfies Progress);
	};
}
