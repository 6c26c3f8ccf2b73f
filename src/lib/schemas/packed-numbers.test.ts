import fc from 'fast-check';
import { expect, it } from 'vitest';
import { packNumbers, unpackNumbers } from './packed-numbers';

it('reads back whatever was written', () => {
	const numbers = fc.array(fc.oneof(fc.integer({ min: -1, max: 40 }), fc.integer({ min: -1 })));
	fc.assert(
		fc.property(numbers, (given) => {
			expect(unpackNumbers(packNumbers(given))).toEqual(given);
		}),
	);
});

it('takes a letter for an ink, and none that a page or a script has to escape', () => {
	const inks = Array.from({ length: 32 }, (_, i) => i - 1);
	expect(packNumbers(inks)).toHaveLength(inks.length);
	expect(packNumbers([...inks, 31, 40_000, 2 ** 31])).toMatch(/^[\w-]+$/);
});

it.each(['A ', '"', '\u{1f5fa}', 'Ah', 'Agg', 'gA'])(
	'refuses what it did not write: %s',
	(text) => {
		expect(() => unpackNumbers(text)).toThrow(RangeError);
	},
);
