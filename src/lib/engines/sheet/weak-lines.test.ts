import { describe, expect, it } from 'vitest';
import { layout, sheetOf, statesCoverage } from '../../../../tests/support/sheets.ts';
import { weakBorders, type Reader } from '../palettes/index.ts';
import { readers } from '../colour/reader.ts';
import { drawSheet, regionSizesMm } from './index.ts';

const coverage = statesCoverage();
// brick and leaf are one to red-green blind eyes, sky and mint nearly to blue-yellow blind ones
const inks = [
	{ name: 'Brick', hex: '#b5654a' },
	{ name: 'Leaf', hex: '#7f8a3c' },
	{ name: 'Sky', hex: '#8db4dd' },
	{ name: 'Mint', hex: '#8fbfae' },
	{ name: 'Rose', hex: '#c99aa8' },
];
const sheet = sheetOf(coverage, { inks });
const weak = weakBorders({
	borders: sheet.borders,
	colouring: sheet.colouring!,
	inks: inks.map(({ hex }) => hex),
	sizesMm: regionSizesMm(coverage, layout, inks),
});
const missedBy = (reader: Reader) => weak.filter((one) => one.reader === reader);
const pairsOf = (list: typeof weak) => {
	const { a, b } = sheet.borders;
	return new Set(list.map(({ border }) => `${a[border]} ${b[border]}`));
};

/** The pairs of regions between which a double line is drawn, by the sides of its arcs. */
function doubled(drawing: ReturnType<typeof drawSheet>, rank: string): Set<string> {
	const arcs = drawing.lines.find((one) => one.rank === rank)?.arcs ?? new Uint32Array();
	return new Set(
		[...arcs].map((arc) => {
			const sides = [coverage.arcLeft[arc], coverage.arcRight[arc]];
			return `${Math.min(...sides)} ${Math.max(...sides)}`;
		}),
	);
}

const legendOf = ({ texts }: ReturnType<typeof drawSheet>) =>
	texts
		.filter(({ layer }) => layer === 'legend')
		.map(({ text }) => text)
		.join(' ');

describe('borders that a reader could miss', () => {
	it('are there for more readers than one, and not for all alike', () => {
		const counts = readers.map((reader) => pairsOf(missedBy(reader)).size);
		expect(counts.filter(Boolean).length).toBeGreaterThan(2);
		expect(new Set(counts).size).toBeGreaterThan(2);
	});

	it.each(readers)(
		'are drawn double where %s readers would miss them, and nowhere else',
		(reader) => {
			const own = missedBy(reader);
			const drawing = drawSheet({ ...sheet, reader, weak: own });
			expect(doubled(drawing, 'weak')).toEqual(pairsOf(own));
			expect(doubled(drawing, 'weak-core')).toEqual(pairsOf(own));
			const words = legendOf(drawing);
			if (!own.length) expect(words).not.toContain('Double line');
			else expect(words).toContain(reader === 'grey' ? 'in grey print' : `to ${reader} readers`);
		},
	);

	it('are told in the legend with all who would miss them', () => {
		const own = [...missedBy('protan'), ...missedBy('deutan')];
		expect(legendOf(drawSheet({ ...sheet, weak: own }))).toContain(
			'Double line: two inks that look rather alike to protan and deutan readers',
		);
	});
});
