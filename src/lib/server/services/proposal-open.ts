import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import type { Member } from '../access/member.ts';
import type { MadePlan } from '../jobs/rebalance.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import type { ProposalRow } from '../repositories/proposals.repository.ts';
import { sheetOf } from './draft.service.ts';
import { Conflict, Unfit } from './outcomes.ts';
import { planNames } from './plan-names.ts';
import { requestOf, staleness } from './proposal-notes.ts';
import { inWords } from './proposal-words.ts';
import { proposalOf } from './proposals.service.ts';
import {
	territoriesIn,
	territoryDraftOf,
	territoryState,
	type TerritoryState,
} from './territory-state.ts';

/** A plan with the draft it was made for, on the data as they are now. */
export interface OpenPlan {
	row: ProposalRow & { assignment: number[] };
	state: TerritoryState;
	/** the territories that were asked about */
	asked: TerritoryDraft;
}

/** States in which a plan may be changed, looked over again or adopted. */
export const openStates = ['kept', 'undecided'] as const;

/** Reads a proposal that has a plan which is neither adopted nor dropped. */
export async function openPlan(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
): Promise<OpenPlan> {
	const sheet = await sheetOf(shop.db, member, number);
	const row = await proposalOf(shop.db, sheet, proposal);
	const { assignment } = row;
	if (!assignment || !openStates.some((state) => state === row.state)) {
		const why = row.state === 'adopted' ? 'It was adopted already.' : 'There is no plan in it.';
		throw new Conflict('no-open-plan', why);
	}
	const state = await territoryState(shop.db, sheet);
	const asked = territoriesIn(await territoryDraftOf(shop.db, sheet.id, row.territory_revision));
	return { row: { ...row, assignment }, state, asked };
}

/** @throws Conflict when the data of a plan have changed since */
export function requirePresent({ row, state }: OpenPlan): void {
	const stale = staleness(state)(row);
	if (stale) throw new Conflict('data-changed', `${stale} Check the proposal against them first.`);
}

/**
 * Figures and faults of a plan, worked out in a thread.
 * @throws Unfit when there are none, because a figure is missing
 */
export async function judged(
	shop: Pick<Workshop, 'pool'>,
	{ row, state, asked }: OpenPlan,
	assignment: number[],
): Promise<MadePlan> {
	const { wishes } = requestOf(row);
	const found = await shop.pool.run('judgePlan', {
		...{ ground: state.ground, draft: asked, wishes },
		assignment: Int32Array.from(assignment),
	});
	if ('plan' in found) return found.plan;
	throw new Unfit(found.reason, inWords(found.message, planNames(state, asked, wishes)));
}
