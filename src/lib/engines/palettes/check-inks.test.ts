import { expect, it } from 'vitest';
import { checkInks, checkPalette, housePalettes, verdictSentence, type Ink } from './index.ts';

const poppy: Ink = { name: 'Poppy', hex: '#e41a1c' };
const leather: Ink = { name: 'Leather', hex: '#a65628' };
const hatch = { kind: 'lines', angle: 45, spacingMm: 2, widthMm: 0.3, hex: '#ffffff' } as const;

it('without hatches is what the colours alone come to', () => {
	for (const { inks } of housePalettes) {
		const hexes = inks.map(({ hex }) => hex);
		expect(checkInks(inks)).toEqual(checkPalette(hexes, 'all'));
	}
	expect(checkInks([poppy, leather]).passes).toBe(false);
});

it('lets a hatch tell inks apart whose colours are too close', () => {
	const inks = [poppy, { ...leather, hatch }];
	const verdict = checkInks(inks);
	expect(verdict.passes).toBe(true);
	expect(verdictSentence(verdict, inks)).toBe('Every reader can tell apart all inks that touch');
});

it('but not one that is too wide spaced to be seen in regions of 5 mm, or that both inks have', () => {
	expect(checkInks([poppy, { ...leather, hatch: { ...hatch, spacingMm: 3 } }]).passes).toBe(false);
	expect(
		checkInks([
			{ ...poppy, hatch },
			{ ...leather, hatch },
		]).passes,
	).toBe(false);
});
