import { requireAccess, type Member } from '../access/member.ts';
import type { ProposalState } from '../database/schema.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { changeProposal, insertProposal } from '../repositories/proposals.repository.ts';
import { Conflict } from './outcomes.ts';
import { recordProposal, withProposal } from './proposal-held.ts';

/** Keeping proposals in order: stop, name, copy, drop. */

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
