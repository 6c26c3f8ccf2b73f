import { drawScaleBar } from '../collar/draw-scale-bar.ts';
import { sampledScales } from '../collar/draw-scale.ts';
import { scaleBar } from '../collar/scale-bar.ts';
import type { DrawnRect, DrawnText } from '../drawing.ts';
import type { OnPaper } from '../place-on-paper.ts';
import { groundScaleAt } from '../plane/ground-scale.ts';
import type { DrawnShape } from '../shapes.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened } from '../type/wrap-text.ts';
import { frameWidth, insetDress, ratioWords, type InsetDress } from './inset-size.ts';
import type { PlacedInset } from './insets-on-paper.ts';

/** A bar shorter than this, in type sizes, says nothing. */
const shortestBar = 4;

export interface DrawnInsets {
	shapes: DrawnShape[];
	texts: DrawnText[];
	rects: DrawnRect[];
}

/** Frames, names, scales and bars of the insets. In: `hex`, a colour that is read on the ground there. */
export function drawInsets(placed: OnPaper, scale: number, bar: boolean, hex: string): DrawnInsets {
	const dress = insetDress(scale, bar);
	const drawn: DrawnInsets = { shapes: [], texts: [], rects: [] };
	placed.insets.forEach((inset, i) => {
		if (!inset.ratio) return;
		drawn.shapes.push(frameOf(inset, scale));
		drawn.texts.push(...headOf(inset, dress, hex));
		if (!bar) return;
		const { rects, texts } = barOf(placed, inset, i + 1, dress);
		drawn.rects.push(...rects.map((rect) => ({ ...rect, fill: hex })));
		drawn.texts.push(...texts.map((text) => ({ ...text, hex })));
	});
	return drawn;
}

function frameOf({ outer: { x, y, width, height } }: PlacedInset, scale: number): DrawnShape {
	return {
		layer: 'inset',
		points: Int32Array.of(x, y, x + width, y, x + width, y + height, x, y + height),
		starts: Uint32Array.of(0, 4),
		...{ closed: true, fill: null, stroke: '#000000' },
		strokeWidth: frameWidth(scale),
	};
}

/** What is written over an inset: its name, and its scale below. */
function headOf(
	{ outer, name, ratio, sameScale }: PlacedInset,
	{ pad, type }: InsetDress,
	hex: string,
) {
	const lines = [
		{ face: 'sans-bold', text: name },
		{ face: 'sans', text: sameScale ? 'scale of the map' : ratioWords(ratio) },
	] as const;
	return lines.flatMap(({ face, text }, i): DrawnText[] => {
		const kept = shortened(face, type, text, outer.width - 2 * pad);
		if (!kept) return [];
		return [
			{
				...{ layer: 'collar', text: kept, face, hex, size: type },
				x: outer.x + pad,
				y: Math.round(outer.y + pad + type * (0.8 + 1.25 * i)),
				width: Math.ceil(textWidth(face, type, kept)),
			},
		];
	});
}

function barOf(placed: OnPaper, inset: PlacedInset, frame: number, { pad, type }: InsetDress) {
	const none = { rects: [], texts: [] };
	const { inner, outer } = inset;
	const [x, y] = [inner.x + inner.width / 2, inner.y + inner.height / 2];
	const centre = groundScaleAt(inset.chosen.projection, inset.fit, x, y);
	if (!centre) return none;
	const room = outer.width - 2 * pad;
	const found = scaleBar(centre, sampledScales(placed, frame, inset), room * 0.6);
	if (!found || found.length < shortestBar * type) return none;
	const drawn = drawScaleBar(
		found,
		outer.x + pad,
		outer.y + outer.height - pad - Math.round(type * 2.1),
		type,
	);
	// words that run out of the frame would be read as the map's
	const fits = drawn.texts.every((text) => text.x + text.width <= outer.x + outer.width);
	return fits ? drawn : none;
}
