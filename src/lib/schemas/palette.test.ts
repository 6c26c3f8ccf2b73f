import { describe, expect, it } from 'vitest';
import { newPalette } from './palette.ts';

const read = (inks: string) => newPalette.safeParse({ name: 'Pasted', inks });

describe('a palette as it is pasted', () => {
	it.each([
		['#ebb855, #e5ecf0', ['#ebb855', '#e5ecf0'], ['Ink 1', 'Ink 2']],
		['EBB855 Ochre\nChalk: e5ecf0\r\n\n', ['#ebb855', '#e5ecf0'], ['Ochre', 'Chalk']],
		['"#fa0"; (0AF)', ['#ffaa00', '#00aaff'], ['Ink 1', 'Ink 2']],
	])('reads %j', (text, hexes, names) => {
		const { data } = read(text);
		expect(data?.inks.map(({ hex }) => hex)).toEqual(hexes);
		expect(data?.inks.map(({ name }) => name)).toEqual(names);
	});

	it.each(['', 'red', '#12345', '#ebb855, nothing', '#gggggg'])('refuses %j in words', (text) => {
		const { success, error } = read(text);
		expect(success).toBe(false);
		expect(error?.issues[0].message).toMatch(/colour/);
	});
});
