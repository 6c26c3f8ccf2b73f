import { drawScaleBar } from '../collar/draw-scale-bar.ts';
import { sampledScales } from '../collar/draw-scale.ts';
import { scaleBar } from '../collar/scale-bar.ts';
import type { DrawnRect, DrawnText } from '../drawing.ts';
import type { OnPaper } from '../place-on-paper.ts';
import { groundScaleAt } from '../plane/ground-scale.ts';
import type { DrawnShape } from '../shapes.ts';
import { textWidth } from '../type/text-width.ts';
import { barWithin, baselineOf, frameWidth, insetDress, type InsetDress } from './inset-size.ts';
import type { PlacedInset } from './insets-on-paper.ts';

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
		if (!inset.bar) return;
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
function headOf({ outer, head }: PlacedInset, dress: InsetDress, hex: string): DrawnText[] {
	const lines = [
		...head.name.map((text) => ({ face: 'sans-bold' as const, text })),
		{ face: 'sans' as const, text: head.scale },
	];
	return lines.map(({ face, text }, i) => ({
		...{ layer: 'collar', text, face, hex, size: dress.type },
		x: outer.x + dress.pad,
		y: outer.y + baselineOf(dress, i),
		width: Math.ceil(textWidth(face, dress.type, text)),
	}));
}

function barOf(placed: OnPaper, inset: PlacedInset, frame: number, dress: InsetDress) {
	const none = { rects: [], texts: [] };
	const { inner, outer, chosen, fit } = inset;
	const [x, y] = [inner.x + inner.width / 2, inner.y + inner.height / 2];
	const centre = groundScaleAt(chosen.projection, fit, x, y);
	if (!centre) return none;
	const places = sampledScales(placed, frame, inset);
	const found = barWithin(dress, outer.width, (longest) => scaleBar(centre, places, longest));
	if (!found) return none;
	const { pad, type } = dress;
	const low = outer.y + outer.height - pad - Math.round(type * 2.1);
	return drawScaleBar(found, outer.x + pad, low, type);
}
