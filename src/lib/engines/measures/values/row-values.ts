import { cellState, type TypedColumn } from '../columns/typed-column.ts';
import type { Join } from '../join/join.ts';
import { counted, listed, note, quoted } from '../note.ts';
import type { TableNote } from '../table.ts';
import type { TakeRules } from './rules.ts';

/** What each row of a region gives under the rules for single cells; NaN for nothing. */
export interface RowValues {
	values: Float64Array;
	notes: TableNote[];
}

/** Applies the rules on empty cells, negative numbers and what is no number to the rows of regions. */
export function rowValues(join: Join, column: TypedColumn, rules: TakeRules): RowValues {
	const values = new Float64Array(join.region.length).fill(NaN);
	const found = { empty: [] as number[], negative: [] as number[], notNumber: [] as number[] };
	join.region.forEach((region, row) => {
		if (region < 0) return;
		const state = column.states[row];
		if (state === cellState.empty) {
			found.empty.push(row);
			if (rules.empty === 'zero') values[row] = 0;
		} else if (state === cellState.notNumber) found.notNumber.push(row);
		else if (column.values[row] < 0) {
			found.negative.push(row);
			if (rules.negative === 'keep') values[row] = column.values[row];
		} else values[row] = column.values[row];
	});
	return { values, notes: notesOn(join, column, rules, found) };
}

function notesOn(
	join: Join,
	column: TypedColumn,
	rules: TakeRules,
	found: Record<'empty' | 'negative' | 'notNumber', number[]>,
): TableNote[] {
	const notes: TableNote[] = [];
	const { heading } = column;
	const tell = (rows: number[], severity: TableNote['severity'], code: string, what: string) => {
		if (!rows.length) return;
		const fileRows = rows.map((row) => join.fileRows[row]);
		const message = `${quoted(heading)}: ${what} (${fileRows.length === 1 ? 'row' : 'rows'} ${listed(fileRows)}).`;
		notes.push(note(severity, code, message, { row: fileRows[0], column: heading }));
	};
	const { empty, negative, notNumber } = found;
	const example = notNumber.length ? quoted(String(column.cells[notNumber[0]])) : '';
	tell(
		notNumber,
		rules.notNumber === 'refuse' ? 'error' : 'warning',
		'not-a-number',
		`${counted(notNumber.length, 'cell holds', 'cells hold')} no number, the first ${example}${rules.notNumber === 'missing' ? '; taken as missing' : ''}`,
	);
	const negativeSeverity = { refuse: 'error', missing: 'warning', keep: 'note' } as const;
	tell(
		negative,
		negativeSeverity[rules.negative],
		'negative',
		`${counted(negative.length, 'number is', 'numbers are')} below zero${{ refuse: '', missing: '; taken as missing', keep: '; kept' }[rules.negative]}`,
	);
	tell(
		empty,
		'note',
		'empty-cells',
		`${counted(empty.length, 'cell is', 'cells are')} empty; taken as ${rules.empty === 'zero' ? '0' : 'missing'}`,
	);
	return notes;
}
