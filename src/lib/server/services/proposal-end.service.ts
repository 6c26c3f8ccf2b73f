import type { Trx } from '../database/connection.ts';
import type { ProposalState, Row } from '../database/schema.ts';
import type { RebalanceOutcome } from '../jobs/rebalance.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdClaim, type Claim } from '../repositories/claims.repository.ts';
import { changeProposal } from '../repositories/proposals.repository.ts';
import { findSheetById } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { digestOfParts, type DataParts } from './proposal-data.ts';
import type { StoredFailure, StoredRequest, StoredResult } from './proposal-result.ts';

/** What a job hands over to be stored; it has passed the checker. */
export interface FinishedProposal {
	answer: RebalanceOutcome;
	result: StoredResult;
	/** inks of the plan's territories, by key */
	inks: Record<string, number>;
	/** what it was really computed from */
	request: StoredRequest & { parts: DataParts };
}

const stateOf = {
	...{ proposed: 'kept', impossible: 'impossible', undecided: 'undecided' },
} as const satisfies Record<RebalanceOutcome['status'], ProposalState>;

/** Stores what came of a proposal, only while the claim holds. */
export const keepProposal = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	{ answer, result, inks, request }: FinishedProposal,
): Promise<boolean> =>
	ending(shop, claim, async (trx, row) => {
		const plan = answer.status === 'impossible' ? null : answer.plan;
		await changeProposal(trx, row.id, ['running'], {
			...{ state: stateOf[answer.status], step: '', share: 1 },
			data_digest: digestOfParts(request.parts),
			request: JSON.stringify(request),
			...(plan ? { assignment: plan.assignment, computed: plan.assignment } : {}),
			result: JSON.stringify(result),
			inks: JSON.stringify(inks),
		});
		return { verb: 'made', detail: { status: answer.status } };
	});

/** Gives up on a proposal in sight of everybody. */
export const failProposal = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	sentence: string,
): Promise<boolean> =>
	ending(shop, claim, async (trx, row) => {
		const result: StoredFailure = { status: 'failed', sentence, outcome: null };
		const end = { state: 'failed', step: '', share: 0 } as const;
		await changeProposal(trx, row.id, ['running'], { ...end, result: JSON.stringify(result) });
		return { verb: 'failed', detail: {} };
	});

/** Holds the row while it is ended, and writes it down under the one who asked for it. */
const ending = (
	shop: Pick<Workshop, 'db'>,
	claim: Claim,
	end: (
		trx: Trx,
		row: Row<'proposals'>,
	) => Promise<{ verb: string; detail: Record<string, unknown> }>,
): Promise<boolean> =>
	shop.db.transaction().execute(async (trx) => {
		const row = await holdClaim(trx, 'proposals', claim);
		const sheet = row && (await findSheetById(trx, row.sheet_id));
		if (!row || !sheet) return false;
		const { verb, detail } = await end(trx, row);
		const actor = {
			team: { id: sheet.team_id, slug: '', name: '' },
			...{ userId: row.created_by, tokenId: null },
		};
		const subject = { kind: 'proposal', id: row.id };
		const numbers = { sheet: sheet.number, number: row.number };
		await record(trx, actor, `proposal.${verb}`, subject, { ...numbers, ...detail });
		return true;
	});
