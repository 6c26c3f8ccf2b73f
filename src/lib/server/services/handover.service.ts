import type { Wishes } from '../../engines/territories/territory-draft.ts';
import type { HandoverNote } from '../../schemas/desk-territories.ts';
import type { CreateHandover, Handover, HandoverSource } from '../../schemas/handover.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { adoptedProposals, insertHandover } from '../repositories/handovers.repository.ts';
import { findProposal, type ProposalRow } from '../repositories/proposals.repository.ts';
import { holdSheet } from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { sheetOf } from './draft.service.ts';
import { keptData, measureIds, partsNow } from './handover-data.ts';
import { contradicted, movesOf, type NewMove } from './handover-moves.ts';
import { handoverOf, isNumber } from './handover-held.ts';
import { handoverNotes, handoverView } from './handover-view.ts';
import { Conflict, NotFound, Refused } from './outcomes.ts';
import { territoryState, type TerritoryState } from './territory-state.ts';

type Reading = Pick<Workshop, 'db'>;
type SheetName = { number: number; name: string };

/** The lists of a sheet, the newest first, and the proposals from which one can be made. */
export async function handoverList(
	shop: Reading,
	member: Member,
	number: number,
): Promise<{ sheet: SheetName; lists: HandoverNote[]; sources: HandoverSource[] }> {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	const now = await territoryState(shop.db, sheet);
	const sources = await adoptedProposals(shop.db, sheet.id);
	return {
		sheet: { number: sheet.number, name: sheet.name },
		lists: await handoverNotes(shop.db, now),
		sources: sources.map(({ number: of, name, listed }) => ({
			...{ number: of, name },
			listed: Boolean(listed),
		})),
	};
}

/** One list, whole. */
export async function readHandover(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
): Promise<Handover> {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await handoverOf(shop.db, sheet.id, handover);
	return handoverView(shop.db, row, await territoryState(shop.db, sheet));
}

/**
 * Makes the next list of a sheet: every move of a proposal that was adopted, as the territories stand now.
 * A day in the past is taken only when it is meant. There is one list of a proposal at a time: to take a
 * move out, withdraw it, plan again and hand over that.
 */
export async function createHandover(
	shop: Reading,
	member: Member,
	number: number,
	{ proposal, effectiveOn, note, past }: CreateHandover,
): Promise<number> {
	requireAccess(member, 'handover.edit');
	if (past !== 'yes' && effectiveOn < today()) {
		const said = 'This day has passed. Tick below it if it is meant.';
		throw new Refused(said, 'effectiveOn');
	}
	return shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, isNumber(number) ? number : 0);
		if (!sheet) throw new NotFound('sheet');
		const now = await territoryState(trx, sheet);
		const source = await sourceOf(trx, sheet.id, proposal);
		const made = await insertHandover(
			trx,
			{
				sheet_id: sheet.id,
				proposal_id: source.id,
				effective_on: effectiveOn,
				state: 'open',
				note,
				...keptData(partsNow(now, measureIds(now))),
				measures: JSON.stringify(shownMeasures(now)),
				created_by: member.userId,
			},
			await movesToList(trx, now, source),
		);
		const subject = { kind: 'handover', id: made.id };
		const detail = { sheet: number, number: made.number, proposal, effective: effectiveOn };
		await record(trx, member, 'handover.made', subject, detail);
		return made.number;
	});
}

const today = (): string => new Date().toISOString().slice(0, 10);

async function sourceOf(trx: Trx, sheetId: string, number: number): Promise<ProposalRow> {
	const proposal = isNumber(number) ? await findProposal(trx, sheetId, number) : undefined;
	if (!proposal) throw new NotFound('proposal');
	if (proposal.state !== 'adopted' || !proposal.assignment) {
		throw new Refused('Adopt the proposal first: a list hands over what was decided.', 'proposal');
	}
	const adopted = await adoptedProposals(trx, sheetId);
	if (adopted.find((one) => one.number === number)?.listed) {
		throw new Conflict('listed', 'There is a list of this proposal already.');
	}
	return proposal;
}

async function movesToList(
	trx: Trx,
	now: TerritoryState,
	proposal: ProposalRow,
): Promise<NewMove[]> {
	if (proposal.boundary_set_id !== now.sheet.boundary_set_id) {
		throw new Conflict('stale', 'The boundaries have been replaced since it was adopted.');
	}
	const before = await territoryState(trx, now.sheet, proposal.territory_revision);
	const { territory_keys, assignment } = proposal;
	const { wishes } = proposal.request as unknown as { wishes: Wishes };
	const moves = movesOf(before, { territory_keys, assignment: assignment ?? [], wishes });
	if (moves.length === 0) throw new Refused('Nothing moves by this proposal.', 'proposal');
	if (contradicted(moves, now.document).length > 0) {
		const said =
			'The territories have been changed since it was adopted, so its moves do not hold.';
		throw new Conflict('stale', said);
	}
	return moves;
}

const shownMeasures = ({ columns }: TerritoryState) =>
	columns.measures
		.filter(({ stale }) => !stale)
		.map(({ name, unit, confidential }) => ({ name, unit, confidential }));
