import type { TableNote } from './table.ts';

type Place = Partial<Pick<TableNote, 'row' | 'column' | 'regions'>>;

/** A note with the places that are not given left open. */
export const note = (
	severity: TableNote['severity'],
	code: string,
	message: string,
	{ row = null, column = null, regions = [] }: Place = {},
): TableNote => ({ code, severity, message, row, column, regions });

const mostNamed = 5;

/** "5, 9 and 12", or "5, 9, 12, 14, 20 and 7 more". */
export function listed(items: readonly (string | number)[]): string {
	const named = items.slice(0, mostNamed).map(String);
	const more = items.length - named.length;
	if (more > 0) return `${named.join(', ')} and ${more} more`;
	return named.length < 2 ? named.join('') : `${named.slice(0, -1).join(', ')} and ${named.at(-1)}`;
}

/** A text of the file in quotation marks, shortened where it is long. */
export const quoted = (text: string): string =>
	`"${text.length > 60 ? `${text.slice(0, 57)}...` : text}"`;

/** "1 row", "12 rows". */
export const counted = (count: number, one: string, many = `${one}s`): string =>
	`${count} ${count === 1 ? one : many}`;
