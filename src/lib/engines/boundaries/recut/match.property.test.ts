import fc from 'fast-check';
import { expect, it } from 'vitest';
import { bentCells, landOf } from '../../../../../tests/support/recut-lands.ts';
import { checkMatch, decide, matchRegions, type RegionMatch } from './index.ts';

const [rows, columns] = [3, 5];

/**
 * What is done to regions of one cell each. A region is split in two halves by cutting its cell, so lands
 * are made of half cells: number 2c and 2c + 1 are the halves of cell c.
 */
interface Done {
	moves: number[];
	/** by cell: what is done to it; merging takes the next cell of the row along, where that is free */
	deeds: ('keep' | 'rename' | 'split' | 'merge' | 'drop' | 'add')[];
}

const done: fc.Arbitrary<Done> = fc.record({
	moves: fc.array(
		fc.integer({ min: -10, max: 10 }).map((v) => v / 10),
		{
			minLength: 5,
			maxLength: 40,
		},
	),
	deeds: fc.array(fc.constantFrom('keep', 'rename', 'split', 'merge', 'drop', 'add'), {
		minLength: rows * columns,
		maxLength: rows * columns,
	}),
});

type Land = Record<string, number[]>;

/** Both lands, and what a match has to say of them. */
function play({ deeds }: Done): { before: Land; after: Land; told: string[] } {
	const before: Land = {};
	const after: Land = {};
	const told: string[] = [];
	const isDone = new Set<number>();
	deeds.forEach((deed, cell) => {
		if (isDone.has(cell)) return;
		const [key, halves] = [`r${cell}`, [2 * cell, 2 * cell + 1]];
		const next = cell + 1;
		if (deed !== 'add') before[key] = halves;
		if (deed === 'merge' && next % columns !== 0) {
			isDone.add(next);
			before[`r${next}`] = [2 * next, 2 * next + 1];
			after[`m${cell}`] = [...halves, 2 * next, 2 * next + 1];
			told.push(`${key},r${next} > m${cell}: merged`);
		} else if (deed === 'keep' || deed === 'merge') {
			after[key] = halves;
			told.push(`${key} > ${key}: kept`);
		} else if (deed === 'rename') {
			after[`n${cell}`] = halves;
			told.push(`${key} > n${cell}: renamed`);
		} else if (deed === 'split') {
			after[key] = [halves[0]];
			after[`s${cell}`] = [halves[1]];
			told.push(`${key} > ${key},s${cell}: split`);
		} else if (deed === 'add') {
			after[key] = halves;
			told.push(` > ${key}: new`);
		} else told.push(`${key} > : gone`);
	});
	return { before, after, told };
}

const toldBy = ({ groups, before, after }: RegionMatch) =>
	groups.map((group) => {
		const [from, to] = [
			group.before.map((r) => before.keys[r]).sort(),
			group.after.map((r) => after.keys[r]).sort(),
		];
		return `${from} > ${to}: ${group.outcome}`;
	});

const halfCells = (moves: number[]) => bentCells(rows, 2 * columns, moves);
const some = (land: Land) => Object.keys(land).length > 0;
const runs = { numRuns: 30 };

it('finds exactly what was done', async () => {
	await fc.assert(
		fc.asyncProperty(done, async (plan) => {
			const { before, after, told } = play(plan);
			fc.pre(some(before) && some(after));
			const cells = halfCells(plan.moves);
			const [old, fresh] = [await landOf(cells, before), await landOf(cells, after)];
			const match = matchRegions(old, fresh);
			expect(toldBy(match).sort()).toEqual(told.sort());
			expect(match.groups.every(({ sure }) => sure)).toBe(true);
			expect(checkMatch(old, fresh, match)).toEqual([]);
		}),
		runs,
	);
});

it('says of the way back what it says of the way there, the other way round', async () => {
	const opposite: Record<string, string> = {
		split: 'merged',
		merged: 'split',
		gone: 'new',
		new: 'gone',
	};
	await fc.assert(
		fc.asyncProperty(done, async (plan) => {
			const { before, after } = play(plan);
			fc.pre(some(before) && some(after));
			const cells = halfCells(plan.moves);
			const [old, fresh] = [await landOf(cells, before), await landOf(cells, after)];
			const back = toldBy(matchRegions(fresh, old)).map((line) => {
				const [, from, to, outcome] = /^(.*) > (.*): (.*)$/.exec(line)!;
				return `${to} > ${from}: ${opposite[outcome] ?? outcome}`;
			});
			expect(back.sort()).toEqual(toldBy(matchRegions(old, fresh)).sort());
		}),
		runs,
	);
});

it('measures any two cuts of one land right, and the shares of each region add up to one', async () => {
	const regionOf = fc.array(fc.integer({ min: 0, max: 6 }), {
		minLength: 2 * rows * columns,
		maxLength: 2 * rows * columns,
	});
	const landFrom = (owners: number[]) => {
		const land: Land = {};
		owners.forEach((owner, cell) => (land[`r${owner}`] ??= []).push(cell));
		return land;
	};
	await fc.assert(
		fc.asyncProperty(regionOf, regionOf, done, async (one, other, { moves }) => {
			const cells = halfCells(moves);
			const [old, fresh] = [
				await landOf(cells, landFrom(one)),
				await landOf(cells, landFrom(other)),
			];
			const match = matchRegions(old, fresh, { mention: 0 });
			expect(checkMatch(old, fresh, match)).toEqual([]);
			const sums = new Float64Array(old.keys.length);
			match.links.from.forEach((from, i) => (sums[from] += match.links.shareOfOld[i]));
			for (const sum of sums) expect(sum).toBeCloseTo(1, 6);
		}),
		runs,
	);
});

it('lets a person undo every group, and put any together', async () => {
	await fc.assert(
		fc.asyncProperty(done, fc.nat(), fc.nat(), async (plan, i, j) => {
			const { before, after } = play(plan);
			fc.pre(some(before) && some(after));
			const cells = halfCells(plan.moves);
			const [old, fresh] = [await landOf(cells, before), await landOf(cells, after)];
			const match = matchRegions(old, fresh);
			const apart = decide(match, [
				...old.keys.map((key) => ({ kind: 'gone', old: key }) as const),
				...fresh.keys.map((region) => ({ kind: 'new', region }) as const),
			]);
			if (apart.status !== 'decided') throw new Error(apart.reasons.join());
			expect(apart.match.groups).toHaveLength(old.keys.length + fresh.keys.length);
			expect(checkMatch(old, fresh, apart.match)).toEqual([]);
			const [from, to] = [old.keys[i % old.keys.length], fresh.keys[j % fresh.keys.length]];
			const joined = decide(apart.match, [{ kind: 'continues', old: from, as: [to] }]);
			if (joined.status !== 'decided') throw new Error(joined.reasons.join());
			expect(checkMatch(old, fresh, joined.match)).toEqual([]);
			expect(toldBy(joined.match)).toContain(
				`${from} > ${to}: ${from === to ? 'kept' : 'renamed'}`,
			);
		}),
		{ numRuns: 15 },
	);
});
