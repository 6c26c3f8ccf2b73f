import { wishFaults } from '../../engines/territories/wish-faults.ts';
import type { Row } from '../database/schema.ts';
import { findSheetById } from '../repositories/sheets.repository.ts';
import { assignmentByKey, planNames } from '../services/plan-names.ts';
import {
	failProposal,
	keepProposal,
	type FinishedProposal,
} from '../services/proposal-end.service.ts';
import { presentParts, requestOf } from '../services/proposal-notes.ts';
import { storedResult } from '../services/proposal-result.ts';
import { inksFor } from '../services/territory-inks.ts';
import { territoryState, type TerritoryState } from '../services/territory-state.ts';
import { Hopeless, runClaimed, wakeSilent, type ClaimedJob } from './claimed-job.ts';
import type { RebalanceOutcome } from './rebalance.work.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** Works out one proposal: takes it up, has the plan made and checked in a thread, and stores what came of it. */
export const runRebalance = (shop: Workshop, proposalId: string, shutdown: AbortSignal) =>
	runClaimed(shop, rebalanceJob(shop), proposalId, shutdown);

/** Takes up again every proposal that was left lying. */
export const wakeSilentRebalances = (shop: Workshop) =>
	wakeSilent(shop, 'proposals', (proposalId) =>
		shop.queue.send(shop.db, 'rebalance', { proposalId }),
	);

/** Finished, or why it cannot be begun any more. */
type Worked = FinishedProposal | { gone: string };

const rebalanceJob = (shop: Workshop): ClaimedJob<'proposals', Worked> => ({
	table: 'proposals',
	work: (row, signal, progress) => work(shop, row, signal, progress),
	settle: (claim, worked) =>
		'gone' in worked ? failProposal(shop, claim, worked.gone) : keepProposal(shop, claim, worked),
	fail: (claim, message) => failProposal(shop, claim, message),
	words: {
		firstStep: 'Making the problem',
		stopped: (times) => `It was tried ${times} times and the worker stopped each time.`,
		outOfMemory: 'Working it out took more memory than one worker may use.',
		fault: 'It could not be worked out because of a fault here. Nothing was kept.',
	},
});

async function work(
	shop: Workshop,
	row: Row<'proposals'>,
	signal: AbortSignal,
	progress: (progress: Progress) => void,
): Promise<Worked> {
	const sheet = await findSheetById(shop.db, row.sheet_id);
	if (sheet?.boundary_set_id !== row.boundary_set_id) {
		return { gone: 'The boundaries were replaced before it was worked out. Ask for it again.' };
	}
	const { wishes } = requestOf(row);
	const state = await territoryState(shop.db, sheet, row.territory_revision);
	const [fault] = wishFaults(state.ground, state.document, wishes);
	if (fault) return { gone: `${fault.message} Ask for it again.` };
	const input = { ground: state.ground, draft: state.document, wishes };
	const checked = await shop.pool.run('rebalancePlan', input, { signal, progress });
	if ('faults' in checked) throw new Hopeless(`the checker refused: ${checked.faults.join(' ')}`);
	const answer = checked.outcome;
	return {
		answer,
		result: storedResult(answer, wishes, planNames(state, state.document, wishes)),
		inks: await planInks(shop, state, answer),
		request: { wishes, parts: presentParts(state)(wishes) },
	};
}

async function planInks(shop: Workshop, state: TerritoryState, answer: RebalanceOutcome) {
	const plan = answer.status === 'impossible' ? null : answer.plan;
	if (!plan) return {};
	const { territories } = state.document;
	const keys = territories.map(({ key }) => key);
	const assignment = assignmentByKey(state.view.keys, keys, plan.assignment);
	return (await inksFor(shop, state.sheet, state.view, { territories, assignment })).inks;
}
