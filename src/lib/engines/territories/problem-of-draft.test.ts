import { describe, expect, it } from 'vitest';
import { borderKinds, type BorderList } from '../borders/border-list.ts';
import { adjacent } from '../graph/index.ts';
import { draftFaults } from './draft-faults.ts';
import { joinedGraph, problemOfDraft, todayOf, type TerritoryGround } from './problem-of-draft.ts';
import { putNames } from './put-names.ts';
import { firstWishes, noTerritories, type TerritoryDraft } from './territory-draft.ts';
import { wishFaults } from './wish-faults.ts';

const borders = (...list: [number, number, (typeof borderKinds)[number]][]): BorderList => ({
	a: Uint32Array.from(list, ([a]) => a),
	b: Uint32Array.from(list, ([, b]) => b),
	kind: Uint8Array.from(list, ([, , kind]) => borderKinds.indexOf(kind)),
	metres: new Float64Array(list.length),
	at: new Float64Array(2 * list.length),
});

/** Four regions: a and b share a line, b and c meet in a point, c and d face each other over water. */
const ground: TerritoryGround = {
	keys: ['a', 'b', 'c', 'd'],
	borders: borders([0, 1, 'line'], [1, 2, 'point'], [2, 3, 'water']),
	measures: [
		{ id: 'calls', name: 'Calls', values: [1, null, 3, 4] },
		{ id: 'visits', name: 'Visits', values: [4, 3, 2, 1] },
	],
};

const entry = (key: string, more = {}) => ({
	...{ key, name: key.toUpperCase(), person: '', email: '', base: null, capacity: 1 },
	...{ frozen: false, vacant: false, closing: false },
	...more,
});

const draft: TerritoryDraft = {
	...noTerritories,
	territories: [entry('north', { base: 'a' }), entry('south', { capacity: 0.5, frozen: true })],
	assignment: { a: 'north', b: 'north', d: 'south' },
	locks: { d: { territory: 'south', reason: 'contract' } },
	together: [['a', 'b']],
	apart: [['a', 'd']],
	wishes: { ...firstWishes, tolerances: { visits: 0.1 }, cost: 'visits', seed: 7 },
};

describe('the question a draft puts', () => {
	it('numbers regions and territories in their order', () => {
		const problem = problemOfDraft(ground, draft);
		expect(Array.from(problem.today)).toEqual([0, 0, -1, 1]);
		expect(problem.territories).toEqual([
			{ base: 0, capacity: 1, frozen: false, closing: false },
			{ base: -1, capacity: 0.5, frozen: true, closing: false },
		]);
		expect(Array.from(problem.locks ?? [])).toEqual([-1, -1, -1, 1]);
		expect([problem.together, problem.apart]).toEqual([[[0, 1]], [[0, 3]]]);
		expect(problem.measures.map(({ name, tolerance }) => [name, tolerance])).toEqual([
			['Visits', 0.1],
		]);
		expect(Array.from(problem.cost ?? [])).toEqual([4, 3, 2, 1]);
		expect(problem).toMatchObject({ goal: 'fewest-moves', reach: null, seed: 7 });
	});

	it('makes a missing figure no number, which the engine tells of', () => {
		const wishes = { ...firstWishes, tolerances: { calls: 0.2 } };
		const problem = problemOfDraft(ground, draft, wishes);
		expect(Array.from(problem.measures[0].values)).toEqual([1, NaN, 3, 4]);
		expect(problem.cost).toBeUndefined();
	});

	it('joins by lines, chosen water links and links made by hand, never by points', () => {
		const plain = joinedGraph(ground, draft);
		expect(adjacent(plain, 0, 1)).toBe(true);
		expect(adjacent(plain, 1, 2)).toBe(false);
		expect(adjacent(plain, 2, 3)).toBe(false);
		const linked = joinedGraph(ground, {
			waterLinks: [['d', 'c']],
			handLinks: [{ a: 'b', b: 'c', reason: 'bridge' }],
		});
		expect([adjacent(linked, 2, 3), adjacent(linked, 1, 2)]).toEqual([true, true]);
	});

	it('takes keys that are words of the language for plain keys', () => {
		const keys = ['constructor', 'toString'];
		const assigned = { territories: [entry('valueOf')], assignment: { toString: 'valueOf' } };
		expect(Array.from(todayOf(keys, assigned))).toEqual([-1, 0]);
	});
});

describe('what is wrong with a draft or with wishes', () => {
	it('is nothing for one that holds together', () => {
		expect(draftFaults(ground, draft)).toEqual([]);
		expect(wishFaults(ground, draft, draft.wishes)).toEqual([]);
	});

	it('lets a new hire name a base that still lies with somebody else', () => {
		const hired = { ...draft, territories: [...draft.territories, entry('new', { base: 'b' })] };
		expect(draftFaults(ground, hired)).toEqual([]);
		const moved = { ...hired, assignment: { ...draft.assignment, c: 'new' } };
		expect(draftFaults(ground, moved)).toMatchObject([{ code: 'base-elsewhere', keys: ['new'] }]);
	});

	it('takes a water link in either order, and only where there is water', () => {
		expect(draftFaults(ground, { ...draft, waterLinks: [['d', 'c']] })).toEqual([]);
		const dry = draftFaults(ground, { ...draft, waterLinks: [['a', 'b']] });
		expect(dry).toMatchObject([{ code: 'no-water-border' }]);
	});

	it('counts moves only by a measure without a gap', () => {
		const [fault] = wishFaults(ground, draft, { ...firstWishes, cost: 'calls' });
		expect(fault).toMatchObject({ code: 'unusable-cost', regions: [1] });
		const [gone] = wishFaults(ground, draft, { ...firstWishes, tolerances: { gone: 1 } });
		expect(gone.code).toBe('unknown-measure');
		const closing = { territories: [entry('north', { closing: true })] };
		expect(wishFaults(ground, closing, firstWishes)).toMatchObject([{ code: 'no-territory' }]);
		const nothing = wishFaults(ground, draft, { ...firstWishes, goal: 'least-deviation' });
		expect(nothing).toMatchObject([{ code: 'nothing-wished' }]);
	});
});

describe('names in messages', () => {
	it('are put in once, whatever signs they hold', () => {
		const names = (message: string) =>
			putNames(
				message,
				(unit) => ['Ash #1', 'Birch @0'][unit],
				(territory) => ['North'][territory],
			);
		expect(names('#0 and #1 leave @0.')).toBe('Ash #1 and Birch @0 leave North.');
		expect(names('10 # of @ stay')).toBe('10 # of @ stay');
	});
});
