/** Inks to a verdict for every reader and touching pair; mends; house and published palettes. */
export * from './palette.ts';
export { housePalettes } from './house.ts';
export { publishedPalettes } from './published.ts';
export { checkPalette, defaultThresholds, judgeLabel, labelContrastAsked } from './check.ts';
export { checkInks } from './check-inks.ts';
export {
	alikeBelow,
	demandFor,
	fillAloneFromMm,
	greySafeFrom,
	greyWarnBelow,
	needsLabelOrHatch,
} from './demand.ts';
export { weakBorders, type SheetFills } from './weak-borders.ts';
export { bordersSentence, toWhom, verdictSentence } from './sentence.ts';
export { mendPalette, type MendRequest, type MendResult } from './mend.ts';
export { pairDemands, type AskedOfInks, type LineRank, type PairDemand } from './pair-demands.ts';
export {
	isUnsafe,
	pairsOnSheet,
	type BesideColour,
	type PairOnSheet,
	type PairState,
	type ReaderOnPair,
	type SheetLines,
} from './pairs-on-sheet.ts';
export { contrastFor, hatchesTell, hatchShows, type Fill } from './hatch-tells.ts';
export {
	meetsDemands,
	proposalKinds,
	proposeMends,
	type Proposal,
	type ProposalAnswer,
	type ProposalKind,
	type ProposalRequest,
} from './mend-proposals.ts';
export { readDesignTokens, tokenLimits, type TokensRead } from './tokens/index.ts';
export { inksText, sameInks } from './same-inks.ts';
export { bestKnown } from './limits.ts';
export { inkDistances } from './ink-distances.ts';
export { tritanDoubts } from './tritan-doubts.ts';
export { checkBorderLine, lineContrastAsked } from './border-line.ts';
export { rampOf, ramps, type Ramp } from './ramps.ts';
export { rampInks } from './ramp-inks.ts';
export { judgeRamp, type RampVerdict, type ReaderVerdict } from './ramp-verdict.ts';
