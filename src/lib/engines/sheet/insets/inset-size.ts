import { drawScaleBar } from '../collar/draw-scale-bar.ts';
import { scaleBar, type ScaleBar } from '../collar/scale-bar.ts';
import type { Box } from '../plane/fit.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened, wrapText } from '../type/wrap-text.ts';

/** Width of a frame on A4. */
const line = 16;

export const frameWidth = (scale: number): number => Math.max(8, Math.round(line * scale));

/** Small print over an inset on A4: 6.5 point. */
const smallPrint = 229;

/** What stands in an inset's frame beside the regions, all in hundredths of a millimetre. */
export interface InsetDress {
	pad: number;
	type: number;
	/** whether a scale bar is wanted */
	bar: boolean;
}

export function insetDress(scale: number, bar: boolean): InsetDress {
	const type = Math.round(smallPrint * scale);
	return { pad: Math.round(type * 0.6), type, bar };
}

export const ratioWords = (ratio: number): string =>
	`1 : ${Number(ratio.toPrecision(3)).toLocaleString('en-GB')}`;

/** Widest name that may widen a frame, in type sizes; a longer one is set in lines, at most so many. */
const widestName = 16;
const mostLines = 3;
/** From one line of words to the next, in type sizes. */
const leading = 1.25;
/** Height of a bar with its figures, in type sizes. */
const barHigh = 2.4;
/** A bar shorter than this, in type sizes, says nothing. */
const shortestBar = 4;
/** Share of a frame that a bar may take of its width. */
const barShare = 0.6;

export interface InsetHead {
	/** the name, in lines */
	name: string[];
	scale: string;
}

/** A frame and what stands in it, its upper left corner at 0. */
export interface InsetFrame {
	outer: Box;
	/** where the regions stand */
	inner: Box;
	head: InsetHead;
	/** the ground a length of the frame stands for leaves room for a bar */
	bar: boolean;
}

/** The baseline of each line of words below the frame's upper edge. */
export const baselineOf = ({ pad, type }: InsetDress, i: number): number =>
	Math.round(pad + type * (0.8 + leading * i));

/**
 * A bar within a frame, for a scale that is even over it; null where it is too short to say anything, or
 * its words would run out of the frame and be read as the map's.
 */
export function barWithin(
	{ pad, type }: InsetDress,
	across: number,
	make: (longest: number) => ScaleBar | null,
): ScaleBar | null {
	const found = make((across - 2 * pad) * barShare);
	if (!found || found.length < shortestBar * type) return null;
	const { texts } = drawScaleBar(found, pad, 0, type);
	return texts.every(({ x, width }) => x + width <= across) ? found : null;
}

/**
 * The frame for regions of a size, with the words over them and room for a bar below. One at the scale of the
 * map says so and has no bar of its own. Names are wrapped between words.
 */
export function insetFrame(
	dress: InsetDress,
	name: string,
	{ ratio, sameScale }: { ratio: number; sameScale: boolean },
	width: number,
	height: number,
): InsetFrame {
	const { pad, type } = dress;
	const scale = sameScale ? 'scale of the map' : ratioWords(ratio);
	const words = Math.max(
		Math.min(textWidth('sans-bold', type, name), widestName * type),
		textWidth('sans', type, scale),
	);
	const across = Math.ceil(Math.max(width, words)) + 2 * pad;
	const lines = linesWithin(type, name, across - 2 * pad);
	const top = pad + Math.round(type * (leading * lines.length + 1.45));
	// hundredths of a millimetre at 1 : n are n / 100,000 metres on the ground
	const even = { across: ratio / 1e5, down: ratio / 1e5 };
	const bar =
		dress.bar &&
		!sameScale &&
		barWithin(dress, across, (longest) => scaleBar(even, [], longest)) !== null;
	const foot = pad + (bar ? Math.round(type * barHigh) : 0);
	return {
		outer: { x: 0, y: 0, width: across, height: Math.ceil(top + height + foot) },
		inner: { x: Math.round((across - width) / 2), y: top, width, height },
		...{ head: { name: lines, scale }, bar },
	};
}

function linesWithin(type: number, name: string, room: number): string[] {
	const all = wrapText('sans-bold', type, name, room);
	if (all.length <= mostLines) return all;
	const last = shortened('sans-bold', type, `${all[mostLines - 1]}…`, room);
	return [...all.slice(0, mostLines - 1), last];
}
