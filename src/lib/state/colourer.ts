import type { ColouringProblem, ColouringResult, Release } from '$lib/engines/colouring/problem';

export interface ColourRequest {
	id: number;
	problem: ColouringProblem;
}
export type ColourReply =
	{ id: number; result: ColouringResult; milliseconds: number } | { id: number; failed: string };
/** Before the reply, while the cheapest release of colliding locks is worked out. */
export interface ReleaseNews {
	id: number;
	soFar: Release;
}

/** A run that is still going when it is overtaken gets this long to end by itself, in milliseconds. */
const patience = 250;
/** A rehearsal gets longer: a worker started anew would take as long. */
const rehearsalPatience = 1000;
/** Number of every rehearsal; questions count from 1. */
const rehearsal = 0;

/**
 * Asks the colouring engine in a worker of its own. Only the newest question is of interest: one that
 * waits is replaced, one that runs too long after being overtaken is ended with its worker.
 */
export class Colourer {
	#worker: Worker | null = null;
	#id = 0;
	#running: ColourRequest | null = null;
	#waiting: ColourRequest | null = null;
	#rehearsals: ColouringProblem[] = [];
	#overtaken: ReturnType<typeof setTimeout> | undefined;

	constructor(
		private makeWorker: () => Worker,
		private answered: (reply: ColourReply) => void,
		private heard: (soFar: Release) => void = () => {},
	) {}

	/** Starts the worker before it is needed, so that the first answer does not wait for it. */
	warm() {
		this.#worker ??= this.#start();
	}

	/**
	 * Has problems solved whose answers nobody wants: the first runs of the engine are many times slower
	 * than the later ones. A question goes before the rehearsals that are left and does away with them.
	 */
	rehearse(problems: readonly ColouringProblem[]) {
		this.#rehearsals = [...problems];
		this.#rehearseNext();
	}

	ask(problem: ColouringProblem): number {
		const request = { id: ++this.#id, problem };
		this.#rehearsals = [];
		if (!this.#running) this.#send(request);
		else {
			this.#waiting = request;
			this.#overtake(this.#running);
		}
		return request.id;
	}

	/** No answer is wanted any more; a worker that is quick to end stays for the next question. */
	forget() {
		++this.#id;
		this.#waiting = null;
		if (this.#running && this.#running.id !== rehearsal) this.#overtake(this.#running);
	}

	/** Ends what runs and what waits. */
	stop() {
		clearTimeout(this.#overtaken);
		this.#overtaken = undefined;
		this.#waiting = null;
		this.#rehearsals = [];
		this.#running = null;
		this.#worker?.terminate();
		this.#worker = null;
	}

	#overtake({ id }: ColourRequest) {
		const wait = id === rehearsal ? rehearsalPatience : patience;
		this.#overtaken ??= setTimeout(() => this.#restart(), wait);
	}

	#restart() {
		const next = this.#waiting;
		this.stop();
		if (next) this.#send(next);
	}

	#send(request: ColourRequest) {
		this.#worker ??= this.#start();
		this.#running = request;
		this.#worker.postMessage(request);
	}

	#start(): Worker {
		const worker = this.makeWorker();
		worker.onmessage = ({ data }: MessageEvent<ColourReply | ReleaseNews>) =>
			'soFar' in data ? this.#hear(data) : this.#settle(data);
		worker.onerror = (event) => {
			const id = this.#running?.id ?? rehearsal;
			this.#worker?.terminate();
			this.#worker = null;
			this.#settle({ id, failed: event.message });
		};
		return worker;
	}

	#hear({ id, soFar }: ReleaseNews) {
		if (id !== rehearsal && id === this.#id) this.heard(soFar);
	}

	#settle(reply: ColourReply) {
		clearTimeout(this.#overtaken);
		this.#overtaken = undefined;
		this.#running = null;
		const next = this.#waiting;
		this.#waiting = null;
		if (next) this.#send(next);
		else if (reply.id !== rehearsal && reply.id === this.#id) this.answered(reply);
		this.#rehearseNext();
	}

	#rehearseNext() {
		const problem = this.#running ? undefined : this.#rehearsals.shift();
		if (problem) this.#send({ id: rehearsal, problem });
	}
}
