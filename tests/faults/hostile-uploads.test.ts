import { gunzipSync } from 'node:zlib';
import { zipSync, strToU8 } from 'fflate';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { UploadFault } from '../../src/lib/server/files/multipart.ts';
import { beginIntake, cancelIntake } from '../../src/lib/server/services/intake.service.ts';
import { draftSvg } from '../../src/lib/server/services/drawing.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import {
	createMember,
	createWorkshop,
	ingest,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'hostile', 'cartographer');
});
afterAll(() => shop.close());

const square = (x: number, y = 0) => [
	[x, y],
	[x + 1, y],
	[x + 1, y + 1],
	[x, y + 1],
	[x, y],
];
const feature = (properties: object, ring: unknown = square(0)) => ({
	type: 'Feature',
	properties,
	geometry: { type: 'Polygon', coordinates: [ring] },
});
const collection = (...features: object[]) =>
	JSON.stringify({ type: 'FeatureCollection', features });

/** Rows of every table that an upload may fill. */
async function rows(): Promise<Record<string, number>> {
	const tables = ['boundary_sets', 'regions', 'borders', 'findings', 'sheets', 'drafts'] as const;
	const counted = tables.map(async (table) => {
		const { n } = await shop.db
			.selectFrom(table)
			.select(({ fn }) => fn.countAll<number>().as('n'))
			.executeTakeFirstOrThrow();
		return [table, n];
	});
	return Object.fromEntries(await Promise.all(counted));
}

const nothing = {
	...{ boundary_sets: 0, regions: 0, borders: 0 },
	...{ findings: 0, sheets: 0, drafts: 0 },
};

const good = collection(feature({ name: 'a' }), feature({ name: 'b' }, square(1)));
const swapped = collection(
	feature(
		{ name: 'a' },
		square(0).map(([x]) => [x, 100 + x]),
	),
);
const nested = `{"type":"FeatureCollection","features":${'['.repeat(200_000)}`;
const bomb = zipSync({ 'a.shp': new Uint8Array(60_000_000), 'a.dbf': new Uint8Array(10) });
const climbing = zipSync({ '../../a.shp': strToU8('x'), '/etc/a.dbf': strToU8('x') });

const refused: [string, string, string | Uint8Array, RegExp][] = [
	[
		'cut off in the middle',
		'cut.geojson',
		good.slice(0, good.length - 40),
		/file-truncated|not-json/,
	],
	[
		'a picture',
		'a.geojson',
		new Uint8Array([137, 80, 78, 71, 13, 10, 26, 10]),
		/unsupported|not-json/,
	],
	['a page', 'a.geojson', '<!doctype html><p>no map', /unsupported|not-json/],
	['JSON of something else', 'a.json', '{"hello":"world"}', /not-geojson|no-areas|unsupported/],
	[
		'points only',
		'p.geojson',
		collection({
			type: 'Feature',
			properties: {},
			geometry: { type: 'Point', coordinates: [0, 0] },
		}),
		/no-areas/,
	],
	['no features', 'e.geojson', collection(), /no-areas|empty-file/],
	['a place that is no number', 'n.geojson', good.replace('[1,0]', '[1e999,0]'), /bad-coordinate/],
	['200,000 levels of nesting', 'nest.geojson', nested, /not-json|not-geojson/],
	['a zip that unpacks to much more', 'bomb.zip', bomb, /.+/],
	['a zip that climbs out of its folder', 'climb.zip', climbing, /.+/],
	['a zip cut off', 'cut.zip', climbing.slice(0, 40), /zip-damaged|unsupported|truncated/],
];

describe('files that are refused', () => {
	it.each(refused)(
		'%s: says why, and leaves no row and no byte',
		async (_case, name, bytes, code) => {
			const status = await ingest(shop, member, name, bytes);
			expect(status.state).toBe('refused');
			expect(status.refusal?.code).toMatch(code);
			expect(status.refusal?.message).toMatch(/^\p{Lu}.*[.?]$/su);
			expect(status.sheet).toBeNull();
			expect(await rows()).toEqual(nothing);
			expect(await shop.stored()).toEqual([]);
		},
	);
});

const doubled = collection(feature({ code: 'a' }), feature({ code: 'a' }, square(1)));
const asked: [string, string, Record<string, string>, string][] = [
	['two rows of one key', doubled, { keyField: 'code' }, 'keys'],
	['latitudes of a hundred', swapped, {}, 'axes'],
];

describe('files that somebody has to say something about', () => {
	it.each(asked)(
		'%s: asks, keeps the file alone, and leaves nothing once nobody wants it',
		async (_case, text, fields, about) => {
			const status = await ingest(shop, member, 'asked.geojson', text, fields);
			expect(status).toMatchObject({ state: 'asking', sheet: null, question: { about } });
			expect(await rows()).toEqual(nothing);
			expect(await shop.stored()).toHaveLength(1);
			await cancelIntake(shop, member, status.id);
			expect(await shop.stored()).toEqual([]);
		},
	);
});

describe('forms that are not taken', () => {
	const limit = 'MERESTONE_MAX_UPLOAD';
	beforeEach(() => void delete process.env[limit]);

	it('a file over the limit', async () => {
		process.env[limit] = '1000';
		const request = uploadRequest('big.geojson', new Uint8Array(5_000));
		await expect(beginIntake(shop, member, request)).rejects.toMatchObject({ status: 413 });
		expect(await shop.stored()).toEqual([]);
	});

	it('a file over the limit whose form does not say how long it is', async () => {
		process.env[limit] = '1000';
		const { headers, body } = uploadRequest('big.geojson', new Uint8Array(500_000));
		const request = new Request('http://localhost/', {
			...{ method: 'POST', body, duplex: 'half' },
			headers: { 'content-type': headers.get('content-type') ?? '' },
		});
		await expect(beginIntake(shop, member, request)).rejects.toMatchObject({ status: 413 });
		expect(await shop.stored()).toEqual([]);
	});

	it('no file, an empty file, another type, a form cut off', async () => {
		const form = new FormData();
		form.set('sheetName', 'Nothing');
		const whole = uploadRequest('a.geojson', good);
		const type = whole.headers.get('content-type') ?? '';
		const text = await whole.text();
		const post = (body: BodyInit, headers: HeadersInit = {}) =>
			new Request('http://localhost/', { method: 'POST', body, headers });
		const attempts = [
			post(form),
			uploadRequest('a.geojson', ''),
			post(good, { 'content-type': 'application/json' }),
			post(text.slice(0, text.length / 2), { 'content-type': type }),
			post(text, { 'content-type': 'multipart/form-data' }),
		];
		for (const request of attempts) {
			const problem = await beginIntake(shop, member, request).then(
				() => null,
				(error: unknown) => error,
			);
			expect(problem).not.toBeNull();
			if (problem instanceof UploadFault) expect([400, 413, 415]).toContain(problem.status);
			else expect(problem).toMatchObject({ code: 'empty-file' });
		}
		expect(await rows()).toEqual(nothing);
		expect(await shop.stored()).toEqual([]);
	});

	it('a field that is not known', async () => {
		const request = uploadRequest('a.geojson', good, { owner: 'me' });
		await expect(beginIntake(shop, member, request)).rejects.toMatchObject({ code: 'malformed' });
		expect(await shop.stored()).toEqual([]);
	});
});

describe('hostile names', () => {
	it('reach no file as markup and no path', async () => {
		const name = '<script>alert(1)</script>" onload="x';
		const bytes = collection(feature({ name }), feature({ name: '=1+1' }, square(1)));
		const status = await ingest(shop, member, '../../../etc/pass\u0000wd.geojson', bytes, {
			nameField: 'name',
			sheetName: '</title><script>alert(2)</script>',
		});
		expect(status.fileName).toBe('passwd.geojson');
		const { regions } = await deskSheet(shop, member, status.sheet ?? 0);
		expect(regions.name[0]).toBe(name);
		const { paint } = await draftSvg(shop, member, status.sheet ?? 0, 'typical');
		const svg = String(gunzipSync(await paint()));
		expect(svg).not.toMatch(/<script|onload="x/i);
		expect(svg).toContain('&lt;script&gt;');
	});
});
