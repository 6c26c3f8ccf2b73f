import { readFileSync } from 'node:fs';
import { buffer } from 'node:stream/consumers';
import { gunzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { verifyEdition, type EditionContent } from '../../src/lib/engines/editions/index.ts';
import { limitsOf, type Theme } from '../../src/lib/engines/measures/index.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { exportGround } from '../../src/lib/server/services/export-ground.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { draftSvg } from '../../src/lib/server/services/drawing.service.ts';
import {
	editionFile,
	issueEdition,
	readEdition,
} from '../../src/lib/server/services/edition.service.ts';
import { feedMeasure } from '../../src/lib/server/services/measure-feed.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { themeMeasures } from '../../src/lib/server/services/theme-figures.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let maker: Member;
let analyst: Member;
let designer: Member;
let approver: Member;
let keys: string[];
/** a figure that nothing else on a sheet could be taken for */
const telltale = 734_219;
const small = 3;

/** One region without a figure, one with a small count, one with the telltale. */
const figures = (most = telltale) =>
	Object.fromEntries(
		keys.slice(1).map((key, i) => [key, i === 0 ? small : i === 1 ? most : 20 + ((i * 97) % 500)]),
	);
const feed = (most?: number) =>
	feedMeasure(shop, analyst, 1, 'Visits', {
		...{ unit: '', values: figures(most), mode: 'replace', confidential: true },
	});

const theme: Theme = {
	measure: 'Visits',
	per: { kind: 'none' },
	isRate: true,
	method: 'quantiles',
	classes: 4,
	breaks: [],
	rounded: true,
	ramp: 'viridis',
	reversed: false,
	middle: null,
	suppressBelow: 5,
	title: 'Visits in a year',
};

beforeAll(async () => {
	shop = await createWorkshop();
	maker = await createMember(shop.db, 'themes', 'cartographer', 'analyst');
	analyst = await createMember(shop.db, 'themes', 'analyst');
	designer = await createMember(shop.db, 'themes', 'designer');
	approver = await createMember(shop.db, 'themes', 'approver');
	const file = readFileSync('sample-data/tavaroe.geojson');
	await ingest(shop, maker, 'tavaroe.geojson', file, { keyField: 'code', nameField: 'name' });
	keys = (await deskSheet(shop, designer, 1)).regions.key;
	await feed();
});
afterAll(() => shop.close());

async function put(member: Member, change: Partial<Theme> | null) {
	const { draft, revision } = await deskSheet(shop, member, 1);
	const next = change && { ...theme, ...change };
	return saveDraft(shop, member, 1, { revision, document: { ...draft, theme: next } });
}
async function madeTheme(change: Partial<Theme> = {}): Promise<Theme> {
	const values = keys.map((key) => figures()[key] ?? null);
	const asked = { ...theme, ...change };
	return { ...asked, breaks: limitsOf(asked, { values, areasKm2: [], denominators: null }) };
}

describe('a theme', () => {
	it('is saved by whoever may edit it, about a measure that is there', async () => {
		await expect(put(designer, {})).rejects.toBeInstanceOf(Forbidden);
		await expect(put(approver, {})).rejects.toBeInstanceOf(Forbidden);
		await expect(put(analyst, { measure: 'Hours' })).rejects.toMatchObject({
			code: 'unknown-measure',
		});
		expect((await put(analyst, await madeTheme())).status).toBe('saved');
	});

	it('is seen by everybody as classes, and by who may not read figures without one of them', async () => {
		expect(await themeMeasures(shop, designer, 1)).toBeNull();
		expect((await themeMeasures(shop, analyst, 1))?.[0].values).toContain(telltale);
		const sheet = await deskSheet(shop, designer, 1);
		expect(sheet.theme).toMatchObject({ told: 4, trouble: null, holds: true });
		expect(sheet.theme?.classes.slice(0, 3)).toEqual([4, 5, 3]);
		expect(sheet.theme?.inks.map(({ name }) => name).slice(4)).toEqual(['no data', 'suppressed']);
		expect(sheet.measures).toBeNull();
		expect(JSON.stringify(sheet)).not.toContain(String(telltale));
	});

	it('is drawn in place of the colouring, hatched where nothing is told', async () => {
		const drawn = await draftSvg(shop, designer, 1, 'typical');
		const svg = String(gunzipSync(await drawn.paint()));
		expect(svg).toContain('Visits in a year');
		expect(svg).toContain('suppressed');
		expect(svg).not.toMatch(/734.?219/);
		await put(analyst, null);
		const plain = await draftSvg(shop, designer, 1, 'typical');
		expect(plain.tag).not.toBe(drawn.tag);
		await put(analyst, await madeTheme());
	});
});

describe('a themed edition', () => {
	const issue = async () =>
		issueEdition(shop, approver, 1, (await deskSheet(shop, approver, 1)).revision, '');
	const content = async (number: number) =>
		(
			await shop.db
				.selectFrom('editions')
				.selectAll()
				.where('number', '=', number)
				.executeTakeFirstOrThrow()
		).content as unknown as EditionContent;

	it('freezes classes, limits and the date of the figures, and holds no figure', async () => {
		const { digest } = await issue();
		const issued = await content(1);
		expect(await verifyEdition(issued, digest)).toBe(true);
		expect(issued.theme?.classes[keys[0]]).toBe(4);
		expect(issued.theme?.classes[keys[1]]).toBe(5);
		expect(issued.theme?.classes[keys[2]]).toBe(3);
		expect(issued.theme?.figuresAt).toMatch(/^\d{4}-/);
		expect(JSON.stringify(issued)).not.toContain(String(telltale));
	});

	it('has files with class and range, and no figure', async () => {
		const { files } = await readEdition(shop, designer, 1, 1);
		for (const { name } of files) {
			const { open } = await editionFile(shop, designer, 1, 1, name);
			const text = String(await buffer(await open()));
			expect(text).not.toMatch(/734.?219/);
			if (!name.endsWith('.csv')) continue;
			const [head, first, second, third] = text.replace('\ufeff', '').split('\r\n');
			expect(head).toMatch(/,class,range$/);
			expect(first).toMatch(/,,no data$/);
			expect(second).toMatch(/,,suppressed$/);
			expect(third).toMatch(/,4,over /);
		}
	});

	it('stays as issued when the figures change, which the draft is told of', async () => {
		await feed(21);
		const sheet = await deskSheet(shop, designer, 1);
		expect(sheet.theme?.holds).toBe(false);
		expect(sheet.theme?.note).toContain('limits kept from earlier figures');
		expect(sheet.theme?.classes[2]).toBe(0);
		const { id } = await shop.db.selectFrom('sheets').select('id').executeTakeFirstOrThrow();
		const again = await exportGround(shop.db, { id }, { edition: 1, revision: 0 });
		expect(again.theme?.classes[2]).toBe(3);
	});

	it('is refused once its measure is gone', async () => {
		await shop.db.deleteFrom('measures').execute();
		expect((await deskSheet(shop, designer, 1)).theme).toMatchObject({ trouble: 'gone' });
		await expect(issue()).rejects.toMatchObject({ code: 'theme-without-figures' });
		await put(analyst, null);
		await issue();
		expect((await content(2)).theme).toBeUndefined();
	});
});
