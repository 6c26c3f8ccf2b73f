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
export { classMethods, mostClasses, type ClassMethod, type Theme, type ThemePer } from './theme.ts';
export { themeFigures, type ThemeFigures, type ThemeGround } from './theme-figures.ts';
export {
	limitsHold,
	limitsOf,
	themeClasses,
	toldFigures,
	type ThemeClasses,
} from './theme-classes.ts';
export { classLimits } from './classing/class-limits.ts';
export { classCounts, classOf } from './classing/class-of.ts';
export { rangeWords, limitWords } from './classing/range-words.ts';
export { roundedLimits } from './classing/rounded-limits.ts';
export { varianceFit } from './classing/goodness.ts';
export { histogram, type Histogram } from './classing/histogram.ts';
export { checkClasses } from './classing/check-classes.ts';
export { addsUp, judgeMeasure, type CountJudgement } from './count-or-rate.ts';
