import { describe, expect, it } from 'vitest';
import { freezeTheme, thawFigures, thawTheme } from './frozen-theme.ts';

const keys = ['a', 'b', 'c', 'd'];
const inks = ['up to 10', 'over 10', 'no data', 'suppressed'].map((name) => ({
	...{ name, hex: '#888888' },
}));
const shown = {
	...{ classes: Int32Array.from([0, 1, 2, 3]), inks, told: 2, title: 'Visits', note: '' },
};

describe('the theme of an edition', () => {
	it('holds classes and no figure unless it is handed figures', () => {
		const frozen = freezeTheme(keys, shown, null);
		expect(frozen).not.toHaveProperty('figures');
		expect(thawFigures(keys, frozen)).toBeNull();
		expect([...thawTheme(['d', 'a', 'new'], frozen).classes]).toEqual([3, 0, 2]);
	});

	it('leaves out what is suppressed or not told, even where it is handed in', () => {
		const frozen = freezeTheme(keys, shown, null, [4, 12, 7777, 3]);
		expect(frozen.figures).toEqual({ a: 4, b: 12 });
		expect(thawFigures(['c', 'b', 'new'], frozen)).toEqual([null, 12, null]);
	});
});
