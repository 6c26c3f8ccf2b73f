import {
	guessJoin,
	joinTable,
	typeColumns,
	type Amend,
	type Join,
	type JoinChoice,
	type RawTable,
	type Regions,
	type TableSource,
	type TypedColumn,
} from '../../engines/measures/index.ts';
import type { TableOptions } from '../../schemas/measure-review.ts';
import { unpackTable, type KeptTable } from './measure-tables.ts';

export interface JoinInput {
	kept: KeptTable;
	source: Pick<TableSource, 'decimal'>;
	options: TableOptions;
	regions: Regions;
}

export interface JoinedTable {
	table: RawTable;
	typed: TypedColumn[];
	/** null where no column names any region and nobody has said which */
	join: Join | null;
	guessed: boolean;
}

/** Columns typed and rows joined, as far as it has been decided. */
export function joinKept({ kept, source, options, regions }: JoinInput): JoinedTable {
	const table = unpackTable(kept);
	const typed = typedColumns(table, source.decimal);
	const choice = options.join ?? guessJoin(table, typed, regions);
	const guessed = options.join === null;
	if (!choice) return { table, typed, join: null, guessed };
	return { table, typed, join: joinRows(table, choice, regions, options), guessed };
}

/** The columns of the table at hand, so that a step of the review does not look at every cell again. */
const known = new WeakMap<RawTable, { decimal: '.' | ','; typed: TypedColumn[] }>();

function typedColumns(table: RawTable, decimal: '.' | ','): TypedColumn[] {
	const before = known.get(table);
	if (before?.decimal === decimal) return before.typed;
	const typed = typeColumns(table, { decimal });
	known.set(table, { decimal, typed });
	return typed;
}

function joinRows(
	table: RawTable,
	{ column, by }: JoinChoice,
	regions: Regions,
	{ amends, leaveOutRest }: TableOptions,
): Join {
	const decided = amendsFor(amends, regions, table.rows);
	const join = joinTable(table, { column, by }, regions, decided);
	if (!leaveOutRest || join.unmatched.length === 0) return join;
	const rest = join.unmatched.map(({ row }) => ({ row, region: null }));
	return joinTable(table, { column, by }, regions, [...decided, ...rest]);
}

/** Decisions by region numbers; one for a region that is no longer there does not count. */
function amendsFor(amends: TableOptions['amends'], { keys }: Regions, rows: number): Amend[] {
	const numbers = new Map(keys.map((key, region) => [key, region]));
	return amends.flatMap(([row, key]) => {
		const region = key === null ? null : numbers.get(key);
		return region === undefined || row >= rows ? [] : { row, region };
	});
}
