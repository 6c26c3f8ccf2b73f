/** Coverage -> who touches whom, how, and over how many metres; and what a sheet makes of it. */
export {
	borderKinds,
	isAcross,
	kindCode,
	type BorderKind,
	type BorderList,
} from './border-list.ts';
export { bordersOf } from './borders-of.ts';
export { partedBorders } from './parts.ts';
export { crossedBorders, type CrossedBorders } from './planarity.ts';
export { surveyOf, type BordersOptions, type Survey } from './survey.ts';
export type { Overlap } from './overlap.ts';
export { bordersForSheet, standingsForSheet, type SheetBorderRules } from './for-sheet.ts';
export {
	sheetBorderRows,
	type ReasonedPair,
	type ReasonedRules,
	type SheetBorderRow,
} from './sheet-rows.ts';
export { standingNames, standingUnder, type CountingRule, type Standing } from './standing.ts';
export { withGaps, type GapList } from './with-gaps.ts';
export { gapsWithin, type WaterGaps } from './gaps-within.ts';
export {
	compareBorders,
	type BorderChanges,
	type KeyedBorders,
	type PairChange,
	type PairEntry,
} from './compare-borders.ts';
