import type { Drawing, RegionFill } from '$lib/engines/sheet/drawing';
import type { DrawnSheet } from '$lib/state/drawn-sheet';
import type { RegionNumbers } from '$lib/state/rules-in-force';
import { parseSvg, setLettering } from './lettering';
import type { Surface } from './surface';

/** The inline SVG of a sheet: finds regions in it and changes it in place, without a redraw. */
export class SheetSurface implements Surface {
	readonly svg: SVGSVGElement;
	readonly viewBox: string;
	readonly #regions: (SVGElement | undefined)[] = [];
	#stop: SVGElement;
	#lettering = '';

	/** The drawn SVG is a document made by the sheet's painter; it is parsed as XML, never as markup. */
	constructor(
		host: HTMLElement,
		private drawn: Pick<DrawnSheet, 'svg' | 'borderPath'>,
		private numbers: RegionNumbers,
	) {
		this.svg = document.importNode(parseSvg(drawn.svg), true);
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

	regionAt(target: EventTarget | null): number {
		const element = target instanceof Element ? target.closest('[data-key]') : null;
		return this.numbers.get(element?.getAttribute('data-key') ?? '') ?? -1;
	}

	pathOf(region: number): string {
		return this.#regions[region]?.getAttribute('d') ?? '';
	}

	borderPath(border: number): string {
		return this.drawn.borderPath(border);
	}

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

	paint(drawing: Drawing, words: (fill: RegionFill) => string) {
		for (const fill of drawing.fills) this.tint(fill.region, fill.hex, words(fill));
		this.#lettering = setLettering(this.svg, drawing, this.#lettering);
	}

	tint(region: number, hex: string, words: string) {
		const element = this.#regions[region];
		if (element?.getAttribute('fill') !== hex) element?.setAttribute('fill', hex);
		if (!element || element.getAttribute('aria-label') === words) return;
		element.setAttribute('aria-label', words);
		element.querySelector('title')?.replaceChildren(words);
	}

	fade(stays: ((region: number) => boolean) | null) {
		this.#regions.forEach((element, region) =>
			element?.classList.toggle('faded', stays !== null && !stays(region)),
		);
	}

	setStop(region: number | null, focus: boolean) {
		const next = region === null ? this.svg : (this.#regions[region] ?? this.svg);
		if (next !== this.#stop) {
			this.#stop.setAttribute('tabindex', '-1');
			next.setAttribute('tabindex', '0');
			this.#stop = next;
		}
		if (focus) next.focus({ preventScroll: true });
	}
}

/** A region in words while the sheet is coloured by region. */
export function inkWords(
	{ name, key, ink }: RegionFill,
	{ inks, themed }: Drawing,
	locked: boolean,
): string {
	if (themed) return `${name || key}, ${inks[ink]?.name ?? 'no data'}`;
	if (ink < 0) return `${name || key}, no ink yet`;
	return `${name || key}, ink ${ink + 1} ${inks[ink]?.name ?? ''}${locked ? ', locked' : ''}`;
}
