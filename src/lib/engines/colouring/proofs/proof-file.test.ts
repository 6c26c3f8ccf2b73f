import { describe, expect, it } from 'vitest';
import {
	fixtureGraph,
	complete,
	cycle,
	fromPairs,
	type EdgeList,
} from '../../../../../tests/support/named-graphs.ts';
import { colour, type ColouringProblem } from '../index.ts';
import { checkProofFile, checkProofText } from './check/index.ts';
import { proofFile, proofText } from './proof-file.ts';
import type { ProofFile } from './proof-form.ts';

const named = (count: number) =>
	Array.from({ length: count }, (_, i) => ({ key: `r${i}`, name: `Region ${i}` }));

async function fileOf(problem: ColouringProblem): Promise<ProofFile> {
	const file = await proofFile(problem, await colour(problem), named(problem.regions));
	if (!file) throw new Error('nothing was claimed');
	return file;
}

const fewest = (map: EdgeList, rules: Partial<ColouringProblem> = {}): ColouringProblem => ({
	...map,
	inks: 'fewest',
	...rules,
});

const locks = (regions: number, pinned: Record<number, number>) => {
	const list = new Int32Array(regions).fill(-1);
	for (const [region, ink] of Object.entries(pinned)) list[Number(region)] = ink;
	return list;
};

const wheel = (rim: number) =>
	fromPairs(rim + 1, [
		...Array.from({ length: rim }, (_, i) => [i + 1, ((i + 1) % rim) + 1] as const),
		...Array.from({ length: rim }, (_, i) => [0, i + 1] as const),
	]);

describe('the proof file of a colouring', () => {
	it.each([
		['one region', fromPairs(1, []), 'there being a region'],
		['a border', fromPairs(3, [[0, 1]]), 'the border of Region 0 and Region 1'],
		['a ring', cycle(5), 'a ring of 5 regions'],
		['a clique', complete(4), '4 regions that all border each other'],
		['a wheel', wheel(5), 'a ring of 5 regions round Region 0'],
		['clauses', fixtureGraph('moser'), 'a clause proof on 7 regions'],
	])('%s', async (_, map, words) => {
		const file = await fileOf(fewest(map));
		const { valid, claims, faults } = checkProofText(proofText(file));
		expect(faults).toEqual([]);
		expect(valid).toBe(true);
		expect(claims).toHaveLength(2);
		expect(claims[1]).toContain(words);
	});

	it('leans on rules where the borders alone do not show it', async () => {
		const path = fromPairs(3, [
			[0, 1],
			[1, 2],
		]);
		const file = await fileOf(
			fewest(path, { locks: locks(3, { 0: 0, 2: 1 }), forbidden: [[1, 2]], reserved: [2] }),
		);
		expect(checkProofFile(file)).toMatchObject({ valid: true, faults: [] });
	});

	it('says only that the inks do when nothing more was proved', async () => {
		const problem = fewest(cycle(5));
		const result = await colour(problem);
		if (result.status !== 'coloured') throw new Error(result.status);
		result.proof = { kind: 'not-proved', regions: [] };
		const file = (await proofFile(problem, result, named(5))) as ProofFile;
		expect(file.claims.map(({ claim }) => claim)).toEqual(['inks do']);
		expect(checkProofFile(file).valid).toBe(true);
	});

	it('comes out the same byte for byte', async () => {
		const problem = fewest(fixtureGraph('golomb'));
		expect(proofText(await fileOf(problem))).toBe(proofText(await fileOf(problem)));
	});
});

describe('the proof file of rules that cannot be kept', () => {
	it('shows the locks that collide, a way out, and how many inks would do', async () => {
		const star = fromPairs(5, [
			[0, 1],
			[0, 2],
			[0, 3],
			[0, 4],
		]);
		const pinned = locks(5, { 1: 0, 2: 1, 3: 2, 4: 2 });
		const file = await fileOf({ ...star, inks: 3, locks: pinned });
		const { valid, claims } = checkProofFile(file);
		expect(valid).toBe(true);
		expect(claims).toHaveLength(3);
		expect(claims[0]).toContain('cannot be kept together');
		expect(claims[1]).toContain('dropped');
		expect(claims[2]).toContain('with 4 inks');
	});

	it('shows that no number of inks helps, also with inks of high number', async () => {
		const pair = fromPairs(2, [[0, 1]]);
		const pinned = locks(2, { 0: 60_000, 1: 60_000 });
		const file = await fileOf(fewest(pair, { locks: pinned }));
		expect(file.claims[0]).toMatchObject({ claim: 'cannot be kept', inks: 'any' });
		expect(checkProofFile(file).claims[0]).toContain('any number of inks');
		expect(checkProofFile(file).valid).toBe(true);
	});

	it('shows rules that collide without any lock', async () => {
		const file = await fileOf(fewest(complete(3), { inks: 3, alike: [[0, 2]] }));
		expect(file.claims[0]).toMatchObject({ claim: 'cannot be kept', locks: [] });
		expect(checkProofFile(file).valid).toBe(true);
	});
});
