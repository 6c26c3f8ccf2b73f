import { readFileSync } from 'node:fs';
import Papa from 'papaparse';
import { distributor } from '../../sample-data/distributor.ts';
import { shapeRepublic } from '../../sample-data/republic.ts';
import { survey } from '../../sample-data/survey.ts';
import {
	firstWishes,
	noTerritories,
	type TerritoryDraft,
} from '../../src/lib/engines/territories/territory-draft.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Db } from '../../src/lib/server/database/connection.ts';
import {
	insertMeasureTable,
	putMeasures,
} from '../../src/lib/server/repositories/measures.repository.ts';
import { insertProposal } from '../../src/lib/server/repositories/proposals.repository.ts';
import { findSheet } from '../../src/lib/server/repositories/sheets.repository.ts';
import { insertTerritoryDraft } from '../../src/lib/server/repositories/territories.repository.ts';
import { ingest, type TestWorkshop } from './workshop.ts';

const rows = Papa.parse<Record<string, string>>(
	readFileSync('sample-data/quellorn-outlets.csv', 'utf8'),
	{ header: true, skipEmptyLines: true },
).data;

/** The sample distributor, and the division that is known to even it out. */
export const firm = distributor(survey(shapeRepublic(21), 21), 21);

/**
 * A sheet of the republic with the distributor's figures and territories, and a proposal adopted that is
 * the known division: rows as the services leave them, without asking the engine.
 */
export async function plannedSheet(shop: TestWorkshop, member: Member) {
	const file = readFileSync('sample-data/tavaroe.geojson');
	const fields = { keyField: 'code', nameField: 'name' };
	const { sheet: number } = await ingest(shop, member, 'tavaroe.geojson', file, fields);
	const sheet = await findSheet(shop.db, member.team.id, number ?? 0);
	if (!sheet) throw new Error('the sample was not taken in');
	const [hours, potential] = await joinMeasures(shop.db, sheet.id, sheet.boundary_set_id);
	const wishes = { ...firstWishes, tolerances: { [hours]: 0.1 } };
	const today = { ...territoriesToday(), wishes };
	await saveTerritories(shop.db, sheet.id, 1, today);
	const proposal = await adopt(shop.db, sheet, today);
	await saveTerritories(shop.db, sheet.id, 2, evenedOut(today));
	return { sheet, proposal, measures: { hours, potential }, today };
}

async function joinMeasures(db: Db, sheetId: string, boundarySetId: string): Promise<string[]> {
	const { id } = await insertMeasureTable(db, {
		...{ sheet_id: sheetId, name: 'Outlets', boundary_set_id: boundarySetId },
		...{ file_name: 'outlets.csv', file_digest: 'none', file_bytes: 1, source: null },
		...{ state: 'taken', created_by: null, taken_by: null },
	});
	const column = (position: number, name: string, unit: string, heading: string) => ({
		...{ id: null, sheet_id: sheetId, table_id: id, position, name, unit, texts: null },
		...{ kind: 'number' as const, values: rows.map((row) => Number(row[heading])) },
	});
	return putMeasures(db, [
		column(0, 'visits', 'hours a year', 'visits (hours a year)'),
		column(1, 'potential', 'thousand skells', 'potential (thousand skells)'),
	]);
}

export const territoriesToday = (): TerritoryDraft => ({
	...noTerritories,
	territories: firm.territories.map(({ key, name, person, email, base, capacity, note }) => ({
		...{ key, name, person, email, base: base || null, capacity, frozen: false },
		vacant: note.startsWith('vacant'),
		closing: note.startsWith('closes'),
	})),
	assignment: Object.fromEntries(firm.rows.map(({ code, territory }) => [code, territory])),
	handLinks: firm.ferries.map(({ from, to }) => ({ a: from, b: to, reason: 'ferry' })),
});

export const saveTerritories = (
	db: Db,
	sheetId: string,
	revision: number,
	document: TerritoryDraft,
) =>
	insertTerritoryDraft(db, {
		...{ sheetId, revision, document, inks: {}, change: 'edited', savedBy: null },
	});

/** An adopted proposal of the known division. */
export async function adopt(
	db: Db,
	sheet: { id: string; boundary_set_id: string },
	today: TerritoryDraft,
): Promise<number> {
	const keys = today.territories.map(({ key }) => key);
	const assignment = firm.fair.map((key) => keys.indexOf(key));
	const { number } = await insertProposal(db, {
		...{ sheet_id: sheet.id, name: 'Within 10 %', state: 'adopted', territory_revision: 1 },
		...{ boundary_set_id: sheet.boundary_set_id, data_digest: 'none', attempts: 1 },
		...{ claim: null, result: null, created_by: null, territory_keys: keys },
		...{ assignment, computed: assignment, request: JSON.stringify({ wishes: today.wishes }) },
	});
	return number;
}

/** As adopting leaves it: a territory that closes is gone from the list. */
export const evenedOut = (today: TerritoryDraft): TerritoryDraft => ({
	...today,
	territories: today.territories.filter(({ closing }) => !closing),
	assignment: Object.fromEntries(firm.rows.map(({ code }, at) => [code, firm.fair[at]])),
});
