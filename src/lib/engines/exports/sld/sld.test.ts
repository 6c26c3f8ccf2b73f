import { SaxesParser } from 'saxes';
import { describe, expect, it } from 'vitest';
import {
	hatchedInks,
	hostileSource,
	sourceOf,
} from '../../../../../tests/support/export-source.ts';
import { statesCoverage } from '../../../../../tests/support/sheets.ts';
import type { ExportSource } from '../index.ts';
import { hatchTile } from './hatch-graphic.ts';
import { exportSld } from './sld.ts';

interface Element {
	/** namespace prefix by the namespace it stands for, then the local name */
	name: string;
	attributes: Record<string, string>;
	children: Element[];
	text: string;
}

const prefixes: Record<string, string> = {
	'http://www.opengis.net/sld': 'sld',
	'http://www.opengis.net/se': 'se',
	'http://www.opengis.net/ogc': 'ogc',
};

/** By saxes 6.0.0 with namespaces. */
function treeOf(bytes: Uint8Array): Element {
	const parser = new SaxesParser({ xmlns: true });
	const root: Element = { name: '', attributes: {}, children: [], text: '' };
	const open = [root];
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('opentag', ({ uri, local, attributes }) => {
		const own = Object.values(attributes).map((one) => [one.name, one.value]);
		const name = `${prefixes[uri]}:${local}`;
		const element: Element = { name, attributes: Object.fromEntries(own), children: [], text: '' };
		open[open.length - 1].children.push(element);
		open.push(element);
	});
	parser.on('text', (text) => void (open[open.length - 1].text += text));
	parser.on('closetag', () => void open.pop());
	parser.write(new TextDecoder('utf-8', { fatal: true }).decode(bytes)).close();
	return root.children[0];
}

/**
 * Children in the order that the schemas give them, `?` for at most one, `*` for any number, `+` for at
 * least one. Sources: StyledLayerDescriptor.xsd 1.1.0 (OGC 05-078r4) for `sld`; FeatureStyle.xsd,
 * Symbolizer.xsd and common.xsd 1.1.0 (OGC 05-077r4) for `se`; filter.xsd and expr.xsd 1.1.0 (OGC 04-095)
 * for `ogc`. Written down from the documents; the schemas themselves are not at hand.
 */
const orders: Record<string, string> = {
	'sld:StyledLayerDescriptor': 'se:Name? se:Description? sld:UseSLDLibrary* sld:NamedLayer*',
	'sld:NamedLayer': 'se:Name se:Description? sld:LayerFeatureConstraints? sld:UserStyle*',
	'sld:UserStyle': 'se:Name? se:Description? sld:IsDefault? se:FeatureTypeStyle+',
	'sld:IsDefault': '',
	'se:FeatureTypeStyle':
		'se:Name? se:Description? se:FeatureTypeName? se:SemanticTypeIdentifier* se:Rule+',
	'se:Rule':
		'se:Name? se:Description? se:LegendGraphic? ogc:Filter? se:ElseFilter? se:MinScaleDenominator? se:MaxScaleDenominator? se:PolygonSymbolizer* se:LineSymbolizer* se:TextSymbolizer*',
	'se:Name': '',
	'se:Description': 'se:Title? se:Abstract?',
	'se:Title': '',
	'se:Abstract': '',
	'se:ElseFilter': '',
	'se:PolygonSymbolizer':
		'se:Name? se:Description? se:BaseSymbolizer? se:Geometry? se:Fill? se:Stroke? se:Displacement? se:PerpendicularOffset?',
	'se:LineSymbolizer':
		'se:Name? se:Description? se:BaseSymbolizer? se:Geometry? se:Stroke? se:PerpendicularOffset?',
	'se:TextSymbolizer':
		'se:Name? se:Description? se:BaseSymbolizer? se:Geometry? se:Label? se:Font? se:LabelPlacement? se:Halo? se:Fill?',
	'se:Fill': 'se:GraphicFill? se:SvgParameter*',
	'se:Stroke': 'se:GraphicFill? se:GraphicStroke? se:SvgParameter*',
	'se:GraphicFill': 'se:Graphic',
	'se:Graphic':
		'se:ExternalGraphic* se:Mark* se:Opacity? se:Size? se:Rotation? se:AnchorPoint? se:Displacement?',
	'se:ExternalGraphic': 'se:OnlineResource? se:InlineContent? se:Format se:ColorReplacement*',
	'se:InlineContent': '',
	'se:Format': '',
	'se:Size': '',
	'se:Font': 'se:SvgParameter*',
	'se:SvgParameter': '',
	'se:Label': 'ogc:PropertyName?',
	'se:LabelPlacement': 'se:PointPlacement? se:LinePlacement?',
	'se:PointPlacement': 'se:AnchorPoint? se:Displacement? se:Rotation?',
	'se:AnchorPoint': 'se:AnchorPointX se:AnchorPointY',
	'se:AnchorPointX': '',
	'se:AnchorPointY': '',
	'ogc:Filter': 'ogc:PropertyIsEqualTo',
	'ogc:PropertyIsEqualTo': 'ogc:PropertyName ogc:Literal',
	'ogc:PropertyName': '',
	'ogc:Literal': '',
};

/** Attributes that the same schemas allow, beside declarations of namespaces. */
const attributes: Record<string, RegExp> = {
	'sld:StyledLayerDescriptor': /^(version|xmlns:.*|xsi:schemaLocation)$/,
	'se:PolygonSymbolizer': /^(version|uom)$/,
	'se:LineSymbolizer': /^(version|uom)$/,
	'se:TextSymbolizer': /^(version|uom)$/,
	'se:SvgParameter': /^name$/,
	'se:InlineContent': /^encoding$/,
};

/** SvgParameter names of Symbology Encoding 1.1.0, 11.1.3, 11.2.2 and 11.4.4. */
const parameters =
	/^(fill|fill-opacity|stroke|stroke-(opacity|width|linejoin|linecap|dasharray|dashoffset)|font-(family|style|weight|size))$/;

function faults({ name, attributes: own, children }: Element): string[] {
	const order = orders[name];
	if (order === undefined) return [`element ${name}`];
	const pattern = order
		.split(' ')
		.filter(Boolean)
		.map((item) => item.replace(/^([\w:]+)(.?)$/, '($1;)$2'))
		.join('');
	const found = children.map((child) => `${child.name};`).join('');
	const allowed = attributes[name] ?? /^$/;
	return [
		...(new RegExp(`^${pattern}$`).test(found) ? [] : [`${name}: ${found}`]),
		...Object.keys(own)
			.filter((one) => !allowed.test(one))
			.map((one) => `${name} has ${one}`),
		...(name === 'se:SvgParameter' && !parameters.test(own.name) ? [own.name] : []),
		...children.flatMap(faults),
	];
}

const all = (element: Element, name: string): Element[] => [
	...(element.name === name ? [element] : []),
	...element.children.flatMap((child) => all(child, name)),
];

const styleOf = ({ drawing, about }: ExportSource) => treeOf(exportSld(drawing, about));

describe('SLD 1.1', () => {
	const source = sourceOf(statesCoverage(), { inks: hatchedInks });
	const root = styleOf(source);

	it('keeps the order that the schemas ask for', () => {
		expect(root.name).toBe('sld:StyledLayerDescriptor');
		expect(root.attributes.version).toBe('1.1.0');
		expect(faults(root)).toEqual([]);
	});

	it('has a rule an ink in use, by its number, with its fill', () => {
		const [fills] = all(root, 'se:FeatureTypeStyle');
		const found = all(fills, 'se:Rule').flatMap((rule) => {
			const [literal] = all(rule, 'ogc:Literal');
			const [fill] = all(rule, 'se:SvgParameter');
			return literal ? [[Number(literal.text), fill.text]] : [];
		});
		const used = [...new Set(source.drawing.fills.map(({ ink }) => ink))].sort((a, b) => a - b);
		expect(found).toEqual(used.map((ink) => [ink + 1, source.drawing.inks[ink].hex]));
		expect(all(fills, 'ogc:PropertyName').every(({ text }) => text === 'inkNumber')).toBe(true);
		expect(all(fills, 'se:ElseFilter').length).toBe(1);
	});

	it('carries a tile for each direction of a hatch', () => {
		const tiles = all(root, 'se:InlineContent');
		// the first ink is crossed, the third has lines one way
		expect(tiles.length).toBe(3);
		for (const { text, attributes: own } of tiles) {
			expect(own.encoding).toBe('base64');
			const svg = Buffer.from(text, 'base64').toString('utf8');
			const parser = new SaxesParser();
			parser.on('error', (error) => {
				throw error;
			});
			parser.write(svg).close();
			expect(svg).toContain('stroke="#333333"');
		}
	});

	it('reckons lengths in pixels of 0.28 mm', () => {
		const width = all(root, 'se:SvgParameter').find(
			({ attributes: own }) => own.name === 'stroke-width',
		)!;
		const line = source.drawing.lines.find(({ rank }) => rank === 'region')!;
		// Symbology Encoding 1.1.0, 10.2: the standardized rendering pixel is 0.28 mm square
		expect(Number(width.text)).toBeCloseTo(line.width / 100 / 0.28, 3);
	});

	it('has a rule a class of a themed sheet, titled with its range, and those that are not told', () => {
		const inkNames = ['up to 10', '10 to 20', 'over 20', 'no data', 'suppressed'];
		const coverage = statesCoverage();
		const theme = {
			...{ told: 3, title: 'Visits', note: '' },
			inks: inkNames.map((name, i) => ({ name, hex: hatchedInks[i % 4].hex })),
			// nobody is in the middle class, which is a class all the same
			classes: Int32Array.from(coverage.keys, (_, i) => [0, 2, 3, 4][i % 4]),
		};
		const themed = styleOf(sourceOf(coverage, { theme }));
		expect(faults(themed)).toEqual([]);
		const rules = all(all(themed, 'se:FeatureTypeStyle')[0], 'se:Rule').map((rule) => [
			all(rule, 'se:Name')[0].text,
			all(rule, 'se:Title')[0].text,
			all(rule, 'ogc:Literal')[0]?.text ?? null,
			all(rule, 'se:SvgParameter')[0].text,
		]);
		const hex = (i: number) => theme.inks[i].hex;
		expect(rules).toEqual([
			['class-1', 'Class 1: up to 10', '1', hex(0)],
			['class-2', 'Class 2: 10 to 20', '2', hex(1)],
			['class-3', 'Class 3: over 20', '3', hex(2)],
			['no-data', 'no data', '4', hex(3)],
			['suppressed', 'suppressed', '5', hex(4)],
			['no-ink', 'No ink', null, '#f2f2f2'],
		]);
	});

	it('stands where nothing is coloured, and is the same bytes every time', () => {
		const bare = sourceOf(statesCoverage(), { colouring: null });
		expect(faults(styleOf(bare))).toEqual([]);
		const { drawing, about } = source;
		expect(exportSld(drawing, about)).toEqual(exportSld(drawing, about));
	});

	it('holds hostile texts as texts', () => {
		expect(faults(styleOf(hostileSource()))).toEqual([]);
	});
});

describe('the tile of a hatch', () => {
	it('repeats with lines at the angle and the distance asked for', () => {
		for (const angle of [20, 30, 45, 60, 110, 135, 160]) {
			const { svg, heightMm } = hatchTile({
				...{ kind: 'lines', angle, spacingMm: 2, widthMm: 0.2, hex: '#000000' },
			});
			const width = Number(/ width="([\d.]+)mm"/.exec(svg)![1]);
			// a line from corner to corner: its slope, and the distance of parallels one tile apart
			expect(Math.atan2(heightMm, width)).toBeCloseTo(
				((angle < 90 ? angle : 180 - angle) * Math.PI) / 180,
				3,
			);
			expect((width * heightMm) / Math.hypot(width, heightMm)).toBeCloseTo(2, 3);
		}
	});

	it('is a square where the lines lie along its edges', () => {
		for (const angle of [0, 1, 90, 179]) {
			const { svg, heightMm } = hatchTile({
				...{ kind: 'lines', angle, spacingMm: 2, widthMm: 0.2, hex: '#000000' },
			});
			expect(heightMm).toBe(2);
			expect(svg).toContain(angle === 90 ? 'd="M1 0V2"' : 'd="M0 1H2"');
		}
	});
});
