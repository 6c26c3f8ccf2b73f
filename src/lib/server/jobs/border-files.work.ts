import {
	exportBordersCol,
	exportBordersCsv,
	type BordersOut,
} from '../../engines/exports/index.ts';
import type { Task } from './task-port.ts';

export type BorderFormat = 'csv' | 'col';

/** A sheet's borders as a file, written in a thread: a large sheet has a hundred thousand of them. */
export const writeBorders = ({
	input: { format, ...out },
}: Task<BordersOut & { format: BorderFormat }>): Uint8Array =>
	format === 'csv' ? exportBordersCsv(out) : exportBordersCol(out);
