import { displayLevels, encodeCoverage, type Coverage } from '../../engines/boundaries/index.ts';

/** A level as it is stored and sent to browsers. */
export interface PackedLevel {
	level: number;
	toleranceMetres: number;
	points: number;
	geometry: Uint8Array;
}

/** The levels of a coverage in the encoding of the full geometry. */
export const packedLevels = (coverage: Coverage): PackedLevel[] =>
	displayLevels(coverage).map(({ level, toleranceMetres, points, coverage: thinned }) => ({
		level,
		toleranceMetres,
		points,
		geometry: encodeCoverage(thinned),
	}));
