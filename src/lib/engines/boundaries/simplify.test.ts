import { describe, expect, it } from 'vitest';
import { bytesOf, conterminousStates } from '../../../../tests/support/atlas.ts';
import { accepted } from '../../../../tests/support/read-boundaries.ts';
import { bordersOf } from '../borders/index.ts';
import { coverageFaults, decodeCoverage, encodeCoverage, simplifyCoverage } from './index.ts';

describe('simplified coverages', () => {
	it('keep their invariants and their neighbours at every level', async () => {
		const { coverage, borders } = await accepted(bytesOf(conterminousStates()));
		let points = coverage.arcPoints.length;
		for (const metres of [500, 2_000, 10_000, 100_000, 1e7]) {
			const { coverage: simple, crossings } = simplifyCoverage(coverage, metres);
			expect(crossings).toBe(0);
			expect(coverageFaults(simple)).toEqual([]);
			if (metres <= 100_000) expect(simple.arcPoints.length).toBeLessThan(points);
			points = simple.arcPoints.length;
			expect(simple.areasKm2).toBe(coverage.areasKm2);
			expect(simple.arcLeft).toBe(coverage.arcLeft);
			if (metres <= 10_000) expect(bordersOf(simple).a).toEqual(borders.a);
		}
	});
});

describe('stored coverages', () => {
	it('are read back bit for bit, and refused when cut off or altered', async () => {
		const { coverage } = await accepted(bytesOf(conterminousStates()));
		const bytes = encodeCoverage(coverage);
		expect(decodeCoverage(bytes)).toEqual(coverage);
		for (const end of [0, 15, 16, 100, bytes.length - 1]) {
			expect(() => decodeCoverage(bytes.slice(0, end))).toThrow(RangeError);
		}
		for (const at of [0, 4, 8, 12]) {
			const altered = bytes.slice();
			altered[at] ^= 0x55;
			expect(() => decodeCoverage(altered)).toThrow(RangeError);
		}
	});
});

describe('the checker of coverages', () => {
	it('finds each kind of fault planted in a sound coverage', async () => {
		const { coverage } = await accepted(bytesOf(conterminousStates()));
		const planted: [string, (c: typeof coverage) => void][] = [
			['two owners', (c) => (c.arcRight[0] = c.arcLeft[0])],
			['a foreign arc', (c) => (c.ringArcs[0] = c.ringArcs[c.ringArcs.length - 1])],
			['an arc backward', (c) => (c.ringArcs[3] = ~c.ringArcs[3])],
			['a broken position', (c) => (c.arcPoints[0] = NaN)],
			['a moved end', (c) => (c.arcPoints[0] += 1)],
			['a key twice', (c) => (c.keys[1] = c.keys[0])],
			['no length', (c) => (c.arcMetres[2] = -1)],
		];
		for (const [name, plant] of planted) {
			const copy = structuredClone(coverage);
			plant(copy);
			expect(coverageFaults(copy), name).not.toEqual([]);
		}
	});
});
