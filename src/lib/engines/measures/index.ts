/** Tables of figures: file bytes -> columns -> rows joined to regions -> one value a region. */
export { readTable, type ReadResult } from './read-table.ts';
export { tableLimits, type Progress, type ReadOptions, type TableLimits } from './options.ts';
export type { TableRefusalCode } from './refusal.ts';
export type { Cell, RawTable, TableNote, TableSource } from './table.ts';
export { csvField } from './text/csv-field.ts';
export { readCsvRows, type CsvRows } from './text/csv-rows.ts';
export { typeColumn, typeColumns } from './columns/type-columns.ts';
export { cellState, type NotNumber, type TypedColumn } from './columns/typed-column.ts';
export { guessJoin } from './join/guess-join.ts';
export { joinTable } from './join/join-table.ts';
export type {
	Amend,
	Join,
	JoinChoice,
	Match,
	Regions,
	Suggestion,
	Unmatched,
} from './join/join.ts';
export { takeValues } from './values/take-values.ts';
export { takeTexts, type TakenTexts } from './values/take-texts.ts';
export type { TakeRefused, TakenValues, TakeRules } from './values/rules.ts';
export { changesBetween, type ValueChange, type ValueChanges } from './values/changes.ts';
export { suggestRegions } from './join/suggestions.ts';
export { checkJoin } from './check/check-join.ts';
export { checkTaken } from './check/check-taken.ts';
export { carryNumbers, carryTexts, type CarriedValues } from './carry-measures.ts';
