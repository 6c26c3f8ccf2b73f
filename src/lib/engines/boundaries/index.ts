/** File bytes -> clean shared-arc coverage, its borders, and findings. */
export { readBoundaries } from './read-boundaries.ts';
export type { BoundariesResult, SourceNote } from './result.ts';
export type { BoundaryOptions, ByteReader, ByteSource, Limits, Watch } from './options.ts';
export type { RefusalCode } from './refusal.ts';
export type { Finding } from './finding.ts';
export type { Mend, MendOffer } from './mends/mend.ts';
export type { Choice, Found, FoundLayer, Question, Sketch } from './question.ts';
export type { Coverage } from './coverage.ts';
export { coverageFaults } from './faults.ts';
export { encodeCoverage, decodeCoverage } from './codec.ts';
export { displayLevels, type DisplayLevel } from './levels.ts';
export { simplifyCoverage } from './simplify.ts';
export { coverageToGeoJson } from './to-geojson.ts';
export { piecesOf, type Piece } from './pieces.ts';
export { sourceOf } from './byte-source.ts';
export {
	edgeNeighbours,
	type EdgeNeighbours,
	type EdgeOptions,
	type EdgeResult,
} from './edge-neighbours.ts';
