import { describe, expect, it } from 'vitest';
import { read } from '../../../../../tests/support/tables.ts';
import { typeColumns } from '../index.ts';
import { unitOf } from './unit.ts';

const typed = async (heading: string, ...cells: string[]) => {
	const rows = cells.map((cell, i) => `${cell}|k${i}|.`).join('\n');
	const { table, source } = await read(`${heading}|Key|End\n${rows}\n`);
	return typeColumns(table, source)[0];
};

describe('a column', () => {
	it('of numbers keeps them apart from all that is none', async () => {
		const column = await typed(
			'Visits',
			'5',
			'',
			'n/a',
			'-',
			'inf',
			'NaN',
			'#DIV/0!',
			'many',
			'-3',
			'7',
			'1',
			'2',
		);
		expect(column.kind).toBe('number');
		expect([...column.values]).toEqual([5, NaN, NaN, NaN, NaN, NaN, NaN, NaN, -3, 7, 1, 2]);
		expect(column).toMatchObject({ numbers: 5, empty: 1, negativeRows: [10] });
		expect(column.notNumbers.map(({ fileRow, text, kind }) => [fileRow, text, kind])).toEqual([
			[4, 'n/a', 'placeholder'],
			[5, '-', 'placeholder'],
			[6, 'inf', 'not-finite'],
			[7, 'NaN', 'not-finite'],
			[8, '#DIV/0!', 'error'],
			[9, 'many', 'text'],
		]);
	});

	it('of keys with zeros at the front is text', async () => {
		const column = await typed('Code', '01001', '01002', '10003');
		expect(column).toMatchObject({ kind: 'text', leadingZeros: true, keyLike: true });
		expect((await typed('Rate', '01.5', '0.5', '0')).kind).toBe('number');
	});

	it('of dates, of texts, of nothing is told', async () => {
		expect((await typed('Day', '2026-05-01', '2026-05-02', '')).kind).toBe('date');
		expect((await typed('Day', '1.5.2026', '02/05/26')).kind).toBe('date');
		expect((await typed('Person', 'A', 'B', '7')).kind).toBe('text');
		expect((await typed('Nothing', '', '')).kind).toBe('empty');
	});

	it('is like a key only where full and without doubles', async () => {
		expect((await typed('Code', 'a', 'b')).keyLike).toBe(true);
		expect((await typed('Code', 'a', 'a')).keyLike).toBe(false);
		expect((await typed('Code', 'a', '')).keyLike).toBe(false);
	});

	it('with percent signs holds shares; mixed ones are told', async () => {
		expect(await typed('Share', '12 %', '7 %')).toMatchObject({ percent: true, notes: [] });
		const mixed = await typed('Share', '12 %', '7 %', '5');
		expect([...mixed.values]).toEqual([0.12, 0.07, 5]);
		expect(mixed.notes).toMatchObject([{ code: 'percent-mixed' }]);
	});
});

it('reads units from headings', () => {
	const units = {
		'Visits per year [h]': 'h',
		'Potential (EUR)': 'EUR',
		'Area [ km² ] ': 'km²',
		'Share %': '%',
		Visits: null,
		'Visits (2)': null,
		'Visits (2025)': null,
		'(EUR) potential': null,
	};
	for (const [heading, unit] of Object.entries(units))
		expect([heading, unitOf(heading)]).toEqual([heading, unit]);
});
