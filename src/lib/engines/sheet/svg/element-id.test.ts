import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { elementId } from './element-id.ts';

describe('element ids', () => {
	it('are different for different keys and valid XML names', () => {
		const key = fc.string({ unit: 'binary', maxLength: 12 });
		fc.assert(
			fc.property(key, key, (a, b) => {
				expect(elementId(a)).toMatch(/^r-[A-Za-z0-9_]*$/);
				expect(elementId(a) === elementId(b)).toBe(a === b);
			}),
		);
	});

	it('keep near keys apart', () => {
		const keys = ['a', 'A', 'a_', 'a_5f_', '_61_', 'a b', 'a-b', 'ab', '', ' '];
		expect(new Set(keys.map((key) => elementId(key))).size).toBe(keys.length);
	});
});
