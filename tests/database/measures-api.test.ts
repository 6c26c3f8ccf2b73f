import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join as joinPath } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { errorBody } from '../../src/lib/schemas/api/common.ts';
import { measureDetail, measureKept, measureList } from '../../src/lib/schemas/api/measures.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { scopes, type Scope } from '../../src/lib/server/access/scopes.ts';
import { closeWorkshop, workshop } from '../../src/lib/server/jobs/workshop.ts';
import { measureTables } from '../../src/lib/server/services/measures.service.ts';
import { createToken } from '../../src/lib/server/services/tokens.service.ts';
import { callApi } from '../support/api.ts';
import { join, newTeam, openHouse } from '../support/house.ts';
import { squaresSheet } from '../support/measure-tables.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let data: string;
let admin: Member;
let analyst: Member;
let token: string;
let sheet: number;
beforeAll(async () => {
	house = await openHouse();
	data = mkdtempSync(joinPath(tmpdir(), 'merestone-'));
	process.env.MERESTONE_DATA = data;
	const made = await newTeam(house.db, 'Figures');
	admin = made.admin;
	analyst = await join(house.db, made.team, 'analyst');
	const cartographer = await join(house.db, made.team, 'cartographer');
	sheet = await squaresSheet(workshop(), cartographer);
	token = await tokenFor([...scopes]);
});
afterAll(async () => {
	await closeWorkshop();
	await house.close();
	rmSync(data, { recursive: true, force: true });
});

const tokenFor = (held: Scope[]) => createToken(admin, { name: 'Feed', scopes: held, days: 1 });
const path = (name = '') =>
	`/sheets/${sheet}/measures${name === '' ? '' : `/${encodeURIComponent(name)}`}`;
const get = (address: string, held = token) =>
	callApi(address, { headers: { authorization: `Bearer ${held}` } });
const put = (name: string, body: unknown, held = token) =>
	callApi(path(name), {
		method: 'PUT',
		headers: { authorization: `Bearer ${held}`, 'content-type': 'application/json' },
		body: typeof body === 'string' ? body : JSON.stringify(body),
	});
async function answer<S extends z.ZodType>(response: Promise<Response>, schema: S) {
	const { status, body } = await response.then(async (r) => ({
		status: r.status,
		body: await r.json(),
	}));
	expect([status, body]).toEqual([200, body]);
	return schema.parse(body);
}
async function fault(response: Promise<Response>) {
	const answered = await response;
	return { status: answered.status, ...errorBody.parse(await answered.json()).error };
}

describe('a measure over the API', () => {
	it('is sent, listed and read back by region key', async () => {
		const name = 'Accounts / open';
		const kept = await answer(
			put(name, { unit: 'pcs', values: { '01': 3, '05': 2.5 } }),
			measureKept,
		);
		expect(kept).toMatchObject({ name, unit: 'pcs', total: 5.5, missing: 4, change: null });
		expect((await answer(get(path()), measureList)).measures).toMatchObject([
			{ name, confidential: true, stale: false },
		]);
		expect((await answer(get(path(name)), measureDetail)).values).toEqual({ '01': 3, '05': 2.5 });
	});

	it('is replaced, or added to on top of what is there, and keeps one table', async () => {
		await answer(put('Visits', { unit: 'a', values: { '01': 1, '02': 2 } }), measureKept);
		const replaced = await answer(
			put('Visits', { unit: 'a', values: { '02': 5, '03': 7 } }),
			measureKept,
		);
		expect(replaced.change).toMatch(/^1 region changes, 1 gets .* 1 loses its value\./);
		const added = await answer(
			put('Visits', { unit: 'a', values: { '01': 4, '03': 1 }, mode: 'add' }),
			measureKept,
		);
		expect(added.total).toBe(17);
		expect((await answer(get(path('Visits')), measureDetail)).values).toEqual({
			...{ '01': 4, '02': 5, '03': 8 },
		});
		const tables = await measureTables(workshop(), analyst, sheet);
		expect(tables.filter(({ name }) => name === 'Visits')).toHaveLength(1);
	});

	it('with regions that are not there is refused, naming them', async () => {
		const refused = await fault(put('Stops', { values: { '01': 1, '7': 2, x: 3 } }));
		expect(refused).toMatchObject({
			...{ status: 422, code: 'unknown-regions', details: { regions: ['7', 'x'], count: 2 } },
		});
		expect(refused.message).toContain('"7", "x"');
		expect((await fault(get(path('Stops')))).status).toBe(404);
	});

	it.each([
		['below zero', { values: { '01': -1 } }, 422, 'negative'],
		['no values', { values: {} }, 422, 'no-values'],
		['an infinite number', '{"values":{"01":1e999}}', 400, 'malformed'],
		['a text', { values: { '01': '5' } }, 400, 'malformed'],
		['NaN', '{"values":{"01":NaN}}', 400, 'malformed'],
		['an unknown field', { values: { '01': 1 }, units: 'h' }, 400, 'unknown-field'],
		['an unknown mode', { values: { '01': 1 }, mode: 'merge' }, 400, 'malformed'],
		['another unit to add', { unit: 'km', values: { '01': 1 }, mode: 'add' }, 422, 'other-unit'],
	])('%s', async (_case, body, status, code) => {
		expect(await fault(put('Visits', body))).toMatchObject({ status, code });
		expect((await answer(get(path('Visits')), measureDetail)).total).toBe(17);
	});

	it('may have a name that would be a formula elsewhere; it stays a name', async () => {
		const name = '=HYPERLINK("http://x.example","y"),z';
		const kept = await answer(put(name, { values: { '01': 1 } }), measureKept);
		expect(kept.name).toBe(name);
		expect((await answer(get(path(name)), measureDetail)).values).toEqual({ '01': 1 });
	});

	it('needs its scope, and a sheet of the team', async () => {
		const reader = await tokenFor(['territories:read']);
		await answer(get(path(), reader), measureList);
		expect(await fault(put('X', { values: { '01': 1 } }, reader))).toMatchObject({
			...{ status: 403, details: { scope: 'territories:write' } },
		});
		expect((await fault(get(path(), await tokenFor(['sheets:read'])))).status).toBe(403);
		expect((await fault(get('/sheets/999/measures'))).status).toBe(404);
	});
});
