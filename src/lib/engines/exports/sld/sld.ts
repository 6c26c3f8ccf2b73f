/**
 * The sheet's look as a style for map servers. Sources: Styled Layer Descriptor profile 1.1.0 (OGC
 * 05-078r4), Symbology Encoding 1.1.0 (OGC 05-077r4), Filter Encoding 1.1.0 (OGC 04-095).
 */
import { labelInk } from '../../colour/index.ts';
import type { Drawing, DrawnInk, SheetThemed } from '../../sheet/index.ts';
import { legendInks } from '../../sheet/themed.ts';
import { cleanText } from '../../sheet/type/clean-text.ts';
import { faceStyles } from '../../sheet/type/face.ts';
import type { ExportAbout } from '../source.ts';
import { hatchSymbolizers } from './hatch-graphic.ts';
import { element as el, parameter, pixels, text } from './xml.ts';

const namespaces = {
	'xmlns:sld': 'http://www.opengis.net/sld',
	'xmlns:se': 'http://www.opengis.net/se',
	'xmlns:ogc': 'http://www.opengis.net/ogc',
	'xmlns:xlink': 'http://www.w3.org/1999/xlink',
	'xmlns:xsi': 'http://www.w3.org/2001/XMLSchema-instance',
	'xsi:schemaLocation':
		'http://www.opengis.net/sld http://schemas.opengis.net/sld/1.1.0/StyledLayerDescriptor.xsd',
};

/**
 * One layer, `regions`, for the columns of the GeoJSON and TopoJSON files: a rule an ink that is in use,
 * by `inkNumber`, with fill and hatch, and one for all else. Of a themed sheet a rule a class, empty ones
 * too, titled with its range, and those of regions that are not told; then the borders, as those between regions
 * are drawn on the sheet; then the names, by `name`, in the ink that reads on each fill. Lengths are in
 * pixels of 0.28 mm, the standard's own. A hatch is a graphic fill that carries its tile as SVG, because
 * the standard has no lines among its marks. Byte for byte repeatable.
 */
export function exportSld(drawing: Drawing, about: ExportAbout): Uint8Array {
	const { themed, inks } = drawing;
	const used = legendInks(drawing.fills, themed).map((number) => ({ ink: inks[number], number }));
	const style = el('sld:UserStyle', {}, [
		el('se:Name', {}, [themed ? 'classes' : 'inks']),
		description(about.title, `${about.issue}. ${drawing.notes.projection}`),
		el('sld:IsDefault', {}, ['1']),
		styleOf('fills', [...used.map((one) => fillRule(one, themed)), elseRule]),
		styleOf('borders', [borderRule(drawing)]),
		styleOf(
			'names',
			used.map((one) => nameRule(drawing, one)),
		),
	]);
	const layer = el('sld:NamedLayer', {}, [el('se:Name', {}, ['regions']), style]);
	const root = el('sld:StyledLayerDescriptor', { version: '1.1.0', ...namespaces }, [layer]);
	return new TextEncoder().encode(`<?xml version="1.0" encoding="UTF-8"?>\n${root}\n`);
}

type Numbered = { ink: DrawnInk; number: number };

const description = (title: string, abstract: string): string =>
	el('se:Description', {}, [
		el('se:Title', {}, [text(cleanText(title))]),
		el('se:Abstract', {}, [text(cleanText(abstract))]),
	]);

const styleOf = (name: string, rules: string[]): string =>
	rules.length ? el('se:FeatureTypeStyle', {}, [el('se:Name', {}, [name]), ...rules]) : '';

const isInk = (number: number): string =>
	el('ogc:Filter', {}, [
		el('ogc:PropertyIsEqualTo', {}, [
			el('ogc:PropertyName', {}, ['inkNumber']),
			el('ogc:Literal', {}, [String(number + 1)]),
		]),
	]);

const titled = (title: string): string =>
	el('se:Description', {}, [el('se:Title', {}, [text(cleanText(title))])]);

function fillRule({ ink, number }: Numbered, themed: SheetThemed | undefined): string {
	return el('se:Rule', {}, [
		...(themed ? classNames(ink, number, themed) : inkNames(ink, number)),
		isInk(number),
		solid(ink.hex),
		...(ink.hatch ? hatchSymbolizers(ink.hatch) : []),
	]);
}

const inkNames = ({ name }: DrawnInk, number: number): string[] => [
	el('se:Name', {}, [`ink-${number + 1}`]),
	titled(name || `Ink ${number + 1}`),
];

/** The ink of a class is named by its range; those after the classes tell why a region has none. */
const classNames = ({ name }: DrawnInk, number: number, { told }: SheetThemed): string[] =>
	number < told
		? [el('se:Name', {}, [`class-${number + 1}`]), titled(`Class ${number + 1}: ${name}`)]
		: [el('se:Name', {}, [name.replaceAll(' ', '-')]), titled(name)];

const solid = (hex: string): string =>
	el('se:PolygonSymbolizer', { version: '1.1.0' }, [
		el('se:Fill', {}, [parameter('fill', hex), parameter('fill-opacity', '1')]),
	]);

const elseRule = el('se:Rule', {}, [
	el('se:Name', {}, ['no-ink']),
	titled('No ink'),
	el('se:ElseFilter', {}, []),
	solid('#f2f2f2'),
]);

function borderRule({ lines }: Drawing): string {
	const line =
		lines.find(({ rank }) => rank === 'region') ?? lines.find(({ rank }) => rank === 'outer');
	const { hex, width, dash } = line ?? { hex: '#000000', width: 20, dash: undefined };
	return el('se:Rule', {}, [
		el('se:Name', {}, ['borders']),
		el('se:LineSymbolizer', { version: '1.1.0' }, [
			el('se:Stroke', {}, [
				parameter('stroke', hex),
				parameter('stroke-width', pixels(width / 100)),
				parameter('stroke-linejoin', 'round'),
				...(dash?.length
					? [parameter('stroke-dasharray', dash.map((one) => pixels(one / 100)).join(' '))]
					: []),
			]),
		]),
	]);
}

function nameRule({ texts }: Drawing, { ink, number }: Numbered): string {
	const label = texts.find(({ layer, onFill }) => layer === 'label' && onFill);
	const { family, weight } = faceStyles[label?.face ?? 'serif'];
	return el('se:Rule', {}, [
		el('se:Name', {}, [`name-on-ink-${number + 1}`]),
		isInk(number),
		el('se:TextSymbolizer', { version: '1.1.0' }, [
			el('se:Label', {}, [el('ogc:PropertyName', {}, ['name'])]),
			el('se:Font', {}, [
				parameter('font-family', family),
				parameter('font-weight', weight === 700 ? 'bold' : 'normal'),
				parameter('font-size', pixels((label?.size ?? 250) / 100)),
			]),
			el('se:LabelPlacement', {}, [
				el('se:PointPlacement', {}, [
					el('se:AnchorPoint', {}, [
						el('se:AnchorPointX', {}, ['0.5']),
						el('se:AnchorPointY', {}, ['0.5']),
					]),
				]),
			]),
			el('se:Fill', {}, [parameter('fill', labelInk(ink.hex))]),
		]),
	]);
}
