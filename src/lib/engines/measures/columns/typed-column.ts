import type { Cell, TableNote } from '../table.ts';

/** State of a cell in a column of numbers. */
export const cellState = { number: 0, empty: 1, notNumber: 2 } as const;

/** Why a cell that is not empty holds no number. */
export type NotNumberKind =
	/** a sign for "none": -, n/a, .. */
	| 'placeholder'
	/** an error of a spreadsheet: #DIV/0! */
	| 'error'
	/** inf, nan */
	| 'not-finite'
	| 'text';

export interface NotNumber {
	/** place in the table, from 0 */
	row: number;
	/** number in the file, from 1 */
	fileRow: number;
	text: string;
	kind: NotNumberKind;
}

/** What a column holds. */
export interface TypedColumn {
	/** place in the table, from 0 */
	column: number;
	heading: string;
	kind: 'number' | 'text' | 'date' | 'empty';
	/** the table's own cells */
	cells: Cell[];
	/** by row; NaN where the cell is empty or holds no number */
	values: Float64Array;
	/** by row, a `cellState` */
	states: Uint8Array;
	numbers: number;
	empty: number;
	/** only in a column of kind `number` */
	notNumbers: NotNumber[];
	/** rows of the file with a negative number; only in a column of kind `number` */
	negativeRows: number[];
	/** every row has a cell and no two are alike */
	keyLike: boolean;
	/** some texts are whole numbers with zeros before them, so it is a column of keys and of kind `text` */
	leadingZeros: boolean;
	/** by the heading, such as `h` of "Visits per year [h]" */
	unit: string | null;
	/** the numbers carry percent signs; values are shares, 0.12 for 12 % */
	percent: boolean;
	notes: TableNote[];
}
