import { linearOf } from '../colour/srgb.ts';
import { seenLinear } from '../colour/vision.ts';
import type { Reader } from '../colour/reader.ts';
import type { Hatch } from './palette.ts';

/** WCAG 2.2, success criterion 1.4.11: graphical objects against what lies beside them. */
export const hatchContrastAsked = 3;
/** So many lines at least must cross a region, or its hatch is not seen as one. Common practice, no source. */
export const leastLines = 2;
/** Directions closer than this are taken for one another. Common practice, no source. */
export const leastTurn = 30;
/** One spacing must be this many times the other to be told from it. Common practice, no source. */
export const leastRatio = 2;

/** What a fill looks like: its colour and, perhaps, lines over it. */
export interface Fill {
	hex: string;
	hatch?: Hatch;
}

/**
 * Whether a reader sees the lines of a fill as a hatch where it shows `sizeMm` large: they reach 3:1
 * against the fill as this reader sees both, cover at most half of it, and at least two of them cross it.
 */
export function hatchShows({ hex, hatch }: Fill, reader: Reader, sizeMm: number): boolean {
	if (!hatch || hatch.widthMm * 2 > hatch.spacingMm) return false;
	if (sizeMm < leastLines * hatch.spacingMm) return false;
	return contrastFor(reader, hatch.hex, hex) >= hatchContrastAsked;
}

/**
 * Whether hatches alone tell two fills apart for a reader, whatever their colours: one shows its hatch and
 * the other shows none, or both show one and they differ in kind, by at least 30 degrees in direction, or
 * at least twofold in spacing. A hatch that does not show for this reader counts as none. Two hatches that
 * do not differ tell nothing, even where only one of the regions is large enough to show its own.
 *
 * In: the two fills and how large each shows, in mm (the smallest region of the ink along the border or
 * borders in question). What holds for these sizes holds for all larger ones.
 */
export function hatchesTell(
	one: Fill,
	two: Fill,
	reader: Reader,
	[sizeOne, sizeTwo]: readonly [number, number],
): boolean {
	const shows = hatchShows(one, reader, sizeOne) || hatchShows(two, reader, sizeTwo);
	if (!shows) return false;
	const both = hatchShows(one, reader, Infinity) && hatchShows(two, reader, Infinity);
	return !both || !one.hatch || !two.hatch || differ(one.hatch, two.hatch);
}

function differ(one: Hatch, two: Hatch): boolean {
	if (one.kind !== two.kind) return true;
	const [fine, coarse] = [one.spacingMm, two.spacingMm].sort((a, b) => a - b);
	return turnBetween(one, two) >= leastTurn || coarse >= leastRatio * fine;
}

/** Crossed lines repeat every 90 degrees, single ones every 180. */
function turnBetween(one: Hatch, two: Hatch): number {
	const whole = one.kind === 'crossed' ? 90 : 180;
	const turn = Math.abs(one.angle - two.angle) % whole;
	return Math.min(turn, whole - turn);
}

/** WCAG contrast of two colours as a reader sees them; for grey print that of the colours themselves. */
export function contrastFor(reader: Reader, one: string, two: string): number {
	const [a, b] = [lightFor(reader, one), lightFor(reader, two)];
	return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}

function lightFor(reader: Reader, hex: string): number {
	const [red, green, blue] = seenLinear(linearOf(hex), reader);
	return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}
