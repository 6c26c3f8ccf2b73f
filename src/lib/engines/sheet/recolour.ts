import { asSeenBy as seen } from '../colour/index.ts';
import type { Ink, Reader } from '../palettes/palette.ts';
import { drawLegend } from './collar/legend.ts';
import { describe } from './describe.ts';
import { fillHex, inkLabels, inksInUse } from './draw-sheet.ts';
import type { Drawing, LineLayer } from './drawing.ts';
import { hatchShapes } from './hatch/hatch-shapes.ts';
import type { DrawnShape } from './shapes.ts';

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
	const { legend } = drawing;
	const keys = legend ? drawLegend(legend, drawn, inksInUse(fills)) : { rects: [], texts: [] };
	const next = {
		...drawing,
		reader,
		inks: drawn,
		fills,
		shapes: seenShapes(
			withHatches({ ...drawing, fills, inks: drawn }, (hex) => asSeenBy(hex, reader)),
			(hex) => asSeenBy(hex, reader),
		),
		lines: seenLines(drawing, (hex) => asSeenBy(hex, reader)),
		texts: [
			...inkLabels(
				drawing.texts.filter(({ layer }) => layer !== 'legend'),
				fills,
			),
			...keys.texts,
		],
		rects: [...drawing.rects.filter(({ layer }) => layer !== 'legend'), ...keys.rects],
	};
	return { ...next, description: describe(next) };
}

/** Hatches cut anew among the shapes that stay; the list itself stays where no ink was or is hatched. */
function withHatches(drawing: Drawing, see: (hex: string) => string): DrawnShape[] {
	const others = drawing.shapes.filter(({ layer }) => layer !== 'hatch');
	const hatches = hatchShapes(drawing, see);
	return hatches.length || others.length < drawing.shapes.length
		? [...hatches, ...others]
		: drawing.shapes;
}

/** Water as the reader sees it; the list itself stays where none changes. */
function seenShapes(shapes: DrawnShape[], see: (hex: string) => string): DrawnShape[] {
	if (!shapes.some(({ set, fill }) => set !== undefined && see(set) !== fill)) return shapes;
	return shapes.map((shape) => (shape.set ? { ...shape, fill: see(shape.set) } : shape));
}

/** Lines of a colour of their own as the reader sees them; the list itself stays where none changes. */
function seenLines({ lines }: Drawing, see: (hex: string) => string): LineLayer[] {
	const differs = lines.some(({ hex, own }) => own !== undefined && see(own) !== hex);
	if (!differs) return lines;
	return lines.map((line) => (line.own === undefined ? line : { ...line, hex: see(line.own) }));
}
