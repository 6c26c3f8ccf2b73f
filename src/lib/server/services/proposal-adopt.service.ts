import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { changeProposal } from '../repositories/proposals.repository.ts';
import { insertTerritoryDraft } from '../repositories/territories.repository.ts';
import { Conflict } from './outcomes.ts';
import { assignmentByKey, planNames } from './plan-names.ts';
import { recordProposal, withProposal } from './proposal-held.ts';
import { requestOf } from './proposal-notes.ts';
import { judged, openPlan, openStates, requirePresent, type OpenPlan } from './proposal-open.ts';
import { inWords } from './proposal-words.ts';
import { inksFor } from './territory-inks.ts';

export interface Adoption {
	/** of the proposal that was looked at */
	revision: number;
	/** whether tolerances that it misses are accepted */
	outside: boolean;
}

/**
 * Makes a proposal the sheet's territories, as their next revision. It is checked once more: one that
 * breaks a rule is refused, one outside a tolerance needs an explicit yes, one whose data have changed
 * must be checked against them first. Territories that close have handed out everything and leave the
 * list; the revisions before keep them. Other proposals are stale from then on.
 */
export async function adoptProposal(
	shop: Workshop,
	member: Member,
	number: number,
	proposal: number,
	{ revision, outside }: Adoption,
): Promise<{ revision: number }> {
	requireAccess(member, 'territories.edit');
	const open = await openPlan(shop, member, number, proposal);
	const { row, state } = open;
	if (row.revision !== revision) throw editedMeanwhile();
	requirePresent(open);
	await requireFit(shop, open, outside);
	const document = adopted(open);
	const { inks } = await inksFor(shop, state.sheet, state.view, document);
	return withProposal(shop, member, number, proposal, async (trx, held) => {
		if (held.row.revision !== revision) throw editedMeanwhile();
		if (held.sheet.territory_revision !== state.sheet.territory_revision) {
			throw new Conflict('data-changed', 'The territories have been changed since.');
		}
		const end = { state: 'adopted', step: '', share: 1 } as const;
		if (!(await changeProposal(trx, row.id, openStates, end))) {
			throw new Conflict('no-open-plan', 'It was adopted or dropped meanwhile.');
		}
		const next = held.sheet.territory_revision + 1;
		await insertTerritoryDraft(trx, {
			...{ sheetId: row.sheet_id, revision: next, document, inks },
			change: `proposal ${row.number}`,
			savedBy: member.userId,
		});
		await recordProposal(trx, member, 'adopted', held, { revision: next, outside });
		return { revision: next };
	});
}

const editedMeanwhile = () =>
	new Conflict('stale', 'The proposal has been edited since. Look at it before you adopt it.');

async function requireFit(shop: Workshop, open: OpenPlan, outside: boolean): Promise<void> {
	const { row, state, asked } = open;
	const names = planNames(state, asked, requestOf(row).wishes);
	const { faults, misses } = await judged(shop, open, row.assignment);
	if (faults.length > 0) {
		throw new Conflict('breaks-rules', `It breaks a rule: ${inWords(faults[0], names)}`);
	}
	if (misses.length > 0 && !outside) {
		const first = inWords(misses[0], names);
		throw new Conflict('outside-tolerance', `${first} Say yes to adopt it all the same.`);
	}
}

/** The present territories with the plan as their assignment, without those that close. */
function adopted({ row, state: { view, document } }: OpenPlan): TerritoryDraft {
	const closing = new Set(document.territories.filter((one) => one.closing).map(({ key }) => key));
	const locks = Object.entries(document.locks).filter(([, lock]) => !closing.has(lock.territory));
	return {
		...document,
		territories: document.territories.filter(({ key }) => !closing.has(key)),
		assignment: assignmentByKey(view.keys, row.territory_keys, row.assignment),
		locks: Object.fromEntries(locks),
	};
}
