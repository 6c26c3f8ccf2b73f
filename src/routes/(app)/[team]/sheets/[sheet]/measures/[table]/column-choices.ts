import type { ColumnChoice, ColumnNote } from '$lib/schemas/measure-review';

export interface Asked {
	field: 'doubled' | 'empty' | 'notNumber' | 'negative';
	label: string;
	value: string;
	options: { value: string; label: string }[];
	/** false where the table gives no occasion to ask */
	shown: boolean;
}

const first = { value: 'first', label: 'the first counts' };
const last = { value: 'last', label: 'the last counts' };
const refuse = { value: 'refuse', label: 'refuse the column' };
const missing = { value: 'missing', label: 'count as missing' };

/** The rules of a column, as far as there is anything to decide. */
export function choicesFor(note: ColumnNote, now: ColumnChoice, doubled: number): Asked[] {
	const numbers = now.kind === 'number';
	// of a column that was not taken for numbers nobody has counted what is none
	const unsure = numbers && note.kind !== 'number';
	return [
		{
			field: 'doubled',
			label: 'Several rows of a region',
			value: now.doubled === 'sum' && !numbers ? 'refuse' : now.doubled,
			options: [...(numbers ? [{ value: 'sum', label: 'are added up' }] : []), first, last, refuse],
			shown: doubled > 0,
		},
		{
			field: 'empty',
			label: 'Empty cells',
			value: now.empty,
			options: [missing, { value: 'zero', label: 'count as 0' }],
			shown: numbers && note.empty > 0,
		},
		{
			field: 'notNumber',
			label: 'Cells that hold no number',
			value: now.notNumber,
			options: [refuse, missing],
			shown: note.notNumbers > 0 || unsure,
		},
		{
			field: 'negative',
			label: 'Numbers below zero',
			value: now.negative,
			options: [refuse, { value: 'keep', label: 'are kept' }, missing],
			shown: note.negatives > 0 || unsure,
		},
	];
}
