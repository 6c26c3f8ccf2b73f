import { Resvg } from '@resvg/resvg-js';
import fc from 'fast-check';
import { PNG } from 'pngjs';
import { describe, expect, it } from 'vitest';
import {
	countiesCoverage,
	layout,
	sheetOf,
	statesCoverage,
} from '../../../../../tests/support/sheets.ts';
import { drawSheet, type SheetInput } from '../draw-sheet.ts';
import type { Drawing } from '../drawing.ts';
import { paintSvg } from '../svg/paint-svg.ts';
import { decodeFirstPicture, encodeFirstPicture } from './first-picture-bytes.ts';
import { firstPicture, type FirstPicture } from './first-picture.ts';
import { paintFirstPicture } from './paint-first-picture.ts';

const bare = { ...layout, labels: false };
const north = (input: SheetInput) =>
	input.coverage.keys.map((key) => (Number(key.slice(0, 2)) > 30 ? 'one' : 'other'));

/** The map alone, painted by resvg 2.6.2 from the SVG of the files, twenty pixels to a cell's side squared. */
function byResvg(drawing: Drawing, { cell }: FirstPicture): PNG {
	const map = { ...drawing, texts: [], rects: [], shapes: [], legend: null };
	const resvg = new Resvg(paintSvg(map, { fills: 'attribute', idPrefix: '' }), {
		fitTo: { mode: 'width', value: Math.round((100 * drawing.widthMm) / cell) },
		background: '#ffffff',
	});
	return PNG.sync.read(resvg.render().asPng());
}

/** How far two pictures are apart: in the mean over the map, 0 to 255, each pixel with its neighbours. */
function apart(drawing: Drawing, picture: FirstPicture, shift = 0): number {
	const pixels = paintFirstPicture(picture, (region) => drawing.fills[region].hex);
	const other = byResvg(drawing, picture);
	const { columns, rows, cell, x, y } = picture;
	const [left, top] = [Math.round(x / cell) + shift, Math.round(y / cell)];
	let [sum, count] = [0, 0];
	for (let row = 4; row + 4 < rows; row += 4) {
		for (let column = 4; column + 4 < columns; column += 4) {
			for (let c = 0; c < 3; c++) {
				const ours = meanOf(pixels, columns, column, row, c);
				const theirs = meanOf(other.data, other.width, column + left, row + top, c);
				sum += Math.abs(ours - theirs);
				count++;
			}
		}
	}
	return sum / count;
}

/** In a square of four pixels a side. */
function meanOf(data: ArrayLike<number>, width: number, x: number, y: number, c: number): number {
	let sum = 0;
	for (let dy = 0; dy < 4; dy++)
		for (let dx = 0; dx < 4; dx++) sum += data[4 * ((y + dy) * width + x + dx) + c];
	return sum / 16;
}

describe.each([
	['49 states', statesCoverage, 2.5],
	['3,108 counties in two groups', countiesCoverage, 8],
])('the first picture of %s', (_, coverage, most) => {
	const plain = sheetOf(coverage(), { layout: bare });
	const input = { ...plain, groups: north(plain) };
	const drawing = drawSheet(input);
	const picture = firstPicture(drawing, input.groups)!;

	it('shows fills and lines where resvg paints them from the SVG of the same drawing', () => {
		expect(apart(drawing, picture)).toBeLessThan(most);
	});

	it('is told from the same picture moved by a millimetre', () => {
		expect(apart(drawing, picture, 5)).toBeGreaterThan(1.5 * apart(drawing, picture));
	});

	it('comes back from its bytes as it was', () => {
		const { buffer } = encodeFirstPicture(picture);
		expect(decodeFirstPicture(buffer as ArrayBuffer)).toEqual(picture);
	});
});

it('is none where nothing is drawn', () => {
	const drawing = drawSheet(sheetOf(statesCoverage(), { layout: bare }));
	const fills = drawing.fills.map((fill) => ({ ...fill, rings: [] }));
	expect(firstPicture({ ...drawing, fills }, [])).toBeNull();
});

describe('the bytes of a first picture', () => {
	const pictures = fc
		.record({ columns: fc.integer({ min: 1, max: 9 }), rows: fc.nat(9) })
		.chain(({ columns, rows }) =>
			fc
				.array(fc.integer({ min: -1, max: 3 }), {
					minLength: columns * rows,
					maxLength: columns * rows,
				})
				.map((owner): FirstPicture => ({
					...{ widthMm: 297, heightMm: 210.5, x: -30, y: 12, cell: 20, columns, rows },
					owner: Int32Array.from(owner),
					group: Uint32Array.of(0, 1, 1, 0),
					lines: [{ rank: 'region', width: 9, hex: '#102030' }],
				})),
		);

	it('are read back whatever the picture', () => {
		fc.assert(
			fc.property(pictures, (picture) => {
				const { buffer } = encodeFirstPicture(picture);
				expect(decodeFirstPicture(buffer as ArrayBuffer)).toEqual(picture);
			}),
		);
	});

	it('are refused when they are cut off or spoilt, and never read past', () => {
		fc.assert(
			fc.property(pictures, fc.nat(), fc.nat(255), ({ ...picture }, at, value) => {
				const bytes = encodeFirstPicture(picture);
				const cut = bytes.slice(0, at % bytes.length);
				expect(() => decodeFirstPicture(cut.buffer as ArrayBuffer)).toThrow(RangeError);
				bytes[at % bytes.length] = value;
				const read = decodedOrNull(bytes.buffer as ArrayBuffer);
				for (const region of read?.owner ?? []) expect(region).toBeLessThan(read!.group.length);
			}),
		);
	});
});

function decodedOrNull(bytes: ArrayBuffer): FirstPicture | null {
	try {
		return decodeFirstPicture(bytes);
	} catch (error) {
		if (error instanceof RangeError || error instanceof SyntaxError) return null;
		throw error;
	}
}
