import { paintSvg } from '$lib/engines/sheet';
import type { Drawing, RegionFill } from '$lib/engines/sheet/drawing';
import type { RegionNumbers } from '$lib/state/rules-in-force';

/** Put before the ids of the sheet's elements, which share the page with others. */
export const idPrefix = 'sheet-';

/** The inline SVG of a sheet: finds regions in it and changes it in place, without a redraw. */
export class SheetSurface {
	readonly svg: SVGSVGElement;
	readonly viewBox: string;
	readonly #regions: (SVGElement | undefined)[] = [];
	#stop: SVGElement;
	#lettering = '';

	/** `text` is an SVG document made by the sheet's painter; it is parsed as XML, never as markup. */
	constructor(
		host: HTMLElement,
		text: string,
		private numbers: RegionNumbers,
	) {
		this.svg = document.importNode(parse(text), true);
		this.viewBox = this.svg.getAttribute('viewBox') ?? '0 0 1 1';
		this.svg.removeAttribute('width');
		this.svg.removeAttribute('height');
		for (const element of this.svg.querySelectorAll<SVGElement>('path[data-key]')) {
			const region = numbers.get(element.getAttribute('data-key') ?? '');
			if (region !== undefined) this.#regions[region] = element;
		}
		this.svg.setAttribute('tabindex', '0');
		this.#stop = this.svg;
		host.replaceChildren(this.svg);
	}

	/** The region under an event, or -1. */
	regionAt(target: EventTarget | null): number {
		const element = target instanceof Element ? target.closest('[data-key]') : null;
		return this.numbers.get(element?.getAttribute('data-key') ?? '') ?? -1;
	}

	pathOf(region: number): string {
		return this.#regions[region]?.getAttribute('d') ?? '';
	}

	/** Box of a region as shares of the paper. */
	boxOf(region: number) {
		const element = this.#regions[region];
		if (!(element instanceof SVGGraphicsElement)) return null;
		const box = element.getBBox();
		const [x, y, width, height] = this.viewBox.split(/[\s,]+/).map(Number);
		return {
			left: (box.x - x) / width,
			top: (box.y - y) / height,
			right: (box.x + box.width - x) / width,
			bottom: (box.y + box.height - y) / height,
		};
	}

	/** Shows the same sheet in other colours: fills and words that differ, then lettering and legend. */
	paint(drawing: Drawing, words: (fill: RegionFill) => string) {
		for (const fill of drawing.fills) this.tint(fill.region, fill.hex, words(fill));
		this.#letter(drawing);
	}

	/** Gives one region a fill and its words. */
	tint(region: number, hex: string, words: string) {
		const element = this.#regions[region];
		if (element?.getAttribute('fill') !== hex) element?.setAttribute('fill', hex);
		if (!element || element.getAttribute('aria-label') === words) return;
		element.setAttribute('aria-label', words);
		element.querySelector('title')?.replaceChildren(words);
	}

	/** Fades every region for which `stays` is false; null fades none. */
	fade(stays: ((region: number) => boolean) | null) {
		this.#regions.forEach((element, region) =>
			element?.classList.toggle('faded', stays !== null && !stays(region)),
		);
	}

	/** The one stop of the Tab key on the sheet: a region, or the sheet as a whole. */
	setStop(region: number | null, focus: boolean) {
		const next = region === null ? this.svg : (this.#regions[region] ?? this.svg);
		if (next !== this.#stop) {
			this.#stop.setAttribute('tabindex', '-1');
			next.setAttribute('tabindex', '0');
			this.#stop = next;
		}
		if (focus) next.focus({ preventScroll: true });
	}

	/** labels take the ink that reads on their fill, the legend lists the inks in use */
	#letter(drawing: Drawing) {
		const lettering = paintSvg(
			{ ...drawing, fills: [], lines: [] },
			{ fills: 'attribute', idPrefix },
		);
		if (lettering === this.#lettering) return;
		this.#lettering = lettering;
		const fresh = parse(lettering);
		for (const name of ['labels', 'collar']) {
			const now = this.svg.querySelector(`#${idPrefix}${name}`);
			const next = fresh.querySelector(`#${idPrefix}${name}`);
			if (now && next) now.replaceWith(document.importNode(next, true));
		}
	}
}

function parse(text: string): SVGSVGElement {
	const root = new DOMParser().parseFromString(text, 'image/svg+xml').documentElement;
	if (root.localName !== 'svg') throw new Error('the sheet could not be read as SVG');
	return root as unknown as SVGSVGElement;
}

/** A region in words while the sheet is coloured by region. */
export function inkWords(
	{ name, key, ink }: RegionFill,
	{ inks }: Drawing,
	locked: boolean,
): string {
	if (ink < 0) return `${name || key}, no ink yet`;
	return `${name || key}, ink ${ink + 1} ${inks[ink]?.name ?? ''}${locked ? ', locked' : ''}`;
}
