import { describe, expect, it } from 'vitest';
import { decided, keyTyped } from './decide';

describe('deciding how regions go on', () => {
	it('keeps one decision for each old region, the last', () => {
		const first = decided([], { before: 'a', after: ['x'] });
		const both = decided(first, { before: 'b', after: [] });
		expect(decided(both, { before: 'a', after: ['y', 'z'] })).toEqual([
			{ before: 'b', after: [] },
			{ before: 'a', after: ['y', 'z'] },
		]);
	});

	it('keeps several decisions about regions that are new', () => {
		const one = decided([], { before: null, after: ['x'] });
		expect(decided(one, { before: null, after: ['y'] })).toHaveLength(2);
		expect(decided(one, { before: null, after: ['x'] })).toHaveLength(1);
	});

	it('takes a key, or a name that only one region has', () => {
		const side = { keys: ['01', '02', '03'], names: ['Lorvik', 'Same', 'Same'] };
		expect(keyTyped(' 02 ', side)).toBe('02');
		expect(keyTyped('lorvik', side)).toBe('01');
		expect(keyTyped('Same', side)).toBeNull();
		expect(keyTyped('', side)).toBeNull();
		expect(keyTyped('09', null)).toBe('09');
	});
});
