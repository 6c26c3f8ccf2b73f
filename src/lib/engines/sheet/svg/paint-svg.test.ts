import { geoPath } from 'd3-geo';
import { SaxesParser } from 'saxes';
import { feature } from 'topojson-client';
import type { GeometryCollection } from 'topojson-specification';
import { describe, expect, it } from 'vitest';
import { topologyOf } from '../../../../../tests/support/atlas.ts';
import { countiesCoverage, sheetOf, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { caution, chooseProjection, drawSheet, extentOf, paintSvg } from '../index.ts';
import { layout } from '../../../../../tests/support/sheets.ts';

interface Element {
	name: string;
	attributes: Record<string, string>;
	text: string;
	inside: string[];
}

/** Every element with its attributes, by a strict XML parser; throws on anything ill-formed. */
function parse(svg: string): Element[] {
	const parser = new SaxesParser({ xmlns: false });
	const found: Element[] = [];
	const open: Element[] = [];
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('opentag', ({ name, attributes }) => {
		const element = { name, attributes, text: '', inside: open.map((one) => one.attributes.id) };
		found.push(element);
		open.push(element);
	});
	parser.on('text', (text) => {
		if (open.length) open[open.length - 1].text += text;
	});
	parser.on('closetag', () => void open.pop());
	parser.write(svg).close();
	return found;
}

const fillsOf = (elements: Element[]) =>
	elements.filter(({ name, inside }) => name === 'path' && inside.includes('fills'));

/** Rings of path data as absolute points; only the commands M, l and z may occur. */
function ringsIn(d: string): [number, number][][] {
	return [...d.matchAll(/M([^lzM]*)l([^z]*)z/g)].map(([, start, steps]) => {
		const numbers = (text: string) => [...text.matchAll(/-?\d+/g)].map(Number);
		let [x, y] = numbers(start);
		const ring: [number, number][] = [[x, y]];
		const moves = numbers(steps);
		for (let i = 0; i < moves.length; i += 2) ring.push([(x += moves[i]), (y += moves[i + 1])]);
		return ring;
	});
}

function area(rings: [number, number][][]): number {
	let sum = 0;
	for (const ring of rings) {
		ring.forEach(([x, y], i) => {
			const [px, py] = ring[(i || ring.length) - 1];
			sum += (px * y - x * py) / 2;
		});
	}
	return Math.abs(sum);
}

describe('SVG of the 48 states and DC', () => {
	const coverage = statesCoverage();
	const drawing = drawSheet(sheetOf(coverage));
	const svg = paintSvg(drawing, { fills: 'attribute' });
	const elements = parse(svg);

	it('has the size of the paper in mm and a hundredth of a mm as its unit', () => {
		expect(elements[0].attributes).toMatchObject({
			viewBox: '0 0 29700 21000',
			width: '297mm',
			height: '210mm',
			role: 'graphics-document',
		});
	});

	it('has one path a region, named, keyed and closed', () => {
		const fills = fillsOf(elements);
		expect(fills.map(({ attributes }) => attributes['data-key'])).toEqual(coverage.keys);
		expect(new Set(fills.map(({ attributes }) => attributes.id)).size).toBe(49);
		for (const { attributes } of fills) {
			expect(attributes.role).toBe('graphics-symbol');
			expect(attributes['aria-label']).toMatch(/^[A-Z][A-Za-z ]+, ink [1-4] /);
			expect(attributes.d).toMatch(/^(M\d+ \d+l[-\d ]+z)+$/);
			for (const ring of ringsIn(attributes.d)) expect(ring[ring.length - 1]).toEqual(ring[0]);
		}
		const ids = elements.map(({ attributes }) => attributes.id).filter(Boolean);
		expect(new Set(ids).size).toBe(ids.length);
	});

	it('encloses the areas that d3-geo finds in the same projection', () => {
		const topology = topologyOf('us-atlas', 'states-10m.json');
		const { features } = feature(topology, topology.objects.states as GeometryCollection);
		const { projection } = chooseProjection(extentOf(coverage), layout);
		const path = geoPath(projection.scale(1e5).precision(0.1));
		const expected = coverage.keys.map((key) => path.area(features.find(({ id }) => id === key)!));
		const found = fillsOf(elements).map(({ attributes }) => area(ringsIn(attributes.d)));
		const total = (list: number[]) => list.reduce((sum, one) => sum + one, 0);
		const scale = total(found) / total(expected);
		found.forEach((one, i) => {
			// 2 % or a tenth of a square millimetre, for points are rounded to 0.01 mm
			const slack = Math.max(0.02 * scale * expected[i], 1000);
			expect(Math.abs(one - scale * expected[i]), coverage.keys[i]).toBeLessThan(slack);
		});
	});

	it('draws every border once, outer edges and those between regions apart', () => {
		const ranks = drawing.lines.filter(({ rank }) => rank !== 'leader');
		const drawn = ranks.flatMap(({ arcs }) => [...arcs]);
		expect(new Set(drawn).size).toBe(drawn.length);
		const kept = coverage.arcLeft.filter(
			(_, arc) => drawing.arcStarts[arc + 1] - drawing.arcStarts[arc] > 1,
		);
		expect(drawn.length).toBe(kept.length);
		const outer = ranks.find(({ rank }) => rank === 'outer')!.arcs;
		const alone = coverage.arcLeft.filter(
			(left, arc) => outer.includes(arc) && left < 0 === coverage.arcRight[arc] < 0,
		);
		expect(alone.length).toBe(0);
		const lines = elements.filter(({ inside }) => inside.includes('borders'));
		expect(lines.filter(({ name }) => name === 'g').map(({ attributes }) => attributes.id)).toEqual(
			['borders-region', 'borders-outer', 'leaders'],
		);
	});

	it('carries no script, no style attribute, no link, and the whole caution', () => {
		expect(svg.match(/<script| style=|href|<style|javascript:/)).toBeNull();
		const collar = elements.filter(({ inside }) => inside.includes('collar'));
		expect(collar.map(({ text }) => text).join(' ')).toContain(caution);
	});

	it('is the same every time', () => {
		expect(paintSvg(drawSheet(sheetOf(statesCoverage())), { fills: 'attribute' })).toBe(svg);
	});

	it('sets colours by class where asked, one rule an ink', () => {
		const byClass = parse(paintSvg(drawing, { fills: 'class', idPrefix: 'a-', interactive: true }));
		const style = byClass.find(({ name }) => name === 'style')!.text;
		expect(style).toContain('.ink-1{fill:#edb552}');
		const fills = byClass.filter(({ attributes }) => attributes['data-key']);
		expect(fills.every(({ attributes }) => /^ink-[1-4]$/.test(attributes.class))).toBe(true);
		expect(fills.every(({ attributes }) => attributes.tabindex === '-1')).toBe(true);
		expect(fills.every(({ attributes }) => attributes.id.startsWith('a-r-'))).toBe(true);
	});
});

describe('SVG of 3,108 counties', () => {
	it('has them all, and no lineto without numbers', () => {
		const coverage = countiesCoverage();
		const svg = paintSvg(drawSheet(sheetOf(coverage)), { fills: 'class' });
		const fills = fillsOf(parse(svg));
		expect(fills.length).toBe(3108);
		const paths = fills.map(({ attributes }) => attributes.d);
		expect(paths.filter((d) => !/^(M\d+ \d+l[-\d ]+z)*$/.test(d))).toEqual([]);
		// on A4 the smallest counties are specks: some may vanish, but only a few
		expect(paths.filter((d) => d === '').length).toBeLessThan(30);
	});
});

describe('hostile names', () => {
	const hostile = [
		'<script>alert(1)</script>',
		'"><img src=x onerror=alert(1)>',
		"' onload='alert(1)",
		'a\u0000b\u0007c\u001b[31m\ufffe',
		'\ud800 lone',
		'\u202egpj.exe',
		']]>&amp;<!--',
		'',
	];

	it('read back as text in every place they stand', () => {
		const coverage = statesCoverage();
		coverage.names = coverage.names.map((_, i) => hostile[i % hostile.length]);
		coverage.keys = coverage.keys.map((key, i) => `${key} ${hostile[i % hostile.length]}`);
		const sheet = sheetOf(coverage, {
			layout: { ...layout, title: hostile[0], subtitle: hostile[1], credits: hostile[2] },
			issue: hostile[3],
			inks: hostile.slice(0, 8).map((name) => ({ name, hex: '#aabbcc' })),
		});
		for (const fills of ['attribute', 'class'] as const) {
			const elements = parse(paintSvg(drawSheet(sheet), { fills }));
			const allowed = ['svg', 'title', 'desc', 'style', 'rect', 'g', 'path', 'text'];
			expect(elements.filter(({ name }) => !allowed.includes(name))).toEqual([]);
			const names = elements.flatMap(({ attributes }) => Object.keys(attributes));
			expect(names.filter((name) => /^on|^style$|href/.test(name))).toEqual([]);
			const ids = elements.map(({ attributes }) => attributes.id).filter(Boolean);
			expect(new Set(ids).size).toBe(ids.length);
			expect(fillsOf(elements).length).toBe(49);
			const title = elements.find(({ attributes }) => attributes.id === 'title')!;
			expect(title.text).toBe('<script>alert(1)</script>');
		}
	});
});
