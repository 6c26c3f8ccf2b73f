import { differenceCiede2000, lab65, parse, type Rgb } from 'culori';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contrast, linearOf, seenLinear } from '../colour/index.ts';
import { covers } from './mend-covers.ts';
import { housePalettes, mendPalette, publishedPalettes, readers } from './index.ts';

const okabeIto = publishedPalettes.filter((one) => one.id === 'okabe-ito')[0];
const hexesOf = (palette: { inks: { hex: string }[] }) => palette.inks.map((ink) => ink.hex);
const difference = differenceCiede2000();

/** The least CIEDE2000 and gap in L* over all pairs and readers, measured by culori. */
function measured(inks: readonly string[]): { ciede2000: number; grey: number } {
	const lab = (text: string, reader: (typeof readers)[number]) => {
		const [r, g, b] = seenLinear(linearOf(text), reader);
		return lab65({ mode: 'lrgb', r, g, b } as unknown as Rgb);
	};
	const pairs = inks.flatMap((one, i) => inks.slice(0, i).map((two) => [one, two]));
	const eyes = readers.filter((reader) => reader !== 'grey');
	return {
		ciede2000: Math.min(
			...pairs.flatMap(([one, two]) => eyes.map((r) => difference(lab(one, r), lab(two, r)))),
		),
		grey: Math.min(...pairs.map(([a, b]) => Math.abs(lab(a, 'typical').l - lab(b, 'typical').l))),
	};
}

describe('mendPalette', () => {
	it('leaves a palette alone that passes', () => {
		const inks = hexesOf(housePalettes[0]);
		const result = mendPalette({ inks, touching: 'all' });
		expect(result).toEqual({ status: 'not-needed', inks, moves: [0, 0, 0, 0] });
	});

	it('moves few inks of a published palette, a little, until culori too finds it passes', () => {
		const inks = hexesOf(okabeIto);
		const result = mendPalette({ inks, touching: 'all', locked: [0, 1], seed: 7 });
		expect(result.status).toBe('mended');
		expect(result.inks.slice(0, 2)).toEqual(inks.slice(0, 2));
		const after = measured(result.inks);
		expect(after.ciede2000).toBeGreaterThanOrEqual(12 - 1e-4);
		expect(after.grey).toBeGreaterThanOrEqual(5 - 1e-4);
		expect(result.moves.filter((move) => move > 0).length).toBeLessThanOrEqual(4);
		result.inks.forEach((hex, i) => {
			const moved = difference(parse(inks[i]) ?? hex, parse(hex) ?? hex);
			expect(result.moves[i] > 0).toBe(hex !== inks[i]);
			expect(Math.abs(result.moves[i] - moved)).toBeLessThan(1);
		});
		const least = Math.min(
			...result.inks.map((hex) => Math.max(contrast(hex, '#000000'), contrast(hex, '#ffffff'))),
		);
		expect(least).toBeGreaterThanOrEqual(4.5);
	});

	it('is the same for the same seed', () => {
		const request = { inks: hexesOf(okabeIto), touching: 'all' as const, seed: 3 };
		expect(mendPalette(request)).toEqual(mendPalette(request));
	});

	it('moves one ink when one is enough', () => {
		const inks = ['#ebb855', '#e5ecf0', '#648fdf', '#6a8fdf'];
		const result = mendPalette({ inks, touching: 'all', locked: [2] });
		expect(result.status).toBe('mended');
		expect(result.moves.slice(0, 3)).toEqual([0, 0, 0]);
		expect(result.moves[3]).toBeGreaterThan(0);
	});

	it('leaves alike inks alone that never touch', () => {
		const inks = ['#648fdf', '#6490df', '#ebb855'];
		const touching: [number, number][] = [
			[0, 2],
			[1, 2],
		];
		expect(mendPalette({ inks, touching }).status).toBe('not-needed');
	});

	it('names the locked inks, the reader and the value that make it impossible', () => {
		const inks = ['#e41a1c', '#a65628', '#377eb8'];
		const result = mendPalette({ inks, touching: 'all', locked: [0, 1] });
		expect(result).toMatchObject({ status: 'impossible', inks, moves: [0, 0, 0] });
		expect(result.reason).toBe(
			'#e41a1c and #a65628 touch and are both locked, and they differ by 3.11 in CIEDE2000 for protan readers where 12 is asked',
		);
	});

	it('names a locked ink whose own label fails', () => {
		const result = mendPalette({
			inks: ['#777777', '#ffffff'],
			touching: 'all',
			locked: [0],
			thresholds: { label: 7 },
		});
		expect(result.status).toBe('impossible');
		expect(result.reason).toMatch(/^#777777 is locked, and a label reaches at most 4\.68:1/);
	});

	it('shows why grey print cannot hold so many steps', () => {
		const inks = hexesOf(okabeIto);
		const result = mendPalette({ inks, touching: 'all', thresholds: { grey: 15 } });
		expect(result.status).toBe('impossible');
		expect(result.reason).toMatch(/^8 inks that all touch would need 105 steps of L\*/);
	});

	it('claims no more than "best found" for a demand beyond what is known', () => {
		const inks = hexesOf(housePalettes[2]);
		const result = mendPalette({ inks, touching: 'all', thresholds: { ciede2000: 40 } });
		expect(result).toMatchObject({ status: 'not-found', inks });
		expect(result.reason).toBe(
			'40 is asked of 5 inks that all touch; the best found for so many is 27.3',
		);
	});

	it('says mended only of what passes, whatever it is given', () => {
		const hex = fc
			.integer({ min: 0, max: 0xffffff })
			.map((n) => `#${n.toString(16).padStart(6, '0')}`);
		fc.assert(
			fc.property(fc.array(hex, { minLength: 2, maxLength: 5 }), fc.nat(), (inks, seed) => {
				const result = mendPalette({ inks, touching: 'all', locked: [0], seed });
				expect(result.inks[0]).toBe(inks[0]);
				expect(result.reason !== undefined).toBe(!/mended|not-needed/.test(result.status));
				if (result.status !== 'mended') {
					expect(result.inks).toEqual(inks);
					return;
				}
				const after = measured(result.inks);
				expect(after.ciede2000).toBeGreaterThanOrEqual(12 - 1e-4);
				expect(after.grey).toBeGreaterThanOrEqual(5 - 1e-4);
			}),
			{ numRuns: 12 },
		);
	});

	it('throws on a lock that is no ink', () => {
		expect(() => mendPalette({ inks: ['#ffffff'], touching: 'all', locked: [1] })).toThrow(
			RangeError,
		);
	});
});

describe('covers', () => {
	it('lists every set that meets all failing pairs', () => {
		const path: [number, number][] = [
			[0, 1],
			[1, 2],
		];
		expect(covers([0, 1, 2, 3], 1, path, [], 99)).toEqual([[1]]);
		const two = covers([0, 1, 2, 3], 2, path, [], 99).map(String).sort();
		expect(two).toEqual(['0,1', '0,2', '1,2', '1,3']);
		expect(covers([0, 2, 3], 1, path, [], 99)).toEqual([]);
		expect(covers([0, 1, 2, 3], 2, path, [3], 99)).toEqual([[1, 3]]);
	});
});
