import { isDeepStrictEqual } from 'node:util';
import { draftFaults } from '../../engines/territories/draft-faults.ts';
import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import type { TerritoriesSaved, TerritoriesStale } from '../../schemas/desk-territories.ts';
import type { Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { holdSheet } from '../repositories/sheets.repository.ts';
import {
	insertTerritoryDraft,
	type TerritoryDraftRow,
} from '../repositories/territories.repository.ts';
import { record } from './activity.service.ts';
import { Conflict, NotFound, Unfit } from './outcomes.ts';
import { personName } from './people.ts';
import { inkNoteOf, inksFor, type TerritoryInks } from './territory-inks.ts';
import { territoriesIn, territoryDraftOf, type TerritoryState } from './territory-state.ts';

export type SaveTerritoriesResult =
	{ status: 'saved'; saved: TerritoriesSaved } | { status: 'stale'; stale: TerritoriesStale };

/**
 * Stores territories on top of the revision of `state`; the caller has asked whether the member may.
 * @param change what they came from, kept with the revision
 */
export async function storeTerritories(
	shop: Workshop,
	member: Member,
	state: TerritoryState,
	document: TerritoryDraft,
	change: string,
): Promise<SaveTerritoriesResult> {
	requireSound(state, document);
	const { sheet, row } = state;
	if (row && isDeepStrictEqual(document, state.document)) return unchanged(row);
	const inked = await inksFor(shop, sheet, state.view, document);
	return shop.db.transaction().execute(async (trx) => {
		const held = await holdSheet(trx, member.team.id, sheet.number);
		if (!held) throw new NotFound('sheet');
		if (held.boundary_set_id !== sheet.boundary_set_id) throw otherBoundaries();
		if (held.territory_revision !== sheet.territory_revision) {
			const saved = await territoryDraftOf(trx, sheet.id, held.territory_revision);
			return staleTerritories(held.territory_revision, saved);
		}
		const revision = held.territory_revision + 1;
		const savedAt = await insertTerritoryDraft(trx, {
			...{ sheetId: sheet.id, revision, document, change },
			inks: inked.inks,
			savedBy: member.userId,
		});
		const detail = {
			sheet: sheet.number,
			revision,
			change,
			territories: document.territories.length,
		};
		await record(trx, member, 'territories.saved', { kind: 'sheet', id: sheet.id }, detail);
		return saved(revision, savedAt, document, inked);
	});
}

/** First territories begin at revision 0 on whichever boundaries, so the revision alone does not tell. */
const otherBoundaries = () =>
	new Conflict('stale', 'The sheet was given other boundaries meanwhile. Load the page again.');

/** @throws Unfit for a draft that contradicts its ground or itself */
export function requireSound({ ground }: TerritoryState, document: TerritoryDraft): void {
	const faults = draftFaults(ground, document);
	if (faults.length === 0) return;
	const [{ code, message }] = faults;
	const listed = faults.map((fault) => ({ ...fault, keys: fault.keys.slice(0, 20) }));
	throw new Unfit(code, message, { faults: listed });
}

const saved = (
	revision: number,
	savedAt: Date,
	document: TerritoryDraft,
	{ inks, note, changed }: TerritoryInks,
): SaveTerritoriesResult => ({
	status: 'saved',
	saved: {
		...{ revision, document, inks },
		savedAt: savedAt.toISOString(),
		inkNote: note,
		changedInks: changed,
	},
});

const unchanged = (row: TerritoryDraftRow): SaveTerritoriesResult => {
	const document = territoriesIn(row);
	const note = inkNoteOf(row.inks, document);
	return saved(row.revision, row.saved_at, document, { inks: row.inks, note, changed: [] });
};

export const staleTerritories = (
	revision: number,
	row: TerritoryDraftRow | null,
): SaveTerritoriesResult => ({
	status: 'stale',
	stale: {
		revision,
		savedBy: row && personName(row),
		savedAt: row?.saved_at.toISOString() ?? null,
		document: territoriesIn(row),
		inks: row?.inks ?? {},
	},
});
