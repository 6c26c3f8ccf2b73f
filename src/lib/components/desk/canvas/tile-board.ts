import { meets, type Area, type Colours, type Ground } from '$lib/engines/sheet';
import type { Drawing, Outline } from '$lib/engines/sheet';
import { areaOf, placeOf, spotsInSight, type Paper, type Sight, type Spot } from './tile-grid';
import type { TileOrder, TileReply } from './tile-messages';

interface Tile {
	spot: Spot;
	bitmap: ImageBitmap;
	stale: boolean;
}

type Drawn = Pick<Drawing, 'lines' | 'shapes'>;

/** Milliseconds without a change of size before tiles of the new size are asked for. */
const settling = 120;
/** Pixels around the frame that are painted ahead. */
const ahead = 256;
/** Tiles kept at once, of a megabyte each. */
const mostTiles = 80;

export interface BoardHost {
	/** tiles came or went: the canvas has to be laid out anew */
	onchange: () => void;
	/** whether all that is in sight is as it should be */
	onsettled: (settled: boolean) => void;
	onfailure: (message: string) => void;
}

/**
 * Tiles of a large sheet, painted in a worker. While new ones are on the way, those of another size or
 * with older colours stand in for them, so that moving and zooming never wait.
 */
export class TileBoard {
	#worker: Worker;
	#tiles = new Map<string, Tile>();
	#sight: Sight | null = null;
	/** the size that tiles are painted at now, and the fitted size, which is always kept */
	#scale = 0;
	#fitted = 0;
	#version = 0;
	#timer: ReturnType<typeof setTimeout> | undefined;

	constructor(
		makeWorker: () => Worker,
		private paper: Paper,
		private host: BoardHost,
	) {
		this.#worker = makeWorker();
		this.#worker.onmessage = ({ data }: MessageEvent<TileReply>) => this.#take(data);
		this.#worker.onerror = ({ message }) => host.onfailure(message);
	}

	stop() {
		clearTimeout(this.#timer);
		this.#worker.terminate();
		for (const { bitmap } of this.#tiles.values()) bitmap.close();
		this.#tiles.clear();
	}

	/** Other lines, of which only those within `area` differ where it is given. */
	ground(ground: Ground, { lines, shapes }: Drawn, area: Area | null) {
		this.#tell({ kind: 'ground', ground, lines, shapes, version: ++this.#version });
		this.#age((spot) => area === null || overlap(areaOf(spot), area));
	}

	/** Other colours; only tiles that show one of the regions given are painted anew, or all. */
	look(
		colours: Colours,
		outline: Outline | null,
		changed: { regions: number[]; ground: Ground } | null,
	) {
		this.#tell({ kind: 'look', colours, outline, version: ++this.#version });
		this.#age((spot) => {
			if (!changed) return true;
			const area = areaOf(spot);
			return changed.regions.some((region) => meets(changed.ground.regionBoxes, region, area));
		});
	}

	/** The sheet was moved, or shown larger or smaller. `fitted`: pixels a unit when the whole sheet is seen. */
	see(sight: Sight, fitted: number) {
		this.#sight = sight;
		this.#fitted = fitted;
		clearTimeout(this.#timer);
		if (this.#scale === 0) this.#scale = sight.scale;
		if (sight.scale === this.#scale) this.#want();
		else this.#timer = setTimeout(() => this.#settleAt(sight.scale), settling);
	}

	/** Lays the tiles that are there on a canvas: those that only stand in first. */
	layOut(pen: CanvasRenderingContext2D) {
		const sight = this.#sight;
		if (!sight) return;
		const order = ({ spot }: Tile) =>
			spot.scale === this.#scale ? Infinity : spot.scale === this.#fitted ? 0 : spot.scale;
		const here = [...this.#tiles.values()].sort((a, b) => order(a) - order(b));
		const covered = this.#missing().length === 0 && sight.scale === this.#scale;
		for (const tile of here) {
			if (covered && tile.spot.scale !== this.#scale) continue;
			const { left, top, width, height } = placeOf(tile.spot, sight);
			if (left > sight.width || top > sight.height || left + width < 0 || top + height < 0)
				continue;
			pen.drawImage(tile.bitmap, left, top, width, height);
		}
	}

	/** Whether every tile in sight shows the present colours. */
	get settled(): boolean {
		const sight = this.#sight;
		return sight !== null && sight.scale === this.#scale && this.#unsettled(sight).length === 0;
	}

	#tell(order: TileOrder) {
		this.#worker.postMessage(order);
	}

	#age(which: (spot: Spot) => boolean) {
		for (const tile of this.#tiles.values()) if (which(tile.spot)) tile.stale = true;
		if (this.#sight) this.#want();
	}

	#settleAt(scale: number) {
		this.#scale = scale;
		this.#want();
	}

	#missing(): Spot[] {
		const sight = this.#sight;
		if (!sight) return [];
		return spotsInSight(sight, this.#scale, this.paper).filter(({ key }) => !this.#tiles.has(key));
	}

	#unsettled(sight: Sight): Spot[] {
		return spotsInSight(sight, this.#scale, this.paper).filter((spot) => this.#isStale(spot));
	}

	#isStale = ({ key }: Spot) => this.#tiles.get(key)?.stale ?? true;

	/** Asks for what is in sight, then what lies around it, then the whole sheet at its fitted size. */
	#want() {
		const sight = this.#sight;
		if (!sight) return;
		const near = [
			...spotsInSight(sight, this.#scale, this.paper),
			...spotsInSight(sight, this.#scale, this.paper, ahead),
		];
		const whole = spotsInSight(
			{ x: 0, y: 0, scale: this.#fitted, width: 1e6, height: 1e6 },
			this.#fitted,
			this.paper,
		);
		const spots = new Map([...near, ...whole].map((spot) => [spot.key, spot]));
		this.#forget(spots);
		this.#tell({ kind: 'want', spots: [...spots.values()].filter(this.#isStale) });
		this.host.onsettled(this.settled);
		this.host.onchange();
	}

	/** Lets go of tiles of the present size that lie far off, and of other sizes once all in sight is there. */
	#forget(needed: Map<string, Spot>) {
		const over = this.#tiles.size > mostTiles;
		const done = this.settled;
		for (const [key, { spot, bitmap, stale }] of this.#tiles) {
			const other = spot.scale !== this.#scale && spot.scale !== this.#fitted;
			if (needed.has(key) || !(over || (done && (stale || other)))) continue;
			bitmap.close();
			this.#tiles.delete(key);
		}
	}

	#take(reply: TileReply) {
		if ('failed' in reply) return this.host.onfailure(reply.failed);
		const { spot, version, bitmap } = reply;
		const before = this.#tiles.get(spot.key);
		before?.bitmap.close();
		const stale = version !== this.#version && (before?.stale ?? true);
		this.#tiles.set(spot.key, { spot, bitmap, stale });
		if (stale) this.#want();
		this.host.onsettled(this.settled);
		this.host.onchange();
	}
}

const overlap = (a: Area, b: Area) =>
	a.left <= b.right && b.left <= a.right && a.top <= b.bottom && b.top <= a.bottom;
