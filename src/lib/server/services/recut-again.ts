import type { BoundaryOptions, Mend } from '../../engines/boundaries/index.ts';
import type { Db } from '../database/connection.ts';
import { findBoundarySet } from '../repositories/boundaries.repository.ts';
import type { HeldRecut } from '../repositories/recuts.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { mendId } from './recut-mends.ts';

/**
 * How a re-cut is to be read on the boundaries that its sheet has now. Another file stays as it was sent.
 * Mends and another reading are of the sheet's own file: they are made on top of what was applied since,
 * and make no sense once the sheet has another file.
 */
export async function optionsOnPresent(
	db: Db,
	sheet: SheetRecord,
	row: HeldRecut,
): Promise<BoundaryOptions> {
	const asked: BoundaryOptions = row.options;
	if (row.kind === 'file' || row.from_set === sheet.boundary_set_id) return asked;
	const was = await findBoundarySet(db, row.from_set);
	const now = await findBoundarySet(db, sheet.boundary_set_id);
	if (!was || !now) throw new NotFound('boundary set');
	if (now.file_digest !== row.file_digest) {
		throw new Conflict(
			'other-file',
			'The sheet was given another file since. Drop this and begin on the new boundaries.',
		);
	}
	const mends = mendsOnTop(mendsOf(was.options), mendsOf(asked), mendsOf(now.options));
	return { ...(row.kind === 'mends' ? now.options : asked), mends };
}

const mendsOf = (options: BoundaryOptions): Mend[] => options.mends ?? [];

/** What was added and taken away, done to what stands now. */
function mendsOnTop(was: Mend[], asked: Mend[], now: Mend[]): Mend[] {
	const ids = (mends: Mend[]) => new Set(mends.map(mendId));
	const [before, wanted, standing] = [ids(was), ids(asked), ids(now)];
	return [
		...now.filter((mend) => !before.has(mendId(mend)) || wanted.has(mendId(mend))),
		...asked.filter((mend) => !before.has(mendId(mend)) && !standing.has(mendId(mend))),
	];
}
