import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { readDraft, saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let people: Member[];
beforeAll(async () => {
	shop = await createWorkshop();
	people = [
		await createMember(shop.db, 'race', 'cartographer'),
		await createMember(shop.db, 'race', 'analyst', 'approver'),
	];
	await ingest(shop, people[0], 'states.geojson', bytesOf(conterminousStates()));
});
afterAll(() => shop.close());

const lockBy = async (member: Member, key: string, ink: number) => {
	const { draft, revision } = await deskSheet(shop, member, 1);
	const document = { ...draft, locks: { ...draft.locks, [key]: { ink, cost: 1 } } };
	return () => saveDraft(shop, member, 1, { revision, document });
};

describe('two people who save at once', () => {
	it('the later one is told what the other saved, and nothing is overwritten', async () => {
		const saves = [await lockBy(people[0], '32', 0), await lockBy(people[1], '06', 1)];
		const results = await Promise.all(saves.map((save) => save()));
		expect(results.map(({ status }) => status).sort()).toEqual(['saved', 'stale']);
		const saved = results.find(({ status }) => status === 'saved');
		const stale = results.find(({ status }) => status === 'stale');
		if (saved?.status !== 'saved' || stale?.status !== 'stale') throw new Error('unreachable');
		expect(stale.stale.revision).toBe(2);
		expect(stale.stale.document).toEqual(saved.saved.document);
		expect(Object.keys(stale.stale.document.locks)).toHaveLength(1);
		expect((await deskSheet(shop, people[0], 1)).draft).toEqual(saved.saved.document);
	});

	it('of ten saves of one revision, one is kept', async () => {
		const before = await deskSheet(shop, people[0], 1);
		const saves = await Promise.all(
			Array.from({ length: 10 }, (_, i) => lockBy(people[i % 2], '48', i % 4)),
		);
		const results = await Promise.all(saves.map((save) => save()));
		expect(results.filter(({ status }) => status === 'saved')).toHaveLength(1);
		const { revision } = await deskSheet(shop, people[0], 1);
		expect(revision).toBe(before.revision + 1);
		for (let past = 1; past <= revision; past++) await readDraft(shop, people[0], 1, past);
	});
});
