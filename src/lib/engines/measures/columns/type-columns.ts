import { counted, note } from '../note.ts';
import { parseNumber } from '../numbers/parse-number.ts';
import type { Cell, RawTable, TableNote, TableSource } from '../table.ts';
import { notNumberKind } from './not-a-number.ts';
import { cellState, type NotNumber, type TypedColumn } from './typed-column.ts';
import { unitOf } from './unit.ts';

/** From this share of its cells on, a column is one of numbers or of dates. House rule, no source. */
const mostly = 0.6;

/**
 * What each column holds, by the decimal sign of the source. Numbers written as text are read; whatever is
 * no number is told with its row and never becomes 0. Linear in the number of cells.
 */
export function typeColumns(table: RawTable, source: Pick<TableSource, 'decimal'>): TypedColumn[] {
	return table.headings.map((_, column) => typeColumn(table, column, source.decimal));
}

/** One column of `typeColumns`. */
export function typeColumn(table: RawTable, column: number, decimal: '.' | ','): TypedColumn {
	const cells = table.cells[column];
	const read = readNumbers(cells, decimal);
	const kind = kindOf(cells, read);
	const isNumber = kind === 'number';
	const signed = table.percent[column] ? read.numbers : read.percents;
	return {
		column,
		heading: table.headings[column],
		kind,
		cells,
		values: read.values,
		states: read.states,
		numbers: read.numbers,
		empty: read.empty,
		notNumbers: isNumber ? notNumbersOf(table, column, read.states) : [],
		negativeRows: isNumber ? negativeRows(table, read.values) : [],
		keyLike: read.empty === 0 && new Set(cells.map(String)).size === cells.length,
		leadingZeros: read.leadingZeros,
		unit: unitOf(table.headings[column]),
		percent: isNumber && signed * 2 > read.numbers,
		notes: isNumber ? notesOnPercents(table.headings[column], signed, read.numbers) : [],
	};
}

interface Read {
	values: Float64Array;
	states: Uint8Array;
	numbers: number;
	empty: number;
	percents: number;
	leadingZeros: boolean;
}

function readNumbers(cells: Cell[], decimal: '.' | ','): Read {
	const values = new Float64Array(cells.length).fill(NaN);
	const states = new Uint8Array(cells.length).fill(cellState.notNumber);
	const read = { values, states, numbers: 0, empty: 0, percents: 0, leadingZeros: false };
	cells.forEach((cell, row) => {
		if (cell === null) {
			states[row] = cellState.empty;
			read.empty++;
			return;
		}
		if (typeof cell === 'boolean') return;
		const number =
			typeof cell === 'number' ? { value: cell, percent: false } : parseNumber(cell, decimal);
		if (!number || !Number.isFinite(number.value)) return;
		values[row] = number.value;
		states[row] = cellState.number;
		read.numbers++;
		if (number.percent) read.percents++;
		if (typeof cell === 'string' && /^\s*0\d+\s*$/.test(cell)) read.leadingZeros = true;
	});
	return read;
}

/** As a workbook's dates are given, and as people write days, months and years. */
const date = /^(\d{4}-\d\d-\d\d(T\d\d:\d\d(:\d\d(\.\d+)?)?)?|\d{1,2}[./]\d{1,2}[./](\d\d|\d{4}))$/;

function kindOf(cells: Cell[], read: Read): TypedColumn['kind'] {
	const present = cells.length - read.empty;
	if (present === 0) return 'empty';
	if (read.leadingZeros && everyNumberWhole(read.values)) return 'text';
	let dates = 0;
	let placeholders = 0;
	cells.forEach((cell, row) => {
		if (typeof cell !== 'string' || read.states[row] === cellState.number) return;
		if (date.test(cell.trim())) dates++;
		else if (notNumberKind(cell) !== 'text') placeholders++;
	});
	const considered = present - placeholders;
	if (considered === 0) return 'text';
	if (read.numbers >= mostly * considered) return 'number';
	return dates >= mostly * considered ? 'date' : 'text';
}

const everyNumberWhole = (values: Float64Array): boolean =>
	values.every((value) => Number.isNaN(value) || Number.isInteger(value));

function notNumbersOf(table: RawTable, column: number, states: Uint8Array): NotNumber[] {
	const found: NotNumber[] = [];
	states.forEach((state, row) => {
		if (state !== cellState.notNumber) return;
		const text = String(table.cells[column][row]);
		found.push({ row, fileRow: table.fileRows[row], text, kind: notNumberKind(text) });
	});
	return found;
}

function negativeRows(table: RawTable, values: Float64Array): number[] {
	const rows: number[] = [];
	values.forEach((value, row) => {
		if (value < 0) rows.push(table.fileRows[row]);
	});
	return rows;
}

function notesOnPercents(column: string, signed: number, numbers: number): TableNote[] {
	if (signed === 0 || signed === numbers) return [];
	const message = `${counted(signed, 'number carries', 'numbers carry')} a percent sign and ${numbers - signed} do not; the signed ones were read as shares (12 % is 0.12), the others as they stand.`;
	return [note('warning', 'percent-mixed', message, { column })];
}
