/** Layers of a drawing as content of a page, each part whole by itself (ISO 32000-1, 8.4 and 8.5). */
import type { Drawing, DrawnRect, DrawnShape, LineLayer, ShapeLayer } from '../../sheet/index.ts';
import { rgb } from './numbers.ts';
import { chainsOperators, linesOperators, ringsOperators, shapeOperators } from './paths.ts';

/** One part a region, so that none grows without bound; a change of colour is told only where there is one. */
export function fillParts(drawing: Drawing): string[] {
	let last = '';
	return drawing.fills.flatMap(({ hex, rings }) => {
		if (!rings.length) return [];
		const colour = hex === last ? '' : `${rgb((last = hex))} rg\n`;
		return [`${colour}${ringsOperators(drawing, rings)}`];
	});
}

const dashes = (dash: number[] | undefined): string => `[${(dash ?? []).join(' ')}] 0 d`;

/** One layer of lines. Ends are round, but for dashes: round ends would close the gaps of a fine one. */
export function lineOperators(drawing: Drawing, line: LineLayer): string {
	const { width, hex, dash, arcs, chains } = line;
	const path = chains ? chainsOperators(drawing, chains) : linesOperators(drawing, arcs);
	return `q ${rgb(hex)} RG ${width} w 1 j ${dash ? 0 : 1} J ${dashes(dash)}\n${path}Q`;
}

/** Layers of lines that bend are joined round, as in the SVG. */
const bent: ReadonlySet<ShapeLayer> = new Set(['sea', 'lakes', 'hatch', 'graticule', 'water']);

export function shapeParts(shape: DrawnShape): string[] {
	const { layer, fill, stroke, strokeWidth, dash } = shape;
	const path = shapeOperators(shape);
	if (path === '' || (!fill && !stroke)) return [];
	const colours = [
		...(fill ? [`${rgb(fill)} rg`] : []),
		...(stroke
			? [`${rgb(stroke)} RG ${strokeWidth} w ${bent.has(layer) ? 1 : 0} j ${dashes(dash)}`]
			: []),
	];
	return [`${colours.join(' ')}\n${path}${fill && stroke ? 'B*' : fill ? 'f*' : 'S'}`];
}

export function rectOperators({
	x,
	y,
	width,
	height,
	fill,
	stroke,
	strokeWidth,
}: DrawnRect): string {
	const colours = [
		...(fill ? [`${rgb(fill)} rg`] : []),
		...(stroke ? [`${rgb(stroke)} RG ${strokeWidth} w`] : []),
	];
	const paint = fill && stroke ? 'B' : fill ? 'f' : stroke ? 'S' : 'n';
	return `${colours.join(' ')}\n${x} ${y} ${width} ${height} re ${paint}`;
}
