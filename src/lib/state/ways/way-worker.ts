import type { ColouringProblem, ColouringResult, Release } from '$lib/engines/colouring/problem';

export type WayQuestion = { way: ColouringProblem } | { release: ColouringProblem };

/** One of these; `soFar` is followed by another. */
export interface WayReply {
	result?: ColouringResult;
	soFar?: Release;
	release?: Release | null;
	failed?: string;
}

/** A worker that is asked one thing after the other and answers each with a promise. */
export class WayWorker {
	#worker: Worker | null = null;

	constructor(private makeWorker: () => Worker) {}

	/** The last reply to a question; never settles once the worker is stopped. */
	ask(question: WayQuestion, onpart?: (soFar: Release) => void): Promise<WayReply> {
		const worker = (this.#worker ??= this.makeWorker());
		return new Promise((settle) => {
			worker.onmessage = ({ data }: MessageEvent<WayReply>) =>
				data.soFar ? onpart?.(data.soFar) : settle(data);
			worker.onerror = ({ message }) => {
				this.stop();
				settle({ failed: message });
			};
			worker.postMessage(question);
		});
	}

	/** Ends what it is doing. */
	stop() {
		this.#worker?.terminate();
		this.#worker = null;
	}
}
