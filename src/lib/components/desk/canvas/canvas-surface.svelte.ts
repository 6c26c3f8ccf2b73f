import {
	boxOfRegion,
	regionAt,
	regionPath,
	shapeLayersTop,
	traceRegion,
	type Area,
	type Ground,
} from '$lib/engines/sheet';
import type { Drawing, RegionFill } from '$lib/engines/sheet/drawing';
import type { FinerGround } from '$lib/state/desk-drawing';
import { layFirst, type ShownFirst } from '$lib/state/first-picture';
import type { DrawnSheet } from '$lib/state/drawn-sheet';
import { arcsPath } from '$lib/state/sheet-places';
import { letteringOf, parseSvg, setLettering } from '../lettering';
import type { Place, Surface } from '../surface';
import { hatchingOf, sameOnTiles } from './hatching';
import { Look } from './look';
import { TileBoard } from './tile-board';
import { areaInSight, type Paper, type Sight } from './tile-grid';

/** Pixels of the screen, whatever the size of the sheet. */
const outlineWidth = 2.6;

export interface CanvasHost {
	/** holds the canvas, as large as the frame */
	canvas: HTMLElement;
	/** holds names, legend and collar, as large as the paper */
	lettering: HTMLElement;
	makeWorker: () => Worker;
	/** asks for finer lines for what is in sight, at so many pixels a unit */
	refine: (area: Area, pixelsPerUnit: number) => void;
	onfailure: (message: string) => void;
	/** shown under the tiles until all in sight are there for the first time */
	first: ShownFirst | null;
	/** they are there */
	onfirst: () => void;
}

/**
 * A large sheet on a canvas: fills and lines as tiles from a worker, lettering as SVG above them. A press
 * finds its region by the geometry itself, so the answer is exact to a hundredth of a millimetre.
 */
export class CanvasSurface implements Surface {
	readonly viewBox: string;
	readonly canvas = document.createElement('canvas');
	#ground: Ground = $state.raw()!;
	#drawn: DrawnSheet & { ground: Ground };
	#host: CanvasHost;
	#pen: CanvasRenderingContext2D;
	#paper: Paper;
	#board: TileBoard;
	#look: Look;
	#letters: SVGSVGElement;
	#lettering: string;
	#words: (region: number) => string = () => '';
	#sight: Sight | null = null;
	#frame = 0;
	/** what the tiles show beside fills: a reader's eyesight changes coloured lines */
	#laid: Drawing;
	#first: ShownFirst | null;

	constructor(host: CanvasHost, drawn: DrawnSheet & { ground: Ground }) {
		const { drawing } = drawn;
		this.#host = host;
		this.#drawn = drawn;
		this.#ground = drawn.ground;
		this.#laid = drawing;
		this.#first = host.first;
		this.#paper = { width: drawing.widthMm * 100, height: drawing.heightMm * 100 };
		this.viewBox = `0 0 ${Math.round(this.#paper.width)} ${Math.round(this.#paper.height)}`;
		this.#look = new Look(drawing);
		this.#board = new TileBoard(host.makeWorker, this.#paper, {
			onchange: () => this.#schedule(),
			onsettled: (settled) => this.#settled(settled),
			onfailure: host.onfailure,
		});
		this.#board.ground(drawn.ground, drawing, null);
		const pen = this.canvas.getContext('2d');
		if (!pen) throw new Error('this browser gives no canvas to paint on');
		this.#pen = pen;
		describe(this.canvas, drawing);
		host.canvas.replaceChildren(this.canvas);
		this.#lettering = letteringOf(drawing, shapeLayersTop);
		this.#letters = lettersIn(host.lettering, this.#lettering);
	}

	stop() {
		cancelAnimationFrame(this.#frame);
		this.#board.stop();
		this.canvas.remove();
		this.#letters.remove();
	}

	/** The paper lies at x, y in the frame and is `shown` pixels wide, `fitted` when all of it is seen. */
	see(at: { x: number; y: number; shown: number; fitted: number; width: number; height: number }) {
		const dense = devicePixelRatio || 1;
		const scale = (at.shown * dense) / this.#paper.width;
		const [width, height] = [Math.round(at.width * dense), Math.round(at.height * dense)];
		if (this.canvas.width !== width || this.canvas.height !== height)
			Object.assign(this.canvas, { width, height });
		this.#sight = { x: at.x * dense, y: at.y * dense, scale, width, height };
		this.#board.see(this.#sight, (at.fitted * dense) / this.#paper.width);
	}

	/** Lays in finer lines, or takes them out again. */
	lay(finer: FinerGround | null) {
		const ground = finer?.ground ?? this.#drawn.ground;
		if (ground === this.#ground) return;
		this.#ground = ground;
		this.#board.ground(ground, this.#laid, finer?.area ?? null);
	}

	#lay(drawing: Drawing) {
		const before = this.#laid;
		this.#laid = drawing;
		if (drawing.lines !== before.lines || !sameOnTiles(drawing, before))
			this.#board.ground(this.#ground, drawing, null);
	}

	regionAt(_target: EventTarget | null, [x, y]: Place): number {
		const sight = this.#sight;
		if (!sight) return -1;
		const dense = devicePixelRatio || 1;
		const along = (offset: number, at: number) => (at * dense - offset) / sight.scale;
		return regionAt(this.#ground, along(sight.x, x), along(sight.y, y));
	}

	/** Under a resting pointer: what stands there, as the titles in an SVG say it. */
	hover(at: Place) {
		const region = this.regionAt(null, at);
		const words = region < 0 ? '' : this.#words(region);
		if (this.canvas.title !== words) this.canvas.title = words;
		this.canvas.classList.toggle('pressable', region >= 0);
	}

	pathOf(region: number): string {
		return regionPath(this.#ground, region);
	}

	borderPath(border: number): string {
		return arcsPath(this.#ground, this.#drawn.borderArcs(border));
	}

	boxOf(region: number): Area | null {
		const box = boxOfRegion(this.#ground, region);
		const { width, height } = this.#paper;
		return (
			box && {
				left: box.left / width,
				top: box.top / height,
				right: box.right / width,
				bottom: box.bottom / height,
			}
		);
	}

	paint(drawing: Drawing, words: (fill: RegionFill) => string) {
		this.#words = (region) => words(drawing.fills[region]);
		for (const { region, hex } of drawing.fills) this.#look.tint(region, hex);
		this.#look.hatch(hatchingOf(drawing));
		this.#lay(drawing);
		this.#lettering = setLettering(this.#letters, drawing, this.#lettering, shapeLayersTop);
		describe(this.canvas, drawing);
		this.#show();
	}

	tint(region: number, hex: string) {
		this.#look.tint(region, hex);
		this.#show();
	}

	fade(stays: ((region: number) => boolean) | null) {
		if (this.#look.fade(stays)) this.#show();
	}

	outline(borders: readonly number[]) {
		const arcs = Uint32Array.from(borders.flatMap((border) => [...this.#drawn.borderArcs(border)]));
		const width = outlineWidth * (devicePixelRatio || 1);
		if (this.#look.draw(arcs.length ? { arcs, hex: '#111111', width } : null)) this.#show();
	}

	setStop(_region: number | null, focus: boolean) {
		if (focus) this.canvas.focus({ preventScroll: true });
	}

	/** Changes gather until the page is idle for a moment: a gesture may tint many regions in a row. */
	#show() {
		queueMicrotask(() => {
			const changed = this.#look.taken();
			if (!changed) return;
			const { colours, outline } = this.#look;
			const few = changed.regions && { regions: changed.regions, ground: this.#ground };
			this.#board.look(colours, outline, few);
		});
	}

	#settled(settled: boolean) {
		this.canvas.setAttribute('aria-busy', String(!settled));
		if (!settled) return;
		this.#look.settled();
		this.#first = null;
		this.#host.onfirst();
		const sight = this.#sight;
		if (sight) this.#host.refine(areaInSight(sight), sight.scale);
	}

	#schedule() {
		cancelAnimationFrame(this.#frame);
		this.#frame = requestAnimationFrame(() => this.#layOut());
	}

	#layOut() {
		const sight = this.#sight;
		if (!sight) return;
		const pen = this.#pen;
		pen.setTransform(1, 0, 0, 1, 0, 0);
		pen.clearRect(0, 0, sight.width, sight.height);
		pen.fillStyle = '#ffffff';
		const { width, height } = this.#paper;
		pen.fillRect(sight.x, sight.y, width * sight.scale, height * sight.scale);
		if (this.#first) layFirst(pen, this.#first, sight);
		this.#board.layOut(pen);
		this.#touchUp(pen, sight);
	}

	/** Regions whose tiles still show their colour before, painted over the tiles. */
	#touchUp(pen: CanvasRenderingContext2D, { x, y, scale }: Sight) {
		const [line] = this.#laid.lines;
		pen.setTransform(scale, 0, 0, scale, x, y);
		pen.lineWidth = line?.width ?? 0;
		pen.strokeStyle = line?.hex ?? '#000000';
		for (const region of this.#look.pending) {
			pen.beginPath();
			traceRegion(pen, this.#ground, region);
			pen.fillStyle = this.#look.hexOf(region);
			pen.fill();
			if (line) pen.stroke();
		}
	}
}

/** A picture with its description, and one stop of the Tab key. */
function describe(canvas: HTMLCanvasElement, { title, description }: Drawing): void {
	canvas.setAttribute('role', 'img');
	canvas.setAttribute('tabindex', '0');
	canvas.setAttribute('aria-label', `${title || 'The sheet'}. ${description}`);
}

function lettersIn(host: HTMLElement, text: string): SVGSVGElement {
	const letters = document.importNode(parseSvg(text), true);
	letters.removeAttribute('width');
	letters.removeAttribute('height');
	// the canvas is the paper, and tells what the sheet is
	letters.querySelector('rect')?.remove();
	for (const name of ['role', 'aria-labelledby']) letters.removeAttribute(name);
	for (const told of letters.querySelectorAll('title, desc')) told.remove();
	letters.setAttribute('aria-hidden', 'true');
	host.replaceChildren(letters);
	return letters;
}
