import type { Drawing, DrawnInk } from '../drawing.ts';
import { ringPoints } from '../fills.ts';
import type { DrawnShape } from '../shapes.ts';
import type { Hatch } from '../../palettes/palette.ts';
import { cutLines } from './cut-lines.ts';
import { cutKey, familiesOf, hatchWidth } from './hatch-look.ts';

/**
 * Segments of a region that were cut last, by its rings: a sheet that is coloured anew shares its rings with
 * the one before, and most regions keep their ink.
 */
const cutLast = new WeakMap<Int32Array[], { key: string; segments: number[] }>();

/** The hatch of one region, cut at its border; one phase over the sheet, so that neighbours run on. */
export function hatchOfRegion(
	arcs: Pick<Drawing, 'arcPoints' | 'arcStarts'>,
	rings: Int32Array[],
	hatch: Hatch,
): number[] {
	const key = cutKey(hatch);
	const known = cutLast.get(rings);
	if (known?.key === key) return known.segments;
	const points = rings.map((ring) => ringPoints(arcs, ring));
	const segments = familiesOf(hatch).flatMap((family) => cutLines(points, family));
	cutLast.set(rings, { key, segments });
	return segments;
}

/**
 * A shape for every hatched ink in use, by ink number: all its segments over the sheet, in the colour that
 * the reader sees. In: inks as drawn; `see` gives a colour as the drawing's reader sees it.
 */
export function hatchShapes(
	drawing: Pick<Drawing, 'arcPoints' | 'arcStarts' | 'fills' | 'inks'>,
	see: (hex: string) => string,
): DrawnShape[] {
	return drawing.inks.flatMap(({ hatch }: DrawnInk, ink) => {
		if (!hatch) return [];
		const parts = drawing.fills
			.filter((fill) => fill.ink === ink)
			.map(({ rings }) => hatchOfRegion(drawing, rings, hatch));
		const shape = segmentShape(parts, hatch, see);
		return shape ? [{ ...shape, layer: 'hatch' as const, ink }] : [];
	});
}

/** Segments as one shape of open lines; null where there are none. */
export function segmentShape(
	parts: readonly number[][],
	hatch: Hatch,
	see: (hex: string) => string,
): Omit<DrawnShape, 'layer'> | null {
	const numbers = parts.reduce((sum, part) => sum + part.length, 0);
	if (numbers === 0) return null;
	const points = new Int32Array(numbers);
	let at = 0;
	for (const part of parts) {
		points.set(part, at);
		at += part.length;
	}
	const starts = Uint32Array.from({ length: numbers / 4 + 1 }, (_, i) => 2 * i);
	const strokeWidth = Math.max(3, hatchWidth(hatch));
	return { points, starts, closed: false, fill: null, stroke: see(hatch.hex), strokeWidth };
}
