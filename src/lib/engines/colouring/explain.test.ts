import { describe, expect, it } from 'vitest';
import { complete, cycle, queens } from '../../../../tests/support/named-graphs.ts';
import { scatteredMap } from '../../../../tests/support/planar.ts';
import { checkExplanation } from './explain-check.ts';
import { explain } from './explain.ts';
import type { ColouringProblem, Explanation } from './problem.ts';

const locksOf = (regions: number, locks: Record<number, number>) => {
	const list = new Int32Array(regions).fill(-1);
	for (const [region, ink] of Object.entries(locks)) list[Number(region)] = ink;
	return list;
};

async function explained(problem: ColouringProblem): Promise<Explanation> {
	const explanation = await explain(problem);
	if (!explanation) throw new Error('nothing to explain');
	expect(await checkExplanation(problem, explanation)).toEqual([]);
	return explanation;
}

const path = (regions: number) => ({
	regions,
	borders: {
		a: Array.from({ length: regions - 1 }, (_, i) => i),
		b: Array.from({ length: regions - 1 }, (_, i) => i + 1),
	},
});

describe('collisions at sight', () => {
	it('bordering regions locked alike: no number of inks helps', async () => {
		const problem = { ...path(6), inks: 4, locks: locksOf(6, { 0: 2, 2: 1, 3: 1, 5: 0 }) };
		const explanation = await explained(problem);
		expect(explanation).toMatchObject({ locks: [2, 3], regions: [2, 3], inksThatWouldDo: null });
		expect(explanation.release).toMatchObject({ cost: 1, proved: true });
	});

	it('with any number of inks too', async () => {
		const problem = { ...path(3), inks: 'fewest' as const, locks: locksOf(3, { 0: 7, 1: 7 }) };
		expect(await explained(problem)).toMatchObject({ locks: [0, 1], inksThatWouldDo: null });
	});

	it('a lock against a forbidden ink', async () => {
		const locks = locksOf(3, { 1: 2 });
		const problem: ColouringProblem = { ...path(3), inks: 4, locks, forbidden: [[1, 2]] };
		expect(await explained(problem)).toMatchObject({ locks: [1], inksThatWouldDo: null });
	});

	it('regions kept alike but locked apart, the cheaper lock released', async () => {
		const locks = locksOf(5, { 0: 1, 4: 2 });
		const lockCosts = Float64Array.from([5, 1, 1, 1, 3]);
		const problem: ColouringProblem = { ...path(5), inks: 4, locks, lockCosts, alike: [[0, 4]] };
		const explanation = await explained(problem);
		expect(explanation).toMatchObject({ locks: [0, 4], inksThatWouldDo: null });
		expect(explanation.release).toEqual({ locks: [4], cost: 3, proved: true, lowerBound: 3 });
	});

	it('an ink beyond the number of inks', async () => {
		const problem = { ...path(3), inks: 4, locks: locksOf(3, { 1: 9 }) };
		expect(await explained(problem)).toMatchObject({ locks: [1], inksThatWouldDo: 10 });
	});

	it('several locks of regions kept alike count together', async () => {
		const locks = locksOf(5, { 0: 1, 2: 1, 3: 1 });
		const problem: ColouringProblem = { ...path(5), inks: 3, locks, alike: [[0, 2]] };
		const explanation = await explained(problem);
		expect(explanation.locks).toEqual([0, 3]);
		expect(explanation.release).toMatchObject({ locks: [3], cost: 1 });
	});
});

describe('collisions across free regions', () => {
	it('a free region among all inks', async () => {
		const star = { regions: 5, borders: { a: [0, 0, 0, 0], b: [1, 2, 3, 4] } };
		const problem = { ...star, inks: 4, locks: locksOf(5, { 1: 0, 2: 1, 3: 2, 4: 3 }) };
		const explanation = await explained(problem);
		expect(explanation).toMatchObject({
			locks: [1, 2, 3, 4],
			regions: [0, 1, 2, 3, 4],
			inksThatWouldDo: 5,
		});
	});

	it('a long row with two inks shows the whole row between the locks', async () => {
		const problem = { ...path(40), inks: 2, locks: locksOf(40, { 3: 0, 30: 0 }) };
		const explanation = await explained(problem);
		expect(explanation.locks).toEqual([3, 30]);
		expect(explanation.regions).toEqual(Array.from({ length: 28 }, (_, i) => i + 3));
		expect(explanation.inksThatWouldDo).toBe(3);
	});
});

describe('rules to blame when no release helps', () => {
	it('five regions that all border, and four inks', async () => {
		const problem = { ...complete(5), inks: 4, locks: locksOf(5, { 0: 0 }) };
		const explanation = await explained(problem);
		expect(explanation).toMatchObject({ locks: [], release: null, inksThatWouldDo: 5 });
		expect(explanation.rules).toHaveLength(11);
		expect(explanation.rules).toContainEqual({ kind: 'inks', inks: 4 });
	});

	it('a chain of regions kept alike whose ends border', async () => {
		const alike = [
			[0, 1],
			[1, 2],
			[2, 4],
		] as const;
		const problem: ColouringProblem = { ...cycle(5), inks: 4, alike };
		const { rules } = await explained({ ...problem, borders: { a: [0], b: [4] } });
		expect(rules).toHaveLength(4);
		expect(rules.filter((rule) => rule.kind === 'alike')).toHaveLength(3);
	});

	it('every ink forbidden', async () => {
		const forbidden = [
			[1, 0],
			[1, 1],
			[0, 1],
		] as const;
		const { rules, inksThatWouldDo } = await explained({ ...path(3), inks: 2, forbidden });
		expect(rules).toEqual([
			{ kind: 'forbidden', region: 1, ink: 0 },
			{ kind: 'forbidden', region: 1, ink: 1 },
			{ kind: 'inks', inks: 2 },
		]);
		expect(inksThatWouldDo).toBe(3);
	});

	it('a ring of odd length with two inks, queens on a board of side 5 with four', async () => {
		expect((await explained({ ...cycle(9), inks: 2 })).rules).toHaveLength(10);
		expect((await explained({ ...queens(5), inks: 4 })).rules).toHaveLength(11);
	});
});

describe('large maps', () => {
	it('are coloured by chains to show that a release works', async () => {
		const map = scatteredMap(12_000, 1);
		const locks = { [map.borders.a[0]]: 1, [map.borders.b[0]]: 1 };
		const problem = { ...map, inks: 4, locks: locksOf(map.regions, locks) };
		const explanation = await explain(problem);
		expect(explanation?.locks).toHaveLength(2);
		expect(explanation?.release).toMatchObject({ cost: 1, lowerBound: 1, proved: true });
	});
});

describe('no explanation', () => {
	it('is given for what can be coloured, nor when cancelled', async () => {
		expect(await explain({ ...path(3), inks: 2, locks: locksOf(3, { 0: 1, 2: 1 }) })).toBeNull();
		const problem = { ...path(40), inks: 2, locks: locksOf(40, { 3: 0, 30: 0 }) };
		expect(await explain({ ...problem, cancelled: () => true })).toBeNull();
	});
});

describe('checkExplanation', () => {
	const problem = { ...path(6), inks: 2, locks: locksOf(6, { 0: 0, 3: 0, 5: 1 }) };

	it('refuses what is wrong in any part', async () => {
		const fine = await explained(problem);
		const wrong: Partial<Explanation>[] = [
			{ locks: [] },
			{ locks: [3] },
			{ locks: [0, 3, 5] },
			{ locks: [0, 1] },
			{ regions: [0, 3] },
			{ regions: [] },
			{ release: null },
			{ release: { locks: [5], cost: 1, proved: true, lowerBound: 1 } },
			{ release: { locks: [0], cost: 2, proved: true, lowerBound: 2 } },
			{ release: { locks: [0], cost: 1, proved: false, lowerBound: 2 } },
			{ inksThatWouldDo: null },
			{ inksThatWouldDo: 2 },
			{ inksThatWouldDo: 4 },
		];
		for (const change of wrong) {
			expect(
				await checkExplanation(problem, { ...fine, ...change }),
				JSON.stringify(change),
			).not.toEqual([]);
		}
	});

	it('refuses rules that can be kept, can be spared or are not in the problem', async () => {
		const five = { ...complete(5), inks: 4 };
		const fine = await explained(five);
		const { rules } = fine;
		expect(await checkExplanation(five, { ...fine, rules: rules.slice(1) })).not.toEqual([]);
		const more = await explained({ ...complete(5), inks: 3 });
		const all = {
			...more,
			rules: rules.map((rule) => ('inks' in rule ? { ...rule, inks: 3 } : rule)),
		};
		expect(await checkExplanation({ ...complete(5), inks: 3 }, all)).not.toEqual([]);
		const foreign = { ...five, borders: { a: [0], b: [1] } };
		expect(await checkExplanation(foreign, fine)).not.toEqual([]);
	});
});
