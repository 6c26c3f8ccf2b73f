import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { deskSheet, sheetList } from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'intake', 'cartographer');
});
afterAll(() => shop.close());

describe('from an uploaded file to a coloured sheet', () => {
	it('takes the 48 states and the District of Columbia', async () => {
		const status = await ingest(shop, member, 'states.geojson', bytesOf(conterminousStates()));
		expect(status).toMatchObject({ state: 'done', share: 1, refusal: null, sheet: 1 });
		const sheet = await deskSheet(shop, member, 1);
		// 49 regions and 107 line borders: the contiguous-USA graph of Knuth, TAOCP 4 fascicle 0;
		// the two point touches are those of the four-state corner
		expect(sheet.boundarySet.regionCount).toBe(49);
		const kinds = [...sheet.borders.kind];
		expect(kinds.filter((kind) => kind === 0)).toHaveLength(107);
		expect(kinds.filter((kind) => kind === 1)).toHaveLength(2);
		// four are needed: Nevada with its ring of five is an odd wheel (Knuth, loc. cit.)
		expect(sheet.colouring).toMatchObject({
			status: 'coloured',
			inksUsed: 4,
			lowerBound: 4,
			proof: { kind: 'odd-wheel' },
		});
		expect(sheet.name).toBe('states');
		expect(await shop.stored()).toHaveLength(1);
		expect(await sheetList(shop, member)).toMatchObject([
			{ number: 1, name: 'states', regionCount: 49, inksUsed: 4, lastEdition: null },
		]);
	});
});
