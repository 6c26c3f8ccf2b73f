import type { TableReading } from '../../schemas/measure-forms.ts';
import type { TableOptions } from '../../schemas/measure-review.ts';
import type { MeasureTableRow } from '../repositories/measures.repository.ts';

/** What holds of a table that nobody has decided anything about. */
export const firstOptions = (reading: TableReading): TableOptions => ({
	reading,
	join: null,
	amends: [],
	leaveOutRest: false,
	columns: null,
	existing: 'replace',
});

/** As they are kept in the table's row, and back; what is stored was checked when it came in. */
export const storedOptions = (options: TableOptions): string => JSON.stringify(options);
export const optionsOf = (row: Pick<MeasureTableRow, 'options'>): TableOptions => ({
	...firstOptions({}),
	...(row.options as unknown as Partial<TableOptions>),
});

/** Digest of the packed table that belongs to a row. */
export const keptDigest = (row: Pick<MeasureTableRow, 'source'>): string =>
	String(row.source?.kept ?? '');
