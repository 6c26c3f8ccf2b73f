import { describe, expect, it } from 'vitest';
import type { HandoverMove } from '$lib/schemas/handover';
import { addressOf, askedOf, movesAsked } from './move-rows';

const move = (ordinal: number, more: Partial<HandoverMove> = {}): HandoverMove => ({
	...{ ordinal, region: { key: `${ordinal}`, name: `District ${ordinal}` } },
	...{ from: { key: 'a', name: 'North' }, to: { key: 'b', name: 'South' } },
	...{ figures: { visits: ordinal * 10 }, reason: 'evens out visits', state: 'proposed' },
	...{ word: '', by: '', changedAt: '', contradicted: false },
	...more,
});
const list = {
	measures: [{ name: 'visits', unit: 'hours', confidential: false }],
	moves: Array.from({ length: 250 }, (_, at) => move(at + 1)),
};
const ask = (query: string, of = list) => movesAsked(of, askedOf(new URLSearchParams(query)));

describe('the moves that an address asks for', () => {
	it('come by the hundred, or all at once for printing', () => {
		expect(ask('')).toMatchObject({ pages: 3, page: 1, found: 250 });
		expect(ask('page=3').rows.map(({ ordinal }) => ordinal)).toHaveLength(50);
		expect(ask('page=0').rows).toHaveLength(250);
		expect(ask('page=99').page).toBe(3);
		for (const odd of ['-1', '1.5', 'x', '1e99']) expect(ask(`page=${odd}`).page).toBe(1);
	});

	it('stand in the order asked for, those without a value last', () => {
		expect(ask('sort=measure-0&down').rows[0].ordinal).toBe(250);
		const gap = { ...list, moves: [move(1, { figures: {} }), move(2), move(3)] };
		expect(ask('sort=measure-0', gap).rows.map(({ ordinal }) => ordinal)).toEqual([2, 3, 1]);
		expect(ask('sort=nonsense').rows[0].ordinal).toBe(1);
	});

	it('are those of a state, a territory, and with all words', () => {
		const moves = [
			move(1, { state: 'disputed', word: 'my customer' }),
			move(2, { to: { key: 'c', name: 'West' } }),
			move(3, { from: null }),
		];
		const few = { ...list, moves };
		expect(ask('state=disputed', few).rows.map(({ ordinal }) => ordinal)).toEqual([1]);
		expect(ask('territory=c', few).rows.map(({ ordinal }) => ordinal)).toEqual([2]);
		expect(ask('territory=a', few).rows.map(({ ordinal }) => ordinal)).toEqual([1, 2]);
		expect(ask('words=customer+my', few).rows.map(({ ordinal }) => ordinal)).toEqual([1]);
	});

	it('keep what was asked when one thing is changed, and begin at the first page', () => {
		const asked = askedOf(new URLSearchParams('sort=to&down&state=accepted&page=2'));
		expect(addressOf(asked, { down: false })).toBe('?sort=to&state=accepted#moves');
		expect(addressOf(asked, { page: 0 })).toContain('page=0');
	});
});
