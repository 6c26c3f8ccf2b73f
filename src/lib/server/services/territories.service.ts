import type { DeskTerritories } from '../../schemas/desk-territories.ts';
import type { SaveTerritories } from '../../schemas/territories.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { sheetOf } from './draft.service.ts';
import { handoverNotes } from './handover-view.ts';
import { personName } from './people.ts';
import { proposalNotes } from './proposal-notes.ts';
import {
	staleTerritories,
	storeTerritories,
	type SaveTerritoriesResult,
} from './territories-store.ts';
import { inkNoteOf } from './territory-inks.ts';
import { territoryState } from './territory-state.ts';
import { unitColumns } from './unit-columns.ts';

/** Everything the stage of territories shows. */
export async function deskTerritories(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
): Promise<DeskTerritories> {
	requireAccess(member, 'measures.read');
	const state = await territoryState(shop.db, await sheetOf(shop.db, member, number));
	const { sheet, row, document, columns } = state;
	const inks = row?.inks ?? {};
	return {
		revision: sheet.territory_revision,
		savedBy: row && personName(row),
		savedAt: row?.saved_at.toISOString() ?? null,
		draft: document,
		inks,
		inkNote: inkNoteOf(inks, document),
		...columns,
		geometry: await unitColumns(shop, sheet.boundary_set_id),
		proposals: await proposalNotes(shop.db, state),
		handovers: await handoverNotes(shop.db, state),
	};
}

/**
 * Saves territories as the next revision, with inks computed and checked here. When somebody else saved
 * first nothing is written and the answer tells what they saved.
 */
export async function saveTerritories(
	shop: Workshop,
	member: Member,
	number: number,
	sent: SaveTerritories,
): Promise<SaveTerritoriesResult> {
	requireAccess(member, 'territories.edit');
	const sheet = await sheetOf(shop.db, member, number);
	const state = await territoryState(shop.db, sheet);
	if (sent.revision !== sheet.territory_revision)
		return staleTerritories(sheet.territory_revision, state.row);
	return storeTerritories(shop, member, state, sent.document, 'edited');
}
