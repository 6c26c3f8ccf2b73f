import type { Piece } from '../engines/boundaries/pieces.ts';

/** `GET sheets/[sheet]/pieces`: one entry a piece in each column, in the order of regions. */
export interface PieceColumns {
	region: number[];
	/** which of the region's parts it is, from 0 */
	part: number[];
	kind: Piece['kind'][];
	areaKm2: number[];
	lon: number[];
	lat: number[];
	/** the region that it lies within, or -1 */
	within: number[];
}
