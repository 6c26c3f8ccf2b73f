import { decodeCoverage } from '../../engines/boundaries/index.ts';
import { unitGeometry } from '../../engines/territories/coverage-geometry.ts';
import type { Task } from './task-port.ts';

/** Where the regions of a stored coverage lie and how long their outlines are, as plain lists. */
export function unitColumns({ input }: Task<{ geometry: Uint8Array }>): {
	at: number[];
	outlineMetres: number[];
} {
	const { at, outlineMetres } = unitGeometry(decodeCoverage(input.geometry));
	return { at: Array.from(at), outlineMetres: Array.from(outlineMetres ?? []) };
}
