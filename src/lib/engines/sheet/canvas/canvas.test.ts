import { booleanPointInPolygon } from '@turf/turf';
import { describe, expect, it } from 'vitest';
import { sheetOf, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { simplifyCoverage } from '../../boundaries/index.ts';
import type { Drawing } from '../drawing.ts';
import { drawPlaced, drawSheet } from '../draw-sheet.ts';
import { ringPoints } from '../fills.ts';
import { paintSvg } from '../svg/paint-svg.ts';
import { boxOfRegion, groundOf, regionPath, type Area, type Ground } from './ground.ts';
import { paintArea, type Pen, type Picture } from './paint-area.ts';
import { refineGround } from './refine.ts';
import { regionAt } from './region-at.ts';

const coverage = statesCoverage();
const drawing = drawSheet(sheetOf(coverage));
const ground = groundOf(drawing);
const whole: Area = { left: 0, top: 0, right: 29_700, bottom: 21_000 };

/** A canvas that only writes down the rings it is told to fill, under their colour, and lines by width. */
class WritingPen {
	fillStyle = '';
	strokeStyle = '';
	lineWidth = 0;
	lineJoin = '';
	lineCap = '';
	globalAlpha = 1;
	filled: Record<string, string[]> = {};
	stroked: Record<string, string[]> = {};
	#paths: number[][] = [];
	beginPath() {
		this.#paths = [];
	}
	moveTo(x: number, y: number) {
		this.#paths.push([x, y]);
	}
	lineTo(x: number, y: number) {
		this.#paths[this.#paths.length - 1].push(x, y);
	}
	closePath() {}
	setTransform() {}
	setLineDash() {}
	fillRect() {}
	fill() {
		const key = this.globalAlpha < 1 ? `${this.fillStyle} faded` : this.fillStyle;
		(this.filled[key] ??= []).push(...this.#paths.map(String));
	}
	stroke() {
		(this.stroked[`${this.strokeStyle} ${this.lineWidth}`] ??= []).push(...this.#paths.map(String));
	}
}

function pictureOf({ fills, lines, shapes }: Drawing, faded: Uint8Array | null = null): Picture {
	const hexes = [...new Set(fills.map(({ hex }) => hex))];
	const of = Uint8Array.from(fills, ({ hex }) => hexes.indexOf(hex));
	return { ground, lines, shapes, colours: { hexes, of, faded }, outline: null };
}

function painted(picture: Picture, area: Area): WritingPen {
	const pen = new WritingPen();
	paintArea(pen as unknown as Pen, picture, area, 0.1);
	return pen;
}

/** Rings of path data made of one absolute moveto and relative linetos, as SVG 2 (9.3) reads them. */
function ringsOf(d: string): string[] {
	return d
		.split('M')
		.slice(1)
		.map((ring) => {
			const [start, steps] = ring.replace('z', '').split('l');
			const numbers = (text: string) => (text.match(/-?\d+/g) ?? []).map(Number);
			let [x, y] = numbers(start);
			const points = [x, y];
			numbers(steps).forEach((by, i) => {
				if (i % 2) points.push(x, (y += by));
				else x += by;
			});
			return String(points);
		});
}

describe('a canvas', () => {
	it('is told to fill the rings of the SVG in the colours of the SVG, each once', () => {
		const expected: Record<string, string[]> = {};
		const svg = paintSvg(drawing, { fills: 'attribute' });
		for (const [, hex, d] of svg.matchAll(/ data-key=[^>]* fill="(#\w+)"[^>]* d="([^"]*)"/g))
			(expected[hex] ??= []).push(...ringsOf(d));
		const { filled } = painted(pictureOf(drawing), whole);
		expect(Object.keys(filled).length).toBeGreaterThan(2);
		for (const rings of [expected, filled]) for (const list of Object.values(rings)) list.sort();
		expect(filled).toEqual(expected);
	});

	it('draws every line of the drawing once, as wide as it is', () => {
		const { stroked } = painted(pictureOf(drawing), whole);
		const lines = drawing.lines.filter(({ arcs }) => arcs.length);
		expect(Object.values(stroked).flat()).toHaveLength(
			lines.reduce((sum, { arcs }) => sum + arcs.length, 0),
		);
		for (const { hex, width, arcs } of lines)
			expect(stroked[`${hex} ${width}`].length).toBeGreaterThanOrEqual(arcs.length);
	});

	it('fades the regions that step back and no others', () => {
		const faded = Uint8Array.from(drawing.fills, (_, region) => (region === 5 ? 0 : 1));
		const { filled } = painted(pictureOf(drawing, faded), whole);
		const bright = Object.entries(filled).filter(([key]) => !key.endsWith('faded'));
		expect(bright.flatMap(([, rings]) => rings)).toHaveLength(drawing.fills[5].rings.length);
	});

	it('paints of a corner only what can show there', () => {
		const box = boxOfRegion(ground, 5)!;
		const area = { left: box.left, top: box.top, right: box.left + 1, bottom: box.top + 1 };
		const all = Object.values(painted(pictureOf(drawing), whole).filled).flat().length;
		const few = Object.values(painted(pictureOf(drawing), area).filled).flat().length;
		expect(few).toBeGreaterThan(0);
		expect(few).toBeLessThan(all / 3);
	});
});

/** Places spread over the paper without a pattern that borders could follow (Halton's sequence, 1960). */
function* places(count: number): Generator<[number, number]> {
	const halton = (index: number, base: number) => {
		let [value, part] = [0, 1];
		for (let i = index; i > 0; i = Math.floor(i / base)) value += (part /= base) * (i % base);
		return value;
	};
	for (let i = 1; i <= count; i++) yield [29_700 * halton(i, 2) + 0.3, 21_000 * halton(i, 3) + 0.3];
}

describe('a press', () => {
	it('finds the region that turf finds, at four thousand places', () => {
		const polygons = drawing.fills.map(({ rings }) => ({
			type: 'MultiPolygon' as const,
			// holes are rings of their own here: a place in two rings of a region is in its hole
			rings: rings.map((ring) => {
				const flat = ringPoints(drawing, ring);
				const points = Array.from({ length: flat.length / 2 }, (_, i) =>
					flat.slice(2 * i, 2 * i + 2),
				);
				return { type: 'Polygon' as const, coordinates: [[...points, points[0]]] };
			}),
		}));
		let inside = 0;
		for (const [x, y] of places(4_000)) {
			const expected = polygons.findIndex(
				({ rings }) => rings.filter((ring) => booleanPointInPolygon([x, y], ring)).length % 2 === 1,
			);
			expect(regionAt(ground, x, y), `${x} ${y}`).toBe(expected);
			inside += Number(expected >= 0);
		}
		expect(inside).toBeGreaterThan(800);
	});
});

const arcOf = ({ arcPoints, arcStarts }: Ground, arc: number) => [
	...arcPoints.subarray(2 * arcStarts[arc], 2 * arcStarts[arc + 1]),
];

describe('finer lines', () => {
	it('are laid in where one looks, and nowhere else, and every ring still closes', () => {
		const coarse = simplifyCoverage(coverage, 12_000).coverage;
		const { drawing: drawn, placement } = drawPlaced(sheetOf(coarse));
		const before = groundOf(drawn);
		const area = { left: 2_000, top: 4_000, right: 9_000, bottom: 9_000 };
		const after = refineGround(before, coverage, placement, area);
		let finer = 0;
		for (let arc = 0; arc + 1 < before.arcStarts.length; arc++) {
			const [was, is] = [arcOf(before, arc), arcOf(after, arc)];
			expect([is[0], is[1], is.at(-2), is.at(-1)]).toEqual([
				was[0],
				was[1],
				was.at(-2),
				was.at(-1),
			]);
			if (is.length > was.length) finer++;
			const [left, top, right, bottom] = before.arcBoxes.subarray(4 * arc, 4 * arc + 4);
			const away = left > area.right || right < area.left || top > area.bottom || bottom < area.top;
			if (away) expect(is).toEqual(was);
		}
		expect(finer).toBeGreaterThan(10);
		for (let region = 0; region < coverage.keys.length; region++) {
			const rings = ringsOf(regionPath(after, region));
			expect(rings.length).toBe(drawn.fills[region].rings.length);
			for (const ring of rings) {
				const points = ring.split(',');
				expect(points.slice(0, 2)).toEqual(points.slice(-2));
			}
		}
	});
});
