import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join as joinPath } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { errorBody } from '../../src/lib/schemas/api/common.ts';
import { operations } from '../../src/lib/schemas/api/operations.ts';
import * as recuts from '../../src/lib/schemas/api/recuts.ts';
import * as sheets from '../../src/lib/schemas/api/sheets.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { scopes, type Scope } from '../../src/lib/server/access/scopes.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import { closeWorkshop, workshop } from '../../src/lib/server/jobs/workshop.ts';
import { createToken } from '../../src/lib/server/services/tokens.service.ts';
import { callApi } from '../support/api.ts';
import { join, newTeam, openHouse } from '../support/house.ts';
import { after, plotsFile, plotsSheet, readOut } from '../support/recut-sheets.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let data: string;
let cartographer: Member;
let tokens: Record<'all' | 'read' | 'other', string>;
let sheet: number;
beforeAll(async () => {
	house = await openHouse();
	data = mkdtempSync(joinPath(tmpdir(), 'merestone-'));
	process.env.MERESTONE_DATA = data;
	const { team, admin } = await newTeam(house.db, 'Boundaries');
	cartographer = await join(house.db, team, 'cartographer');
	sheet = await plotsSheet(workshop(), cartographer);
	const stranger = (await newTeam(house.db, 'Strangers')).admin;
	const make = (by: Member, held: Scope[]) =>
		createToken(by, { name: 'Feed', scopes: held, days: 1 });
	tokens = {
		all: await make(admin, [...scopes]),
		read: await make(admin, ['sheets:read']),
		other: await make(stranger, [...scopes]),
	};
});
afterAll(async () => {
	await closeWorkshop();
	await house.close();
	rmSync(data, { recursive: true, force: true });
});

type Held = keyof typeof tokens;
const bearer = (held: Held) => ({ authorization: `Bearer ${tokens[held]}` });
const get = (path: string, held: Held = 'all') => callApi(path, { headers: bearer(held) });
const post = (path: string, body: unknown = {}, held: Held = 'all') =>
	callApi(path, {
		method: 'POST',
		headers: { ...bearer(held), 'content-type': 'application/json' },
		body: JSON.stringify(body),
	});
function send(path: string, fields: Record<string, string>, file: string, held: Held = 'all') {
	const body = new FormData();
	for (const [name, value] of Object.entries(fields)) body.set(name, value);
	body.set('file', new Blob([file]), 'later.geojson');
	return callApi(path, { method: 'POST', headers: bearer(held), body });
}
async function answer<S extends z.ZodType>(response: Promise<Response>, status: number, schema: S) {
	const answered = await response;
	const body = await answered.json();
	expect([answered.status, body]).toEqual([status, body]);
	return schema.parse(body);
}
async function fault(response: Promise<Response>) {
	const answered = await response;
	return { status: answered.status, ...errorBody.parse(await answered.json()).error };
}
const all = () => `/sheets/${sheet}/recuts`;

describe('re-cuts over the API', () => {
	it('a file is sent, followed, and read with what it changes', async () => {
		const begun = await send(all(), { keyField: 'code' }, plotsFile(after));
		expect(begun.headers.get('location')).toBe(`/api/v1${all()}/1`);
		expect(await answer(Promise.resolve(begun), 202, recuts.recutBegun)).toEqual({ number: 1 });
		const waiting = await answer(get(`${all()}/1`, 'read'), 200, recuts.recutDetail);
		expect(waiting).toMatchObject({ state: 'waiting', change: null });
		await readOut(workshop(), cartographer, sheet, 1);
		const ready = await answer(get(`${all()}/1`, 'read'), 200, recuts.recutDetail);
		// by construction: see tests/support/recut-sheets.ts
		expect(ready.change?.counts).toMatchObject({
			kept: 4,
			renamed: 1,
			split: 1,
			merged: 2,
			new: 1,
			gone: 1,
		});
		const { recuts: list } = await answer(get(all(), 'read'), 200, recuts.recutList);
		expect(list.map(({ number, state }) => [number, state])).toEqual([[1, 'ready']]);
	});

	it('is applied to the revision that was seen, and put back', async () => {
		const old = await fault(post(`${all()}/1/apply`, { revision: 7 }));
		expect(old).toMatchObject({ status: 409, code: 'saved-meanwhile' });
		const applied = await answer(post(`${all()}/1/apply`, { revision: 1 }), 200, recuts.recutDone);
		expect(applied).toEqual({ revision: 2 });
		const detail = await answer(get(`/sheets/${sheet}`), 200, sheets.sheetDetail);
		expect(detail.regions.map(({ key }) => key)).toContain('b2');
		expect(await fault(post(`${all()}/1/drop`))).toMatchObject({ status: 409 });
		await answer(post(`${all()}/1/put-back`), 200, recuts.recutDone);
		await answer(post(`${all()}/1/drop`), 200, recuts.recutEnded);
		expect(await answer(get(all()), 200, recuts.recutList)).toEqual({ recuts: [] });
	});

	it('refuses in the one shape what is malformed', async () => {
		const field = await fault(send(all(), { colour: 'red' }, plotsFile(after)));
		expect(field).toMatchObject({ status: 400, code: 'malformed' });
		expect(await fault(send(all(), {}, ''))).toMatchObject({ status: 422, code: 'empty-file' });
		expect(await fault(post(`${all()}/9/apply`))).toMatchObject({ status: 404 });
		expect(await fault(post(`${all()}/1/apply`, { when: 'now' }))).toMatchObject({ status: 400 });
		expect(await fault(post(`${all()}/zero/drop`))).toMatchObject({ status: 404 });
	});

	it('is closed without the scope, and to another team', async () => {
		const routes = Object.values(operations).filter(({ path }) => path.includes('/recuts'));
		for (const { method, path } of routes) {
			const at = path.replace('{sheet}', String(sheet)).replace('{recut}', '1');
			const call = (held: Held) => (method === 'GET' ? get(at, held) : post(at, {}, held));
			if (method === 'POST') expect(await fault(call('read')), at).toMatchObject({ status: 403 });
			const theirs = method === 'POST' && at === all() ? send(at, {}, 'x', 'other') : call('other');
			expect((await theirs).status, at).toBe(404);
		}
	});
});

describe('a question over the API', () => {
	/** Metres somewhere: RFC 7946 knows degrees only, so nothing in the file says where. */
	const metres = plotsFile([['a', 5e7, 5e7, 5.01e7, 5.01e7]]);

	it('is told with its choices and answered', async () => {
		const sent = await answer(send('/sheets', {}, metres), 202, sheets.intake);
		await runIntake(workshop(), sent.id, new AbortController().signal);
		const path = `/intakes/${sent.id}`;
		const asked = await answer(get(path, 'read'), 200, sheets.intake);
		expect(asked).toMatchObject({ state: 'asking', question: { about: 'crs', free: true } });
		expect(await fault(post(`${path}/answer`, { typed: 'EPSG:32632' }, 'read'))).toMatchObject({
			status: 403,
		});
		expect(await fault(post(`${path}/answer`, { typed: 'x' }, 'other'))).toMatchObject({
			status: 404,
		});
		expect(await fault(post(`${path}/answer`, { choice: 'x' }))).toMatchObject({ status: 422 });
		const taken = await answer(post(`${path}/answer`, { typed: 'EPSG:32632' }), 202, sheets.intake);
		expect(taken).toMatchObject({ state: 'waiting', question: null });
		await runIntake(workshop(), sent.id, new AbortController().signal);
		expect(await answer(get(path), 200, sheets.intake)).toMatchObject({ state: 'done' });
	});
});
