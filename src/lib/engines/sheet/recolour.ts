import { asSeenBy as seen } from '../colour/index.ts';
import type { Ink, Reader } from '../palettes/palette.ts';
import { drawLegend } from './collar/legend.ts';
import { describe } from './describe.ts';
import { fillHex, inkLabels } from './draw-sheet.ts';
import type { Drawing, LineLayer } from './drawing.ts';
import { hatchShapes } from './hatch/hatch-shapes.ts';
import type { DrawnShape } from './shapes.ts';
import { legendInks } from './themed.ts';

/**
 * The same sheet in other colours: geometry, lettering and collar stay where they are and are shared
 * with the drawing given, which is not changed. For a lock set or a reader chosen; weak borders are
 * those of the drawing given.
 *
 * In: a palette as long as the drawing's. Out: what `drawSheet` would draw. Throws RangeError for
 * another length, because the legend would not fit its place.
 */
export function recolour(
	drawing: Drawing,
	colouring: Int32Array | null,
	inks: Ink[],
	reader: Reader,
	asSeenBy: (hex: string, reader: Reader) => string = seen,
): Drawing {
	if (inks.length !== drawing.inks.length) {
		throw new RangeError(`a palette of ${inks.length} for one of ${drawing.inks.length}`);
	}
	const drawn = inks.map((ink) => ({ ...ink, shown: asSeenBy(ink.hex, reader) }));
	const fills = drawing.fills.map((fill) => {
		const ink = colouring ? colouring[fill.region] : -1;
		return { ...fill, ink, hex: fillHex(ink, drawn) };
	});
	const { themed } = drawing;
	const see = (hex: string) => asSeenBy(hex, reader);
	const lines = seenLines(drawing, see);
	const shown = { inks: drawn, fills, lines, themed };
	const keys = drawLegend(drawing.legend, shown, legendInks(fills, themed), see);
	const next = {
		...drawing,
		reader,
		inks: drawn,
		fills,
		lines,
		shapes: newShapes({ ...drawing, fills, inks: drawn }, keys.shapes, see),
		texts: [
			...inkLabels(
				drawing.texts.filter(({ layer }) => layer !== 'legend'),
				fills,
				drawn,
			),
			...keys.texts,
		],
		rects: [...drawing.rects.filter(({ layer }) => layer !== 'legend'), ...keys.rects],
	};
	return { ...next, description: describe(next) };
}

/** What follows from the inks in use. */
const setAnew: readonly DrawnShape['layer'][] = ['hatch', 'legend-ground', 'legend'];

/** Hatches and samples in the legend made anew among the shapes that stay; the list stays where there are none. */
function newShapes(
	drawing: Drawing,
	samples: DrawnShape[],
	see: (hex: string) => string,
): DrawnShape[] {
	const others = drawing.shapes.filter(({ layer }) => !setAnew.includes(layer));
	const hatches = hatchShapes(drawing, see);
	const tinted = others.some(({ set }) => set !== undefined);
	const kept = others.length === drawing.shapes.length && !tinted;
	if (kept && !hatches.length && !samples.length) return drawing.shapes;
	const shown = others.map((shape) =>
		shape.set === undefined ? shape : { ...shape, fill: see(shape.set) },
	);
	return [...hatches, ...shown, ...samples];
}

/** Lines of a colour of their own as the reader sees them; the list itself stays where none changes. */
function seenLines({ lines }: Drawing, see: (hex: string) => string): LineLayer[] {
	const differs = lines.some(({ hex, own }) => own !== undefined && see(own) !== hex);
	if (!differs) return lines;
	return lines.map((line) => (line.own === undefined ? line : { ...line, hex: see(line.own) }));
}
