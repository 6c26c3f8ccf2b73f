import fc from 'fast-check';
import { expect, it } from 'vitest';
import { JsonBytes } from './json-bytes.ts';

function numberIn(text: string, room = 1): number {
	const json = new JsonBytes(64);
	const bytes = new TextEncoder().encode(text);
	const memory = new Uint8Array(bytes.length + room);
	memory.set(bytes);
	json.hold(memory, bytes.length);
	json.last = true;
	return json.number();
}

const digits = (minLength: number, maxLength: number) =>
	fc.string({ unit: fc.constantFrom(...'0123456789'), minLength, maxLength });

// The language itself is the reference: `Number` rounds a decimal to the nearest double (ECMA-262, 7.1.4.1.1).
it('reads any decimal as the nearest double', () =>
	fc.assert(
		fc.property(
			fc.constantFrom('', '-'),
			digits(1, 20),
			fc.option(digits(1, 30)),
			fc.option(fc.integer({ min: -30, max: 30 })),
			fc.constantFrom(',', ']', ' '),
			(sign, whole, fraction, exponent, after) => {
				const point = fraction === null ? '' : `.${fraction}`;
				const text = sign + whole + point + (exponent === null ? '' : `e${exponent}`);
				expect(numberIn(text + after)).toBe(Number(text));
				expect(numberIn(text + after, 0)).toBe(Number(text));
			},
		),
		{ numRuns: 3000 },
	));

it('refuses what is no number', () => {
	for (const text of ['-,', '1.,', '.5,', 'NaN,', 'x]', '1e999,', '"1",']) {
		expect(() => numberIn(text), text).toThrow();
	}
});
