import { describe, expect, it } from 'vitest';
import { filtered, ordered, type Column } from './table';

interface Place {
	name: string;
	km2: number | null;
}
const columns: Column<Place>[] = [
	{ id: 'name', label: 'Name', value: (row) => row.name },
	{ id: 'km2', label: 'Area', value: (row) => row.km2, numeric: true },
];
const places: Place[] = [
	{ name: 'Ward 10', km2: 4 },
	{ name: 'ward 9', km2: null },
	{ name: 'Élan', km2: 12 },
];

describe('ordered', () => {
	it('counts figures inside words and ignores case', () => {
		const names = ordered(places, columns, { id: 'name', down: false }).map(({ name }) => name);
		expect(names).toEqual(['Élan', 'ward 9', 'Ward 10']);
	});

	it('keeps rows without a value last, both ways', () => {
		for (const down of [false, true])
			expect(ordered(places, columns, { id: 'km2', down }).at(-1)?.name).toBe('ward 9');
	});

	it('does not touch the rows it was given', () => {
		const before = [...places];
		ordered(places, columns, { id: 'km2', down: true });
		expect(places).toEqual(before);
	});
});

describe('filtered', () => {
	it('asks for every word, in any column', () => {
		expect(filtered(places, columns, 'ward 4').map(({ name }) => name)).toEqual(['Ward 10']);
		expect(filtered(places, columns, '  ')).toHaveLength(3);
	});
});
