import { SaxesParser } from 'saxes';
import { describe, expect, it } from 'vitest';
import { sheetOf, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { paintArea, type Pen } from '../canvas/paint-area.ts';
import { groundOf } from '../canvas/ground.ts';
import { drawSheet } from '../draw-sheet.ts';
import { shapeLayers, type DrawnShape } from '../shapes.ts';
import { paintSvg } from './paint-svg.ts';

const drawing = drawSheet(sheetOf(statesCoverage()));
const plain = paintSvg(drawing, { fills: 'attribute' });

/** A square with a hole, and an open line, in every layer. */
const shapes: DrawnShape[] = shapeLayers.flatMap((layer, i) => [
	{
		layer,
		points: Int32Array.of(100, 100, 900, 100, 900, 900, 100, 900, 300, 300, 300, 600, 600, 600),
		starts: Uint32Array.of(0, 4, 7),
		closed: true,
		fill: `#00000${i}`,
		stroke: null,
		strokeWidth: 0,
	},
	{
		layer,
		points: Int32Array.of(50, 60, 40, 90, 7, 7, 500, 20, 480, 40, 480, 35),
		starts: Uint32Array.of(0, 2, 3, 6),
		closed: false,
		fill: null,
		stroke: `#0000${i}0`,
		strokeWidth: 12,
		dash: [30, 20],
		...(layer === 'hatch' ? { ink: 2 } : {}),
	},
]);

interface Path {
	groups: string[];
	attributes: Record<string, string>;
}

/** Groups in order, and paths with the groups that they stand in, by a strict XML parser. */
function parse(svg: string) {
	const parser = new SaxesParser({ xmlns: false });
	const groups: string[] = [];
	const paths: Path[] = [];
	const open: string[] = [];
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('opentag', ({ name, attributes }) => {
		if (name === 'g' && attributes.id) groups.push(attributes.id);
		if (name === 'path') paths.push({ groups: open.filter(Boolean), attributes });
		open.push(attributes.id ?? '');
	});
	parser.on('closetag', () => void open.pop());
	parser.write(svg).close();
	return { groups, paths };
}

/** Absolute points of path data of m, M, l and z, as SVG 2 (9.3) reads them. */
function pathsOf(d: string): string[] {
	const found: number[][] = [];
	let [x, y] = [0, 0];
	for (const [, command, text] of d.matchAll(/([MmlLz])([^MmlLz]*)/g)) {
		const numbers = (text.match(/-?\d+/g) ?? []).map(Number);
		if (command === 'z') [x, y] = found[found.length - 1];
		if (command === 'M') [x, y] = [0, 0];
		if (command === 'M' || command === 'm') found.push([]);
		for (let i = 0; i < numbers.length; i += 2)
			found[found.length - 1].push((x += numbers[i]), (y += numbers[i + 1]));
	}
	return found.map(String);
}

const expected = [
	['100,100,900,100,900,900,100,900', '300,300,300,600,600,600'],
	['50,60,40,90', '500,20,480,40,480,35'],
];

describe('shapes as SVG', () => {
	it('write nothing where there are none', () => {
		expect(paintSvg({ ...drawing, shapes: [] }, { fills: 'attribute' })).toBe(plain);
		const speck = { ...shapes[0], points: Int32Array.of(1, 1), starts: Uint32Array.of(0, 1) };
		expect(paintSvg({ ...drawing, shapes: [speck] }, { fills: 'attribute' })).toBe(plain);
	});

	it('stand in named groups in the order of the layers, with the points that were given', () => {
		const { groups, paths } = parse(paintSvg({ ...drawing, shapes }, { fills: 'attribute' }));
		expect(groups).toEqual([
			...['sea', 'fills', 'lakes', 'hatches', 'graticule', 'water'],
			...['halos', 'borders', 'borders-region', 'borders-outer', 'leaders'],
			...['inset-frames', 'legend-ground', 'neat-line', 'text-grounds', 'north-arrow'],
			...['labels', 'collar', 'legend-samples'],
		]);
		for (const layer of ['sea', 'hatches', 'north-arrow', 'legend-samples']) {
			const own = paths.filter((path) => path.groups.includes(layer));
			expect(own.map(({ attributes }) => pathsOf(attributes.d))).toEqual(expected);
			expect(own[0].attributes['fill-rule']).toBe('evenodd');
			expect(own[1].attributes).toMatchObject({ fill: 'none', 'stroke-dasharray': '30 20' });
		}
	});

	it('give a hatch the class of its ink, with one rule', () => {
		const svg = paintSvg({ ...drawing, shapes }, { fills: 'class' });
		expect(svg.match(/\.hatch-3\{stroke:#000020\}/g)).toHaveLength(1);
		const hatched = parse(svg).paths.filter(({ attributes }) => attributes.class === 'hatch-3');
		expect(hatched.map(({ attributes }) => attributes['data-ink'])).toEqual(['3']);
	});
});

/** A canvas that writes down what it is told to paint, in order. */
class Writing {
	fillStyle = '';
	strokeStyle = '';
	lineWidth = 0;
	lineJoin = '';
	lineCap = '';
	globalAlpha = 1;
	told: string[] = [];
	#paths: number[][] = [];
	#dash: number[] = [];
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
	setLineDash(dash: number[]) {
		this.#dash = dash;
	}
	fillRect() {}
	fill(rule = 'nonzero') {
		this.told.push(`${this.fillStyle} ${rule}: ${this.#paths.join(' ')}`);
	}
	stroke() {
		this.told.push(
			`${this.strokeStyle} ${this.lineWidth} [${this.#dash}]: ${this.#paths.join(' ')}`,
		);
	}
}

function painted(area = { left: 0, top: 0, right: 29_700, bottom: 21_000 }): string[] {
	const pen = new Writing();
	const colours = { hexes: ['#abcdef'], of: new Uint8Array(drawing.fills.length), faded: null };
	const lines = [{ rank: 'outer', width: 7, hex: '#111111', arcs: Uint32Array.of(0) }];
	const picture = { ground: groundOf(drawing), lines, shapes, colours, outline: null };
	paintArea(pen as unknown as Pen, picture, area, 0.1);
	return pen.told;
}

describe('shapes on a canvas', () => {
	it('lie under and over the fills as in the SVG, and below border lines; the rest is lettering', () => {
		const order = painted().map((one) => one.slice(0, 7));
		expect(order.filter((hex, i) => hex !== order[i - 1])).toEqual(
			[
				...['#000000', '#000000', '#abcdef'],
				...['#000001', '#000010', '#000002', '#000020'],
				...['#000003', '#000030', '#000004', '#000040', '#111111'],
			].filter((hex, i, all) => hex !== all[i - 1]),
		);
		expect(painted()[0]).toBe(`#000000 evenodd: ${expected[0].join(' ')}`);
		expect(painted()[1]).toBe(`#000000 12 [30,20]: ${expected[1].join(' ')}`);
	});

	it('are passed over where they cannot show', () => {
		const far = painted({ left: 5000, top: 5000, right: 5100, bottom: 5100 });
		expect(far.filter((one) => /^#00000|^#0000.0/.test(one))).toEqual([]);
		const near = painted({ left: 490, top: 10, right: 520, bottom: 30 });
		expect(near).toContain(`#000000 12 [30,20]: ${expected[1][1]}`);
	});
});
