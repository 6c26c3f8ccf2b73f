/** New boundaries for an old sheet: which region goes on as which, and what people said about it. */
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
export type { CarriedRow } from './carried.ts';
