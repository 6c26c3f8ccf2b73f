import { describe, expect, it } from 'vitest';
import { topologyOf } from '../../../../../tests/support/atlas.ts';
import { coverageFrom } from '../../../../../tests/support/coverage.ts';
import { layout, sheetOf, worldCoverage } from '../../../../../tests/support/sheets.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import type { Drawing } from '../drawing.ts';
import { drawSheet } from '../index.ts';
import type { SheetLayout } from '../layout.ts';
import { clustersOf } from './clusters.ts';

const us = coverageFrom(topologyOf('us-atlas', 'states-10m.json'), 'states', {
	keep: (_, id) => !['60', '66', '69', '78'].includes(id),
});
const west = worldCoverage(['France', 'Spain', 'Portugal', 'Italy', 'Germany']);
const north = worldCoverage(['Greenland', 'Iceland', 'Faeroe Is.', 'Norway']);

const drawn = (coverage: Coverage, changes: Partial<SheetLayout> = {}, choices = {}) =>
	drawSheet(
		sheetOf(coverage, {
			layout: {
				...layout,
				...changes,
				labels: false,
				frame: { ...layout.frame, insets: 'auto', insetChoices: choices },
			},
		}),
	);

/** Left, top, right, bottom of every frame. */
const framesOf = ({ shapes }: Drawing) =>
	shapes
		.filter(({ layer }) => layer === 'inset')
		.map(({ points }) => [points[0], points[1], points[4], points[5]]);

/** The words that begin within each frame, and what stands out of it. */
function wordsIn(drawing: Drawing) {
	return framesOf(drawing).map(([left, top, right, bottom]) => {
		const own = drawing.texts.filter(
			({ layer, x, y }) => layer === 'collar' && x >= left && x <= right && y >= top && y <= bottom,
		);
		const out = own.filter(
			({ x, y, width, size }) => x + width > right || y - 0.7 * size < top || y > bottom,
		);
		return { said: own.map(({ text }) => text), out };
	});
}

describe('words over insets', () => {
	it.each([
		['the United States', us, {}],
		['the United States, standing', us, { orientation: 'portrait' }],
		['western Europe', west, {}],
		['western Europe on A5', west, { paper: 'A5' }],
		['the north', north, { orientation: 'portrait' }],
	] as const)('are whole and within the frame: %s', (_, coverage, changes) => {
		const frames = wordsIn(drawn(coverage, changes));
		expect(frames.length).toBeGreaterThan(1);
		for (const { said, out } of frames) {
			expect(out).toEqual([]);
			expect(said.join(' ')).not.toContain('…');
			expect(said.some((one) => one === 'scale of the map' || one.startsWith('1 : '))).toBe(true);
		}
	});

	it('wrap a long name between words', () => {
		const name = 'The islands of the far north and the sounds between them';
		const { id } = clustersOf(us)[1];
		const choice = { place: null, cornerMm: null, ratio: null, name };
		const said = wordsIn(drawn(us, {}, { [id]: choice })).map((frame) => frame.said.join(' '));
		expect(said.filter((one) => one.startsWith(name))).toHaveLength(1);
	});

	it('tell parts of one region from each other by where they lie', () => {
		const said = wordsIn(drawn(west)).map((frame) => frame.said.join(' '));
		const france = said.filter((one) => one.startsWith('part of France'));
		expect(france.length).toBeGreaterThan(1);
		for (const one of france) expect(one).toMatch(/^part of France \(\d+° [NS] \d+° [EW]\)/);
		expect(new Set(said).size).toBe(said.length);
	});

	it('have a bar under them only where the scale is not that of the map', () => {
		for (const { said } of wordsIn(drawn(us))) {
			const figures = said.filter((one) => /km$/.test(one));
			expect(figures).toHaveLength(said.includes('scale of the map') ? 0 : 1);
		}
	});
});

describe('boxes of insets', () => {
	const boxOf = (drawing: Drawing, name: string) => {
		const { said, frame } = framesOf(drawing)
			.map((frame, i) => ({ frame, said: wordsIn(drawing)[i].said }))
			.find((one) => one.said.includes(name))!;
		return { said, frame };
	};

	it.each(['landscape', 'portrait'] as const)(
		'show Alaska no more than five times smaller than the map, and north of Hawaii: %s',
		(orientation) => {
			const drawing = drawn(us, { orientation });
			const [alaska, hawaii] = ['Alaska', 'Hawaii'].map((one) => boxOf(drawing, one));
			const { ratio } = drawing.frame.clusters.find(({ name }) => name.startsWith('Alaska'))!;
			expect(ratio! / drawing.frame.ratio!).toBeLessThan(5);
			expect(alaska.frame[3]).toBeLessThan(hawaii.frame[1]);
		},
	);

	it('use the room that a tall sheet leaves over a wide map', () => {
		const drawing = drawn(us, { orientation: 'portrait' });
		const [left, , right] = boxOf(drawing, 'Alaska').frame;
		expect(right - left).toBeGreaterThan(0.4 * drawing.widthMm * 100);
	});
});
