import fc from 'fast-check';
import { expect, it } from 'vitest';
import { decodeColumns, encodeColumns, type SheetColumns } from './sheet-columns';

const whole = fc.integer({ min: 0, max: 2 ** 31 - 1 });
const metres = fc.double({ min: 0, max: 1e7, noNaN: true });
const region = fc.record({
	key: fc.string({ unit: 'grapheme' }),
	name: fc.string({ unit: 'grapheme' }),
	parts: whole,
	areaKm2: metres,
	enclaveOf: fc.integer({ min: -1, max: 40_000 }),
});
const border = fc.record({ a: whole, b: whole, kind: fc.nat(2), metres, lon: metres, lat: metres });

const columns = fc
	.record({ regions: fc.array(region), borders: fc.array(border) })
	.map(({ regions, borders }): SheetColumns => ({
		regions: {
			key: regions.map(({ key }) => key),
			name: regions.map(({ name }) => name),
			parts: regions.map(({ parts }) => parts),
			areaKm2: regions.map(({ areaKm2 }) => areaKm2),
			enclaveOf: regions.map(({ enclaveOf }) => enclaveOf),
		},
		borders: {
			a: Uint32Array.from(borders, ({ a }) => a),
			b: Uint32Array.from(borders, ({ b }) => b),
			kind: Uint8Array.from(borders, ({ kind }) => kind),
			metres: Float64Array.from(borders, (one) => one.metres),
			at: Float64Array.from(borders.flatMap(({ lon, lat }) => [lon, lat])),
		},
	}));

it('reads back whatever was written', () => {
	fc.assert(
		fc.property(columns, (given) => {
			const { buffer } = encodeColumns(given);
			expect(decodeColumns(buffer as ArrayBuffer)).toEqual(given);
		}),
	);
});

it('refuses bytes that are cut off', () => {
	const [given] = fc.sample(columns, { numRuns: 1, seed: 5 });
	const { buffer } = encodeColumns(given);
	for (const length of [0, 15, 16, buffer.byteLength - 1]) {
		if (length >= buffer.byteLength) continue;
		expect(() => decodeColumns(buffer.slice(0, length) as ArrayBuffer)).toThrow(RangeError);
	}
});
