import type { Drawing } from '../drawing.ts';
import { shapesIn, type DrawnShape, type ShapeLayer } from '../shapes.ts';
import { escapeXml } from './escape.ts';
import type { SvgOptions } from './paint-svg.ts';
import { shapePath } from './path-data.ts';

/** Layers of lines that bend are joined round, frames and arrows keep their corners. */
const bent: ReadonlySet<ShapeLayer> = new Set(['sea', 'lakes', 'hatch', 'graticule', 'water']);

/** One group a layer, in the order given; a layer without shapes writes nothing. */
export function paintShapes(
	drawing: Drawing,
	layers: readonly ShapeLayer[],
	options: SvgOptions,
): string[] {
	return layers.flatMap((layer) => {
		const paths = shapesIn(drawing, layer)
			.map((shape) => shapeElement(shape, options))
			.filter((element) => element !== '');
		if (paths.length === 0) return [];
		const name = escapeXml((options.idPrefix ?? '') + shapeGroups[layer]);
		const join = bent.has(layer) ? ' stroke-linejoin="round"' : '';
		return [`<g id="${name}"${join} aria-hidden="true">`, ...paths, '</g>'];
	});
}

/** Names of the groups in the file. */
export const shapeGroups: Record<ShapeLayer, string> = {
	sea: 'sea',
	lakes: 'lakes',
	hatch: 'hatches',
	graticule: 'graticule',
	water: 'water',
	inset: 'inset-frames',
	'legend-ground': 'legend-ground',
	'neat-line': 'neat-line',
	ground: 'text-grounds',
	north: 'north-arrow',
	legend: 'legend-samples',
};

function shapeElement(shape: DrawnShape, { fills }: SvgOptions): string {
	const path = shapePath(shape);
	if (path === '') return '';
	const { fill, stroke, strokeWidth, dash, ink } = shape;
	const outline = stroke
		? ` stroke="${stroke}" stroke-width="${strokeWidth}"${dash?.length ? ` stroke-dasharray="${dash.join(' ')}"` : ''}`
		: '';
	const area = fill ? ` fill="${fill}" fill-rule="evenodd"` : ' fill="none"';
	const own = ink === undefined ? '' : ` data-ink="${ink + 1}"`;
	const styled = fills === 'class' && ink !== undefined ? ` class="${inkClass(shape)}"` : '';
	return `<path${styled}${own}${area}${outline} d="${path}"/>`;
}

/** Under the ink's own class a designer finds its hatch; the attribute stands where style is dropped. */
export const inkClass = ({ ink = 0 }: Pick<DrawnShape, 'ink'>): string => `hatch-${ink + 1}`;
