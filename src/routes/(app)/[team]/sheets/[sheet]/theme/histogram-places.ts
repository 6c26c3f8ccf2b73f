import type { Histogram } from '$lib/engines/measures/classing/histogram';

/** Units of the drawing, which is as wide as its place. */
export const plot = { width: 320, height: 118, base: 100, top: 10 };

const inset = 8;
const room = plot.width - 2 * inset;

/** Bars of equal width; those that hold anything are at least a hair high. */
export function barsOf({ from, width, counts }: Histogram) {
	const most = Math.max(1, ...counts);
	const wide = room / counts.length;
	return counts.map((held, i) => {
		const high = held ? Math.max(1, (held / most) * (plot.base - plot.top)) : 0;
		return {
			...{ x: inset + i * wide, y: plot.base - high, width: wide, height: high },
			middle: from + (i + 0.5) * width,
		};
	});
}

const span = ({ width, counts }: Histogram): number => width * counts.length;

/** Where a figure lies across the drawing; those beyond its ends stand at them. */
export function placeOf(bins: Histogram, figure: number): number {
	const share = span(bins) > 0 ? (figure - bins.from) / span(bins) : 0.5;
	return inset + Math.min(1, Math.max(0, share)) * room;
}

/** The figure at a place, as round as a pixel allows. In: the place in units, the drawing's width in pixels. */
export function figureAt(bins: Histogram, place: number, pixels: number): number {
	const share = Math.min(1, Math.max(0, (place - inset) / room));
	const pixel = span(bins) / Math.max(1, pixels);
	const step = pixel > 0 ? 10 ** Math.floor(Math.log10(pixel)) : 1;
	const rough = bins.from + share * span(bins);
	return Number((Math.round(rough / step) * step).toPrecision(12));
}
