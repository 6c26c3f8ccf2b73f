/** New boundaries for an old sheet: which region goes on as which, and what people said about it. */
export { matchRegions } from './match-regions.ts';
export { decide } from './decide.ts';
export { checkMatch } from './check-match.ts';
export { thresholds } from './region-match.ts';
export type {
	MatchGroup,
	MatchLinks,
	MatchSide,
	Outcome,
	RegionMatch,
	Thresholds,
} from './region-match.ts';
export type { DecideResult, Decision } from './decision.ts';
export { carriedRow, type CarriedRow, type Carrying } from './carried.ts';
export {
	apartFrom,
	carryGround,
	pairTest,
	type CarryGround,
	type PairTest,
} from './carry-ground.ts';
export { carryPairs, everyPair, type Choose } from './carry-pairs.ts';
export { carryPins, type Pin, type PinRules } from './carry-pins.ts';
export { heirsOf, type Heirs } from './heirs.ts';
export { inPercent, listedKeys, quoted } from './words.ts';
