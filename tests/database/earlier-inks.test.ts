import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { editionInks, revisionInks } from '../../src/lib/server/services/earlier-inks.service.ts';
import { issueEdition } from '../../src/lib/server/services/edition.service.ts';
import { NotFound } from '../../src/lib/server/services/outcomes.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let analyst: Member;
let approver: Member;
let stranger: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	const cartographer = await createMember(shop.db, 'earlier', 'cartographer');
	analyst = await createMember(shop.db, 'earlier', 'analyst');
	approver = await createMember(shop.db, 'earlier', 'approver');
	stranger = await createMember(shop.db, 'elsewhere', 'admin');
	await ingest(shop, cartographer, 'states.geojson', bytesOf(conterminousStates()));
});
afterAll(() => shop.close());

it('gives the inks of an edition and of a revision by key, whatever the draft is now', async () => {
	const { revision, draft, colouring, regions } = await deskSheet(shop, analyst, 1);
	if (colouring?.status !== 'coloured') throw new Error('not coloured');
	const before = Object.fromEntries(regions.key.map((key, r) => [key, colouring.inks[r]]));
	await issueEdition(shop, approver, 1, revision, '');
	const inks = colouring.inks.map((ink) => (ink < 2 ? 1 - ink : ink));
	await saveDraft(shop, analyst, 1, { revision, document: draft, inks });

	expect(await editionInks(shop, analyst, 1, 1)).toEqual({ inks: before });
	expect(await revisionInks(shop, analyst, 1, revision)).toEqual({ inks: before });
	const now = (await revisionInks(shop, analyst, 1, revision + 1)).inks;
	expect(regions.key.map((key) => now[key])).toEqual(inks);
});

it('has nothing for another team, an edition or a revision that is not there', async () => {
	await expect(editionInks(shop, stranger, 1, 1)).rejects.toThrow(NotFound);
	for (const number of [0, 2, 1.5, NaN, 2 ** 40]) {
		await expect(editionInks(shop, analyst, 1, number)).rejects.toThrow(NotFound);
		await expect(revisionInks(shop, analyst, 1, number + 40)).rejects.toThrow(NotFound);
	}
});
