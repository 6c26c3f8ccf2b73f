import type { Grid } from '../grid.ts';
import type { Progress, ReadOptions, TableLimits } from '../options.ts';
import { TableRefusal } from '../refusal.ts';
import type { TableNote, TableSource } from '../table.ts';

export interface ReadSheets {
	grid: Grid;
	sheet: string;
	sheets: TableSource['sheets'];
	notes: TableNote[];
}

export function readWorkbook(
	_bytes: Uint8Array,
	_options: ReadOptions,
	_limits: TableLimits,
	_progress: Progress,
): ReadSheets {
	throw new TableRefusal('not-a-workbook', 'Workbooks are not read yet.');
}
