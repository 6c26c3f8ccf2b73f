import type { Drawing } from '$lib/engines/sheet/drawing';
import type { SheetInput } from '$lib/engines/sheet';
import type { BorderArcs } from './sheet-places';

export interface DrawRequest {
	id: number;
	/** address of the coverage's bytes */
	geometry: string;
	input: Omit<SheetInput, 'coverage'>;
	/** degrees, interleaved: places to be found on the sheet */
	places: Float64Array;
}
export interface Drawn {
	id: number;
	drawing: Drawing;
	svg: string;
	anchors: Float64Array;
	sizesMm: Float64Array;
	borderArcs: BorderArcs;
	places: Float64Array;
}
export type DrawReply = Drawn | { id: number; failed: string };

/** Asks for drawings in a worker; what was asked last is what counts. */
export class Drawer {
	#worker: Worker | null = null;
	#id = 0;
	#busy = false;
	#next: DrawRequest | null = null;

	constructor(
		private makeWorker: () => Worker,
		private answered: (reply: DrawReply) => void,
	) {}

	ask(request: Omit<DrawRequest, 'id'>) {
		const numbered = { ...request, id: ++this.#id };
		if (this.#busy) this.#next = numbered;
		else this.#send(numbered);
	}

	stop() {
		this.#worker?.terminate();
		this.#worker = null;
		this.#busy = false;
		this.#next = null;
	}

	#send(request: DrawRequest) {
		if (!this.#worker) {
			this.#worker = this.makeWorker();
			this.#worker.onmessage = ({ data }: MessageEvent<DrawReply>) => this.#settle(data);
			this.#worker.onerror = ({ message }) => {
				this.#worker = null;
				this.#settle({ id: this.#id, failed: message });
			};
		}
		this.#busy = true;
		this.#worker.postMessage(request);
	}

	#settle(reply: DrawReply) {
		this.#busy = false;
		const next = this.#next;
		this.#next = null;
		if (next) this.#send(next);
		if (reply.id === this.#id || !('failed' in reply)) this.answered(reply);
	}
}
