import { describe, expect, it } from 'vitest';
import { inkDistances } from '$lib/engines/palettes';
import { blankDraft } from '../../../tests/support/blank-draft';
import { lock, useInks, weigh } from './draft-edits';

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

describe('more inks than the palette has', () => {
	it('are added as greys that can be told from each other and from all there are', () => {
		for (const hex of ['#e4eaee', '#808080', '#111111']) {
			const { palette } = blankDraft();
			const inks = [...palette.inks, { name: 'Three', hex }];
			const grown = useInks(5)(blankDraft({ palette: { ...palette, inks } })).palette.inks;
			expect(grown.slice(0, 3)).toEqual(inks);
			const distances = inkDistances(grown.map((ink) => ink.hex));
			for (const added of [3, 4])
				for (const other of [0, 1, 2, 3].filter((ink) => ink !== added))
					expect(distances[added][other]).toBeGreaterThan(10);
		}
	});
});
