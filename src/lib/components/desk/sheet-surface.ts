import type { RegionNumbers } from '$lib/state/rules-in-force';

/** The inline SVG of a sheet: finds regions in it and changes fills in place, without a redraw. */
export class SheetSurface {
	readonly svg: SVGSVGElement;
	readonly viewBox: string;
	readonly #regions: (SVGElement | undefined)[] = [];
	readonly #labels = new Map<number, SVGElement[]>();
	#stop: SVGElement | null = null;

	/** `text` is an SVG document made by the sheet's painter; it is parsed as XML, never as markup. */
	constructor(
		host: HTMLElement,
		text: string,
		private numbers: RegionNumbers,
	) {
		const parsed = new DOMParser().parseFromString(text, 'image/svg+xml').documentElement;
		if (parsed.nodeName !== 'svg') throw new Error('the sheet could not be read as SVG');
		this.svg = document.importNode(parsed as unknown as SVGSVGElement, true);
		this.viewBox = this.svg.getAttribute('viewBox') ?? '0 0 1 1';
		this.svg.removeAttribute('width');
		this.svg.removeAttribute('height');
		this.#collect();
		this.svg.setAttribute('tabindex', '0');
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

	/** Fills that differ from what stands there are set; nothing else is touched. */
	paint(fillOf: (region: number) => string, labelOf: (region: number) => string | null) {
		this.#regions.forEach((element, region) => {
			const fill = fillOf(region);
			if (element && element.getAttribute('fill') !== fill) element.setAttribute('fill', fill);
		});
		for (const [region, labels] of this.#labels) {
			const ink = labelOf(region);
			if (ink) for (const label of labels) label.setAttribute('fill', ink);
		}
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
		(this.#stop ?? this.svg).setAttribute('tabindex', '-1');
		next.setAttribute('tabindex', '0');
		this.#stop = next;
		if (focus) next.focus({ preventScroll: true });
	}

	#collect() {
		for (const element of this.svg.querySelectorAll<SVGElement>('[data-key]')) {
			const region = this.numbers.get(element.getAttribute('data-key') ?? '');
			if (region === undefined) continue;
			if (element.localName === 'path') this.#regions[region] ??= element;
			else if (element.localName === 'text')
				this.#labels.set(region, [...(this.#labels.get(region) ?? []), element]);
		}
	}
}
