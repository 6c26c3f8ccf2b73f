import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join as joinPath } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { errorBody } from '../../src/lib/schemas/api/common.ts';
import { operations, type Operation } from '../../src/lib/schemas/api/operations.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { scopes, type Scope } from '../../src/lib/server/access/scopes.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import { closeWorkshop, workshop } from '../../src/lib/server/jobs/workshop.ts';
import { issueEdition } from '../../src/lib/server/services/edition.service.ts';
import { limits } from '../../src/lib/server/services/limits.service.ts';
import { createToken } from '../../src/lib/server/services/tokens.service.ts';
import { callApi } from '../support/api.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { join, newTeam, openHouse } from '../support/house.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let data: string;
let admin: Member;
let approver: Member;
let token: string;
beforeAll(async () => {
	house = await openHouse();
	data = mkdtempSync(joinPath(tmpdir(), 'merestone-'));
	process.env.MERESTONE_DATA = data;
	const made = await newTeam(house.db, 'Pipeline');
	admin = made.admin;
	approver = await join(house.db, made.team, 'approver');
	token = await tokenFor(admin, [...scopes]);
});
afterAll(async () => {
	await closeWorkshop();
	await house.close();
	rmSync(data, { recursive: true, force: true });
});

const tokenFor = (member: Member, held: Scope[]) =>
	createToken(member, { name: 'Test', scopes: held, days: 1 });
const bearer = (text = token) => ({ authorization: `Bearer ${text}` });
const get = (path: string, held = token) => callApi(path, { headers: bearer(held) });
const sendJson = (path: string, body: unknown, method = 'POST') =>
	callApi(path, {
		method,
		headers: { ...bearer(), 'content-type': 'application/json' },
		body: typeof body === 'string' ? body : JSON.stringify(body),
	});
function sendFile(path: string, bytes: Uint8Array | string, fields: Record<string, string> = {}) {
	const form = new FormData();
	for (const [name, value] of Object.entries(fields)) form.set(name, value);
	form.set('file', new Blob([bytes as Uint8Array<ArrayBuffer>]), 'file.geojson');
	return callApi(path, { method: 'POST', headers: bearer(), body: form });
}

/** An answer by the schema that the API's own description shows; a field too many fails. */
async function answer<S extends z.ZodType>(
	response: Response | Promise<Response>,
	operation: Omit<Operation, 'answer'> & { answer: S },
): Promise<z.output<S>> {
	const { status, body } = await read(await response);
	expect([status, body]).toEqual([operation.status, body]);
	return operation.answer.parse(body);
}

async function fault(response: Promise<Response>) {
	const { status, body } = await read(await response);
	return { status, ...errorBody.parse(body).error };
}

async function read(response: Response) {
	expect(response.headers.get('content-type')).toBe('application/json');
	return { status: response.status, body: await response.json() };
}

const states = bytesOf(conterminousStates());

describe('who may call', () => {
	it('nobody without a token that works', async () => {
		const headers: HeadersInit[] = [
			{},
			{ authorization: 'Bearer merestone_no' },
			{ authorization: 'x' },
		];
		for (const header of headers) {
			const response = await callApi('/sheets', { headers: header });
			expect(response.headers.get('www-authenticate')).toBe('Bearer');
			expect(response.status).toBe(401);
			errorBody.parse(await response.json());
		}
	});

	it('only within the scope', async () => {
		const held = await tokenFor(admin, ['palette:check']);
		expect(await fault(get('/sheets', held))).toMatchObject({
			...{ status: 403, code: 'scope-missing', details: { scope: 'sheets:read' } },
		});
	});

	it('600 times a minute, then is told when to come back', async () => {
		const held = await tokenFor(admin, ['sheets:read']);
		expect((await get('/sheets', held)).status).toBe(200);
		await house.db
			.updateTable('rate_limits')
			.set({ hits: limits.callsByToken.uses })
			.where('key', 'like', 'calls:%')
			.execute();
		const response = await get('/sheets', held);
		expect(response.status).toBe(429);
		const wait = Number(response.headers.get('retry-after'));
		expect(wait).toBeGreaterThan(0);
		expect(wait).toBeLessThanOrEqual(60);
		await house.db.deleteFrom('rate_limits').execute();
	});
});

describe('every route', () => {
	const values: Record<string, string> = {
		...{ sheet: '999', edition: '1', file: 'x', intake: 'x' },
		...{ measure: 'x', handover: '1', proposal: '1', recut: '1' },
	};
	const paths = [...new Set(Object.values(operations).map(({ path }) => path))];

	it.each(paths)('%s refuses another method in the one shape', async (path) => {
		const at = path.replace(/\{(\w+)\}/g, (_, name) => values[name]);
		const response = await callApi(at, { method: 'DELETE', headers: bearer() });
		expect(response.status).toBe(405);
		const allowed = Object.values(operations).filter((one) => one.path === path);
		expect(response.headers.get('allow')).toBe(allowed.map(({ method }) => method).join(', '));
		errorBody.parse(await response.json());
	});

	const readable = Object.values(operations).filter(({ method }) => method === 'GET');
	const things = readable.map(({ path }) => path).filter((path) => path.includes('{'));
	it.each(things)('%s knows no other thing', async (path) => {
		const at = path.replace(/\{(\w+)\}/g, (_, name) => values[name]);
		expect(await fault(get(at))).toMatchObject({ status: 404, code: 'not-found' });
	});

	it('that is none answers 404 in the same shape', async () => {
		expect(await fault(get('/no/such/route'))).toMatchObject({ status: 404 });
	});
});

describe('POST /check/boundaries', () => {
	it('reads regions, borders and findings, and keeps nothing', async () => {
		const found = await answer(
			sendFile('/check/boundaries', states, { keyField: 'id', nameField: 'name' }),
			operations.checkBoundaries,
		);
		// the contiguous-USA graph: Knuth, TAOCP 4 fascicle 0; the four-state corner has two touches
		expect(found.regions).toHaveLength(49);
		expect(found.borders.filter(({ kind }) => kind === 'line')).toHaveLength(107);
		expect(found.borders.filter(({ kind }) => kind === 'point')).toHaveLength(2);
		expect(found.planar).toBe(true);
		for (const { a, b } of found.borders) expect(a < b).toBe(true);
		const { n } = await house.db
			.selectFrom('boundary_sets')
			.select(({ fn }) => fn.countAll<number>().as('n'))
			.executeTakeFirstOrThrow();
		expect(n).toBe(0);
	});

	it('refuses a file with the reason and its findings', async () => {
		const problem = await fault(sendFile('/check/boundaries', '{"type":"FeatureCollection"'));
		expect(problem.status).toBe(422);
		expect(problem.details?.findings).toBeInstanceOf(Array);
	});

	it('names a field it does not know, and asks for a form', async () => {
		expect(await fault(sendFile('/check/boundaries', states, { colour: 'red' }))).toMatchObject({
			...{ status: 400, code: 'unknown-field', details: { fields: ['colour'] } },
		});
		expect(await fault(sendJson('/check/boundaries', {}))).toMatchObject({ status: 415 });
	});
});

describe('POST /check/colouring', () => {
	const ring = (count: number) => ({
		regions: Array.from({ length: count }, (_, i) => `r${i}`),
		borders: Array.from({ length: count }, (_, i) => [`r${i}`, `r${(i + 1) % count}`]),
		inks: 'fewest',
	});
	const colour = (body: object) =>
		answer(sendJson('/check/colouring', body), operations.checkColouring);

	it('colours an odd ring with three inks and shows the ring', async () => {
		// chromatic number of an odd cycle is 3 (common knowledge; D. König 1936 for the even case, 2)
		const found = await colour(ring(7));
		if (found.status !== 'coloured') throw new Error(found.status);
		expect(found).toMatchObject({ inksUsed: 3, lowerBound: 3, proof: { kind: 'odd-cycle' } });
		expect(Object.keys(found.colouring)).toHaveLength(7);
		expect(await colour(ring(8))).toMatchObject({ status: 'coloured', inksUsed: 2 });
	});

	it('explains locks that collide, and releases the cheapest', async () => {
		const found = await colour({
			...ring(4),
			inks: 2,
			locks: { r0: 0, r1: 0 },
			lockCosts: { r1: 5 },
		});
		if (found.status !== 'impossible') throw new Error(found.status);
		expect([...found.explanation.locks].sort()).toEqual(['r0', 'r1']);
		expect(found.explanation.release).toMatchObject({ locks: ['r0'], cost: 1, proved: true });
		expect(found.explanation.message).toContain('r0');
	});

	it('takes any key, those of the language itself included', async () => {
		const regions = ['constructor', 'toString', 'hasOwnProperty'];
		const borders = [[regions[0], regions[1]]];
		const found = await colour({ regions, borders, inks: 2, locks: { toString: 1 } });
		expect(found).toMatchObject({ colouring: { constructor: 0, toString: 1 } });
	});

	it('keeps groups alike or different, and reserved inks from regions without their lock', async () => {
		const regions = ['a', 'b', 'c', 'd', 'e'];
		const found = await colour({
			...{ regions, borders: [['a', 'b']], inks: 'fewest', reserved: [0], locks: { e: 0 } },
			groups: [
				{ kind: 'alike', name: 'North', keys: ['a', 'c'] },
				{ kind: 'different', keys: ['b', 'c', 'd', 'e'] },
			],
		});
		if (found.status !== 'coloured') throw new Error(found.status);
		const { a, b, c, d, e } = found.colouring;
		expect([a, e, new Set([b, c, d, e]).size]).toEqual([c, 0, 4]);
		expect(found).toMatchObject({ inksUsed: 4, lowerBound: 4 });
		const none = await colour({ ...ring(2), inks: 2, reserved: [1] });
		if (none.status !== 'impossible') throw new Error(none.status);
		expect(none.explanation.rules).toContainEqual({ kind: 'reserved', region: 'r0', ink: 1 });
	});

	it.each([
		['no JSON', '{"regions":', 'malformed'],
		[
			'a group with a stranger',
			{ ...ring(3), groups: [{ kind: 'alike', keys: ['r0', 'x'] }] },
			'malformed',
		],
		['a group of one', { ...ring(3), groups: [{ kind: 'different', keys: ['r0'] }] }, 'malformed'],
		['a field not known', { ...ring(3), color: 1 }, 'unknown-field'],
		['a border of nobody', { ...ring(3), borders: [['r0', 'x']] }, 'malformed'],
		['a border with itself', { ...ring(3), borders: [['r0', 'r0']] }, 'malformed'],
		['a region twice', { regions: ['a', 'a'], borders: [], inks: 1 }, 'malformed'],
		['no inks', { ...ring(3), inks: 0 }, 'malformed'],
		['half an ink', { ...ring(3), locks: { r0: 0.5 } }, 'malformed'],
		['lengths for other borders', { ...ring(3), lengths: [1] }, 'malformed'],
	])('refuses %s', async (_case, body, code) => {
		expect(await fault(sendJson('/check/colouring', body))).toMatchObject({ status: 400, code });
	});

	it('refuses another type and too much', async () => {
		const init = {
			method: 'POST',
			headers: { ...bearer(), 'content-type': 'text/plain' },
			body: '{}',
		};
		expect(await fault(callApi('/check/colouring', init))).toMatchObject({ status: 415 });
		const much = `"${'x'.repeat(33 * 1024 * 1024)}"`;
		expect(await fault(sendJson('/check/colouring', much))).toMatchObject({ status: 413 });
	});
});

describe('POST /check/proof', () => {
	const check = (body: unknown) => answer(sendJson('/check/proof', body), operations.checkProof);
	const ring = {
		form: 'merestone proof 1',
		regions: [{ key: 'a' }, { key: 'b' }, { key: 'c' }],
		borders: [
			[0, 1],
			[1, 2],
			[0, 2],
		],
		rules: { locks: [], forbidden: [], alike: [], apart: [], reserved: [] },
		claims: [{ claim: 'inks do not', inks: 2, evidence: { kind: 'odd ring', regions: [0, 1, 2] } }],
	};

	it('shows what holds and says what does not', async () => {
		expect(await check(ring)).toMatchObject({ valid: true, faults: [] });
		const open = await check({ ...ring, borders: ring.borders.slice(1) });
		expect(open).toMatchObject({ valid: false, claims: [] });
		expect(open.faults[0]).toContain('do not border');
	});

	it('answers hostile files with a fault, and bodies that are no JSON with 400', async () => {
		for (const body of [[], 7, null, { form: 'merestone proof 2' }, { ...ring, more: 1 }]) {
			expect(await check(body)).toMatchObject({ valid: false, claims: [] });
		}
		const sly = await check(JSON.stringify(ring).replace('{', '{"__proto__":{"claims":[]},'));
		expect(sly.valid).toBe(false);
		expect(await fault(sendJson('/check/proof', '{"form":'))).toMatchObject({ status: 400 });
	});
});

describe('POST /check/palette', () => {
	it('judges every touching pair for every reader, and mends', async () => {
		const found = await answer(
			sendJson('/check/palette', {
				inks: ['#cc3311', '#cc3312', '#ffffff'],
				mend: true,
				locked: [2],
			}),
			operations.checkPalette,
		);
		expect(found.passes).toBe(false);
		expect(found.pairs).toHaveLength(3 * 5);
		expect(found.labels).toHaveLength(3);
		expect(found.mend?.status).toBe('mended');
		expect(found.mend?.inks[2]).toBe('#ffffff');
	});

	it('asks only about the pairs that touch', async () => {
		const body = { inks: ['#ff0000', '#0000ff', '#ff0001'], touching: [[1, 0]] };
		const found = await answer(sendJson('/check/palette', body), operations.checkPalette);
		expect(found.pairs.map(({ a, b }) => [a, b])).toEqual(Array(5).fill([0, 1]));
		expect(found.mend).toBeNull();
	});

	it.each([
		['no colour', { inks: ['red'] }],
		['an ink that is not there', { inks: ['#ff0000'], touching: [[0, 1]] }],
		['a lock on none', { inks: ['#ff0000'], locked: [3] }],
	])('refuses %s', async (_case, body) => {
		expect(await fault(sendJson('/check/palette', body))).toMatchObject({ status: 400 });
	});
});

describe('the team’s sheets', () => {
	it('are uploaded, followed and read', async () => {
		const response = await sendFile('/sheets', states, { sheetName: 'States', keyField: 'id' });
		const intake = await answer(response, operations.uploadSheet);
		expect(response.headers.get('location')).toBe(`/api/v1/intakes/${intake.id}`);
		expect(intake).toMatchObject({ state: 'waiting', sheet: null });
		await runIntake(workshop(), intake.id, new AbortController().signal);
		const done = await answer(get(`/intakes/${intake.id}`), operations.readIntake);
		expect(done).toMatchObject({ state: 'done', sheet: 1 });
		const { sheets } = await answer(get('/sheets'), operations.listSheets);
		expect(sheets).toMatchObject([{ number: 1, name: 'States', regionCount: 49, inksUsed: 4 }]);
		const sheet = await answer(get('/sheets/1'), operations.readSheet);
		expect(sheet.regions).toHaveLength(49);
		const { borders } = await answer(get('/sheets/1/borders'), operations.readBorders);
		// point touches do not bind until the sheet says so
		expect(borders).toHaveLength(107);
		const csv = await get('/sheets/1/borders/borders.csv');
		expect(csv.headers.get('content-type')).toMatch(/^text\/csv/);
		// a heading, 107 lines and 2 point touches
		expect((await csv.text()).trim().split('\r\n')).toHaveLength(110);
		const col = await get('/sheets/1/borders/borders.col');
		expect(await col.text()).toContain('\np edge 49 107\n');
		expect((await get('/sheets/1/borders/borders.txt')).status).toBe(404);
		const proof = await (await get('/sheets/1/proof')).json();
		const checked = await answer(sendJson('/check/proof', proof), operations.checkProof);
		expect(checked).toMatchObject({ valid: true, faults: [], gaveUp: false });
		expect(checked.claims).toHaveLength(2);
		const colouring = await answer(get('/sheets/1/colouring'), operations.readColouring);
		expect(colouring).toMatchObject({
			status: 'coloured',
			inksUsed: 4,
			proof: { kind: 'odd-wheel' },
		});
	});

	it('have rules that are saved by revision', async () => {
		const rules = await answer(get('/sheets/1/rules'), operations.readRules);
		const locks = { '32': { ink: 3, cost: 1 } };
		const sent = { revision: rules.revision, document: { ...rules.document, locks } };
		const saved = await answer(sendJson('/sheets/1/rules', sent, 'PUT'), operations.saveRules);
		expect(saved.revision).toBe(rules.revision + 1);
		const stale = await fault(sendJson('/sheets/1/rules', sent, 'PUT'));
		expect(stale).toMatchObject({ status: 409, code: 'stale', details: { revision: 2 } });
		const now = await answer(get('/sheets/1/rules'), operations.readRules);
		expect(now.document.locks['32']).toMatchObject({ ink: 3, by: 'Test' });
		const unknown = {
			revision: 2,
			document: { ...now.document, locks: { nowhere: { ink: 0, cost: 1 } } },
		};
		expect(await fault(sendJson('/sheets/1/rules', unknown, 'PUT'))).toMatchObject({
			...{ status: 422, code: 'unknown-region' },
		});
		expect(await fault(sendJson('/sheets/1/rules', { ...sent, extra: 1 }, 'PUT'))).toMatchObject({
			...{ status: 400, code: 'unknown-field', details: { fields: ['extra'] } },
		});
	});

	it('have rules that go out and come in as a table', async () => {
		const table = await get('/sheets/1/rules.csv');
		expect(table.headers.get('content-type')).toMatch(/^text\/csv/);
		const text = await table.text();
		expect(text.split('\r\n')[1]).toMatch(/^lock,32,/);
		const put = (body: string, type = 'text/csv') =>
			callApi('/sheets/1/rules.csv', {
				...{ method: 'PUT', body },
				headers: { ...bearer(), 'content-type': type },
			});
		const saved = await answer(put(text), operations.saveRulesTable);
		expect(saved.revision).toBe(2);
		expect(await fault(put('rule,region,ink\nlock,x,1'))).toMatchObject({
			...{ status: 422, code: 'unfit-rules' },
			details: { faults: [{ row: 2, words: 'there is no region “x”' }] },
		});
		expect(await fault(put(text, 'text/plain'))).toMatchObject({ status: 415 });
	});

	it('have editions whose files are those that were issued', async () => {
		await issueEdition(workshop(), approver, 1, 2, 'By hand');
		const { editions } = await answer(get('/sheets/1/editions'), operations.listEditions);
		expect(editions).toMatchObject([{ number: 1, note: 'By hand' }]);
		const edition = await answer(get('/sheets/1/editions/1'), operations.readEdition);
		for (const file of edition.files) {
			const response = await get(`/sheets/1/editions/1/files/${file.name}`);
			expect(response.status).toBe(200);
			expect(response.headers.get('content-type')).toBe(file.mediaType);
			expect((await response.arrayBuffer()).byteLength).toBe(file.bytes);
			const tag = response.headers.get('etag') ?? '';
			const again = await callApi(`/sheets/1/editions/1/files/${file.name}`, {
				headers: { ...bearer(), 'if-none-match': tag },
			});
			expect(again.status).toBe(304);
		}
	});

	it('are unknown to another team’s token', async () => {
		const stranger = await tokenFor((await newTeam(house.db, 'Elsewhere')).admin, [...scopes]);
		expect(await (await get('/sheets', stranger)).json()).toEqual({ sheets: [] });
		for (const path of ['', '/borders', '/colouring', '/rules', '/editions', '/editions/1']) {
			expect((await get(`/sheets/1${path}`, stranger)).status).toBe(404);
		}
		const [{ id }] = await house.db.selectFrom('intakes').select('id').execute();
		expect((await get(`/intakes/${id}`, stranger)).status).toBe(404);
	});

	it('are not made of what is no map', async () => {
		expect(await fault(sendFile('/sheets', ''))).toMatchObject({ status: 422, code: 'empty-file' });
		expect(await fault(sendFile('/sheets', states, { sheet: 'x' }))).toMatchObject({ status: 400 });
		const sample = readFileSync('sample-data/README.md');
		const intake = await answer(sendFile('/sheets', sample), operations.uploadSheet);
		await runIntake(workshop(), intake.id, new AbortController().signal);
		const refused = await answer(get(`/intakes/${intake.id}`), operations.readIntake);
		expect(refused).toMatchObject({ state: 'refused', sheet: null });
	});
});
