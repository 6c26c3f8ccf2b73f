import { describe, expect, it } from 'vitest';
import { tableOf } from '../../../../../tests/support/joins.ts';
import { checkJoin, guessJoin, joinTable, suggestRegions, typeColumns } from '../index.ts';

const regions = {
	keys: ['01001', '01002', '01003', '10010', 'A-1'],
	names: ['Åhus', 'Łódź', 'Springfield', 'Springfield', 'Saint-Jean'],
};
const byKey = { column: 0, by: 'key' } as const;
const byName = { column: 0, by: 'name' } as const;
const joinBy = (choice: typeof byKey | typeof byName, ...cells: (string | number | null)[]) => {
	const table = tableOf({ Unit: cells });
	const join = joinTable(table, choice, regions);
	expect(checkJoin(table, join, regions)).toEqual([]);
	return join;
};

describe('a row joined by key', () => {
	it('matches exactly, folded, or without zeros at the front, and says how', () => {
		const join = joinBy(byKey, '01001', ' 01002 ', 1003, '0010010', 'a1');
		expect([...join.region]).toEqual([0, 1, 2, 3, 4]);
		expect(join.how).toEqual(['exact', 'folded', 'zeros', 'zeros', 'folded']);
		expect(join.counts).toEqual({ exact: 1, folded: 2, zeros: 2, 'by-hand': 0 });
		expect(join.notes).toMatchObject([
			{ code: 'zeros-dropped', severity: 'warning', row: 4 },
			{ code: 'matched-folded', severity: 'note', row: 3 },
		]);
	});

	it('is not matched where zeros at the front could mean two regions', () => {
		const two = { keys: ['1', '01', '2'], names: ['a', 'b', 'c'] };
		const table = tableOf({ Unit: ['001', '1', '01', '02'] });
		const join = joinTable(table, byKey, two);
		expect(checkJoin(table, join, two)).toEqual([]);
		expect([...join.region]).toEqual([-1, 0, 1, 2]);
		expect(join.unmatched).toMatchObject([{ row: 0, why: 'ambiguous', candidates: [0, 1] }]);
	});

	it('does not take 1.5 for 15', () => {
		const fifteen = { keys: ['15'], names: ['a'] };
		expect([...joinTable(tableOf({ Unit: [1.5] }), byKey, fifteen).region]).toEqual([-1]);
	});

	it('that names nothing gets the nearest keys, nearest first', () => {
		const join = joinBy(byKey, '01O01', 'zzz', null);
		expect(join.unmatched).toMatchObject([
			{ row: 0, fileRow: 2, why: 'unknown', suggestions: [{ region: 0, distance: 1 }] },
			{ row: 1, why: 'unknown', suggestions: [] },
			{ row: 2, why: 'blank', suggestions: [] },
		]);
		expect(join.missing).toEqual([0, 1, 2, 3, 4]);
	});
});

describe('a row joined by name', () => {
	it('matches whatever the case, accents and strokes', () => {
		const join = joinBy(byName, 'Åhus', 'AHUS', 'lodz', 'saint jean');
		expect([...join.region]).toEqual([0, 0, 1, 4]);
		expect(join.how).toEqual(['exact', 'folded', 'folded', 'folded']);
		expect(join.doubled).toEqual([{ region: 0, rows: [0, 1] }]);
	});

	it('is ambiguous where regions share the name', () => {
		const join = joinBy(byName, 'Springfield', 'SPRINGFIELD');
		expect([...join.region]).toEqual([-1, -1]);
		expect(join.unmatched).toMatchObject([
			{ why: 'ambiguous', candidates: [2, 3] },
			{ why: 'ambiguous', candidates: [2, 3] },
		]);
		expect(join.notes[0]).toMatchObject({ code: 'row-ambiguous', row: 2 });
	});

	it('knows no zeros', () => {
		const numbered = { keys: ['a'], names: ['007'] };
		expect([...joinTable(tableOf({ Unit: ['7'] }), byName, numbered).region]).toEqual([-1]);
	});
});

describe('decisions of a person', () => {
	const table = tableOf({ Unit: ['01001', 'x', '01002'] });

	it('assign and leave out rows; the last one counts', () => {
		const amends = [
			{ row: 1, region: 4 },
			{ row: 1, region: 3 },
			{ row: 2, region: null },
		];
		const join = joinTable(table, byKey, regions, amends);
		expect(checkJoin(table, join, regions)).toEqual([]);
		expect([...join.region]).toEqual([0, 3, -1]);
		expect(join).toMatchObject({ how: ['exact', 'by-hand', null], leftOut: [2], unmatched: [] });
	});

	it('on what does not exist are a programmer’s error', () => {
		expect(() => joinTable(table, byKey, regions, [{ row: 3, region: 0 }])).toThrow(RangeError);
		expect(() => joinTable(table, byKey, regions, [{ row: 0, region: 5 }])).toThrow(RangeError);
		expect(() => joinTable(table, { column: 9, by: 'key' }, regions)).toThrow(RangeError);
	});
});

describe('the column to join by', () => {
	const guess = (columns: Parameters<typeof tableOf>[0]) => {
		const table = tableOf(columns);
		return guessJoin(table, typeColumns(table, { decimal: '.' }), regions);
	};

	it('is the one that names most regions', () => {
		const columns = { No: [1, 2, 3], Name: ['Åhus', 'x', 'y'], Code: ['01001', 1002, 'zz'] };
		expect(guess(columns)).toEqual({ column: 2, by: 'key', share: 2 / 3 });
		expect(guess({ Note: ['a', 'b'], Name: ['ahus', 'łódź'] })).toEqual({
			column: 1,
			by: 'name',
			share: 1,
		});
		expect(guess({ Note: ['nothing', 'here'] })).toBeNull();
	});

	it('is not a column of small figures', () => {
		const many = {
			keys: Array.from({ length: 60 }, (_, i) => String(i + 1)),
			names: [] as string[],
		};
		many.names = many.keys.map((key) => `Region ${key}`);
		const table = tableOf({
			Visits: many.keys.map((_, i) => (i % 7) + 1),
			Code: [...many.keys].reverse().map(Number),
		});
		const found = guessJoin(table, typeColumns(table, { decimal: '.' }), many);
		expect(found).toEqual({ column: 1, by: 'key', share: 1 });
	});
});

it('suggests at most three, by distance and then in order', () => {
	const names = ['Norden', 'Nordern', 'Nordan', 'Norten', 'Süd'];
	const near = { keys: ['a', 'b', 'c', 'd', 'e'], names };
	expect(suggestRegions('Norde', near, 'name')).toEqual([{ region: 0, distance: 1 }]);
	expect(suggestRegions('nordenn', near, 'name')).toEqual([
		{ region: 0, distance: 1 },
		{ region: 1, distance: 1 },
		{ region: 2, distance: 2 },
	]);
	expect(suggestRegions('***', near, 'name')).toEqual([]);
});
