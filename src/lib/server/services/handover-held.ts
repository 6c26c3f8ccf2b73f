import type { Member } from '../access/member.ts';
import type { Db, Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	findHandover,
	holdHandover,
	type HandoverRow,
} from '../repositories/handovers.repository.ts';
import { holdSheet } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { territoryState, type TerritoryState } from './territory-state.ts';

/** A handover list in hand: found, held while it is changed, and written down. */

/** A list of this sheet, or `NotFound`. */
export async function handoverOf(db: Db, sheetId: string, number: number): Promise<HandoverRow> {
	const row = isNumber(number) ? await findHandover(db, sheetId, number) : undefined;
	if (!row) throw new NotFound('handover list');
	return row;
}

/** Numbers from addresses may be anything. */
export const isNumber = (value: number) =>
	Number.isSafeInteger(value) && value > 0 && value < 2 ** 31;

/** Holds a sheet and one of its lists, which must be open, while `work` changes it. */
export const withOpenHandover = <T>(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	handover: number,
	work: (trx: Trx, row: HandoverRow, now: TerritoryState) => Promise<T>,
): Promise<T> =>
	shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, isNumber(number) ? number : 0);
		if (!sheet) throw new NotFound('sheet');
		const { id } = await handoverOf(trx, sheet.id, handover);
		await holdHandover(trx, id);
		const row = await handoverOf(trx, sheet.id, handover);
		if (row.state !== 'open') {
			const said = row.state === 'approved' ? 'approved, so nothing in it changes' : 'withdrawn';
			throw new Conflict('closed', `This list is ${said}.`);
		}
		return work(trx, row, await territoryState(trx, sheet));
	});

/** Writes down what was done with a list. */
export const recordHandover = (
	trx: Trx,
	member: Member,
	verb: string,
	{ row, now }: { row: HandoverRow; now: TerritoryState },
	detail: Record<string, unknown> = {},
): Promise<void> =>
	record(
		trx,
		member,
		`handover.${verb}`,
		{ kind: 'handover', id: row.id },
		{ sheet: now.sheet.number, number: row.number, ...detail },
	);
