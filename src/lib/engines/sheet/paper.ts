import type { SheetLayout } from './layout.ts';

/** Short and long side in mm. Source: ISO 216:2007, A series. */
const sides = {
	A5: [148, 210],
	A4: [210, 297],
	A3: [297, 420],
	A2: [420, 594],
	A1: [594, 841],
	A0: [841, 1189],
} as const;

/** Least and greatest side of a sheet of one's own, in mm. */
export const paperLimits = { least: 50, greatest: 5000 };

/**
 * Width and height of the paper in mm, turned as the layout asks; a size of one's own is taken as
 * given. Throws RangeError outside 50 to 5,000 mm: callers check what users enter.
 */
export function paperSize(layout: SheetLayout): { widthMm: number; heightMm: number } {
	const { paper, orientation } = layout;
	if (typeof paper === 'object') {
		for (const side of [paper.widthMm, paper.heightMm]) {
			if (!(side >= paperLimits.least && side <= paperLimits.greatest)) {
				throw new RangeError(`a sheet side of ${side} mm`);
			}
		}
		return { widthMm: paper.widthMm, heightMm: paper.heightMm };
	}
	const [short, long] = sides[paper];
	return orientation === 'portrait'
		? { widthMm: short, heightMm: long }
		: { widthMm: long, heightMm: short };
}

/**
 * How much larger than on A4 type and lines are drawn: bigger sheets are read from further off, so
 * type grows with the square root of the short side. Common practice, no source.
 */
export function paperScale(widthMm: number, heightMm: number): number {
	return Math.min(3, Math.max(0.5, Math.sqrt(Math.min(widthMm, heightMm) / 210)));
}

/** The paper but for a narrow edge that printers cannot reach, in hundredths of a millimetre. */
export function paperBox(layout: SheetLayout) {
	const { widthMm, heightMm } = paperSize(layout);
	const edge = hundredths(unprinted);
	return {
		x: edge,
		y: edge,
		width: hundredths(widthMm) - 2 * edge,
		height: hundredths(heightMm) - 2 * edge,
	};
}
/** mm; common practice, no source */
const unprinted = 3;

/** Millimetres as the whole hundredths a drawing is made of. */
export const hundredths = (mm: number): number => Math.round(mm * 100);
