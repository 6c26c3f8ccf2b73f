import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { rowsKeptWhole, windowOf } from './virtual-rows';

describe('windowOf', () => {
	it('keeps short tables whole', () => {
		expect(windowOf(rowsKeptWhole, 36, 0, 400)).toMatchObject({ from: 0, to: rowsKeptWhole });
	});

	it('never loses height, and always holds what is in view', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: rowsKeptWhole + 1, max: 50_000 }),
				fc.integer({ min: 20, max: 60 }),
				fc.double({ min: 0, max: 1, noNaN: true }),
				fc.integer({ min: 100, max: 900 }),
				(rows, rowHeight, place, seen) => {
					const scrolled = Math.floor(place * (rows * rowHeight - seen));
					const { from, to, above, below } = windowOf(rows, rowHeight, scrolled, seen);
					expect(above + below + (to - from) * rowHeight).toBe(rows * rowHeight);
					expect(above).toBeLessThanOrEqual(scrolled);
					expect(to * rowHeight).toBeGreaterThanOrEqual(
						Math.min(rows * rowHeight, scrolled + seen),
					);
					expect(to - from).toBeLessThanOrEqual(Math.ceil(seen / rowHeight) + 26);
				},
			),
		);
	});
});
