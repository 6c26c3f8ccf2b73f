import { describe, expect, it } from 'vitest';
import { acceptedFeatures } from '../../../../tests/support/read-boundaries.ts';
import { dissolved, gridCells, landOf } from '../../../../tests/support/recut-lands.ts';
import type { BorderList } from '../borders/index.ts';
import { matchRegions } from '../boundaries/recut/index.ts';
import { carryTerritories } from './index.ts';
import { draftFaults } from './draft-faults.ts';
import { noTerritories, type TerritoryDraft, type TerritoryEntry } from './territory-draft.ts';

const cells = gridCells(2, 4);
const before = await landOf(cells, { a: [0], b: [1], c: [2, 3], d: [4], e: [5], f: [6, 7] });
/** c is split, e and f are one, d has another key, b is gone */
const later = await acceptedFeatures(
	dissolved(cells, { a: [0], c: [2], c2: [3], D: [4], ef: [5, 6, 7] }),
);
const match = matchRegions(before, later.coverage);
const keys = later.coverage.keys;

const territory = (key: string, base: string | null = null): TerritoryEntry => ({
	...{ key, base, name: `Area ${key}`, person: 'Ann', email: '', capacity: 1 },
	...{ frozen: false, vacant: false, closing: false },
});
const draftOf = (changes: Partial<TerritoryDraft>): TerritoryDraft => ({
	...noTerritories,
	territories: [territory('n'), territory('s')],
	...changes,
});
const carried = (changes: Partial<TerritoryDraft>, borders: BorderList = later.borders) =>
	carryTerritories(draftOf(changes), match, { borders });
const told = ({ rows }: ReturnType<typeof carried>) =>
	rows.map(({ what, outcome, now }) => `${what} ${outcome}: ${now}`);

describe('regions of territories', () => {
	it('stay in theirs, all pieces of them', () => {
		const result = carried({ assignment: { a: 'n', c: 's', d: 'n' } });
		expect(result.draft.assignment).toEqual({ a: 'n', c: 's', c2: 's', D: 'n' });
		expect(told(result)).toEqual(['region copied: c,c2']);
	});
	it('go with the greater share of ground, which is told', () => {
		const result = carried({ assignment: { e: 'n', f: 's', a: 'n' } });
		expect(result.draft.assignment).toEqual({ a: 'n', ef: 's' });
		expect(result.rows[0]).toMatchObject({ outcome: 'settled', keys: ['f', 'e'], now: ['ef'] });
		expect(result.rows[0].words).toBe(
			'The territory of "ef", which was "f" and "e", is settled for "ef": "Area s" had 66.7 % of it and "Area n" had 33.3 % of it; it is in "Area s" now.',
		);
	});
	it('are told where they are gone, and a territory that has none left', () => {
		const result = carried({ assignment: { b: 'n' } });
		expect(result.draft.assignment).toEqual({});
		expect(result.draft.territories).toHaveLength(2);
		expect(told(result)).toEqual(['region dropped: ', 'territory dropped: ']);
	});
});

describe('bases', () => {
	it('are in the largest piece of their region', () => {
		const result = carried({
			territories: [territory('n', 'd'), territory('s', 'c')],
			assignment: { d: 'n', c: 's' },
		});
		const [north, south] = result.draft.territories;
		expect(north.base).toBe('D');
		expect(['c', 'c2']).toContain(south.base);
		expect(result.rows.filter(({ what }) => what === 'base')).toMatchObject([
			{ outcome: 'followed', words: 'The base of "Area n" in "d" follows to "D".' },
			{ outcome: 'followed' },
		]);
	});
	it('are dropped where their region is gone, or in another territory now', () => {
		const result = carried({
			territories: [territory('n', 'e'), territory('s', 'f'), territory('w', 'b')],
			assignment: { e: 'n', a: 'n', f: 's', b: 'w', d: 'w' },
		});
		expect(result.draft.territories.map(({ base }) => base)).toEqual([null, 'ef', null]);
		expect(result.rows.filter(({ what }) => what === 'base').map(({ words }) => words)).toEqual([
			'The base of "Area n" in "e" is dropped: its region is in another territory now.',
			'The base of "Area s" in "f" follows to "ef".',
			'The base of "Area w" in "b" is dropped: the region is gone.',
		]);
		expect(draftFaults({ keys, borders: later.borders }, result.draft)).toEqual([]);
	});
	it('of a territory that lost its only region give way to the one that has it', () => {
		const { draft } = carried({
			territories: [territory('n', 'e'), territory('s', 'f')],
			assignment: { e: 'n', f: 's' },
		});
		expect(draft.territories.map(({ base }) => base)).toEqual([null, 'ef']);
	});
});

describe('rules of territories', () => {
	it('follow like those of the sheet', () => {
		const reason = 'a key account';
		const result = carried({
			locks: { c: { territory: 'n', reason }, e: { territory: 's', reason } },
			together: [
				['a', 'd'],
				['e', 'f'],
				['a', 'c'],
			],
			apart: [['b', 'c']],
			handLinks: [{ a: 'a', b: 'c', reason: 'a ferry' }],
		});
		expect(result.draft.locks).toEqual({
			c: { territory: 'n', reason },
			c2: { territory: 'n', reason },
		});
		expect(result.draft.together).toEqual([
			['a', 'D'],
			['a', 'c'],
			['a', 'c2'],
		]);
		expect(result.draft.apart).toEqual([]);
		expect(result.draft.handLinks).toEqual([
			{ a: 'a', b: 'c', reason: 'a ferry' },
			{ a: 'a', b: 'c2', reason: 'a ferry' },
		]);
		expect(told(result)).toEqual([
			...['lock copied: c,c2', 'lock dropped: ', 'together followed: a,D', 'together dropped: '],
			...['together copied: a,c,c2', 'apart dropped: ', 'hand link copied: a,c,c2'],
		]);
	});
	it('keep a link across water where there is such a border', () => {
		const [a, c] = ['a', 'c'].map((key) => keys.indexOf(key));
		const water: BorderList = {
			...{ a: Uint32Array.of(Math.min(a, c)), b: Uint32Array.of(Math.max(a, c)) },
			...{ kind: Uint8Array.of(2), metres: Float64Array.of(900), at: Float64Array.of(12, 45) },
		};
		const waterLinks: [string, string][] = [
			['c', 'a'],
			['d', 'a'],
		];
		const result = carried({ waterLinks }, water);
		expect(result.draft.waterLinks).toEqual([['c', 'a']]);
		expect(told(result)).toEqual(['water link followed: c,a', 'water link dropped: ']);
		expect(draftFaults({ keys, borders: water }, result.draft)).toEqual([]);
	});
});
