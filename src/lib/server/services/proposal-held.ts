import type { Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdProposal, type ProposalRecord } from '../repositories/proposals.repository.ts';
import { holdSheet, type SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { NotFound } from './outcomes.ts';

type Held = { sheet: SheetRecord; row: ProposalRecord };

/** Holds a sheet and one of its proposals while `work` changes them. */
export const withProposal = <T>(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
	work: (trx: Trx, held: Held) => Promise<T>,
): Promise<T> =>
	shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, known(number));
		if (!sheet) throw new NotFound('sheet');
		const row = await holdProposal(trx, sheet.id, known(proposal));
		if (!row) throw new NotFound('proposal');
		return work(trx, { sheet, row });
	});

/** Numbers from addresses may be anything; 0 is given to nothing. */
const known = (number: number): number =>
	Number.isSafeInteger(number) && number > 0 && number < 2 ** 31 ? number : 0;

export const recordProposal = (
	trx: Trx,
	member: Member,
	verb: string,
	{ sheet, row }: Held,
	detail: Record<string, unknown> = {},
) =>
	record(
		trx,
		member,
		`proposal.${verb}`,
		{ kind: 'proposal', id: row.id },
		{ sheet: sheet.number, number: row.number, ...detail },
	);
