import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inks, layout } from '../../../../tests/support/sheets.ts';
import { caution } from '../sheet/index.ts';
import {
	canonicalJson,
	differences,
	digestOf,
	editionContent,
	verifyEdition,
	type Draft,
	type EditionContent,
} from './index.ts';

const draft: Draft = {
	inks: 'fewest',
	palette: { id: 'house', name: 'House', inks },
	locks: { b: { ink: 1, cost: 1, by: 'an analyst', at: '2026-12-01' } },
	forbidden: [{ key: 'a', ink: 3 }],
	alike: [['a', 'c']],
	apart: [],
	groups: [],
	reserved: [],
	goals: [],
	ties: [],
	pointTouches: false,
	leastMetres: 0,
	waterKm: null,
	struck: [],
	added: [{ a: 'a', b: 'c', reason: 'ferry' }],
	seed: 0,
	layout,
	theme: null,
};

const input = {
	boundariesDigest: 'f'.repeat(64),
	keys: ['a', 'b', 'c'],
	draft,
	colouring: Int32Array.of(0, 1, 0),
	lowerBound: 2,
	proof: { kind: 'edge', regions: ['a', 'b'] },
};

function content(changes: Partial<typeof input> = {}): EditionContent {
	const made = editionContent({ ...input, ...changes });
	if (made.status !== 'complete') throw new Error(made.reason);
	return made.content;
}

describe('content of an edition', () => {
	it('holds all that was decided, by key, with the caution', () => {
		expect(content()).toMatchObject({
			colouring: { a: 0, b: 1, c: 0 },
			inksUsed: 2,
			lowerBound: 2,
			caution,
			draft: { layout, pointTouches: false },
		});
	});

	it('is refused where a region has no ink or shares its key', () => {
		const bare = editionContent({ ...input, colouring: Int32Array.of(0, -1, 8) });
		expect(bare).toEqual({ status: 'incomplete', reason: 'not-coloured', keys: ['b', 'c'] });
		const twice = editionContent({ ...input, keys: ['a', 'b', 'a'] });
		expect(twice).toEqual({ status: 'incomplete', reason: 'duplicate-keys', keys: ['a'] });
	});

	it('keeps keys that objects treat in their own way', () => {
		const odd = content({ keys: ['__proto__', '10', '9'] });
		expect(Object.entries(odd.colouring).sort()).toEqual([
			['10', 1],
			['9', 0],
			['__proto__', 0],
		]);
		expect(canonicalJson(odd.colouring)).toBe('{"10":1,"9":0,"__proto__":0}');
	});
});

/** The same value with the members of every object in another order. */
function shuffled(value: unknown): unknown {
	if (Array.isArray(value)) return value.map(shuffled);
	if (typeof value !== 'object' || value === null) return value;
	return Object.fromEntries(
		Object.entries(value)
			.reverse()
			.map(([name, member]) => [name, shuffled(member)]),
	);
}

describe('digest', () => {
	it("is SHA-256 of the canonical JSON by Node's own library", async () => {
		const expected = createHash('sha256').update(canonicalJson(content()), 'utf8').digest('hex');
		expect(await digestOf(content())).toBe(expected);
	});

	it('does not depend on order or on storage as JSON, and sees every change', async () => {
		const key = fc.string({ minLength: 1 });
		await fc.assert(
			fc.asyncProperty(fc.uniqueArray(key, { minLength: 1 }), fc.string(), async (keys, title) => {
				const one = content({
					keys,
					draft: { ...draft, layout: { ...layout, title } },
					colouring: Int32Array.from(keys, (_, i) => i % 3),
				});
				const digest = await digestOf(one);
				expect(await digestOf(shuffled(one) as EditionContent)).toBe(digest);
				expect(await verifyEdition(JSON.parse(JSON.stringify(one)), digest)).toBe(true);
				const other = { ...one, colouring: { ...one.colouring, [keys[0]]: 7 } };
				expect(await verifyEdition(other, digest)).toBe(false);
			}),
			{ numRuns: 50 },
		);
	});
});

describe('differences', () => {
	it('finds none between a state and itself, whatever the order of its lists', () => {
		const turned = content({
			draft: { ...draft, locks: { b: { ...draft.locks.b, by: 'somebody else' } } },
		});
		expect(differences(content(), turned)).toEqual({
			boundariesChanged: false,
			regions: [],
			palette: [],
			rules: [],
			layout: [],
			theme: [],
			classes: [],
			figures: [],
			territories: [],
			same: true,
		});
	});

	it('names what changed', () => {
		const after = content({
			boundariesDigest: 'e'.repeat(64),
			keys: ['a', 'b', 'd'],
			colouring: Int32Array.of(2, 1, 0),
			draft: {
				...draft,
				locks: {},
				apart: [['a', 'b']],
				palette: { ...draft.palette, inks: [{ ...inks[0], hex: '#000000' }, ...inks.slice(1)] },
				layout: { ...layout, title: 'Another' },
			},
		});
		const found = differences(content(), after);
		expect(found.same).toBe(false);
		expect(found.boundariesChanged).toBe(true);
		expect(found.regions).toEqual([
			{ key: 'a', before: 0, after: 2 },
			{ key: 'c', before: 0, after: null },
			{ key: 'd', before: null, after: 0 },
		]);
		expect(found.palette.map(({ what }) => what)).toEqual(['ink 0']);
		expect(found.rules.map(({ what }) => what)).toEqual(['apart ["a","b"]', 'lock b']);
		expect(found.layout).toEqual([{ what: 'title', before: layout.title, after: 'Another' }]);
	});

	it('says groups, reserved inks, goals and ties in words, in whatever order they stand', () => {
		const north = { kind: 'alike' as const, name: 'North', keys: ['a', 'b'] };
		const ruled = {
			...draft,
			groups: [north],
			reserved: [1, 2],
			goals: [{ kind: 'even-area' as const, give: 0.125 }],
			ties: [{ sheet: 4, name: 'Next door', edition: 2, revision: 9 }],
		};
		const found = differences(content(), content({ draft: ruled }));
		expect(found.rules.map(({ what, after }) => [what, after])).toEqual([
			['all of “North” kept alike', ['a', 'b']],
			['goals', ['even use by area, of which later goals may take 12.5 %']],
			['ink 1 reserved', true],
			['ink 2 reserved', true],
			['tie to sheet 4', '“Next door”, edition 2, revision 9'],
		]);
		const turned = { ...ruled, groups: [{ ...north, keys: ['b', 'a'] }], reserved: [2, 1] };
		expect(differences(content({ draft: ruled }), content({ draft: turned })).same).toBe(true);
	});

	it('finds nothing new in an edition from before such rules could be said', () => {
		const old = content();
		const { groups, reserved, goals, ties, ...unasked } = old.draft;
		expect([groups, reserved, goals, ties].flat()).toEqual([]);
		const stored = { ...old, draft: unasked as typeof old.draft };
		expect(differences(stored, content()).same).toBe(true);
		expect(differences(content(), stored).same).toBe(true);
	});
});
