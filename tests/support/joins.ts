import type { Cell, RawTable } from '../../src/lib/engines/measures/index.ts';

/** A table from its columns, as if read from a text whose heading is row 1. */
export function tableOf(columns: Record<string, Cell[]>): RawTable {
	const cells = Object.values(columns);
	const rows = cells[0].length;
	return {
		sheet: null,
		headings: Object.keys(columns),
		cells,
		rows,
		headingRow: 1,
		firstRow: 2,
		fileRows: Array.from({ length: rows }, (_, i) => i + 2),
		percent: cells.map(() => false),
	};
}
