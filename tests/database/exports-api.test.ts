import { createHash } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join as joinPath } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { operations } from '../../src/lib/schemas/api/operations.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Scope } from '../../src/lib/server/access/scopes.ts';
import { runExport } from '../../src/lib/server/jobs/export.job.ts';
import { closeWorkshop, workshop } from '../../src/lib/server/jobs/workshop.ts';
import { createToken } from '../../src/lib/server/services/tokens.service.ts';
import { callApi } from '../support/api.ts';
import { newTeam, openHouse } from '../support/house.ts';
import { ingest } from '../support/workshop.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let data: string;
let admin: Member;
let token: string;
beforeAll(async () => {
	house = await openHouse();
	data = mkdtempSync(joinPath(tmpdir(), 'merestone-'));
	process.env.MERESTONE_DATA = data;
	({ admin } = await newTeam(house.db, 'Export pipeline'));
	token = await tokenFor(['editions:read']);
	const file = readFileSync('sample-data/tavaroe.geojson');
	const fields = { keyField: 'code', nameField: 'name' };
	await ingest(workshop(), admin, 'tavaroe.geojson', file, fields);
});
afterAll(async () => {
	await closeWorkshop();
	await house.close();
	rmSync(data, { recursive: true, force: true });
});

const tokenFor = (held: Scope[]) =>
	createToken(admin, { name: 'Export test', scopes: held, days: 1 });
const get = (path: string, held = token) =>
	callApi(path, { headers: { authorization: `Bearer ${held}` } });
const ask = (body: unknown, held = token) =>
	callApi('/sheets/1/exports', {
		method: 'POST',
		headers: { authorization: `Bearer ${held}`, 'content-type': 'application/json' },
		body: JSON.stringify(body),
	});

describe('files by the API', () => {
	it('are asked for, followed and taken', async () => {
		const asked = await ask({ kind: 'geojson' });
		expect(asked.status).toBe(202);
		const note = operations.askExport.answer.parse(await asked.json());
		expect(note).toMatchObject({ state: 'waiting', kind: 'geojson', edition: null, file: null });
		const path = `/sheets/1/exports/${note.number}`;
		expect((await get(`${path}/file`)).status).toBe(409);
		const { id } = await house.db.selectFrom('exports').select('id').executeTakeFirstOrThrow();
		await runExport(workshop(), id, new AbortController().signal);
		const done = operations.readExport.answer.parse(await (await get(path)).json());
		expect(done).toMatchObject({ state: 'done', share: 1 });
		const file = await get(`${path}/file`);
		expect(file.headers.get('content-type')).toBe('application/geo+json');
		expect(file.headers.get('content-disposition')).toContain(done.file?.name);
		const bytes = Buffer.from(await file.arrayBuffer());
		expect(createHash('sha256').update(bytes).digest('hex')).toBe(done.file?.digest);
		expect(JSON.parse(String(bytes)).features).toHaveLength(180);
		const list = await (await get('/sheets/1/exports')).json();
		expect(operations.listExports.answer.parse(list).exports).toHaveLength(1);
	});

	it('are refused with what is wrong, and to those without the scope', async () => {
		const told = async (response: Response) => {
			const { error } = await response.json();
			return [response.status, error.code];
		};
		expect(await told(await ask({ kind: 'csv', options: { dpi: 300 } }))).toEqual([
			...[422, 'no-such-option'],
		]);
		expect((await ask({ kind: 'csv', colour: 1 })).status).toBe(400);
		expect((await ask({ kind: 'csv', edition: 4 })).status).toBe(404);
		expect(await told(await ask({ kind: 'css', reader: 'grey' }))).toEqual([
			...[422, 'same-for-every-reader'],
		]);
		const other = await tokenFor(['sheets:read']);
		expect(await told(await ask({ kind: 'csv' }, other))).toEqual([403, 'scope-missing']);
		expect((await get('/sheets/1/exports/99', token)).status).toBe(404);
	});
});
