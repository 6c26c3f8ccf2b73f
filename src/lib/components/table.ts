import type { Snippet } from 'svelte';

/** A column of a `DataTable`. `value` sorts and filters; `text` (or `cell`) is what is seen. */
export interface Column<Row> {
	id: string;
	label: string;
	value: (row: Row) => string | number | null;
	text?: (row: Row) => string;
	/** given the row and the column's id */
	cell?: Snippet<[Row, string]>;
	numeric?: boolean;
	/** false where an order would mean nothing */
	sortable?: boolean;
	/** left out where the table is narrow */
	secondary?: boolean;
}

export interface Order {
	id: string;
	down: boolean;
}

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** Rows in the order asked for; rows without a value come last whichever way the order runs. */
export function ordered<Row>(
	rows: readonly Row[],
	columns: readonly Column<Row>[],
	order: Order | null,
): readonly Row[] {
	const column = columns.find(({ id }) => id === order?.id);
	if (!column || !order) return rows;
	const sign = order.down ? -1 : 1;
	const values = rows.map(column.value);
	const between = (one: number, other: number): number => {
		const [a, b] = [values[one], values[other]];
		if (a === null || b === null) return Number(a === null) - Number(b === null);
		if (typeof a === 'number' && typeof b === 'number') return sign * (a - b);
		return sign * collator.compare(String(a), String(b));
	};
	const places = Array.from(rows, (_, place) => place);
	return places.sort(between).map((place) => rows[place]);
}

/** Rows of which some column holds every word of the query. */
export function filtered<Row>(
	rows: readonly Row[],
	columns: readonly Column<Row>[],
	query: string,
	texts: readonly string[] = query.trim() ? searchTexts(rows, columns) : [],
): readonly Row[] {
	const words = query.toLocaleLowerCase().split(/\s+/).filter(Boolean);
	if (!words.length) return rows;
	return rows.filter((_, place) => words.every((word) => texts[place].includes(word)));
}

/** What each row is found by; worked out once for many queries. */
export const searchTexts = <Row>(rows: readonly Row[], columns: readonly Column<Row>[]): string[] =>
	rows.map((row) =>
		columns
			.map((column) => column.text?.(row) ?? column.value(row) ?? '')
			.join(' ')
			.toLocaleLowerCase(),
	);
