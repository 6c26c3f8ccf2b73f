import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { columnOfSheet } from '../../src/lib/server/services/column-values.service.ts';
import { NotFound, Unfit } from '../../src/lib/server/services/outcomes.ts';
import { replaceRulesByFile, rulesFile } from '../../src/lib/server/services/rules-csv.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
const asker = AbortSignal.timeout(100_000);
const square = (x: number) => [
	[x, 0],
	[x + 1, 0],
	[x + 1, 1],
	[x, 1],
	[x, 0],
];
/** Four in a row; one key begins like a formula. */
const row = JSON.stringify({
	type: 'FeatureCollection',
	features: [
		['=a', 'Nord', 'Coast'],
		['b', 'Süd', 'Coast'],
		['c', 'Mitte', null],
		['d', 'Ost', 'Hills'],
	].map(([key, name, province], x) => ({
		type: 'Feature',
		properties: { key, name, province },
		geometry: { type: 'Polygon', coordinates: [square(x)] },
	})),
});

beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'rules', 'analyst', 'cartographer');
	const read = await ingest(shop, member, 'row.geojson', row, {
		keyField: 'key',
		nameField: 'name',
	});
	expect(read.state).toBe('done');
});
afterAll(() => shop.close());

const send = (text: string) =>
	replaceRulesByFile(shop, member, 1, new TextEncoder().encode(text), asker);
const fetched = async () =>
	new TextDecoder().decode((await rulesFile(shop, member, 1, asker)).bytes);

describe('rules as a file', () => {
	it('replace those of the draft, coloured and signed as any other', async () => {
		const saved = await send(
			[
				'rule;region;ink;weight;group',
				'lock;Nord;1;2,5;',
				'reserved ink;;2;;',
				'all different;b;;;East',
				'all different;d;;;East',
			].join('\n'),
		);
		expect(saved).toMatchObject({ revision: 2, colouring: { status: 'coloured' } });
		const { draft, lastInks } = await deskSheet(shop, member, 1);
		expect(draft.locks['=a']).toMatchObject({ ink: 0, cost: 2.5, by: expect.any(String) });
		expect(draft).toMatchObject({
			reserved: [1],
			groups: [{ kind: 'different', keys: ['b', 'd'] }],
		});
		expect(lastInks).not.toContain(1);
	});

	it('come out so that no key runs as a formula, and go in again unchanged', async () => {
		const text = await fetched();
		expect(text).toContain("lock,'=a,Nord,,,1,2.5,");
		// nothing changed, so that nothing is saved
		expect(await send(text)).toMatchObject({ revision: 2 });
		expect(await fetched()).toBe(text);
	});

	it('are refused whole when a row makes no rule, and the rows are named', async () => {
		const failing = send('rule,region,ink\nlock,b,1\nlock,nowhere,1\nlock,c,none');
		await expect(failing).rejects.toMatchObject({
			message: 'row 3: there is no region “nowhere”',
			details: { faults: [{ row: 3 }, { row: 4 }] },
		});
		await expect(send('a,b\n1,2')).rejects.toThrow(Unfit);
		expect((await deskSheet(shop, member, 1)).revision).toBe(2);
	});
});

describe('a column of the boundary file', () => {
	it('says what it says of every region', async () => {
		const { values, boundarySet } = await columnOfSheet(shop, member, 1, 'province');
		expect(values).toEqual(['Coast', 'Coast', null, 'Hills']);
		expect(boundarySet).toBe((await deskSheet(shop, member, 1)).boundarySet.id);
	});

	it('must be one of the file', async () => {
		await expect(columnOfSheet(shop, member, 1, 'nothing')).rejects.toThrow(NotFound);
	});
});
