import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { dissolved, gridCells, landOf } from '../../../../tests/support/recut-lands.ts';
import { acceptedFeatures } from '../../../../tests/support/read-boundaries.ts';
import { decide, matchRegions } from '../boundaries/recut/index.ts';
import { colour } from '../colouring/index.ts';
import { carryDraft, carryInks, type Draft } from './index.ts';

const cells = gridCells(2, 4);
const landA = { a: [0], b: [1], c: [2, 3], d: [4], e: [5], f: [6, 7] };
const before = await landOf(cells, landA);
/** c is split along its middle, e and f are one, d has another key, b is gone */
const later = await acceptedFeatures(
	dissolved(cells, { a: [0], c: [2], c2: [3], D: [4], ef: [5, 6, 7] }),
);
const after = later.coverage;
const match = matchRegions(before, after);
const fresh = { borders: later.borders };

const carried = (changes: Partial<Draft>, ground = fresh as Parameters<typeof carryDraft>[2]) =>
	carryDraft(blankDraft(changes), match, ground);
const lock = (ink: number) => ({ ink, cost: 1, by: 'Ann', at: '2024-01-01' });
const words = (result: ReturnType<typeof carried>) => result.rows.map((row) => row.words);

describe('locks', () => {
	it('follow to the new key, with who set them and when', () => {
		const { draft, rows } = carried({ locks: { a: lock(0), d: lock(1) } });
		expect(draft.locks).toEqual({ a: lock(0), D: lock(1) });
		expect(rows).toEqual([
			expect.objectContaining({
				what: 'lock',
				outcome: 'followed',
				words: 'The lock of "a" on One stands.',
			}),
			expect.objectContaining({
				keys: ['d'],
				now: ['D'],
				words: 'The lock of "d" on Two follows to "D".',
			}),
		]);
	});
	it('are copied to every piece where nothing is known of borders', () => {
		const { draft, rows } = carried({ locks: { c: lock(0) } }, {});
		expect(draft.locks).toEqual({ c: lock(0), c2: lock(0) });
		expect(rows).toMatchObject([{ outcome: 'copied', now: ['c', 'c2'] }]);
	});
	it('stay off a piece that touches another with the same lock', () => {
		const result = carried({ locks: { c: lock(0) } });
		expect(Object.keys(result.draft.locks)).toHaveLength(1);
		expect(result.rows.map(({ outcome }) => outcome)).toEqual(['followed', 'dropped']);
		expect(words(result)[1]).toContain('would touch a larger piece with the same.');
	});
	it('stand on a merged region where its parts agree', () => {
		const { draft, rows } = carried({ locks: { e: lock(1), f: lock(1) } });
		expect(draft.locks).toEqual({ ef: lock(1) });
		expect(rows.map(({ outcome }) => outcome)).toEqual(['followed', 'doubled']);
	});
	it('are dropped where parts disagree, or the smaller part alone was locked', () => {
		const unlike = carried({ locks: { e: lock(1), f: lock(0) } });
		expect(unlike.draft.locks).toEqual({});
		expect(words(unlike)[0]).toBe(
			'The lock of "e" on Two is dropped: the parts of "ef" say different things.',
		);
		const small = carried({ locks: { e: lock(1) } });
		expect(small.draft.locks).toEqual({});
		expect(words(small)[0]).toContain('it held for less than half of "ef".');
		expect(carried({ locks: { f: lock(1) } }).draft.locks).toEqual({ ef: lock(1) });
	});
	it('are dropped where another part may not have the ink', () => {
		const { draft, rows } = carried({ locks: { f: lock(1) }, forbidden: [{ key: 'e', ink: 1 }] });
		expect(draft).toMatchObject({ locks: {}, forbidden: [{ key: 'ef', ink: 1 }] });
		expect(rows[0].words).toContain('another part of "ef" may not have this ink.');
	});
	it('go with a region that is gone', () => {
		const result = carried({ locks: { b: lock(0) } });
		expect(result.draft.locks).toEqual({});
		expect(words(result)).toEqual(['The lock of "b" on One is dropped: the region is gone.']);
	});
	it('follow what a person decided', () => {
		const decided = decide(match, [{ kind: 'continues', old: 'b', as: ['a'] }]);
		if (decided.status !== 'decided') throw new Error(decided.reasons.join());
		const { draft } = carryDraft(blankDraft({ locks: { a: lock(0) } }), decided.match);
		expect(draft.locks).toEqual({ a: lock(0) });
	});
	it('may have keys that mean something to the language', async () => {
		const odd = await landOf(cells, { constructor: [0], toString: [1], ['__proto__']: [2] });
		const same = matchRegions(odd, odd);
		const locks = Object.fromEntries(odd.keys.map((key) => [key, lock(0)]));
		const result = carryDraft(blankDraft({ locks }), same).draft.locks;
		expect(Object.entries(result)).toEqual(Object.entries(locks));
	});
});

describe('bans and pairs', () => {
	it('go to each piece, once', () => {
		const { draft, rows } = carried({
			forbidden: [
				{ key: 'c', ink: 1 },
				{ key: 'e', ink: 0 },
				{ key: 'f', ink: 0 },
			],
			apart: [['c', 'd']],
		});
		expect(draft.forbidden).toEqual([
			{ key: 'c', ink: 1 },
			{ key: 'c2', ink: 1 },
			{ key: 'ef', ink: 0 },
		]);
		expect(draft.apart).toEqual([
			['c', 'D'],
			['c2', 'D'],
		]);
		expect(rows.map(({ what, outcome }) => `${what} ${outcome}`)).toEqual([
			...['forbidden copied', 'forbidden followed', 'forbidden doubled', 'apart copied'],
		]);
	});
	it('keep alike what need not differ', () => {
		expect(carried({ alike: [['c', 'd']] }).draft.alike).toHaveLength(1);
		expect(carried({ alike: [['c', 'd']] }, {}).draft.alike).toHaveLength(2);
	});
	it('are dropped between regions that are one now, and where one is gone', () => {
		const { draft, rows } = carried({ alike: [['e', 'f']], apart: [['a', 'b']] });
		expect(draft).toMatchObject({ alike: [], apart: [] });
		expect(rows.map((row) => row.words)).toEqual([
			'That "e" and "f" are kept alike is dropped: the two regions have become one.',
			'That "a" and "b" are kept apart is dropped: a region of it is gone.',
		]);
	});
	it('are not alike and apart at once after a merger', () => {
		const { draft, rows } = carried({ alike: [['a', 'e']], apart: [['a', 'f']] });
		expect(draft).toMatchObject({ alike: [], apart: [['a', 'ef']] });
		expect(rows[0].words).toContain('they are kept apart as well.');
	});
});

describe('groups', () => {
	const group = (kind: 'alike' | 'different', ...keys: string[]) => ({ kind, name: 'North', keys });
	it('that are alike take in every piece that need not differ', () => {
		const touching = carried({ groups: [group('alike', 'a', 'c', 'd')] });
		expect(touching.draft.groups[0].keys).toHaveLength(3);
		expect(words(touching)[0]).toMatch(
			/: "c2?" is left out \(must differ from the others now\)\.$/,
		);
		const { draft, rows } = carried({ groups: [group('alike', 'a', 'c', 'd')] }, {});
		expect(draft.groups).toEqual([group('alike', 'a', 'c', 'c2', 'D')]);
		expect(rows).toMatchObject([{ what: 'group', outcome: 'copied', now: ['a', 'c', 'c2', 'D'] }]);
	});
	it('that all differ take one piece of a region, and one of regions that are one now', () => {
		const { draft, rows } = carried({ groups: [group('different', 'a', 'c', 'd', 'e', 'f')] });
		expect(draft.groups).toHaveLength(1);
		expect(draft.groups[0].keys).toHaveLength(4);
		expect(rows[0].words).toMatch(
			/^That all of "North" are different follows to "a", "c2?", "D" and "ef": "c2?" is left out \(count with a larger piece\); regions of it have become one\.$/,
		);
	});
	it('are dropped with fewer than two regions', () => {
		const result = carried({ groups: [group('different', 'b', 'a'), group('alike', 'e', 'f')] });
		expect(result.draft.groups).toEqual([]);
		expect(words(result)).toEqual([
			'That all of "North" are different is dropped: "b" is gone.',
			'That all of "North" are kept alike is dropped: regions of it have become one.',
		]);
	});
});

describe('borders struck out and added', () => {
	const hand = (a: string, b: string) => ({ a, b, reason: 'a ridge' });
	it('follow with their reason where the pair has a border', () => {
		const { draft, rows } = carried({ struck: [hand('c', 'f'), hand('a', 'd')] });
		expect(draft.struck).toEqual([hand('c', 'ef'), hand('c2', 'ef'), hand('a', 'D')]);
		expect(rows.map(({ outcome }) => outcome)).toEqual(['copied', 'followed']);
	});
	it('are dropped where there is no such border, or no such pair', () => {
		const result = carried({ struck: [hand('b', 'c')], added: [hand('e', 'f'), hand('a', 'c')] });
		expect(result.draft).toMatchObject({ struck: [], added: [hand('a', 'c'), hand('a', 'c2')] });
		expect(words(result)[1]).toBe(
			'The border of "e" and "f", added by hand, is dropped: the two regions have become one.',
		);
	});
});

it('a grouping by a column that is missing is dropped', () => {
	const layout = { ...blankDraft().layout, groupColumn: 'province' };
	expect(carried({ layout }, { columns: ['name'] })).toMatchObject({
		draft: { layout: { groupColumn: null } },
		rows: [{ what: 'layout', outcome: 'dropped' }],
	});
	expect(carried({ layout }, { columns: ['province'] }).draft.layout).toEqual(layout);
});

describe('the colouring before', () => {
	it('becomes a wish of each new region, the larger share first', () => {
		expect(match.after.keys).toEqual(['a', 'c', 'c2', 'D', 'ef']);
		expect([...carryInks([0, 1, 2, 3, 4, 5], match)]).toEqual([0, 2, 2, 3, 5]);
		expect([...carryInks([0, 1, -1, 3, 4, -1], match)]).toEqual([0, -1, -1, 3, 4]);
		expect(() => carryInks([0], match)).toThrow(RangeError);
	});
	it('keeps all inks but that of one piece when the new land is coloured', async () => {
		const previous = carryInks([0, 1, 0, 1, 0, 2], match);
		const result = await colour({
			regions: after.keys.length,
			borders: later.borders,
			inks: 4,
			previous,
			goal: 'fewest-changes',
		});
		if (result.status !== 'coloured') throw new Error(result.status);
		expect(result.changes?.count).toBe(1);
	});
});

describe('names', () => {
	const at = { dxMm: 2, dyMm: -1, lines: 2, short: true } as const;
	const withNames = (lettering: Partial<Draft['layout']['lettering']>) => {
		const { layout } = blankDraft({});
		return carried({
			layout: { ...layout, lettering: { ...layout.lettering, ...lettering } },
		});
	};
	it('go with place and abbreviation to the largest piece, and are hidden on every piece', () => {
		const result = withNames({ placed: { c: at, d: at }, hidden: ['c'], first: ['d', 'a'] });
		const { lettering } = result.draft.layout;
		expect(Object.keys(lettering.placed)).toHaveLength(2);
		expect(lettering.placed.D).toEqual(at);
		expect(lettering.hidden.toSorted()).toEqual(['c', 'c2']);
		expect(lettering.first).toEqual(['D', 'a']);
		expect(words(result)).toContain('The place of the name of "d", set by hand, follows to "D".');
	});
	it('of merged regions are one, and those of a region that is gone are told as dropped', () => {
		const result = withNames({ abbreviations: { e: 'E.', f: 'F.', b: 'B.' }, hidden: ['b'] });
		expect(result.draft.layout.lettering.abbreviations).toEqual({ ef: 'E.' });
		expect(result.draft.layout.lettering.hidden).toEqual([]);
		expect(result.rows.map(({ outcome }) => outcome)).toEqual([
			...['followed', 'doubled', 'dropped'],
			'dropped',
		]);
	});
	it('from a column that is missing are the sheet’s own again', () => {
		const { layout } = blankDraft({});
		const own = { ...layout, lettering: { ...layout.lettering, nameColumn: 'label' } };
		const { draft, rows } = carried({ layout: own }, { ...fresh, columns: ['code'] });
		expect(draft.layout.lettering.nameColumn).toBeNull();
		expect(rows.map(({ what }) => what)).toEqual(['layout']);
	});
});
