import { describe, expect, it } from 'vitest';
import { gridCells, landOf } from '../../../../../tests/support/recut-lands.ts';
import { checkMatch, decide, matchRegions, type Decision, type RegionMatch } from './index.ts';

const cells = gridCells(2, 4);
const before = await landOf(cells, { a: [0], b: [1], c: [2, 3], d: [4] });
const after = await landOf(cells, { a: [0, 1], c: [2], c2: [3], e: [7] });
const match = matchRegions(before, after);

const told = ({ groups }: RegionMatch) =>
	groups.map((group) => {
		const from = group.before.map((r) => before.keys[r]);
		const to = group.after.map((r) => after.keys[r]);
		return `${from} > ${to}: ${group.outcome} by ${group.by}`;
	});
const decided = (decisions: Decision[], from = match) => {
	const result = decide(from, decisions);
	if (result.status !== 'decided') throw new Error(result.reasons.join(' '));
	expect(checkMatch(before, after, result.match)).toEqual([]);
	return result.match;
};

describe('decisions', () => {
	it('start from what was found', () => {
		expect(told(match)).toEqual([
			...['a,b > a: merged by area', 'c > c,c2: split by area', 'd > : gone by area'],
			' > e: new by area',
		]);
		expect(decided([])).toEqual(match);
	});
	it('let an old region go on as a new one that lies elsewhere', () => {
		const result = decided([{ kind: 'continues', old: 'd', as: ['e'] }]);
		expect(told(result).at(-1)).toBe('d > e: renamed by hand');
		expect(result.groups.at(-1)).toMatchObject({
			sure: true,
			words: expect.stringContaining('Decided by hand: "d" is now called "e".'),
		});
	});
	it('take the place of all that the region went on as', () => {
		const result = decided([{ kind: 'continues', old: 'c', as: ['c'] }]);
		expect(told(result)).toEqual([
			...['a,b > a: merged by area', 'c > c: kept by hand', 'd > : gone by area'],
			...[' > c2: new by hand', ' > e: new by area'],
		]);
	});
	it('let regions stand alone', () => {
		const result = decided([
			{ kind: 'gone', old: 'b' },
			{ kind: 'new', region: 'c2' },
		]);
		expect(told(result)).toEqual([
			...['a > a: kept by hand', 'b > : gone by hand', 'c > c: kept by hand', 'd > : gone by area'],
			...[' > c2: new by hand', ' > e: new by area'],
		]);
	});
	it('stay when others are added, and leave what they were made from as it was', () => {
		const copy = structuredClone(match);
		const once = decided([{ kind: 'continues', old: 'd', as: ['e'] }]);
		const twice = decided([{ kind: 'gone', old: 'b' }], once);
		expect(told(twice)).toContain('d > e: renamed by hand');
		expect(match).toEqual(copy);
	});
	it('make no difference by their order', () => {
		const list: Decision[] = [
			{ kind: 'gone', old: 'b' },
			{ kind: 'continues', old: 'd', as: ['e', 'c2'] },
			{ kind: 'continues', old: 'c', as: ['c'] },
		];
		expect(decided(list)).toEqual(decided([...list].reverse()));
	});
});

describe('decisions that cannot be', () => {
	const refused = (...decisions: Decision[]) => {
		const result = decide(match, decisions);
		return result.status === 'refused' ? result.reasons : [];
	};
	it.each<[string, Decision[]]>([
		['There was no region "x".', [{ kind: 'gone', old: 'x' }]],
		['There is no new region "x".', [{ kind: 'new', region: 'x' }]],
		['There is no new region "d".', [{ kind: 'continues', old: 'a', as: ['d'] }]],
		[
			'Say as which new region "a" goes on, or that it is gone.',
			[{ kind: 'continues', old: 'a', as: [] }],
		],
		[
			'"a" is decided twice.',
			[
				{ kind: 'gone', old: 'a' },
				{ kind: 'continues', old: 'a', as: ['a'] },
			],
		],
		[
			'"e" cannot be new and go on from "d".',
			[
				{ kind: 'continues', old: 'd', as: ['e'] },
				{ kind: 'new', region: 'e' },
			],
		],
	])('%s', (sentence, decisions) => {
		expect(refused(...decisions)).toEqual([sentence]);
	});
	it('are all told at once', () => {
		expect(refused({ kind: 'gone', old: 'x' }, { kind: 'gone', old: 'y' })).toHaveLength(2);
	});
});

it('a match is plain data', () => {
	expect(JSON.parse(JSON.stringify(match))).toEqual(match);
});
