import { readFileSync } from 'node:fs';
import path from 'node:path';
import { limitsOf, type Theme } from '../lib/engines/measures/index.ts';
import type { Member } from '../lib/server/access/member.ts';
import type { Workshop } from '../lib/server/jobs/workshop.ts';
import { saveDraft } from '../lib/server/services/draft.service.ts';
import { issueEdition } from '../lib/server/services/edition.service.ts';
import { beginIntake } from '../lib/server/services/intake.service.ts';
import { feedMeasure } from '../lib/server/services/measure-feed.service.ts';
import { deskSheet } from '../lib/server/services/sheet.service.ts';
import { applyTemplate, keepTemplate } from '../lib/server/services/templates.service.ts';
import { root } from './files.mjs';
import { readIn } from './seed-sheets.ts';

const sheetName = 'Where people live in Tavaröe';
const measure = 'People';
const source = path.join(root, 'sample-data', 'tavaroe.geojson');

/**
 * A second sheet of the sample republic that shows its invented people per square kilometre, laid out by a
 * template kept from the first. Done by the services that answer people.
 * @param first number of the sheet that the template is kept from
 */
export async function seedDemoTheme(shop: Workshop, member: Member, first: number): Promise<void> {
	const template = await keepTemplate(shop, member, first, {
		...{ name: 'Sheets of the Survey Office', ratio: false, palette: true },
	});
	const number = await takeInNamed(shop, member);
	const values = peopleByKey();
	await feedMeasure(shop, member, number, measure, {
		...{ unit: '', values, mode: 'replace', confidential: false },
	});
	await showPeople(shop, member, number, values);
	const { revision } = await deskSheet(shop, member, number);
	const set = await applyTemplate(shop, member, number, { id: template, revision });
	if (set.status !== 'saved') throw new Error('the themed sheet was saved by somebody else');
	await issueEdition(shop, member, number, set.saved.revision, 'People per km², first edition.');
}

async function takeInNamed(shop: Workshop, member: Member): Promise<number> {
	const form = new FormData();
	const fields = { sheetName, keyField: 'code', nameField: 'name' };
	for (const [name, value] of Object.entries(fields)) form.set(name, value);
	form.set('file', new Blob([readFileSync(source)]), 'tavaroe.geojson');
	const request = new Request('http://localhost/', { method: 'POST', body: form });
	const { id } = await beginIntake(shop, member, request);
	return readIn(shop, member, id);
}

interface Districts {
	features: { properties: { code: string; population: number } }[];
}

function peopleByKey(): Record<string, number> {
	const { features } = JSON.parse(readFileSync(source, 'utf8')) as Districts;
	return Object.fromEntries(
		features.map(({ properties: { code, population } }) => [code, population]),
	);
}

async function showPeople(
	shop: Workshop,
	member: Member,
	number: number,
	people: Record<string, number>,
): Promise<void> {
	const { draft, revision, regions } = await deskSheet(shop, member, number);
	const asked: Theme = {
		...{ measure, per: { kind: 'area' }, isRate: false, method: 'quantiles', classes: 4 },
		...{ breaks: [], rounded: true, ramp: 'viridis', reversed: false, middle: null },
		...{ suppressBelow: null, figuresInFiles: true, title: 'People per km²' },
	};
	const values = regions.key.map((key) => people[key] ?? null);
	const ground = { values, areasKm2: regions.areaKm2, denominators: null };
	const theme = { ...asked, breaks: limitsOf(asked, ground) };
	const layout = {
		...draft.layout,
		title: 'Where people live',
		subtitle: 'Republic of Tavaröe, by district',
		groupColumn: 'province',
		credits: 'Tavaröe Survey Office. An invented country; free to use (CC0-1.0).',
	};
	const { status } = await saveDraft(shop, member, number, {
		...{ revision, document: { ...draft, theme, layout } },
	});
	if (status !== 'saved') throw new Error('the themed sheet was saved by somebody else');
}
