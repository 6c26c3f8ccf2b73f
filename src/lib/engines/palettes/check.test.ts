import { differenceCiede2000, lab65, type Rgb } from 'culori';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contrast, linearOf, seenLinear } from '../colour/index.ts';
import { checkPalette, demandFor, housePalettes, needsLabelOrHatch, readers } from './index.ts';

const hex = fc.integer({ min: 0, max: 0xffffff }).map((n) => `#${n.toString(16).padStart(6, '0')}`);
const palette = fc.array(hex, { minLength: 2, maxLength: 6 });

describe('checkPalette', () => {
	it('judges every pair once for every reader', () => {
		fc.assert(
			fc.property(palette, (inks) => {
				const { pairs, labels } = checkPalette(inks, 'all');
				expect(pairs).toHaveLength(((inks.length * (inks.length - 1)) / 2) * readers.length);
				expect(pairs.every(({ a, b }) => a < b)).toBe(true);
				expect(labels.map((label) => label.ink)).toEqual(inks.map((_, i) => i));
			}),
		);
	});

	it('passes exactly when nothing fails, each value against its own threshold', () => {
		fc.assert(
			fc.property(palette, fc.integer({ min: 1, max: 30 }), (inks, asked) => {
				const verdict = checkPalette(inks, 'all', { ciede2000: asked, grey: 3 });
				for (const pair of verdict.pairs) {
					const enough = pair.reader === 'grey' ? pair.greyGap >= 3 : pair.ciede2000 >= asked;
					expect(pair.passes).toBe(enough);
				}
				const all = [...verdict.pairs, ...verdict.labels].every((one) => one.passes);
				expect(verdict.passes).toBe(all);
			}),
		);
	});

	it('measures what culori measures on the simulated colours', () => {
		const difference = differenceCiede2000();
		const lab = (linear: readonly number[]) =>
			lab65({ mode: 'lrgb', r: linear[0], g: linear[1], b: linear[2] } as unknown as Rgb);
		fc.assert(
			fc.property(hex, hex, (one, two) => {
				for (const pair of checkPalette([one, two], 'all').pairs) {
					const [a, b] = [one, two].map((text) => lab(seenLinear(linearOf(text), pair.reader)));
					expect(pair.ciede2000).toBeCloseTo(difference(a, b), 3);
					expect(pair.greyGap).toBeCloseTo(
						Math.abs(lab(linearOf(one)).l - lab(linearOf(two)).l),
						3,
					);
					expect(pair.contrast).toBe(contrast(one, two));
				}
			}),
		);
	});

	it('counts only the pairs that touch, in any order and written twice', () => {
		const { pairs } = checkPalette(
			['#ff0000', '#fe0000', '#0000ff'],
			[
				[2, 0],
				[0, 2],
			],
		);
		expect(pairs.map(({ a, b }) => [a, b])).toEqual(readers.map(() => [0, 2]));
	});

	it('says so when nothing touches', () => {
		expect(checkPalette(['#777777', '#777777'], []).passes).toBe(true);
	});

	it.each([[[[0, 2]]], [[[1, 1]]], [[[-1, 0]]], [[[0.5, 1]]]])(
		'throws on a pair that is no pair of its inks: %j',
		(touching) => {
			expect(() => checkPalette(['#ffffff', '#000000'], touching as [number, number][])).toThrow(
				RangeError,
			);
		},
	);
});

describe('house palettes', () => {
	it.each(housePalettes)('$name passes for every reader and in grey print', ({ id, inks }) => {
		expect(
			checkPalette(
				inks.map((ink) => ink.hex),
				'all',
				{ ciede2000: 17 },
			).passes,
		).toBe(true);
		expect(id).toMatch(/^[a-z0-9-]+$/);
		expect(new Set(inks.map((ink) => ink.name)).size).toBe(inks.length);
	});

	it('runs from four inks to eight', () => {
		expect(housePalettes.map((one) => one.inks.length)).toEqual([4, 4, 5, 6, 7, 8]);
	});
});

// the steps are derived from Stone, Szafir and Setlur 2014; see demand.ts
it.each([
	[40, 10, false],
	[10, 10, false],
	[9.99, 12, false],
	[5, 12, false],
	[4.99, 15, false],
	[3.5, 15, false],
	[3.49, 15, true],
	[0, 15, true],
])('asks at a printed size of %d mm for %d', (mm, asked, more) => {
	expect(demandFor(mm)).toBe(asked);
	expect(needsLabelOrHatch(mm)).toBe(more);
});
