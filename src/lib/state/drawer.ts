import type { Area, Drawing, Ground, SheetInput } from '$lib/engines/sheet';
import type { PackedFills } from './packed-fills';
import type { BorderArcs } from './sheet-places';

export interface DrawRequest {
	id: number;
	/** address of the bytes of the coverage, or of one of its levels */
	geometry: string;
	/** whether a canvas will show it: then there is no SVG, and the fills' rings travel as one ground */
	onCanvas: boolean;
	input: Omit<SheetInput, 'coverage'>;
	/** degrees, interleaved: places to be found on the sheet */
	places: Float64Array;
}
export interface Drawn {
	id: number;
	/** for a canvas without its fills */
	drawing: Drawing;
	fills: PackedFills | null;
	/** '' for a canvas */
	svg: string;
	ground: Ground | null;
	/** hundredths of a millimetre to a metre at the middle of the sheet */
	unitsPerMetre: number;
	anchors: Float64Array;
	/** how large each region shows, mm; for a canvas it is measured once the sheet stands */
	sizesMm: Float64Array | null;
	/** for a canvas they follow */
	borderArcs: BorderArcs | null;
	places: Float64Array;
}
/** Follows a drawing on a canvas: what the first tiles need not wait for. */
export interface Sized {
	id: number;
	sizesMm: Float64Array;
	borderArcs: BorderArcs;
}
/** Has the worker fetch and unpack a geometry before a drawing of it is asked for. */
export interface WarmRequest {
	/** address of its bytes */
	warm: string;
}
export interface RefineRequest {
	id: number;
	/** address of the finer level */
	finer: string;
	area: Area;
}
export interface Refined {
	id: number;
	area: Area;
	finer: string;
	refined: Ground;
}
export type DrawReply = Drawn | Sized | Refined | { id: number; failed: string };

type Request = DrawRequest | RefineRequest;

/** Asks for drawings in a worker; what was asked last is what counts, a drawing before finer lines. */
export class Drawer {
	#worker: Worker | null = null;
	#id = 0;
	#busy = false;
	#draw: DrawRequest | null = null;
	#refine: RefineRequest | null = null;

	constructor(
		private makeWorker: () => Worker,
		private answered: (reply: DrawReply) => void,
	) {}

	ask(request: Omit<DrawRequest, 'id'>) {
		this.#draw = { ...request, id: ++this.#id };
		this.#refine = null;
		this.#next();
	}

	/** Finer lines for the drawing that was asked for last. */
	refine(request: Omit<RefineRequest, 'id'>) {
		this.#refine = { ...request, id: this.#id };
		this.#next();
	}

	stop() {
		this.#worker?.terminate();
		this.#worker = null;
		this.#busy = false;
		this.#draw = this.#refine = null;
	}

	#next() {
		const request: Request | null = this.#draw ?? this.#refine;
		if (this.#busy || !request) return;
		if (request === this.#draw) this.#draw = null;
		else this.#refine = null;
		this.#send(request);
	}

	#send(request: Request) {
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
		if ('sizesMm' in reply && !('drawing' in reply)) return this.answered(reply);
		this.#busy = false;
		this.#next();
		if (reply.id === this.#id || 'drawing' in reply) this.answered(reply);
	}
}
