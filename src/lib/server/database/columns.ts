import type { ColumnType } from 'kysely';

/** Kinds of columns that many tables have. */
export type Moment = ColumnType<Date, Date | string | undefined, Date | string>;
export type OptionalMoment = ColumnType<
	Date | null,
	Date | string | null | undefined,
	Date | string | null
>;
/** bigint columns arrive as numbers: the connection installs the parser */
export type Whole = ColumnType<number, number, number>;
