/** Coverage -> who touches whom, how, and over how many metres; and what a sheet makes of it. */
export { borderKinds, type BorderKind, type BorderList } from './border-list.ts';
export { bordersOf } from './borders-of.ts';
export { surveyOf, type BordersOptions, type Survey } from './survey.ts';
export type { Overlap } from './overlap.ts';
export { bordersForSheet, type SheetBorderRules } from './for-sheet.ts';
export { gapsWithin, type Gaps } from './across-water.ts';
export {
	compareBorders,
	type BorderChanges,
	type KeyedBorders,
	type PairChange,
	type PairEntry,
} from './compare-borders.ts';
