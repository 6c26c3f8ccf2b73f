import type { ColouringProblem, ColouringResult } from '$lib/engines/colouring/problem';

export interface ColourRequest {
	id: number;
	problem: ColouringProblem;
}
export type ColourReply =
	{ id: number; result: ColouringResult; milliseconds: number } | { id: number; failed: string };

/** A run that is still going when it is overtaken gets this long to end by itself. */
const patience = 250;

/**
 * Asks the colouring engine in a worker of its own. Only the newest question is of interest: one that
 * waits is replaced, one that runs too long after being overtaken is ended with its worker.
 */
export class Colourer {
	#worker: Worker | null = null;
	#id = 0;
	#running = 0;
	#waiting: ColourRequest | null = null;
	#overtaken: ReturnType<typeof setTimeout> | undefined;

	constructor(
		private makeWorker: () => Worker,
		private answered: (reply: ColourReply) => void,
	) {}

	/** Starts the worker before it is needed, so that the first answer does not wait for it. */
	warm() {
		this.#worker ??= this.#start();
	}

	ask(problem: ColouringProblem): number {
		const request = { id: ++this.#id, problem };
		if (!this.#running) this.#send(request);
		else {
			this.#waiting = request;
			this.#overtaken ??= setTimeout(() => this.#restart(), patience);
		}
		return request.id;
	}

	/** Ends what runs and what waits. */
	stop() {
		clearTimeout(this.#overtaken);
		this.#overtaken = undefined;
		this.#waiting = null;
		this.#running = 0;
		this.#worker?.terminate();
		this.#worker = null;
	}

	#restart() {
		const next = this.#waiting;
		this.stop();
		if (next) this.#send(next);
	}

	#send(request: ColourRequest) {
		this.#worker ??= this.#start();
		this.#running = request.id;
		this.#worker.postMessage(request);
	}

	#start(): Worker {
		const worker = this.makeWorker();
		worker.onmessage = ({ data }: MessageEvent<ColourReply>) => this.#settle(data);
		worker.onerror = (event) => {
			const id = this.#running;
			this.#worker?.terminate();
			this.#worker = null;
			this.#settle({ id, failed: event.message });
		};
		return worker;
	}

	#settle(reply: ColourReply) {
		clearTimeout(this.#overtaken);
		this.#overtaken = undefined;
		this.#running = 0;
		const next = this.#waiting;
		this.#waiting = null;
		if (next) this.#send(next);
		else if (reply.id === this.#id) this.answered(reply);
	}
}
