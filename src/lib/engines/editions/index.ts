/** What an edition contains, its digest, and the difference between two. */
export {
	editionContent,
	type EditionContent,
	type EditionInput,
	type EditionOutcome,
} from './edition-content.ts';
export { freezeTheme, thawFigures, thawTheme, type FrozenTheme } from './frozen-theme.ts';
export {
	freezeTerritories,
	thawTerritories,
	type FrozenTerritories,
	type RegionTerritory,
} from './frozen-territories.ts';
export { canonicalJson } from './canonical-json.ts';
export { digestOf, verifyEdition } from './digest.ts';
export {
	differences,
	type Change,
	type Comparable,
	type Differences,
	type InkChange,
} from './differences.ts';
export { changeSentences } from './change-sentences.ts';
export type { Draft } from './draft.ts';
export { carryDraft, type CarriedDraft, type NewGround } from './carry-draft.ts';
export { colouringProblem, strangersIn, type RuleGround } from './colouring-problem.ts';
export { lockSource, ruleSources, type RuleSource, type SourceGround } from './rule-sources.ts';
export { carryInks } from './carry-inks.ts';
export {
	inkMap,
	tieRules,
	withoutTie,
	withTie,
	type TieGround,
	type TieRules,
} from './edge-ties.ts';
