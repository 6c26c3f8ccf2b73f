import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { tableOf } from '../../../../../tests/support/joins.ts';
import {
	changesBetween,
	checkTaken,
	joinTable,
	takeTexts,
	takeValues,
	typeColumn,
	type Cell,
	type TakeRules,
} from '../index.ts';

const regions = { keys: ['a', 'b', 'c'], names: ['A', 'B', 'C'] };
const usual: TakeRules = {
	doubled: 'sum',
	empty: 'missing',
	negative: 'keep',
	notNumber: 'missing',
};

function prepared(rows: [string, Cell][]) {
	const table = tableOf({ Unit: rows.map(([key]) => key), Visits: rows.map(([, value]) => value) });
	return {
		table,
		join: joinTable(table, { column: 0, by: 'key' }, regions),
		column: typeColumn(table, 1, '.'),
	};
}

function take(rows: [string, Cell][], rules: Partial<TakeRules> = {}) {
	const { join, column } = prepared(rows);
	const taken = takeValues(join, column, { ...usual, ...rules });
	if (taken.status === 'taken') {
		expect(checkTaken(join, column, { ...usual, ...rules }, taken)).toEqual([]);
	}
	return taken;
}

const codesOf = (taken: ReturnType<typeof take>, severity: string) =>
	taken.notes.filter((note) => note.severity === severity).map(({ code }) => code);

describe('values of regions', () => {
	it('are summed, or the first or last of several rows', () => {
		const rows: [string, Cell][] = [
			['a', 1],
			['b', null],
			['a', 2],
			['b', 5],
			['x', 9],
		];
		expect(take(rows)).toMatchObject({ values: Float64Array.of(3, 5, NaN), total: 8, outside: 9 });
		expect(take(rows, { doubled: 'first' })).toMatchObject({ values: Float64Array.of(1, 5, NaN) });
		expect(take(rows, { doubled: 'last' })).toMatchObject({ values: Float64Array.of(2, 5, NaN) });
		const refused = take(rows, { doubled: 'refuse' });
		expect(refused.status).toBe('refused');
		expect(refused.notes[0]).toMatchObject({
			code: 'region-doubled',
			severity: 'error',
			regions: [0, 1],
		});
	});

	it('are missing where cells are empty, and 0 only if the rules say so', () => {
		const rows: [string, Cell][] = [
			['a', 1],
			['b', null],
			['c', 'n/a'],
		];
		expect(take(rows)).toMatchObject({ values: Float64Array.of(1, NaN, NaN) });
		expect(take(rows, { empty: 'zero' })).toMatchObject({ values: Float64Array.of(1, 0, NaN) });
		expect(codesOf(take(rows, { empty: 'zero' }), 'note')).toEqual(['empty-cells']);
	});

	it('are refused or missing where text stands among numbers', () => {
		const rows: [string, Cell][] = [
			['a', 1],
			['b', '12 or so'],
			['c', '#DIV/0!'],
		];
		const refused = take(rows, { notNumber: 'refuse' });
		expect(refused.status).toBe('refused');
		expect(refused.notes[0]).toMatchObject({ code: 'not-a-number', row: 3, column: 'Visits' });
		expect(refused.notes[0].message).toBe(
			'"Visits": 2 cells hold no number, the first "12 or so" (rows 3 and 4).',
		);
		expect(take(rows)).toMatchObject({ values: Float64Array.of(1, NaN, NaN) });
		// a row that belongs to no region is no reason to refuse
		expect(
			take(
				[
					['a', 1],
					['x', 'text'],
				],
				{ notNumber: 'refuse' },
			).status,
		).toBe('taken');
	});

	it('that are negative are kept, refused or missing', () => {
		const rows: [string, Cell][] = [
			['a', 1],
			['b', -2],
			['c', 3],
		];
		expect(take(rows)).toMatchObject({ values: Float64Array.of(1, -2, 3) });
		expect(take(rows, { negative: 'missing' })).toMatchObject({
			values: Float64Array.of(1, NaN, 3),
		});
		expect(codesOf(take(rows, { negative: 'refuse' }), 'error')).toEqual(['negative']);
	});

	it('too large to be added up are refused', () => {
		const huge = take([
			['a', 1.7e308],
			['a', 1.7e308],
		]);
		expect(codesOf(huge, 'error')).toEqual(['sum-too-large']);
	});

	it('lose nothing, whatever the rows', () => {
		const row = fc.tuple(
			fc.constantFrom('a', 'b', 'c', 'x'),
			fc.oneof(
				fc.integer({ min: -999, max: 999 }).map((n) => n / 4),
				fc.constantFrom(null, 'text', '7'),
			),
		);
		const rules = fc.record<TakeRules>({
			doubled: fc.constantFrom('sum', 'first', 'last', 'refuse'),
			empty: fc.constantFrom('missing', 'zero'),
			negative: fc.constantFrom('keep', 'refuse', 'missing'),
			notNumber: fc.constantFrom('refuse', 'missing'),
		});
		fc.assert(
			fc.property(fc.array(row, { minLength: 1, maxLength: 20 }), rules, (rows, chosen) => {
				// `take` runs the checker, which sums over the rows for itself
				const taken = take(rows, chosen);
				const backwards = take([...rows].reverse(), { ...chosen });
				expect(backwards.status).toBe(taken.status);
				if (taken.status === 'taken' && backwards.status === 'taken' && chosen.doubled === 'sum') {
					// quarters, so that no order of adding rounds
					expect(backwards.values).toEqual(taken.values);
				}
			}),
			{ numRuns: 400 },
		);
	});
});

describe('texts of regions', () => {
	const texts = (rows: [string, Cell][], doubled?: 'first' | 'last' | 'refuse') => {
		const { join, table } = prepared(rows);
		return takeTexts(join, table.cells[1], doubled);
	};

	it('are one a region; the same text twice is no conflict', () => {
		expect(
			texts([
				['a', 'North'],
				['b', 7],
				['a', ' North '],
				['a', null],
			]),
		).toMatchObject({
			status: 'taken',
			values: ['North', '7', null],
			notes: [{ code: 'value-missing', regions: [2] }],
		});
	});

	it('that differ are refused by name of the region, unless one is to be taken', () => {
		const rows: [string, Cell][] = [
			['b', 'North'],
			['b', 'South'],
			['a', 'East'],
		];
		expect(texts(rows)).toMatchObject({ status: 'refused', notes: [{ regions: [1] }, {}] });
		expect(texts(rows, 'first')).toMatchObject({ values: ['East', 'North', null] });
		expect(texts(rows, 'last')).toMatchObject({ values: ['East', 'South', null] });
	});

	it('of another table are a programmer’s error', () => {
		const { join, column } = prepared([['a', 1]]);
		expect(() => takeTexts(join, [1, 2])).toThrow(RangeError);
		const other = { ...column, values: new Float64Array(2) };
		expect(() => takeValues(join, other, usual)).toThrow(RangeError);
	});
});

it('tells what a later table changes', () => {
	const before = Float64Array.of(1, 2, NaN, 4, NaN, 0);
	const after = Float64Array.of(1, 5, 3, NaN, NaN, -0);
	expect(changesBetween(before, after)).toEqual({
		changed: [{ region: 1, from: 2, to: 5 }],
		added: [{ region: 2, to: 3 }],
		removed: [{ region: 3, from: 4 }],
		largest: { region: 1, from: 2, to: 5 },
		totals: { before: 7, after: 9 },
	});
	expect(changesBetween(before, before)).toMatchObject({ changed: [], added: [], largest: null });
	expect(() => changesBetween(before, new Float64Array(1))).toThrow(RangeError);
});
