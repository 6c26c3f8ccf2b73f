import { readFileSync } from 'node:fs';
import { buffer } from 'node:stream/consumers';
import { gunzipSync } from 'node:zlib';
import Papa from 'papaparse';
import { PNG } from 'pngjs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { verifyEdition, type EditionContent } from '../../src/lib/engines/editions/index.ts';
import { exportKinds, type ExportKindId } from '../../src/lib/engines/exports/index.ts';
import { limitsOf, type Theme } from '../../src/lib/engines/measures/index.ts';
import { noTerritories } from '../../src/lib/engines/territories/territory-draft.ts';
import { askExport } from '../../src/lib/schemas/export.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { runExport } from '../../src/lib/server/jobs/export.job.ts';
import { findSheet } from '../../src/lib/server/repositories/sheets.repository.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { draftSvg } from '../../src/lib/server/services/drawing.service.ts';
import {
	editionChanges,
	themedEditions,
} from '../../src/lib/server/services/edition-changes.service.ts';
import {
	editionFile,
	issueEdition,
	readEdition,
} from '../../src/lib/server/services/edition.service.ts';
import { askForExport, exportFileOf } from '../../src/lib/server/services/exports.service.ts';
import { feedMeasure } from '../../src/lib/server/services/measure-feed.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { saveTerritories } from '../support/planned-sheet.ts';
import { pdfText } from '../support/poppler.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';
import { zipEntries } from '../support/zip-entries.ts';

let shop: TestWorkshop;
let analyst: Member;
let designer: Member;
let approver: Member;
let keys: string[];
let sheetId: string;
/** suppressed, and like no other number of a sheet */
const secret = 31_337;
const told = 734_219;

const figures = (first = told) =>
	Object.fromEntries(
		keys
			.slice(1)
			.map((key, i) => [
				key,
				i === 0 ? secret : i === 1 ? first : 60_000 + ((i * 3_719) % 500_000),
			]),
	);
const feed = (confidential: boolean, first?: number) =>
	feedMeasure(shop, analyst, 1, 'Visits', {
		...{ unit: '', values: figures(first), mode: 'replace', confidential },
	});
const territories = (moved = 'north') => ({
	...noTerritories,
	territories: ['north', 'south'].map((key) => ({
		...{ key, name: `=${key}`, person: 'A person of Tavarø', email: 'person@example.com' },
		...{ base: null, capacity: 1, frozen: false, vacant: false, closing: false },
	})),
	assignment: { [keys[0]]: moved, [keys[1]]: 'south', [keys[2]]: 'north' },
});

beforeAll(async () => {
	shop = await createWorkshop();
	const maker = await createMember(shop.db, 'frozen', 'cartographer');
	analyst = await createMember(shop.db, 'frozen', 'analyst');
	designer = await createMember(shop.db, 'frozen', 'designer');
	approver = await createMember(shop.db, 'frozen', 'approver');
	const file = readFileSync('sample-data/tavaroe.geojson');
	await ingest(shop, maker, 'tavaroe.geojson', file, { keyField: 'code', nameField: 'name' });
	keys = (await deskSheet(shop, designer, 1)).regions.key;
	sheetId = (await findSheet(shop.db, maker.team.id, 1))!.id;
});
afterAll(() => shop.close());

const issue = async () =>
	issueEdition(shop, approver, 1, (await deskSheet(shop, approver, 1)).revision, '');
const contentOf = async (number: number) =>
	(
		await shop.db
			.selectFrom('editions')
			.select('content')
			.where('number', '=', number)
			.executeTakeFirstOrThrow()
	).content as unknown as EditionContent;

async function issued(edition: number, extension: string): Promise<Buffer> {
	const { files } = await readEdition(shop, designer, 1, edition);
	const { name } = files.find((file) => file.name.endsWith(extension))!;
	return buffer(await (await editionFile(shop, designer, 1, edition, name)).open());
}

async function taken(kind: ExportKindId, edition: number | null): Promise<Buffer> {
	const options = kind === 'png' ? { dpi: 72 } : {};
	const asked = askExport.parse({ kind, edition, options });
	const { number } = await askForExport(shop, designer, 1, asked);
	const { id } = await shop.db
		.selectFrom('exports')
		.select('id')
		.where('number', '=', number)
		.executeTakeFirstOrThrow();
	await runExport(shop, id, new AbortController().signal);
	return buffer(await (await exportFileOf(shop, designer, 1, number)).open());
}

const csvOf = (bytes: Buffer) =>
	Papa.parse<Record<string, string>>(String(bytes).replace('\ufeff', ''), {
		...{ header: true, skipEmptyLines: true },
	});
const propertiesOf = (bytes: Buffer) =>
	(
		JSON.parse(String(bytes)) as { features: { properties: Record<string, unknown> }[] }
	).features.map(({ properties }) => properties);

const base: Theme = {
	...{ measure: 'Visits', per: { kind: 'none' }, isRate: true, method: 'quantiles' },
	...{ classes: 4, breaks: [], rounded: true, ramp: 'viridis', reversed: false, middle: null },
	...{ suppressBelow: 50_000, title: 'Visits in a year' },
};
async function show(change: Partial<Theme> = {}) {
	const { draft, revision } = await deskSheet(shop, analyst, 1);
	const values = keys.map((key) => figures()[key] ?? null);
	const asked = { ...base, ...change };
	const theme = {
		...asked,
		breaks: limitsOf(asked, { values, areasKm2: [], denominators: null }),
	};
	return saveDraft(shop, analyst, 1, { revision, document: { ...draft, theme } });
}

describe('territories in editions', () => {
	it('have no columns where the sheet has none, and the content says nothing of them', async () => {
		await issue();
		expect(await contentOf(1)).not.toHaveProperty('territories');
		expect(csvOf(await issued(1, 'csv')).meta.fields).not.toContain('territory');
		expect(propertiesOf(await issued(1, 'geojson'))[0]).not.toHaveProperty('territory');
	});

	it('are frozen with it, under its digest, and written into every table', async () => {
		await saveTerritories(shop.db, sheetId, 1, territories());
		const { digest } = await issue();
		const content = await contentOf(2);
		expect(await verifyEdition(content, digest)).toBe(true);
		expect(await verifyEdition({ ...content, territories: undefined }, digest)).toBe(false);
		expect(JSON.stringify(content)).not.toMatch(/person/i);
		const { data } = csvOf(await issued(2, 'csv'));
		// OWASP, CSV Injection: a field that begins with = is led by an apostrophe
		expect(data.slice(0, 4).map((row) => [row.territory, row['territory name']])).toEqual([
			['north', "'=north"],
			['south', "'=south"],
			['north', "'=north"],
			['', ''],
		]);
		const properties = propertiesOf(await issued(2, 'geojson'));
		expect(properties[1]).toMatchObject({ territory: 'south', territoryName: '=south' });
		expect(properties[3]).toMatchObject({ territory: null, territoryName: null });
	});

	it('stay as issued while those of the draft go on; an edition before them stays without', async () => {
		await saveTerritories(shop.db, sheetId, 2, territories('south'));
		const [first, second] = [await taken('csv', 1), await taken('geojson', 2)];
		expect(csvOf(first).meta.fields).not.toContain('territory');
		expect(second.equals(await issued(2, 'geojson'))).toBe(true);
		expect(csvOf(await taken('csv', null)).data[0].territory).toBe('south');
		await issue();
		expect(await editionChanges(shop, designer, 1, 3)).toEqual({
			since: 2,
			sentences: ['1 region is in another territory.'],
		});
		expect(await editionChanges(shop, designer, 1, 1)).toEqual({ since: null, sentences: [] });
	});
});

/** Without the numbers of its lines, among which any figure may happen to be. */
const propertiesIn = (bytes: Buffer): string => {
	const { objects } = JSON.parse(String(bytes)) as {
		objects: { regions: { geometries: { properties: unknown }[] } };
	};
	return JSON.stringify(objects.regions.geometries.map(({ properties }) => properties));
};

/** Everything in a file that could be read as text, packed parts unpacked. */
function textsIn(kind: ExportKindId, bytes: Buffer): string {
	if (kind === 'pdf') return pdfText(bytes) + bytes.toString('latin1');
	if (kind === 'svgz') return String(gunzipSync(bytes));
	if (kind === 'png') {
		expect(PNG.sync.read(bytes).width).toBeGreaterThan(100);
		return bytes.toString('latin1');
	}
	if (kind === 'topojson') return propertiesIn(bytes);
	if (kind !== 'zip' && kind !== 'xlsx') return String(bytes);
	return zipEntries(bytes)
		.map(({ name, bytes: part }) => {
			const inner = exportKinds.find(({ extension }) => name.endsWith(`.${extension}`));
			return inner ? textsIn(inner.id, part) : String(part);
		})
		.join('\n');
}

const leaked = /(?<!\d)31[., \u00a0\u202f']?337(?!\d)/;

describe('figures of a themed edition', () => {
	it('stay out of files while they are confidential, whatever is asked', async () => {
		await feed(true);
		await expect(show({ figuresInFiles: true })).rejects.toMatchObject({
			code: 'confidential-figures',
		});
		await show();
		const { data, meta } = csvOf(await taken('csv', null));
		expect(meta.fields?.slice(-4)).toEqual(['class', 'range', 'territory', 'territory name']);
		expect(data[0].range).toBe('no data');
	});

	it('are carried where the theme says so, with class and range, and never a suppressed one', async () => {
		await feed(false);
		await show({ figuresInFiles: true });
		await issue();
		const content = await contentOf(4);
		expect(content.theme?.figures?.[keys[2]]).toBe(told);
		expect(content.theme?.figures).not.toHaveProperty(keys[1]);
		const { data } = csvOf(await issued(4, 'csv'));
		const value = 'value (Visits in a year)';
		expect([data[0].range, data[0][value]]).toEqual(['no data', '']);
		expect([data[1].range, data[1][value]]).toEqual(['suppressed', '']);
		expect([data[2].class, data[2][value]]).toEqual(['4', String(told)]);
	});

	it('are refused to be issued once their table is marked as confidential', async () => {
		await feed(true);
		await expect(issue()).rejects.toMatchObject({ code: 'confidential-figures' });
		expect(csvOf(await taken('csv', null)).meta.fields).not.toContain('value (Visits in a year)');
		await feed(false);
	});

	it.each(exportKinds.map(({ id }) => id))(
		'that are suppressed are in no %s, of the edition or the draft',
		{ timeout: 120_000 },
		async (kind) => {
			for (const edition of [4, null]) {
				const text = textsIn(kind, await taken(kind, edition));
				expect(text.length).toBeGreaterThan(100);
				expect(leaked.test(text)).toBe(false);
			}
		},
	);

	it('that are suppressed are in nothing that a reader is given', async () => {
		const svg = await (await draftSvg(shop, designer, 1, 'typical')).paint();
		const given = [
			JSON.stringify(await contentOf(4)),
			JSON.stringify(await deskSheet(shop, designer, 1)),
			JSON.stringify(await readEdition(shop, designer, 1, 4)),
			JSON.stringify(await themedEditions(shop, designer, 1)),
			JSON.stringify(await editionChanges(shop, designer, 1, 4)),
			String(gunzipSync(svg)),
			String(await issued(4, 'svg')),
			String(await issued(4, 'geojson')),
		];
		for (const text of given) expect(leaked.test(text)).toBe(false);
		// the search itself is able to find a figure
		expect(String(await issued(4, 'geojson'))).toMatch(/734219/);
	});
});

describe('figures that change after an edition was issued', () => {
	it('are told on its page, and the edition keeps its own', async () => {
		await issue();
		const [last] = await themedEditions(shop, designer, 1);
		expect(last).toMatchObject({ number: 5, measure: 'Visits', since: { state: 'same' } });
		expect(last.figuresAt).toMatch(/^\d{4}-/);
		await feed(false, 100_001);
		const [again, earlier] = await themedEditions(shop, designer, 1);
		expect(again).toMatchObject({ figuresAt: last.figuresAt, since: { state: 'replaced' } });
		expect(earlier).toMatchObject({ number: 4, since: { state: 'replaced' } });
		expect(propertiesOf(await taken('geojson', 5))[2].value).toBe(told);
		expect(propertiesOf(await taken('geojson', null))[2].value).toBe(100_001);
	});

	it('are told from one edition to the next', async () => {
		await issue();
		const { sentences } = await editionChanges(shop, designer, 1, 6);
		expect(sentences).toEqual([
			'1 region is in another class.',
			'The figures are others in 1 region.',
		]);
		await shop.db.deleteFrom('measures').execute();
		const notes = await themedEditions(shop, designer, 1);
		expect(notes.map(({ since }) => since.state)).toEqual(['gone', 'gone', 'gone']);
	});
});
