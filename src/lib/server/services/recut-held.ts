import type { Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { deleteUnusedBoundarySet, findBoundarySet } from '../repositories/boundaries.repository.ts';
import { holdRecut, type HeldRecut } from '../repositories/recuts.repository.ts';
import { holdSheet, type SheetRecord } from '../repositories/sheets.repository.ts';
import { record, type Actor } from './activity.service.ts';
import { NotFound } from './outcomes.ts';

export interface Held {
	sheet: SheetRecord;
	row: HeldRecut;
}

/**
 * Holds a sheet and one of its re-cuts while `work` changes them. Locks are taken in one order everywhere:
 * the sheet, its re-cuts, then files by digest; the job that reads holds the re-cut alone.
 */
export const withRecut = <T>(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	recut: number,
	work: (trx: Trx, held: Held) => Promise<T>,
): Promise<T> =>
	shop.db.transaction().execute(async (trx) => {
		const sheet = await heldSheet(trx, member, number);
		const row = await holdRecut(trx, sheet.id, known(recut));
		if (!row) throw new NotFound('re-cut');
		return work(trx, { sheet, row });
	});

/** A sheet of this team, held against every other change until the transaction ends. */
export async function heldSheet(trx: Trx, member: Member, number: number): Promise<SheetRecord> {
	const sheet = await holdSheet(trx, member.team.id, known(number));
	if (!sheet) throw new NotFound('sheet');
	return sheet;
}

/** Numbers from addresses may be anything; 0 is given to nothing. */
export const known = (number: number): number =>
	Number.isSafeInteger(number) && number > 0 && number < 2 ** 31 ? number : 0;

/** Writes down what was done to a re-cut. */
export const recordRecut = (
	trx: Trx,
	actor: Actor,
	verb: string,
	sheet: number,
	row: { id: string; number: number },
	detail: Record<string, unknown> = {},
) =>
	record(
		trx,
		actor,
		`boundaries.recut-${verb}`,
		{ kind: 'recut', id: row.id },
		{ ...detail, sheet, number: row.number },
	);

/** Removes a set that nothing uses any more; answers the digest of its file, which may be unused too. */
export async function removeSet(trx: Trx, id: string | null): Promise<string[]> {
	const set = id ? await findBoundarySet(trx, id) : undefined;
	return set && (await deleteUnusedBoundarySet(trx, set.id)) ? [set.file_digest] : [];
}
