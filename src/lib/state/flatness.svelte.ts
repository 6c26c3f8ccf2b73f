import { kindCode, type BorderList } from '$lib/engines/borders/border-list';
import type { CrossedBorders } from '$lib/engines/borders/planarity';
import type { DeskSheet } from '$lib/schemas/desk';

export interface PlanarityRequest {
	id: number;
	regions: number;
	a: Uint32Array;
	b: Uint32Array;
}
export type PlanarityReply =
	{ id: number; crossed: CrossedBorders | null } | { id: number; failed: string };

/** What a sheet's counted borders are judged by. */
export interface CountedGround {
	set: DeskSheet['boundarySet'];
	/** as the file was read, gaps among them */
	borders: BorderList;
	counted: BorderList;
}

const line = kindCode('line');
const lines = ({ kind }: BorderList) => kind.reduce((sum, code) => sum + Number(code === line), 0);

/**
 * What is known without looking: borders that are lines of a planar map stay planar whichever are left
 * out, and where all lines count and nothing else, what was found when the file was read holds.
 */
export function knownPlanar({ set, borders, counted }: CountedGround): boolean | null {
	if (lines(counted) < counted.kind.length) return null;
	if (set.planar) return true;
	return lines(borders) === counted.kind.length ? false : null;
}

/** Whether the borders that count now can be drawn in a plane; looked up in a worker where it must be. */
export class Flatness {
	planar: boolean = $state()!;
	/** why not, where the worker found it */
	crossed: CrossedBorders | null = $state.raw(null);
	looking = $state(false);
	/** it ended without an answer: what it said */
	failure = $state('');

	#makeWorker: (() => Worker) | null = null;
	#worker: Worker | null = null;
	#id = 0;
	#judged: CountedGround | null = null;

	constructor(planar: boolean) {
		this.planar = planar;
	}

	/** In the browser: who looks. */
	work(makeWorker: () => Worker): () => void {
		this.#makeWorker = makeWorker;
		return () => this.#stop();
	}

	/** The same borders are not judged twice: saving signs what was decided by hand and changes no pair. */
	judge(ground: CountedGround) {
		if (this.#judged && this.failure === '' && sameGround(this.#judged, ground)) return;
		this.#judged = this.#makeWorker && ground;
		const known = knownPlanar(ground);
		this.failure = '';
		this.#stop();
		if (known !== null) {
			this.crossed = null;
			this.planar = known;
		} else this.#look(ground);
	}

	#look({ set, counted: { a, b } }: CountedGround) {
		if (!this.#makeWorker) return;
		this.looking = true;
		this.#worker = this.#makeWorker();
		this.#worker.onmessage = ({ data }: MessageEvent<PlanarityReply>) => this.#settle(data);
		this.#worker.onerror = ({ message }) => this.#settle({ id: this.#id, failed: message });
		this.#worker.postMessage({ id: ++this.#id, regions: set.regionCount, a, b });
	}

	#settle(reply: PlanarityReply) {
		if (reply.id !== this.#id) return;
		this.#stop();
		if ('failed' in reply) this.failure = reply.failed;
		else {
			this.crossed = reply.crossed;
			this.planar = reply.crossed === null;
		}
	}

	#stop() {
		this.#worker?.terminate();
		this.#worker = null;
		this.looking = false;
	}
}

const sameGround = (one: CountedGround, other: CountedGround): boolean =>
	one.set.id === other.set.id &&
	(['a', 'b', 'kind'] as const).every((column) => {
		const [left, right] = [one.counted[column], other.counted[column]];
		return left.length === right.length && left.every((value, i) => value === right[i]);
	});
