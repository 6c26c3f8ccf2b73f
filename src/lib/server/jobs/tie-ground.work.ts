import { decodeCoverage, edgeNeighbours, type EdgeResult } from '../../engines/boundaries/index.ts';
import type { Task } from './task-port.ts';

export interface EdgeInput {
	/** stored coverages of the two sheets */
	here: Uint8Array;
	there: Uint8Array;
	toleranceMetres: number;
}

/** Which regions of two stored coverages are the same, or lie beside each other across the edge. */
export const findEdge = ({
	input: { here, there, toleranceMetres },
}: Task<EdgeInput>): Promise<EdgeResult> =>
	edgeNeighbours(decodeCoverage(here), decodeCoverage(there), { toleranceMetres });
