import { todayOf } from '../../engines/territories/problem-of-draft.ts';
import { wishFaults } from '../../engines/territories/wish-faults.ts';
import type {
	DeskProposal,
	ProposalNote,
	ProposalProgress,
} from '../../schemas/desk-territories.ts';
import type { BeginProposal } from '../../schemas/territories.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	countOpenProposals,
	findProposal,
	insertProposal,
	listProgress,
	type ProposalRow,
} from '../repositories/proposals.repository.ts';
import { holdSheet, type SheetRecord } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { sheetOf } from './draft.service.ts';
import { Conflict, NotFound, Unfit } from './outcomes.ts';
import { digestOfParts } from './proposal-data.ts';
import { noteOf, presentParts, proposalNotes, resultOf, staleness } from './proposal-notes.ts';
import type { StoredRequest, StoredResult } from './proposal-result.ts';
import { requireSound } from './territories-store.ts';
import { changedInks } from './territory-inks.ts';
import { territoriesIn, territoryDraftOf, territoryState } from './territory-state.ts';

/** Proposals of one sheet that may wait or be worked out at once. */
const mostOpen = 10;

/**
 * Asks for a proposal to even out the territories as they are saved now. The job is asked for when this
 * answers with the number under which to follow it.
 */
export async function beginProposal(
	shop: Workshop,
	member: Member,
	number: number,
	{ name, revision, wishes }: BeginProposal,
): Promise<{ number: number }> {
	requireAccess(member, 'territories.edit');
	return shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, number);
		if (!sheet) throw new NotFound('sheet');
		if (revision !== undefined && revision !== sheet.territory_revision) {
			throw new Conflict(
				'stale',
				'The territories have been saved again since. Look at them first.',
			);
		}
		if ((await countOpenProposals(trx, sheet.id)) >= mostOpen) {
			throw new Conflict('too-many-open', `${mostOpen} proposals are being worked out already.`);
		}
		const state = await territoryState(trx, sheet);
		requireSound(state, state.document);
		const [fault] = wishFaults(state.ground, state.document, wishes);
		if (fault) {
			const regions = fault.regions.slice(0, 20).map((region) => state.view.keys[region]);
			throw new Unfit(fault.code, fault.message, { regions });
		}
		const parts = presentParts(state)(wishes);
		const made = await insertProposal(trx, {
			...{ sheet_id: sheet.id, name, state: 'waiting' },
			territory_revision: sheet.territory_revision,
			boundary_set_id: sheet.boundary_set_id,
			data_digest: digestOfParts(parts),
			request: JSON.stringify({ wishes, parts } satisfies StoredRequest),
			territory_keys: state.document.territories.map(({ key }) => key),
			created_by: member.userId,
		});
		await shop.queue.send(trx, 'rebalance', { proposalId: made.id });
		const subject = { kind: 'proposal', id: made.id };
		await record(trx, member, 'proposal.asked', subject, { sheet: number, number: made.number });
		return { number: made.number };
	});
}

/** Every proposal that was not dropped, the newest first. */
export async function listOfProposals(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<ProposalNote[]> {
	requireAccess(member, 'measures.read');
	const state = await territoryState(shop.db, await sheetOf(shop.db, member, number));
	return proposalNotes(shop.db, state);
}

/** How far those at work are, for asking again and again. */
export async function proposalProgress(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<ProposalProgress[]> {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	return listProgress(shop.db, sheet.id);
}

/**
 * A proposal opened. Where the boundaries have been replaced since, its plan is in the order of regions
 * that are not there any more, so it is told and not shown.
 */
export const openProposal = async (
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
): Promise<DeskProposal> => (await readProposal(shop, member, number, proposal)).opened;

/** The same with what stands behind it. */
export async function readProposal(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	proposal: number,
): Promise<{ opened: DeskProposal; result: StoredResult | null; keys: string[] }> {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await proposalOf(shop.db, sheet, proposal);
	const state = await territoryState(shop.db, sheet);
	const isPresent = row.boundary_set_id === sheet.boundary_set_id;
	const asked = territoriesIn(await territoryDraftOf(shop.db, sheet.id, row.territory_revision));
	const result = resultOf(row);
	const opened = {
		...noteOf(row, staleness(state)),
		territoryKeys: row.territory_keys,
		assignment: isPresent ? row.assignment : null,
		computed: isPresent ? row.computed : null,
		today: Array.from(todayOf(state.view.keys, asked)),
		inks: row.inks,
		changedInks: changedInks(state.row?.inks ?? {}, row.inks),
	};
	const whole = isPresent && result?.status !== 'failed' ? result : null;
	return { opened, result: whole, keys: state.view.keys };
}

/** A proposal of this sheet, or `NotFound`. */
export async function proposalOf(
	db: Db,
	sheet: Pick<SheetRecord, 'id'>,
	number: number,
): Promise<ProposalRow> {
	const known = Number.isSafeInteger(number) && number > 0 && number < 2 ** 31;
	const row = known ? await findProposal(db, sheet.id, number) : undefined;
	if (!row) throw new NotFound('proposal');
	return row;
}
