import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { inkMap, tieRules, withoutTie, withTie, type TieGround } from './edge-ties.ts';

const inks = ['#111111', '#222222', '#333333', '#444444'].map((hex) => ({ name: hex, hex }));
const palette = { id: 'p', name: 'P', inks };
const ground: TieGround = {
	...{ sheet: 7, name: 'North', edition: 2, revision: 9, inks },
	same: [{ key: 'k', ink: 1 }],
	beside: [
		{ key: 'm', ink: 2, metres: 500, other: 'Y' },
		{ key: 'm', ink: 2, metres: 90, other: 'Z' },
		{ key: 'n', ink: 3, metres: 0, other: 'Z' },
	],
};

describe('what a tie asks', () => {
	it('locks what is on both sheets and forbids what lies across, each once and marked', () => {
		const rules = tieRules(ground, blankDraft({ palette }));
		expect(rules.locks).toEqual({ k: { ink: 1, cost: 1, tie: 7 } });
		expect(rules.forbidden).toEqual([{ key: 'm', ink: 2, tie: 7 }]);
		expect(rules).toMatchObject({ missing: [], against: [], beside: ['m'] });
	});

	it('counts points and short lines as the sheet does', () => {
		const draft = blankDraft({ palette, pointTouches: true, leastMetres: 100 });
		const forbidden = tieRules(ground, draft).forbidden.map(({ key, ink }) => [key, ink]);
		expect(forbidden).toEqual([
			['m', 2],
			['n', 3],
		]);
		const short = tieRules(ground, blankDraft({ palette, leastMetres: 600 }));
		expect(short).toMatchObject({ forbidden: [], beside: [] });
	});

	it('leaves own locks, and tells those that go against it', () => {
		const locks = { k: { ink: 0, cost: 5 }, m: { ink: 2, cost: 1 } };
		const rules = tieRules(ground, blankDraft({ palette, locks }));
		expect(rules.locks).toEqual({});
		expect(rules.against).toEqual([
			{ key: 'k', ink: 1, why: 'same' },
			{ key: 'm', ink: 2, why: 'beside' },
		]);
		const agreeing = blankDraft({ palette, locks: { k: { ink: 1, cost: 5 } } });
		expect(tieRules(ground, agreeing)).toMatchObject({ locks: {}, against: [] });
	});

	it('finds inks by colour, and binds nothing where this palette has none', () => {
		const few = { ...palette, inks: [inks[2], inks[0]] };
		const rules = tieRules(ground, blankDraft({ palette: few }));
		expect(rules).toMatchObject({ locks: {}, missing: [1] });
		expect(rules.forbidden).toEqual([{ key: 'm', ink: 0, tie: 7 }]);
		expect(inkMap(few.inks, inks)).toEqual([1, null, 0, null]);
		const doubled = [inks[0], inks[0]];
		expect(inkMap(doubled, doubled)).toEqual([0, 1]);
	});

	it('minds no key that objects have by nature', () => {
		const odd = { ...ground, same: [{ key: 'constructor', ink: 1 }], beside: [] };
		const { locks } = tieRules(odd, blankDraft({ palette }));
		expect(Object.keys(locks)).toEqual(['constructor']);
	});
});

describe('a draft that is tied', () => {
	const before = blankDraft({
		palette,
		locks: { z: { ink: 0, cost: 1 }, w: { ink: 1, cost: 1, tie: 8 } },
		forbidden: [{ key: 'm', ink: 2 }],
		ties: [{ sheet: 8, name: 'South', edition: null, revision: 3 }],
	});

	it('is as before once the tie is taken back', () => {
		const tied = withTie(ground)(before);
		expect(tied.ties.map(({ sheet }) => sheet)).toEqual([8, 7]);
		expect(tied.forbidden).toHaveLength(2);
		expect(withoutTie(7)(tied)).toEqual(before);
		expect(before.ties).toHaveLength(1);
	});

	it('follows what the other sheet has by now, and forgets what it had', () => {
		const newer = { ...ground, edition: 3, same: [{ key: 'k', ink: 3 }], beside: [] };
		const again = withTie(newer)(withTie(ground)(before));
		expect(again).toEqual(withTie(newer)(before));
		expect(again.locks.k).toMatchObject({ ink: 3, tie: 7 });
	});
});
