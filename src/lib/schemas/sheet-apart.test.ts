import { expect, it } from 'vitest';
import type { DeskSheet } from './desk';
import { sheetApart, wholeSheet } from './sheet-apart';

/** Of a desk's sheet, the parts that travel in another form. */
const sheet = (changes: Partial<DeskSheet> = {}): DeskSheet =>
	({
		...{ name: 'Rivers', revision: 3 },
		colouring: { status: 'coloured', inks: [0, 2, 1], inksUsed: 3, lowerBound: 3, sentence: '' },
		lastInks: [0, 2, 1],
		theme: null,
		regions: { key: ['a', 'b', 'c'], group: [null, null, null] },
		borders: { a: Uint32Array.of(0, 1), b: Uint32Array.of(1, 2) },
		...changes,
	}) as DeskSheet;

const cases: [string, DeskSheet][] = [
	['coloured', sheet()],
	['never coloured', sheet({ colouring: null, lastInks: null })],
	[
		'whose rules collide since it was coloured',
		sheet({ colouring: { status: 'undecided', lowerBound: 3, message: 'm', sentence: 's' } }),
	],
	[
		'with a level above',
		sheet({ regions: { key: ['a', 'b', 'c'], group: ['East', null, 'East'] } as never }),
	],
	['with a theme', sheet({ theme: { classes: [2, 0, 5], title: 'Rain' } as never })],
];

it.each(cases)('a sheet %s is whole again with its columns', (_, given) => {
	const apart = sheetApart(given, 'a tag');
	expect(apart).toMatchObject({ regions: null, borders: null, borderCount: 2 });
	expect(JSON.parse(JSON.stringify(apart))).toEqual(apart);
	const { group: __, ...regions } = given.regions;
	expect(wholeSheet(apart, { regions, borders: given.borders })).toEqual(given);
});
