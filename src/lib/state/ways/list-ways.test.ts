import { describe, expect, it } from 'vitest';
import type { Explanation } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import { blankDraft } from '../../../../tests/support/blank-draft';
import { listWays } from './list-ways';

const ground = {
	keys: ['a', 'b', 'c', 'd'],
	names: ['Ost', 'West', '', 'Süd'],
	borders: {
		a: Uint32Array.of(0, 1),
		b: Uint32Array.of(1, 2),
		kind: new Uint8Array(2),
		metres: Float64Array.of(5, 5),
		at: new Float64Array(4),
	},
};

const locked = (costs: number[]): Draft['locks'] =>
	Object.fromEntries(costs.map((cost, i) => [ground.keys[i], { ink: 0, cost }]));

const explanation = (parts: Partial<Explanation>): Explanation => ({
	locks: [0, 1],
	rules: [],
	regions: [0, 1],
	release: { locks: [0], cost: 2, proved: true, lowerBound: 2 },
	inksThatWouldDo: null,
	...parts,
});

const list = (parts: Partial<Explanation>, draft: Partial<Draft> = {}) =>
	listWays(explanation(parts), blankDraft({ locks: locked([2, 3]), ...draft }), ground);

describe('the ways out of a collision', () => {
	it('begin with the cheapest release, which is not listed again among single locks', () => {
		const ways = list({});
		expect(ways.map(({ gives, weight }) => [gives, weight])).toEqual([
			['Release Ost', 2],
			['Release West', 3],
		]);
		expect(ways[0].note).toBe('Nothing cheaper would do.');
		const draft = blankDraft({ locks: locked([2, 3]) });
		expect(Object.keys(ways[0].change(draft).locks)).toEqual(['b']);
		expect(Object.keys(ways[1].change(draft).locks)).toEqual(['a']);
		expect(Object.keys(draft.locks)).toEqual(['a', 'b']);
	});

	it('say how far the cheapest release is known', () => {
		const open = { locks: [0, 1], cost: 5, proved: false, lowerBound: 4 };
		const [release, one, other] = list({ release: open });
		expect(release.note).toBe('Costs 5; at least 4 has to go, by what was worked out so far.');
		for (const way of [one, other])
			expect(way.hopeless).toBe('Not enough: locks of weight 4 at least have to go.');
	});

	it('offer so many inks as would do, and the palette grows with them', () => {
		const inks = list({ inksThatWouldDo: 3 }).find(({ kind }) => kind === 'inks');
		expect(inks?.gives).toBe('Use 3 inks');
		const changed = inks?.change(blankDraft());
		expect([changed?.inks, changed?.palette.inks.length]).toEqual([3, 3]);
	});

	it('offer the rules that speak of the regions in the collision, and no others', () => {
		const ways = list(
			{ regions: [0, 1, 2] },
			{
				forbidden: [
					{ key: 'c', ink: 1 },
					{ key: 'd', ink: 1 },
				],
				alike: [['a', 'd']],
				apart: [['a', 'c']],
				groups: [{ kind: 'different', name: 'North', keys: ['d', 'b', 'c'] }],
				reserved: [1],
				added: [{ a: 'a', b: 'c', reason: 'a bridge' }],
			},
		);
		const rules = ways.filter(({ kind }) => kind === 'rule').map(({ gives }) => gives);
		expect(rules).toEqual([
			'Drop the rule that c may not be Two',
			'Drop the rule that Ost and c are kept apart',
			'Drop the rule that all 3 regions of “North” are kept different from each other',
			'Drop the rule that Two is reserved for regions locked to it',
			'Drop the rule that a border between Ost and c was added by hand',
		]);
	});

	it('are the rules to blame where no lock is, but for borders of the file', () => {
		const ways = listWays(
			explanation({
				...{ locks: [], release: null },
				rules: [
					{ kind: 'border', a: 0, b: 1 },
					{ kind: 'alike', a: 0, b: 1 },
					{ kind: 'inks', inks: 2 },
				],
			}),
			blankDraft({ alike: [['b', 'a']] }),
			ground,
		);
		expect(ways.map(({ gives }) => gives)).toEqual([
			'Drop the rule that Ost and West are kept alike',
		]);
		expect(ways[0].change(blankDraft({ alike: [['b', 'a']] })).alike).toEqual([]);
	});
});
