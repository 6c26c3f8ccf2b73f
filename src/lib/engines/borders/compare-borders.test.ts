import { describe, expect, it } from 'vitest';
import { acceptedFeatures, box } from '../../../../tests/support/read-boundaries.ts';
import { compareBorders } from './index.ts';

const read = async (map: ReturnType<typeof box>[]) => {
	const { coverage, borders } = await acceptedFeatures(map);
	return { keys: coverage.keys, borders };
};

describe('what becomes of borders between two readings', () => {
	it('is told pair by pair, by key and not by number', async () => {
		const before = await read([
			box('a', 0, 0, 1, 1),
			box('b', 1, 0, 2, 1),
			box('c', 2, 0, 3, 1),
			box('d', 0, 1, 1, 2),
		]);
		// b reaches half as high, c is away from it, and e is new
		const after = await read([
			box('e', 3, 0, 4, 1),
			box('d', 0, 1, 1, 2),
			box('c', 2.1, 0, 3, 1),
			box('b', 1, 0, 2, 0.5),
			box('a', 0, 0, 1, 1),
		]);
		const { gained, lost, changed } = compareBorders(before, after);
		const pairs = (list: { a: string; b: string }[]) => list.map(({ a, b }) => `${a}-${b}`);
		expect(pairs(gained)).toEqual(['c-e']);
		// b and d met in a corner of all four
		expect(pairs(lost)).toEqual(['b-c', 'b-d']);
		expect(lost.map(({ kind }) => kind)).toEqual(['line', 'point']);
		expect(pairs(changed)).toEqual(['a-b']);
		expect(changed[0].after.metres / changed[0].before.metres).toBeCloseTo(0.5, 3);
	});
	it('is nothing for the same map in another order, or for less than half a percent', async () => {
		const map = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1), box('c', 1, 1, 2, 2)];
		const same = compareBorders(await read(map), await read(map.toReversed()));
		expect(same).toEqual({ gained: [], lost: [], changed: [] });
		const longer = await read([box('a', 0, 0, 1, 1.004), box('b', 1, 0, 2, 1.004)]);
		const plain = await read([box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)]);
		expect(compareBorders(plain, longer).changed).toEqual([]);
		const much = await read([box('a', 0, 0, 1, 1.006), box('b', 1, 0, 2, 1.006)]);
		expect(compareBorders(plain, much).changed).toHaveLength(1);
	});
});
