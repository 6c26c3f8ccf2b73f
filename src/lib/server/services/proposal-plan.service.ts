import { numbersOf } from '../../engines/territories/problem-of-draft.ts';
import { wishFaults } from '../../engines/territories/wish-faults.ts';
import type { PlanSaved, PlanStale } from '../../schemas/desk-territories.ts';
import type { SavePlan } from '../../schemas/territories.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { changeProposal } from '../repositories/proposals.repository.ts';
import { Conflict, Unfit } from './outcomes.ts';
import { assignmentByKey, planNames } from './plan-names.ts';
import { digestOfParts } from './proposal-data.ts';
import { recordProposal, withProposal } from './proposal-held.ts';
import { noteFrom, presentParts, requestOf, resultOf } from './proposal-notes.ts';
import { judged, openPlan, openStates, requirePresent, type OpenPlan } from './proposal-open.ts';
import { planResult, type StoredRequest } from './proposal-result.ts';
import { changedInks, inksFor } from './territory-inks.ts';

export type SavePlanResult =
	{ status: 'saved'; saved: PlanSaved } | { status: 'stale'; stale: PlanStale };

/**
 * Saves edits by hand. A plan that breaks rules is kept and says so; it cannot be adopted. When somebody
 * else edited it first nothing is written and the answer tells their plan.
 */
export async function editProposal(
	shop: Workshop,
	member: Member,
	number: number,
	proposal: number,
	sent: SavePlan,
): Promise<SavePlanResult> {
	requireAccess(member, 'territories.edit');
	const open = await openPlan(shop, member, number, proposal);
	const { row } = open;
	if (sent.revision !== row.revision) return stale(row.revision, row.assignment);
	requirePresent(open);
	const assignment = edited(open, sent);
	const outcome = resultOf(row)?.outcome;
	return storePlan(shop, member, open, assignment, {
		...{ verb: 'edited', lowerBound: outcome?.lowerBound ?? 0 },
	});
}

function edited({ row, state }: OpenPlan, sent: SavePlan): number[] {
	const { keys } = state.view;
	if ('assignment' in sent) {
		const isWhole = sent.assignment.length === keys.length;
		if (isWhole && sent.assignment.every((t) => t < row.territory_keys.length)) {
			return sent.assignment;
		}
		throw new Unfit('malformed', 'The plan must name a territory for every region.');
	}
	const [unit, territory] = [numbersOf(keys), numbersOf(row.territory_keys)];
	const assignment = [...row.assignment];
	for (const [key, to] of Object.entries(sent.moves)) {
		if (unit(key) < 0) throw new Unfit('unknown-region', `The sheet has no region “${key}”.`);
		if (territory(to) < 0) throw new Unfit('unknown-territory', `There is no territory “${to}”.`);
		assignment[unit(key)] = territory(to);
	}
	return assignment;
}

/**
 * Looks a plan over against territories and figures as they are now, after they changed: its moves are
 * counted from today's assignment. How few moves would do is not known any more.
 */
export async function recheckProposal(
	shop: Workshop,
	member: Member,
	number: number,
	proposal: number,
): Promise<SavePlanResult> {
	requireAccess(member, 'territories.edit');
	const open = await openPlan(shop, member, number, proposal);
	const { row, state } = open;
	if (row.boundary_set_id !== state.sheet.boundary_set_id) {
		throw new Conflict(
			'boundaries-replaced',
			'The boundaries have been replaced. Ask for it again.',
		);
	}
	const [fault] = wishFaults(state.ground, state.document, requestOf(row).wishes);
	if (fault) throw new Unfit(fault.code, fault.message);
	const carried = carriedOver(open);
	const present = {
		state,
		asked: state.document,
		row: { ...row, territory_keys: carried.keys, computed: carried.of(row.computed ?? []) },
	};
	const change = { verb: 'rechecked', lowerBound: 0 };
	return storePlan(shop, member, present, carried.of(row.assignment), change);
}

/** A plan in the order of the present territories. */
function carriedOver({ row, state, asked }: OpenPlan) {
	const keys = state.document.territories.map(({ key }) => key);
	const place = numbersOf(keys);
	const gone = new Set(row.assignment.map((t) => row.territory_keys[t]));
	for (const key of keys) gone.delete(key);
	if (gone.size > 0) {
		const [key] = gone;
		const name = asked.territories.find((entry) => entry.key === key)?.name ?? key;
		throw new Conflict(
			'territory-gone',
			`It hands regions to ${name}, which is not there any more.`,
		);
	}
	return { keys, of: (plan: number[]) => plan.map((t) => place(row.territory_keys[t])) };
}

async function storePlan(
	shop: Workshop,
	member: Member,
	open: OpenPlan,
	assignment: number[],
	{ verb, lowerBound }: { verb: string; lowerBound: number },
): Promise<SavePlanResult> {
	const { row, state, asked } = open;
	const { sheet, view } = state;
	const { wishes } = requestOf(row);
	const plan = await judged(shop, open, assignment);
	const isSound = plan.faults.length + plan.misses.length === 0;
	const proved = isSound && lowerBound > 0 && plan.cost <= lowerBound * (1 + 1e-9);
	const result = planResult(plan, { lowerBound, proved }, wishes, planNames(state, asked, wishes));
	const inked = await inksFor(shop, sheet, view, {
		territories: asked.territories,
		assignment: assignmentByKey(view.keys, row.territory_keys, assignment),
	});
	const parts = presentParts(state)(wishes);
	return withProposal(shop, member, sheet.number, row.number, async (trx, held) => {
		const stands = held.row.revision === row.revision && held.row.state === row.state;
		if (!stands) return stale(held.row.revision, held.row.assignment ?? []);
		const change = {
			state: isSound ? 'kept' : row.state,
			revision: row.revision + 1,
			territory_revision: verb === 'rechecked' ? sheet.territory_revision : row.territory_revision,
			data_digest: digestOfParts(parts),
			request: JSON.stringify({ wishes, parts } satisfies StoredRequest),
			territory_keys: row.territory_keys,
			assignment,
			computed: row.computed ?? assignment,
			result: JSON.stringify(result),
			inks: JSON.stringify(inked.inks),
		} as const;
		await changeProposal(trx, row.id, openStates, change);
		await recordProposal(trx, member, verb, held, { revision: change.revision });
		const { inks } = inked;
		const note = noteFrom({ ...row, ...change, inks }, wishes, result, null);
		const saved = { revision: change.revision, assignment, note, inks };
		return {
			status: 'saved',
			saved: { ...saved, changedInks: changedInks(state.row?.inks ?? {}, inks) },
		};
	});
}

const stale = (revision: number, assignment: number[]): SavePlanResult => ({
	status: 'stale',
	stale: { revision, assignment },
});
