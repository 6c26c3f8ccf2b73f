import type { ProofChecked } from '$lib/engines/colouring/proofs/check';

export interface ProofRequest {
	/** a file, or the text of one */
	source: File | string;
}
export type ProofReply = { checked: ProofChecked; milliseconds: number } | { failed: string };

/** Files above this are not even read: the checker would refuse their text. */
export const mostBytes = 64 * 2 ** 20;

/** One proof file at a time, checked in a worker that can be stopped. */
export class ProofChecking {
	working = $state(false);
	/** what was checked, for the line above the answer */
	name = $state('');
	answer: ProofChecked | null = $state.raw(null);
	milliseconds = $state(0);
	failure = $state('');

	#worker: Worker | null = null;

	constructor(private makeWorker: () => Worker) {}

	/** Fetches the checker before it is needed, so that the page works when the connection is gone. */
	prepare() {
		this.#worker ??= this.makeWorker();
	}

	check(source: File | string, name: string) {
		this.stop();
		this.name = name;
		const size = typeof source === 'string' ? source.length : source.size;
		if (size > mostBytes) {
			this.failure = 'The file is longer than 64 MB and was not read.';
			return;
		}
		this.working = true;
		this.prepare();
		const worker = this.#worker as Worker;
		worker.onmessage = ({ data }: MessageEvent<ProofReply>) => this.#settle(data);
		worker.onerror = ({ message }) => this.#settle({ failed: message || 'it ended early' });
		worker.postMessage({ source } satisfies ProofRequest);
	}

	/** Ends what is running and forgets the last answer. */
	stop() {
		if (this.working) this.drop();
		this.answer = null;
		this.failure = '';
	}

	drop() {
		this.#worker?.terminate();
		this.#worker = null;
		this.working = false;
	}

	#settle(reply: ProofReply) {
		this.working = false;
		if ('failed' in reply) {
			this.drop();
			this.failure = `The check could not be finished (${reply.failed}).`;
			return;
		}
		this.answer = reply.checked;
		this.milliseconds = reply.milliseconds;
	}
}
