import { gunzipSync } from 'node:zlib';
import fc from 'fast-check';
import { SaxesParser } from 'saxes';
import { describe, expect, it } from 'vitest';
import { hatchedInks, hostileSource, sourceOf } from '../../../../tests/support/export-source.ts';
import { layout, statesCoverage } from '../../../../tests/support/sheets.ts';
import { elementId } from '../sheet/index.ts';
import { exportFile, type ExportSource, type SvgFileOptions } from './index.ts';

interface Element {
	name: string;
	attributes: Record<string, string>;
	parent: Element | null;
	children: Element[];
	text: string;
}

/** The tree of a document by saxes 6.0.0 with namespaces, which throws on what is not well-formed. */
function treeOf(xml: string): Element[] {
	const all: Element[] = [];
	let open: Element | null = null;
	const parser = new SaxesParser({ xmlns: true });
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('opentag', ({ name, attributes }) => {
		const own = Object.values(attributes).map((one) => [one.name, one.value]);
		const element: Element = {
			...{ name, attributes: Object.fromEntries(own), parent: open, children: [], text: '' },
		};
		open?.children.push(element);
		all.push((open = element));
	});
	parser.on('text', (text) => void (open && (open.text += text)));
	parser.on('closetag', () => void (open = open!.parent));
	parser.write(xml).close();
	return all;
}

async function fileOf(
	source: ExportSource,
	options: Partial<SvgFileOptions> = {},
	kind: 'svg' | 'svgz' = 'svg',
): Promise<Uint8Array> {
	const outcome = await exportFile(kind, source, options);
	if (outcome.status === 'refused') throw new Error(outcome.message);
	return outcome.file.bytes;
}

const text = (bytes: Uint8Array) => new TextDecoder().decode(bytes);

/**
 * Elements and attributes of SVG 2 (W3C Candidate Recommendation 2018, appendices for elements and
 * attributes), WAI-ARIA 1.2 and the Graphics Module that a sheet may have. No script, no link, no image,
 * no foreign content, no event, no style attribute.
 */
const elements = new Set(['svg', 'title', 'desc', 'style', 'g', 'path', 'rect', 'text']);
const attributes =
	/^(xmlns|xml:lang|viewBox|id|class|role|tabindex|d|x|y|width|height|fill|fill-rule|stroke|stroke-(width|linejoin|linecap|dasharray)|font-(family|size|weight|style)|textLength|aria-(label|labelledby|hidden)|data-(key|ink|locked))$/;

function faults(all: Element[]): string[] {
	const ids = all.map(({ attributes: { id } }) => id).filter((id) => id !== undefined);
	const [root] = all;
	const named = [...elements, ''];
	return [
		...all.filter(({ name }) => !named.includes(name)).map(({ name }) => `element ${name}`),
		...all
			.flatMap((one) => Object.keys(one.attributes))
			.filter((name) => !attributes.test(name))
			.map((name) => `attribute ${name}`),
		...ids.filter((id, i) => ids.indexOf(id) !== i).map((id) => `twice: ${id}`),
		// XML 1.0, 2.3: ID values are names
		...ids.filter((id) => !/^[A-Za-z_][\w.-]*$/.test(id)).map((id) => `no name: ${id}`),
		// SVG 2, 5.8: a title is to be the first child
		...all
			.filter(({ children }) => children.slice(1).some(({ name }) => name === 'title'))
			.map(({ name }) => `title not first in ${name}`),
		...(root.children[0]?.name === 'title' ? [] : ['the document has no title first']),
		// SVG 2, 9.3: a path begins with a moveto, and a lineto has numbers
		...all
			.filter(({ name, attributes: { d } }) => name === 'path' && /^[^Mm]|[lLQC][zZMm]|NaN/.test(d))
			.map(({ attributes: { d } }) => `path ${d.slice(0, 20)}`),
		...root.attributes['aria-labelledby']
			.split(' ')
			.filter((id) => !ids.includes(id))
			.map((id) => `no element ${id}`),
	];
}

const every = (['class', 'attribute'] as const).flatMap((colours) =>
	(['embedded', 'outlines', 'plain'] as const).map((letters) => ({ colours, letters })),
);

describe.each(every)('SVG with colours by $colours and letters $letters', (options) => {
	const source = sourceOf(statesCoverage(), { inks: hatchedInks });

	it('keeps the rules of the standard and refers to nothing outside', async () => {
		const svg = text(await fileOf(source, options));
		expect(svg.startsWith('<?xml version="1.0" encoding="UTF-8"?>\n<svg ')).toBe(true);
		const all = treeOf(svg);
		expect(faults(all)).toEqual([]);
		expect(all[0].attributes).toMatchObject({
			...{ role: 'graphics-document', 'xml:lang': 'en', xmlns: 'http://www.w3.org/2000/svg' },
		});
		expect(
			svg.match(/url\((?!data:font\/ttf;base64,)|@import|href|<!DOCTYPE|<!ENTITY/i),
		).toBeNull();
		expect(all.find(({ name }) => name === 'desc')!.text).toBe(source.drawing.description);
	});

	it('has a shape a region with its key, its title and an id that stays', async () => {
		const all = treeOf(text(await fileOf(source, options)));
		const regions = all.filter((one) => one.attributes['data-key'] !== undefined);
		expect(regions.map((one) => one.attributes['data-key'])).toEqual(source.coverage.keys);
		for (const { attributes: own, children, parent } of regions) {
			expect(own.id).toBe(elementId(own['data-key']));
			expect(children.map(({ name }) => name)).toEqual(['title']);
			expect(parent!.attributes.id).toBe('fills');
			expect('class' in own).toBe(options.colours === 'class');
			expect('fill' in own).toBe(options.colours === 'attribute');
		}
		const names = all.filter(({ name }) => name === 'g').map((one) => one.attributes.id);
		for (const layer of ['fills', 'borders', 'borders-outer', 'labels', 'collar']) {
			expect(names).toContain(layer);
		}
	});

	it('has its letters as asked, and the same bytes every time', async () => {
		const bytes = await fileOf(source, options);
		const svg = text(bytes);
		expect(svg.includes('@font-face')).toBe(options.letters === 'embedded');
		expect(svg.includes('<text ')).toBe(options.letters !== 'outlines');
		const words = treeOf(svg).map((one) => one.text || one.attributes['aria-label']);
		expect(words).toContain(source.drawing.title);
		expect(Buffer.compare(bytes, await fileOf(source, options))).toBe(0);
	});

	it('holds hostile texts as texts', async () => {
		expect(faults(treeOf(text(await fileOf(hostileSource(), options))))).toEqual([]);
	});
});

describe('packed SVG', () => {
	it('is the very SVG, unpacked by zlib, without a time in it', async () => {
		const source = sourceOf();
		const packed = await fileOf(source, {}, 'svgz');
		expect(Buffer.compare(gunzipSync(packed), await fileOf(source))).toBe(0);
		// RFC 1952, 2.3.1: four bytes of time from the fourth on
		expect([...packed.subarray(4, 8)]).toEqual([0, 0, 0, 0]);
	});
});

describe('names', () => {
	it('may hold anything', async () => {
		const coverage = statesCoverage();
		const any = fc.array(fc.string({ unit: 'binary', maxLength: 30 }), {
			minLength: 1,
			maxLength: 20,
		});
		await fc.assert(
			fc.asyncProperty(any, async (names) => {
				const source = sourceOf({
					...coverage,
					names: coverage.names.map((_, i) => names[i % names.length]),
					keys: coverage.keys.map((key, i) => `${key}${names[i % names.length]}`),
				});
				const svg = text(await fileOf(source, { letters: 'plain' }));
				expect(faults(treeOf(svg))).toEqual([]);
			}),
			{ numRuns: 5 },
		);
	});

	it('with letters that no face has are told', async () => {
		const titled = sourceOf(statesCoverage(), { layout: { ...layout, title: '東京' } });
		const outcome = await exportFile('svg', titled);
		if (outcome.status === 'refused') throw new Error(outcome.message);
		expect(titled.drawing.texts.some(({ text: words }) => words === '東京')).toBe(true);
		expect(outcome.file.notes).toEqual([
			'1 text holds letters that the sheet’s typefaces lack: “東京”.',
		]);
	});
});
