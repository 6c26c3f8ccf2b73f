import type { MendRequest, MendResult } from '$lib/engines/palettes';

export interface MendQuestion {
	mend: MendRequest;
}
export type MendReply = { result: MendResult } | { failed: string };

/**
 * Has a mend of the palette looked for in a worker of its own, so that neither the page nor a lock set
 * meanwhile waits for it. Holds the one proposal there is.
 */
export class Mending {
	proposal: MendResult | null = $state.raw(null);
	working = $state(false);
	/** the search ended without an answer: what it said */
	failure = $state('');
	readonly #makeWorker: () => Worker;
	#worker: Worker | null = null;

	constructor(makeWorker: () => Worker) {
		this.#makeWorker = makeWorker;
	}

	ask(request: MendRequest) {
		this.drop();
		this.working = true;
		const worker = (this.#worker = this.#makeWorker());
		worker.onmessage = ({ data }: MessageEvent<MendReply>) => this.#settle(data);
		worker.onerror = ({ message }) => this.#settle({ failed: message });
		worker.postMessage({ mend: request } satisfies MendQuestion);
	}

	/** Ends a search that is going on and forgets what was proposed. */
	drop() {
		this.#end();
		this.proposal = null;
		this.failure = '';
	}

	#settle(reply: MendReply) {
		this.#end();
		if ('failed' in reply) this.failure = reply.failed;
		else this.proposal = reply.result;
	}

	#end() {
		this.#worker?.terminate();
		this.#worker = null;
		this.working = false;
	}
}
