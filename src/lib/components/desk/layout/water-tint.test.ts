import { describe, expect, it } from 'vitest';
import { takenFor, waterTint } from './water-tint.ts';

const inks = [
	{ name: 'Ochre', hex: '#edb552' },
	{ name: 'Chalk', hex: '#e4eaed' },
];

describe('the tint of water', () => {
	it('keeps away from the inks of the sheet', () => {
		expect(takenFor('#dfe9ee', inks)).toEqual(['Chalk']);
		expect(takenFor(waterTint(inks), inks)).toEqual([]);
	});

	it('is the first where there are no inks', () => {
		expect(waterTint([])).toBe('#dfe9ee');
	});
});
