import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { delaunayMap, scatteredMap } from '../../../../tests/support/planar.ts';
import { redrawnMap } from '../../../../tests/support/redrawn-map.ts';
import { checkColouring } from './check-colouring.ts';
import { colour } from './colour.ts';
import type { ColouringProblem, ColouringResult } from './problem.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

async function coloured(problem: ColouringProblem): Promise<Coloured> {
	const result = await colour(problem);
	if (result.status !== 'coloured') throw new Error(result.status);
	expect(checkColouring(problem, result)).toEqual([]);
	return result;
}

/** The fewest changes, by trying every colouring; null when there is none. */
function fewestByTrying(problem: ColouringProblem, inks: number): number | null {
	const { regions, borders, previous, locks, alike } = problem;
	const ink = new Int32Array(regions);
	let best: number | null = null;
	const extend = (r: number, changes: number) => {
		if (best !== null && changes >= best) return;
		if (r === regions) {
			best = changes;
			return;
		}
		for (let c = 0; c < inks; c++) {
			if (locks && locks[r] >= 0 && locks[r] !== c) continue;
			ink[r] = c;
			const clash = (a: number, b: number, same: boolean) =>
				Math.max(a, b) === r && (ink[a] === ink[b]) === same;
			let fits = true;
			for (let i = 0; i < borders.a.length; i++) {
				if (clash(borders.a[i], borders.b[i], true)) fits = false;
			}
			for (const [a, b] of alike ?? []) if (clash(a, b, false)) fits = false;
			const old = previous?.[r] ?? -1;
			if (fits) extend(r + 1, changes + (old >= 0 && old !== c ? 1 : 0));
		}
	};
	extend(0, 0);
	return best;
}

const drafts = fc.integer({ min: 2, max: 8 }).chain((regions) => {
	const pair = fc.tuple(fc.nat(regions - 1), fc.nat(regions - 1));
	const list = (min: number) =>
		fc.array(fc.integer({ min, max: 3 }), { minLength: regions, maxLength: regions });
	return fc
		.record({
			pairs: fc.array(pair, { maxLength: 14 }),
			together: fc.array(pair, { maxLength: 1 }),
			previous: list(-1),
			locks: list(-12),
		})
		.map(({ pairs, together, previous, locks }): ColouringProblem => {
			const differ = pairs.filter(([a, b]) => a !== b);
			return {
				regions,
				borders: { a: differ.map((p) => p[0]), b: differ.map((p) => p[1]) },
				inks: 4,
				alike: together.filter(([a, b]) => a !== b),
				previous: Int32Array.from(previous),
				locks: Int32Array.from(locks, (ink) => Math.max(-1, ink)),
				goal: 'fewest-changes',
			};
		});
});

describe('goals', () => {
	it('changes as few regions as trying every colouring does', async () => {
		await fc.assert(
			fc.asyncProperty(drafts, async (problem) => {
				const least = fewestByTrying(problem, 4);
				const result = await colour(problem);
				if (least === null) {
					expect(result.status).toBe('impossible');
					return;
				}
				if (result.status !== 'coloured') throw new Error(result.status);
				expect(checkColouring(problem, result)).toEqual([]);
				expect(result.changes).toEqual({ count: least, lowerBound: least });
			}),
			{ numRuns: 300 },
		);
	});

	it('repairs 18 clashes among 900 regions with as few changes as is possible', async () => {
		const problem = await redrawnMap(delaunayMap(900, 3), 18, 3);
		const { changes } = await coloured(problem);
		expect(changes?.count).toBe(changes?.lowerBound);
		expect(changes?.count).toBeLessThan(120);
		expect(changes?.count).toBeGreaterThan(20);
	});

	it('evens out the use of inks to the exact share by count', async () => {
		const map = scatteredMap(3_000, 5);
		const result = await coloured({ ...map, inks: 4, goal: 'even' });
		const use = [0, 0, 0, 0];
		for (const ink of result.colouring) use[ink]++;
		expect(Math.max(...use) - Math.min(...use)).toBeLessThanOrEqual(1);
		const mean = map.regions / 4;
		expect(result.objective).toBeCloseTo(
			use.reduce((sum, n) => sum + (n - mean) ** 2, 0),
			6,
		);
	});

	it('sets neighbours further apart than without the goal, over the same map', async () => {
		const map = scatteredMap(1_000, 6);
		const lengths = Float64Array.from(map.borders.a, (_, i) => 1 + (i % 17));
		const inkDistances = [
			[0, 10, 30, 60],
			[10, 0, 25, 55],
			[30, 25, 0, 12],
			[60, 55, 12, 0],
		];
		const problem = { ...map, inks: 4, lengths, inkDistances };
		const mean = (colouring: Int32Array) => {
			let sum = 0;
			lengths.forEach((metres, i) => {
				const [c, d] = [colouring[map.borders.a[i]], colouring[map.borders.b[i]]];
				sum += metres * inkDistances[c][d];
			});
			return sum / lengths.reduce((total, metres) => total + metres, 0);
		};
		const plain = await coloured(problem);
		const result = await coloured({ ...problem, goal: 'distinct' });
		expect(result.objective).toBeCloseTo(mean(result.colouring), 9);
		expect(mean(result.colouring)).toBeGreaterThan(1.1 * mean(plain.colouring));
	});

	it('answers the same for the same seed', async () => {
		const map = scatteredMap(500, 8);
		for (const goal of ['any', 'even'] as const) {
			const problem: ColouringProblem = { ...map, inks: 4, goal, seed: 11 };
			expect(await coloured(problem)).toEqual(await coloured(problem));
		}
	});
});
