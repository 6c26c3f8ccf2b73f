import { readFileSync } from 'node:fs';
import path from 'node:path';
import Papa from 'papaparse';
import {
	firstWishes,
	noTerritories,
	type TerritoryDraft,
} from '../lib/engines/territories/territory-draft.ts';
import type { Member } from '../lib/server/access/member.ts';
import type { Workshop } from '../lib/server/jobs/workshop.ts';
import { takeTable } from '../lib/server/services/measure-taking.service.ts';
import { uploadTable } from '../lib/server/services/measure-upload.service.ts';
import { deskMeasures, measureTables } from '../lib/server/services/measures.service.ts';
import { deskSheet, sheetList } from '../lib/server/services/sheet.service.ts';
import { deskTerritories, saveTerritories } from '../lib/server/services/territories.service.ts';
import { root } from './files.mjs';

type Row = Record<string, string>;

const sample = (name: string) => readFileSync(path.join(root, 'sample-data', name));
const rowsOf = (name: string): Row[] =>
	Papa.parse<Row>(sample(name).toString(), { header: true, skipEmptyLines: true }).data;

/**
 * Joins the invented distributor's figures to a sheet of the sample republic and saves its territories as
 * they are today, unless the sheet has some of its own. Done by the services that answer people.
 */
export async function seedDemoTerritories(
	shop: Workshop,
	member: Member,
	number: number,
): Promise<void> {
	if (!(await isSample(shop, member, number))) return;
	const { revision } = await deskTerritories(shop, member, number);
	if (revision > 0) return;
	if ((await measureTables(shop, member, number)).length === 0) {
		await joinFigures(shop, member, number);
	}
	const { measures } = await deskMeasures(shop, member, number);
	const hours = measures.find(({ name }) => name.startsWith('visits'));
	const document = territoriesToday(hours ? { [hours.id]: 0.1 } : {});
	const { status } = await saveTerritories(shop, member, number, { revision, document });
	if (status !== 'saved') throw new Error('the demo territories were saved by somebody else');
}

/** The demo's people may have deleted the sheet, or made another of it. */
async function isSample(shop: Workshop, member: Member, number: number): Promise<boolean> {
	if (!(await sheetList(shop, member)).some((sheet) => sheet.number === number)) return false;
	const keys = new Set((await deskSheet(shop, member, number)).regions.key);
	return rowsOf('quellorn-outlets.csv').every(({ code }) => keys.has(code));
}

async function joinFigures(shop: Workshop, member: Member, number: number): Promise<void> {
	const form = new FormData();
	form.set('name', 'Quellorn outlets');
	const name = 'quellorn-outlets.csv';
	form.set('file', new Blob([sample(name)]), name);
	const request = new Request('http://localhost/', { method: 'POST', body: form });
	const { number: table } = await uploadTable(shop, member, number, request);
	await takeTable(shop, member, number, table, true);
}

function territoriesToday(tolerances: Record<string, number>): TerritoryDraft {
	return {
		...noTerritories,
		territories: rowsOf('quellorn-territories.csv').map((row) => ({
			...{ key: row.territory, name: row.name, person: row.person, email: row['e-mail'] },
			base: row.base || null,
			capacity: Number(row['capacity (share of full time)']),
			frozen: false,
			vacant: row.note.startsWith('vacant'),
			closing: row.note.startsWith('closes'),
		})),
		assignment: Object.fromEntries(
			rowsOf('quellorn-outlets.csv').map(({ code, territory }) => [code, territory]),
		),
		handLinks: rowsOf('quellorn-ferries.csv').map(({ from, to }) => ({
			...{ a: from, b: to, reason: 'ferry' },
		})),
		wishes: { ...firstWishes, tolerances },
	};
}
