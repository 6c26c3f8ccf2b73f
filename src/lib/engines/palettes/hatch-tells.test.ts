import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { asSeenBy, contrast } from '../colour/index.ts';
import { contrastFor, hatchesTell, hatchShows, readers, type Hatch } from './index.ts';

const lines: Hatch = { kind: 'lines', angle: 45, spacingMm: 2, widthMm: 0.3, hex: '#000000' };
const fill = (hatch?: Partial<Hatch>, hex = '#e41a1c') => ({
	hex,
	...(hatch ? { hatch: { ...lines, ...hatch } } : {}),
});
const large: [number, number] = [20, 20];

describe('a hatch', () => {
	// WCAG 2.2, 1.4.11: 3:1; the thresholds of lines, turns and ratios are common practice, no source
	it('shows where its lines reach 3:1 against the fill as the reader sees both', () => {
		expect(readers.map((reader) => hatchShows(fill({}), reader, 20))).toEqual([
			...[true, false, true, true, true],
		]);
		// red darkens for protan readers, and black lines on it with it
		expect(contrastFor('protan', '#000000', '#e41a1c')).toBeLessThan(3);
		expect(contrastFor('typical', '#000000', '#e41a1c')).toBeGreaterThan(3);
	});

	it('is measured on what the reader sees, as WCAG measures colours', () => {
		for (const reader of ['typical', 'protan', 'deutan', 'tritan'] as const) {
			const seen = contrast(asSeenBy('#ebb855', reader), asSeenBy('#648fdf', reader));
			expect(contrastFor(reader, '#ebb855', '#648fdf')).toBeCloseTo(seen, 1);
		}
	});

	it('needs two lines across a region, and lines no wider than half their spacing', () => {
		expect(hatchShows(fill({}), 'typical', 4)).toBe(true);
		expect(hatchShows(fill({}), 'typical', 3.9)).toBe(false);
		expect(hatchShows(fill({ widthMm: 1.1 }), 'typical', 20)).toBe(false);
		expect(hatchShows(fill(), 'typical', 20)).toBe(false);
	});
});

describe('two fills of one and the same colour', () => {
	it.each<[string, Partial<Hatch> | undefined, Partial<Hatch> | undefined, boolean]>([
		['neither has a hatch', undefined, undefined, false],
		['one has', {}, undefined, true],
		['both have the same', {}, {}, false],
		['kinds differ', {}, { kind: 'crossed' }, true],
		['directions are 30 degrees apart', { angle: 10 }, { angle: 40 }, true],
		['directions are 29 degrees apart', { angle: 10 }, { angle: 39 }, false],
		['directions are 20 degrees apart over the level', { angle: 170 }, { angle: 10 }, false],
		[
			'crossed lines are turned by 90 degrees',
			{ kind: 'crossed', angle: 0 },
			{ kind: 'crossed', angle: 90 },
			false,
		],
		['one is twice as wide spaced', { spacingMm: 2 }, { spacingMm: 4 }, true],
		['one is nearly twice as wide spaced', { spacingMm: 2 }, { spacingMm: 3.9 }, false],
		['one has lines that do not show', {}, { hex: '#e41a1c' }, true],
		['neither has lines that show', { hex: '#e41a1c' }, { hex: '#e41a1d', kind: 'crossed' }, false],
	])('are told apart or not: %s', (_, one, two, told) => {
		expect(hatchesTell(fill(one), fill(two), 'typical', large)).toBe(told);
		expect(hatchesTell(fill(two), fill(one), 'typical', large)).toBe(told);
	});

	it('are not told apart on regions too small for the lines', () => {
		expect(hatchesTell(fill({}), fill(), 'typical', [3, 20])).toBe(false);
		expect(hatchesTell(fill({}), fill(), 'typical', [20, 3])).toBe(true);
	});

	it('are not told apart by one and the same hatch, though one region is too small to show it', () => {
		expect(hatchesTell(fill({}), fill({}), 'typical', [20, 3])).toBe(false);
		expect(hatchesTell(fill({}), fill({ angle: 135 }), 'typical', [20, 3])).toBe(true);
	});

	it('and are told apart on larger regions wherever they are on smaller ones', () => {
		const hatch = fc.option(
			fc.record({
				kind: fc.constantFrom('lines' as const, 'crossed' as const),
				angle: fc.integer({ min: 0, max: 179 }),
				spacingMm: fc.integer({ min: 1, max: 8 }),
				widthMm: fc.constant(0.3),
				hex: fc.constantFrom('#000000', '#ffffff', '#e41a1c'),
			}),
			{ nil: undefined },
		);
		const size = fc.integer({ min: 1, max: 20 });
		const sizes = fc.tuple(size, size);
		fc.assert(
			fc.property(hatch, hatch, sizes, sizes, (one, two, [a, b], [moreA, moreB]) => {
				if (!hatchesTell(fill(one), fill(two), 'typical', [a, b])) return;
				expect(hatchesTell(fill(one), fill(two), 'typical', [a + moreA, b + moreB])).toBe(true);
			}),
		);
	});
});
