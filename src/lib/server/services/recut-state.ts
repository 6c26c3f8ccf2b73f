import type { Db } from '../database/connection.ts';
import type { RecutState } from '../database/schema.ts';
import {
	findRecut,
	findRecutNote,
	type RecutNote,
	type RecutRecord,
} from '../repositories/recuts.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { known } from './recut-held.ts';

/** A re-cut of a sheet with what its page shows, or `NotFound`. */
export async function recutOf(db: Db, sheet: SheetRecord, number: number): Promise<RecutRecord> {
	const row = await findRecut(db, sheet.id, known(number));
	if (!row) throw new NotFound('re-cut');
	return row;
}

/** The same without what is long. */
export async function recutNoteOf(db: Db, sheet: SheetRecord, number: number): Promise<RecutNote> {
	const row = await findRecutNote(db, sheet.id, known(number));
	if (!row) throw new NotFound('re-cut');
	return row;
}

type Read = { state: RecutState; from_set: string; to_set: string | null };

/** Whether it was compared with boundaries that the sheet no longer has. */
export const isStale = (sheet: SheetRecord, row: Read): boolean =>
	(row.state === 'ready' || row.state === 'put-back') && row.from_set !== sheet.boundary_set_id;

/** Why it cannot be applied now, in a sentence; null when it can. */
export function hindranceOf(sheet: SheetRecord, row: Read): string | null {
	if (row.state === 'applied') return 'It is applied already.';
	if ((row.state !== 'ready' && row.state !== 'put-back') || !row.to_set) {
		return 'It has not been read and compared.';
	}
	if (!isStale(sheet, row)) return null;
	return 'The sheet was given other boundaries since this was read. Have it read again first.';
}

/** Throws `Conflict` with that sentence. */
export function requireApplicable(sheet: SheetRecord, row: Read): void {
	const hindrance = hindranceOf(sheet, row);
	if (hindrance) throw new Conflict(isStale(sheet, row) ? 'stale' : 'not-ready', hindrance);
}
