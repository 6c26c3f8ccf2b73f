import type { TypedColumn } from '../columns/typed-column.ts';
import type { Join } from '../join/join.ts';
import { counted, listed, note } from '../note.ts';
import type { TableNote } from '../table.ts';
import { rowValues } from './row-values.ts';
import type { TakeRefused, TakenValues, TakeRules } from './rules.ts';
import { Sum, sumOf } from './sum.ts';

const mostNamed = 5;

/**
 * One value a region from a column of a joined table.
 *
 * In: the join and a column of the same table; what to do about empty cells, negative numbers, texts and
 * regions in several rows. Of several rows, those that give no value are passed over; `first` and `last` are
 * by the order of the file. Out: values by region, NaN where none, with notes; or a refusal whose notes say
 * which rows. Guarantee: no text and no empty cell counts as 0 unless the rules say so; with `sum` nothing
 * is lost: `total` is the sum over all rows of regions. Throws RangeError for a column of another table.
 */
export function takeValues(
	join: Join,
	column: TypedColumn,
	rules: TakeRules,
): TakenValues | TakeRefused {
	if (column.values.length !== join.region.length) {
		throw new RangeError('The column has other rows than the join.');
	}
	const rows = rowValues(join, column, rules);
	const values = new Float64Array(join.regions).fill(NaN);
	join.region.forEach((region, row) => {
		if (region >= 0) values[region] = rows.values[row];
	});
	for (const { region, rows: own } of join.doubled) {
		const given = own.map((row) => rows.values[row]).filter((value) => !Number.isNaN(value));
		values[region] = combine(given, rules.doubled);
	}
	const total = sumOf(values);
	const notes = [
		...rows.notes,
		...notesOnDoubled(join, column.heading, rules),
		...notesOnSums(values, total, column.heading),
		...notesOnMissing(values, column.heading),
	];
	notes.sort((a, b) => gravity[a.severity] - gravity[b.severity]);
	if (notes.some(({ severity }) => severity === 'error')) return { status: 'refused', notes };
	return { status: 'taken', values, total, outside: outside(join, column), notes };
}

const gravity = { error: 0, warning: 1, note: 2 };

function combine(given: number[], rule: TakeRules['doubled']): number {
	if (!given.length) return NaN;
	if (rule === 'sum') return sumOf(given);
	return rule === 'last' ? given[given.length - 1] : given[0];
}

function outside(join: Join, column: TypedColumn): number {
	const sum = new Sum();
	column.values.forEach((value, row) => {
		if (join.region[row] < 0 && !Number.isNaN(value)) sum.add(value);
	});
	return sum.value;
}

function notesOnDoubled({ doubled }: Join, column: string, rules: TakeRules): TableNote[] {
	if (!doubled.length) return [];
	const regions = doubled.map(({ region }) => region);
	const outcome = {
		sum: '; their numbers were added up',
		first: '; the first number of each counts',
		last: '; the last number of each counts',
		refuse: '',
	}[rules.doubled];
	const message = `${counted(regions.length, 'region stands', 'regions stand')} in several rows (${listed(regions.map((r) => `#${r}`))})${outcome}.`;
	const severity = rules.doubled === 'refuse' ? 'error' : 'warning';
	return [
		note(severity, 'region-doubled', message, { column, regions: regions.slice(0, mostNamed) }),
	];
}

function notesOnSums(values: Float64Array, total: number, column: string): TableNote[] {
	if (Number.isFinite(total) && !values.some((value) => Math.abs(value) === Infinity)) return [];
	return [note('error', 'sum-too-large', 'The numbers are too large to be added up.', { column })];
}

function notesOnMissing(values: Float64Array, column: string): TableNote[] {
	const missing: number[] = [];
	values.forEach((value, region) => {
		if (Number.isNaN(value)) missing.push(region);
	});
	if (!missing.length) return [];
	const message = `${counted(missing.length, 'region has', 'regions have')} no value: ${listed(missing.map((r) => `#${r}`))}.`;
	return [
		note('warning', 'value-missing', message, { column, regions: missing.slice(0, mostNamed) }),
	];
}
