import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join as joinPath } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { territoriesResponse } from '../../src/lib/schemas/api/check-territories.ts';
import { errorBody } from '../../src/lib/schemas/api/common.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Scope } from '../../src/lib/server/access/scopes.ts';
import { closeWorkshop } from '../../src/lib/server/jobs/workshop.ts';
import { createToken } from '../../src/lib/server/services/tokens.service.ts';
import { callApi } from '../support/api.ts';
import { newTeam, openHouse } from '../support/house.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let data: string;
let admin: Member;
let token: string;
beforeAll(async () => {
	house = await openHouse();
	data = mkdtempSync(joinPath(tmpdir(), 'merestone-'));
	process.env.MERESTONE_DATA = data;
	admin = (await newTeam(house.db, 'Evening out')).admin;
	token = await tokenFor('territories:check');
});
afterAll(async () => {
	await closeWorkshop();
	await house.close();
	rmSync(data, { recursive: true, force: true });
});

const tokenFor = (scope: Scope) => createToken(admin, { name: 'Check', scopes: [scope], days: 1 });

const send = (body: unknown, held = token) =>
	callApi('/check/territories', {
		method: 'POST',
		headers: { authorization: `Bearer ${held}`, 'content-type': 'application/json' },
		body: typeof body === 'string' ? body : JSON.stringify(body),
	});
async function check(body: unknown) {
	const response = await send(body);
	const answered = await response.json();
	expect([response.status, answered]).toEqual([200, answered]);
	return territoriesResponse.parse(answered);
}
async function fault(body: unknown, held?: string) {
	const response = await send(body, held);
	return { status: response.status, ...errorBody.parse(await response.json()).error };
}

/** Eight units in a row, two to the west and six to the east; even is four and four. */
const row = (changes: object = {}) => ({
	units: Array.from({ length: 8 }, (_, i) => ({
		key: `u${i}`,
		measures: { visits: 1 },
		territory: i < 2 ? 'west' : 'east',
	})),
	borders: Array.from({ length: 7 }, (_, i) => [`u${i}`, `u${i + 1}`]),
	territories: [{ key: 'west' }, { key: 'east' }],
	tolerance: { visits: 0.1 },
	...changes,
});

describe('POST /check/territories', () => {
	it('evens out a row with the two moves that it takes, and proves it', async () => {
		const found = await check(row());
		if (found.status !== 'proposed') throw new Error(found.status);
		// within 10 % of four only four is a whole number, and only the two next to the west can follow
		expect(found.assignment).toEqual({
			...{ u0: 'west', u1: 'west', u2: 'west', u3: 'west' },
			...{ u4: 'east', u5: 'east', u6: 'east', u7: 'east' },
		});
		expect(found.moves).toEqual([
			{ unit: 'u2', from: 'east', to: 'west', compulsory: false },
			{ unit: 'u3', from: 'east', to: 'west', compulsory: false },
		]);
		expect(found).toMatchObject({ cost: 2, compulsoryCost: 0 });
		expect(found.lowerBound).toBeLessThanOrEqual(2);
		if (found.proved) expect(found.lowerBound).toBe(2);
		expect(found.deviations).toEqual({ visits: { west: 0, east: 0 } });
		expect(found.cutBorders).toEqual({ before: 1, after: 1 });
	});

	it('tells deviations of measures that are free, and counts moves by a measure', async () => {
		const units = row().units.map((unit, i) => ({
			...unit,
			measures: { visits: 1, revenue: 10 * (i + 1) },
		}));
		const found = await check(row({ units, cost: 'revenue' }));
		if (found.status !== 'proposed') throw new Error(found.status);
		// u2 and u3 bring 30 and 40; the west then has 10 + 20 + 30 + 40 = 100 of 360
		expect(found.cost).toBe(70);
		expect(found.deviations.revenue.west).toBeCloseTo(100 / 180 - 1, 9);
	});

	it('hands out the units of a leaver, and counts them as compulsory', async () => {
		const territories = [{ key: 'west' }, { key: 'east' }, { key: 'gone', closing: true }];
		const units = row().units.map((unit, i) => ({
			...unit,
			territory: i < 3 ? 'west' : i < 5 ? 'gone' : 'east',
		}));
		const found = await check(row({ units, territories, tolerance: { visits: 0.3 } }));
		if (found.status !== 'proposed') throw new Error(found.status);
		expect(found).toMatchObject({ cost: 2, compulsoryCost: 2 });
		expect(found.moves.map(({ unit, from, compulsory }) => [unit, from, compulsory])).toEqual([
			['u3', 'gone', true],
			['u4', 'gone', true],
		]);
		expect(Object.keys(found.deviations.visits)).toEqual(['west', 'east']);
	});

	it('gives a unit that had none a territory, by null or by saying nothing', async () => {
		const units = row().units.map(({ key, measures, territory }, i) =>
			i === 2
				? { key, measures, territory: null }
				: i === 3
					? { key, measures }
					: { key, measures, territory },
		);
		const found = await check(row({ units }));
		if (found.status !== 'proposed') throw new Error(found.status);
		expect(found.moves.map(({ unit, from }) => [unit, from])).toEqual([
			['u2', null],
			['u3', null],
		]);
	});

	it('names the unit that is too heavy, by keys, with the tolerance that would do', async () => {
		const units = row().units.map((unit, i) => ({
			...unit,
			measures: { visits: i === 0 ? 21 : 1 },
		}));
		const found = await check(row({ units }));
		if (found.status !== 'impossible') throw new Error(found.status);
		expect(found.reason).toBe('unit-too-heavy');
		expect(found.witness.units).toEqual(['u0']);
		expect(found.message).toContain('"u0"');
		// 28 in all, 14 each; 21 is half as much again
		const wider = found.relief.find(({ kind }) => kind === 'tolerance');
		expect(wider).toMatchObject({ measure: 'visits' });
		if (wider?.kind === 'tolerance') expect(wider.value).toBeCloseTo(0.5, 6);
	});

	it('answers a figure that is missing, null or left out, with the units', async () => {
		const units = row().units.map((unit, i) => ({
			...unit,
			measures: i === 1 ? { visits: null } : i === 4 ? {} : unit.measures,
		}));
		const found = await check(row({ units }));
		expect(found).toMatchObject({
			...{ status: 'impossible', reason: 'missing-value', relief: [] },
			witness: { units: ['u1', 'u4'], territories: [] },
		});
		const free = await check(row({ units, tolerance: {}, cost: 'visits' }));
		expect(free).toMatchObject({ reason: 'missing-value', witness: { units: ['u1', 'u4'] } });
		expect(await check(row({ units, tolerance: {} }))).toMatchObject({ status: 'proposed' });
	});

	it('takes any key, those of the language itself included', async () => {
		const keys = ['constructor', 'toString', 'hasOwnProperty', 'valueOf'];
		const found = await check({
			units: keys.map((key, i) => ({
				key,
				measures: { valueOf: 1 },
				territory: i < 1 ? 'toString' : 'x',
			})),
			borders: keys.slice(1).map((key, i) => [keys[i], key]),
			territories: [{ key: 'toString' }, { key: 'x' }],
			tolerance: { valueOf: 0 },
		});
		expect(found).toMatchObject({
			assignment: { constructor: 'toString', toString: 'toString', valueOf: 'x' },
			deviations: { valueOf: { toString: 0, x: 0 } },
		});
	});

	it('gives the same answer for the same seed', async () => {
		const [one, two] = [await check(row({ seed: 5 })), await check(row({ seed: 5 }))];
		expect({ ...one, stats: null }).toEqual({ ...two, stats: null });
	});

	it.each<[string, unknown, string, string]>([
		['no JSON', '{"units":', 'malformed', 'JSON'],
		['a field not known', { ...row(), colour: 1 }, 'unknown-field', '"colour"'],
		[
			'a field not known in a unit',
			row({ units: [{ key: 'a', measures: {}, territory: 'west', colour: 1 }] }),
			'unknown-field',
			'units.0.colour',
		],
		[
			'a unit twice',
			row({ units: [...row().units, row().units[0]] }),
			'malformed',
			'"u0" is there twice',
		],
		[
			'a territory twice',
			row({ territories: [{ key: 'west' }, { key: 'west' }, { key: 'east' }] }),
			'malformed',
			'"west" is there twice',
		],
		['a border of nobody', row({ borders: [['u0', 'x']] }), 'malformed', 'no unit "x"'],
		['a border with itself', row({ borders: [['u0', 'u0']] }), 'malformed', 'borders.0'],
		[
			'a territory of nobody',
			row({ territories: [{ key: 'west' }] }),
			'malformed',
			'no territory "east"',
		],
		['a lock of nobody', row({ locks: { x: 'west' } }), 'malformed', 'no unit "x"'],
		['a lock to nowhere', row({ locks: { u0: 'x' } }), 'malformed', 'no territory "x"'],
		[
			'a base that is no unit',
			row({ territories: [{ key: 'west', base: 'x' }, { key: 'east' }] }),
			'malformed',
			'territories.0.base',
		],
		[
			'one base for two',
			row({
				territories: [
					{ key: 'west', base: 'u0' },
					{ key: 'east', base: 'u0' },
				],
			}),
			'malformed',
			'base of two territories',
		],
		['a measure no unit has', row({ tolerance: { calls: 0.1 } }), 'malformed', '"calls"'],
		['a cost no unit has', row({ cost: 'calls' }), 'malformed', '"calls"'],
		[
			'text for a figure',
			row({ units: [{ key: 'a', measures: { visits: '1' }, territory: 'west' }] }),
			'malformed',
			'visits',
		],
		[
			'a figure without end',
			JSON.stringify(row()).replace('"visits":1', '"visits":1e999'),
			'malformed',
			'visits',
		],
		['a tolerance below 0', row({ tolerance: { visits: -0.1 } }), 'malformed', 'tolerance.visits'],
		[
			'a capacity of 0',
			row({ territories: [{ key: 'west', capacity: 0 }, { key: 'east' }] }),
			'malformed',
			'capacity',
		],
		['a reach of a half', row({ reach: 0.5 }), 'malformed', 'reach'],
	])('names %s', async (_case, body, code, words) => {
		const problem = await fault(body);
		expect(problem).toMatchObject({ status: 400, code });
		expect(problem.message).toContain(words);
	});

	it('is closed without the scope', async () => {
		const other = await tokenFor('territories:read');
		expect(await fault(row(), other)).toMatchObject({ status: 403, code: 'scope-missing' });
	});
});
