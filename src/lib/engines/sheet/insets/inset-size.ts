import type { Box } from '../plane/fit.ts';
import { textWidth } from '../type/text-width.ts';

/** Width of a frame on A4. */
const line = 16;

export const frameWidth = (scale: number): number => Math.max(8, Math.round(line * scale));

/** Small print over an inset on A4: 6.5 point. */
const smallPrint = 229;

/** What stands in an inset's frame beside the regions, all in hundredths of a millimetre. */
export interface InsetDress {
	pad: number;
	type: number;
	/** from the frame's upper edge to the regions */
	head: number;
	/** from the regions to the lower edge */
	foot: number;
	bar: boolean;
}

export function insetDress(scale: number, bar: boolean): InsetDress {
	const type = Math.round(smallPrint * scale);
	const pad = Math.round(type * 0.6);
	const barHigh = bar ? Math.round(type * 2.4) : 0;
	return { pad, type, head: pad + Math.round(type * 2.7), foot: pad + barHigh, bar };
}

export const ratioWords = (ratio: number): string =>
	`1 : ${Number(ratio.toPrecision(3)).toLocaleString('en-GB')}`;

/** Widest name that may widen a frame, in type sizes. */
const widestName = 16;

/** The frame for regions of a size, its upper left corner at 0, and where the regions stand in it. */
export function insetFrame(
	dress: InsetDress,
	name: string,
	ratio: number,
	width: number,
	height: number,
): { outer: Box; inner: Box } {
	const { pad, type, head, foot } = dress;
	const words = Math.max(
		Math.min(textWidth('sans-bold', type, name), widestName * type),
		textWidth('sans', type, ratioWords(ratio)),
	);
	const across = Math.ceil(Math.max(width, words)) + 2 * pad;
	return {
		outer: { x: 0, y: 0, width: across, height: Math.ceil(head + height + foot) },
		inner: { x: Math.round((across - width) / 2), y: head, width, height },
	};
}
