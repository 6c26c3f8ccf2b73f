import type { Box, Frame, SideDrawing } from '$lib/components/boundaries/side-drawing';

/** Keys of regions on either side of a change. */
export interface TwoSides {
	before: readonly string[];
	after: readonly string[];
}

/** What is to be seen: the whole, or what is looked at, and how near. */
export interface Sight {
	focus: TwoSides | null;
	/** the middle of a closer look; that of the regions where it is null */
	at: [number, number] | null;
	/** regions that change */
	marked: TwoSides;
	/** each halves the frame twice */
	steps: number;
}

export type DrawRequest =
	{ ask: 'load'; before: string; after: string } | ({ ask: 'draw' } & Sight);

export interface LoadedSides {
	before: { keys: string[]; names: string[] };
	after: { keys: string[]; names: string[] };
}

export interface DrawnSides {
	frame: Frame;
	before: SideDrawing;
	after: SideDrawing;
	place: { x: number; y: number } | null;
}

export type DrawReply =
	| { told: 'loaded'; sides: LoadedSides; box: Box }
	| { told: 'drawn'; drawn: DrawnSides }
	| { told: 'failed'; message: string };

/** Two versions of the boundaries, drawn by a worker; the last request made is the one that counts. */
export class RecutDrawer {
	#worker: Worker;

	constructor(
		makeWorker: () => Worker,
		addresses: { before: string; after: string },
		told: (reply: DrawReply) => void,
	) {
		this.#worker = makeWorker();
		this.#worker.onmessage = ({ data }: MessageEvent<DrawReply>) => told(data);
		this.#worker.onerror = ({ message }) => told({ told: 'failed', message });
		this.#post({ ask: 'load', ...addresses });
	}

	draw(sight: Sight) {
		this.#post({ ask: 'draw', ...sight });
	}

	stop() {
		this.#worker.terminate();
	}

	#post(request: DrawRequest) {
		this.#worker.postMessage(request);
	}
}
