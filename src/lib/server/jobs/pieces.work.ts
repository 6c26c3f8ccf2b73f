import { decodeCoverage, piecesOf, type Coverage } from '../../engines/boundaries/index.ts';
import type { PieceColumns } from '../../schemas/pieces.ts';
import type { Task } from './task-port.ts';

/** The pieces of a coverage, as they are stored and sent. */
export function pieceColumns(coverage: Coverage): PieceColumns {
	const pieces = piecesOf(coverage);
	return {
		region: pieces.map(({ region }) => region),
		part: pieces.map(({ part }) => part),
		kind: pieces.map(({ kind }) => kind),
		areaKm2: pieces.map(({ areaKm2 }) => areaKm2),
		lon: pieces.map(({ at }) => at[0]),
		lat: pieces.map(({ at }) => at[1]),
		within: pieces.map(({ within }) => within),
	};
}

/** For boundaries that were read before pieces were kept. */
export const findPieces = ({ input }: Task<{ geometry: Uint8Array }>): PieceColumns =>
	pieceColumns(decodeCoverage(input.geometry));
