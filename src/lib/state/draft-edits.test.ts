import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../tests/support/blank-draft';
import { lock, weigh } from './draft-edits';

describe('the weight of a lock', () => {
	const draft = lock(['a'], 0)(blankDraft());

	it('is one at first, is set, and stays when the region is locked to another ink', () => {
		expect(draft.locks.a.cost).toBe(1);
		const heavy = weigh('a', 2.5)(draft);
		expect(heavy.locks.a).toEqual({ ...draft.locks.a, cost: 2.5 });
		expect(lock(['a'], 1)(heavy).locks.a).toMatchObject({ ink: 1, cost: 2.5 });
		expect(draft.locks.a.cost).toBe(1);
	});

	it('is left as it was for a region without a lock and for a weight that is none', () => {
		for (const cost of [0, -1, NaN, Infinity, 2e9]) expect(weigh('a', cost)(draft)).toBe(draft);
		expect(weigh('b', 2)(draft)).toBe(draft);
	});
});
