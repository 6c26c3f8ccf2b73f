import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join as joinPath } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { z } from 'zod';
import { errorBody } from '../../src/lib/schemas/api/common.ts';
import { operations, type Operation } from '../../src/lib/schemas/api/operations.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Scope } from '../../src/lib/server/access/scopes.ts';
import { runRebalance } from '../../src/lib/server/jobs/rebalance.job.ts';
import { closeWorkshop, workshop } from '../../src/lib/server/jobs/workshop.ts';
import { createToken } from '../../src/lib/server/services/tokens.service.ts';
import { callApi } from '../support/api.ts';
import { join, newTeam, openHouse } from '../support/house.ts';
import { fieldKey, plainFor, territoriesOf, within, type Plain } from '../support/planner.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let data: string;
let admin: Member;
let plain: Plain;
let token: string;
beforeAll(async () => {
	house = await openHouse();
	data = mkdtempSync(joinPath(tmpdir(), 'merestone-'));
	process.env.MERESTONE_DATA = data;
	const made = await newTeam(house.db, 'Rounds');
	admin = made.admin;
	const cartographer = await join(house.db, made.team, 'cartographer');
	const planner = await join(house.db, made.team, 'planner');
	plain = await plainFor(workshop(), { cartographer, planner }, { rows: 6, columns: 6 });
	token = await tokenFor('territories:read', 'territories:write');
});
afterAll(async () => {
	await closeWorkshop();
	await house.close();
	rmSync(data, { recursive: true, force: true });
});

const tokenFor = (...scopes: Scope[]) => createToken(admin, { name: 'Rounds', scopes, days: 1 });

function call(method: string, path: string, body?: unknown, held = token): Promise<Response> {
	const headers = { authorization: `Bearer ${held}`, 'content-type': 'application/json' };
	const at = `/sheets/${plain.sheet}${path}`;
	if (body === undefined) return callApi(at, { method, headers });
	return callApi(at, { method, headers, body: JSON.stringify(body) });
}

/** An answer by the schema of the API's own description; a field too many fails. */
async function answer<S extends z.ZodType>(
	response: Promise<Response>,
	operation: Omit<Operation, 'answer'> & { answer: S },
): Promise<z.output<S>> {
	const { status, ...answered } = await response.then(async (r) => ({
		status: r.status,
		body: await r.json(),
	}));
	expect([status, answered.body]).toEqual([operation.status, answered.body]);
	return operation.answer.parse(answered.body);
}

async function fault(response: Promise<Response>) {
	const answered = await response;
	return { status: answered.status, ...errorBody.parse(await answered.json()).error };
}

const workOut = async () => {
	const rows = await house.db.selectFrom('proposals').select('id').execute();
	for (const { id } of rows) await runRebalance(workshop(), id, new AbortController().signal);
};

const lopsided = (_key: string, _row: number, column: number) => (column < 2 ? 'west' : 'east');

describe('territories over the API', () => {
	it('are read, saved, and refused when somebody else saved first', async () => {
		const first = await answer(call('GET', '/territories'), operations.readTerritories);
		expect(first).toMatchObject({ revision: 0, savedAt: null, inks: {} });
		const document = territoriesOf(plain.keys, lopsided);
		const saved = await answer(
			call('PUT', '/territories', { revision: 0, document }),
			operations.saveTerritories,
		);
		expect(saved).toMatchObject({ revision: 1, inkNote: null });
		expect(saved.inks.west).not.toBe(saved.inks.east);
		const second = await answer(call('GET', '/territories'), operations.readTerritories);
		expect(second).toMatchObject({ revision: 1, document, inks: saved.inks });
		const late = await fault(call('PUT', '/territories', { revision: 0, document }));
		expect(late).toMatchObject({ status: 409, code: 'stale', details: { revision: 1, document } });
	});

	it('name what does not fit', async () => {
		const document = territoriesOf(plain.keys, lopsided);
		const assignment = { ...document.assignment, nowhere: 'west' };
		const body = { revision: 1, document: { ...document, assignment } };
		expect(await fault(call('PUT', '/territories', body))).toMatchObject({
			...{ status: 422, code: 'unknown-region', message: 'The sheet has no region “nowhere”.' },
		});
		const odd = { revision: 1, document: { ...document, colour: 1 } };
		expect(await fault(call('PUT', '/territories', odd))).toMatchObject({
			...{ status: 400, code: 'unknown-field', details: { fields: ['document.colour'] } },
		});
	});
});

describe('proposals over the API', () => {
	const ask = (tolerance: number, name = 'Even') =>
		call('POST', '/proposals', { name, wishes: within(plain.visits, tolerance) });

	it('are asked for, followed and read with moves, deviations and bound', async () => {
		const { number } = await answer(ask(0.05), operations.askProposal);
		const waiting = await answer(call('GET', `/proposals/${number}`), operations.readProposal);
		expect(waiting).toMatchObject({ state: 'waiting', outcome: null, assignment: null, moves: [] });
		await workOut();
		const made = await answer(call('GET', `/proposals/${number}`), operations.readProposal);
		expect(made.state).toBe('kept');
		// 12 of 36 fields are in the west and 18 are even
		expect(made.moves).toHaveLength(6);
		for (const move of made.moves) {
			expect(move).toMatchObject({ from: 'east', to: 'west', compulsory: false });
			expect(made.assignment?.[move.region]).toBe('west');
		}
		expect(made.deviations).toEqual({ [plain.visits]: { west: 0, east: 0 } });
		expect(made.outcome?.lowerBound).toBeLessThanOrEqual(6);
		const list = await answer(call('GET', '/proposals'), operations.listProposals);
		expect(list.proposals.map(({ name, state }) => [name, state])).toEqual([['Even', 'kept']]);
	});

	it('tell why there is none by key', async () => {
		await house.db
			.updateTable('measures')
			.set({ values: plain.keys.map((_, i) => (i === 0 ? 100 : 1)) })
			.where('id', '=', plain.visits)
			.execute();
		const { number } = await answer(ask(0.05, 'Heavy'), operations.askProposal);
		await workOut();
		const made = await answer(call('GET', `/proposals/${number}`), operations.readProposal);
		expect(made.state).toBe('impossible');
		expect(made.outcome?.witness?.regions).toEqual([fieldKey(0, 0)]);
		const [wider] = made.outcome?.relief ?? [];
		expect(wider).toMatchObject({ kind: 'tolerance', measure: plain.visits });
		const dropped = await answer(
			call('POST', `/proposals/${number}/drop`),
			operations.dropProposal,
		);
		expect(dropped).toEqual({ number, state: 'dropped' });
		expect((await fault(call('GET', `/proposals/${number}`))).status).toBe(404);
		await house.db
			.updateTable('measures')
			.set({ values: plain.keys.map(() => 1) })
			.where('id', '=', plain.visits)
			.execute();
	});

	it('are stopped, and adopted once', async () => {
		const { number } = await answer(ask(0.1, 'Stopped'), operations.askProposal);
		await answer(call('POST', `/proposals/${number}/cancel`), operations.cancelProposal);
		const again = await fault(call('POST', `/proposals/${number}/cancel`));
		expect(again).toMatchObject({ status: 409, code: 'not-open' });
		const adopt = () => call('POST', '/proposals/1/adopt', { revision: 0 });
		expect(await answer(adopt(), operations.adoptProposal)).toEqual({ revision: 2 });
		expect(await fault(adopt())).toMatchObject({ status: 409, code: 'no-open-plan' });
		const after = await answer(call('GET', '/territories'), operations.readTerritories);
		const west = Object.values(after.document.assignment).filter((key) => key === 'west');
		expect(west).toHaveLength(18);
	});

	it('are read and asked for within the scope only', async () => {
		const reader = await tokenFor('territories:read');
		expect((await call('GET', '/proposals', undefined, reader)).status).toBe(200);
		const body = { name: 'No', wishes: within(plain.visits, 0.1) };
		const refused = await fault(call('POST', '/proposals', body, reader));
		expect(refused).toMatchObject({ status: 403, code: 'scope-missing' });
		const other = await tokenFor('sheets:read');
		expect((await call('GET', '/territories', undefined, other)).status).toBe(403);
	});
});
