import type { TableNote } from '../table.ts';

/** What to do where a column does not hold one number >= 0 for each region. */
export interface TakeRules {
	/** regions in several rows */
	doubled: 'sum' | 'first' | 'last' | 'refuse';
	empty: 'missing' | 'zero';
	negative: 'keep' | 'refuse' | 'missing';
	/** texts, errors of a spreadsheet, infinite numbers */
	notNumber: 'refuse' | 'missing';
}

export interface TakenValues {
	status: 'taken';
	/** by region; NaN where there is none */
	values: Float64Array;
	/** sum over regions that have a value */
	total: number;
	/** sum of the numbers in rows that belong to no region, left out ones too */
	outside: number;
	notes: TableNote[];
}

export interface TakeRefused {
	status: 'refused';
	/** the reasons, each an error; then what else is to be told */
	notes: TableNote[];
}
