import { requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { ProposalState } from '../database/schema.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	changeProposal,
	holdProposal,
	insertProposal,
	type ProposalRecord,
} from '../repositories/proposals.repository.ts';
import { holdSheet, type SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { Conflict, NotFound } from './outcomes.ts';

/** Keeping proposals in order: stop, name, copy, drop. */

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

/** Stops one that waits or is being worked out; its thread ends within a second. */
export async function cancelProposal(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
): Promise<void> {
	requireAccess(member, 'territories.edit');
	await withProposal(shop, member, number, proposal, async (trx, held) => {
		const end = { state: 'cancelled', step: '', share: 0 } as const;
		if (!(await changeProposal(trx, held.row.id, ['waiting', 'running'], end))) {
			throw new Conflict('not-open', 'It is not being worked out any more.');
		}
		await recordProposal(trx, member, 'cancelled', held);
	});
}

export async function renameProposal(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
	name: string,
): Promise<void> {
	requireAccess(member, 'territories.edit');
	await withProposal(shop, member, number, proposal, async (trx, held) => {
		await changeProposal(trx, held.row.id, [held.row.state], { name });
		await recordProposal(trx, member, 'renamed', held, { from: held.row.name, to: name });
	});
}

const droppable: ProposalState[] = ['kept', 'impossible', 'undecided', 'failed', 'cancelled'];

/** Takes a proposal off the list; one that was adopted stays, for handover lists refer to it. */
export async function dropProposal(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
): Promise<void> {
	requireAccess(member, 'territories.edit');
	await withProposal(shop, member, number, proposal, async (trx, held) => {
		if (!(await changeProposal(trx, held.row.id, droppable, { state: 'dropped' }))) {
			const why =
				held.row.state === 'adopted'
					? 'It was adopted, so it is kept.'
					: 'It is being worked out. Stop it first.';
			throw new Conflict('not-droppable', why);
		}
		await recordProposal(trx, member, 'dropped', held);
	});
}

/** Keeps a copy of a plan, so that one of the two can be changed by hand. */
export async function duplicateProposal(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
): Promise<{ number: number }> {
	requireAccess(member, 'territories.edit');
	return withProposal(shop, member, number, proposal, async (trx, held) => {
		const { row } = held;
		if (!row.assignment) throw new Conflict('no-plan', 'There is no plan to copy.');
		const made = await insertProposal(trx, {
			...{ sheet_id: row.sheet_id, state: row.state === 'adopted' ? 'kept' : row.state },
			name: copyName(row.name),
			territory_revision: row.territory_revision,
			boundary_set_id: row.boundary_set_id,
			data_digest: row.data_digest,
			request: JSON.stringify(row.request),
			territory_keys: row.territory_keys,
			assignment: row.assignment,
			computed: row.computed,
			result: JSON.stringify(row.result),
			inks: JSON.stringify(row.inks),
			created_by: member.userId,
		});
		await recordProposal(trx, member, 'copied', held, { copy: made.number });
		return { number: made.number };
	});
}

const copyName = (name: string) => `${name.slice(0, 112)}, copy`;
