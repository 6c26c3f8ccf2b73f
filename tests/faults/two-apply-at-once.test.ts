import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { Conflict } from '../../src/lib/server/services/outcomes.ts';
import { applyRecut } from '../../src/lib/server/services/recut-apply.service.ts';
import { putBackRecut } from '../../src/lib/server/services/recut-put-back.service.ts';
import { readRecut } from '../../src/lib/server/services/recuts.service.ts';
import { deskSheet, removeSheet } from '../../src/lib/server/services/sheet.service.ts';
import { after, plotsSheet, recutWith } from '../support/recut-sheets.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let one: Member;
let other: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	one = await createMember(shop.db, 'two', 'cartographer');
	other = await createMember(shop.db, 'two', 'cartographer', 'admin');
});
afterAll(() => shop.close());

const outcomes = (settled: PromiseSettledResult<unknown>[]) =>
	settled.map((result) => (result.status === 'rejected' ? result.reason : 'done'));
const whole = async (sheet: number) => {
	const { regions, colouring, draft } = await deskSheet(shop, one, sheet);
	const known = new Set(regions.key);
	for (const key of Object.keys(draft.locks)) expect(known).toContain(key);
	if (colouring?.status === 'coloured') expect(colouring.inks).toHaveLength(regions.key.length);
	return regions.key;
};

describe('two people at once', () => {
	it('apply different re-cuts: one wins, the other is told to have theirs read again', async () => {
		const sheet = await plotsSheet(shop, one);
		const first = await recutWith(shop, one, sheet);
		const second = await recutWith(shop, other, sheet, after.slice(1));
		const settled = await Promise.allSettled([
			applyRecut(shop, one, sheet, first.number),
			applyRecut(shop, other, sheet, second.number),
		]);
		const [lost] = outcomes(settled).filter((result) => result !== 'done');
		expect(outcomes(settled).filter((result) => result === 'done')).toHaveLength(1);
		expect(lost).toBeInstanceOf(Conflict);
		const states = [
			await readRecut(shop, one, sheet, first.number),
			await readRecut(shop, one, sheet, second.number),
		];
		expect(states.map(({ state }) => state).sort()).toEqual(['applied', 'ready']);
		expect(states.find(({ state }) => state === 'ready')?.stale).toBe(true);
		await whole(sheet);
	});

	it('apply and put back the same one: it is done once each', async () => {
		const sheet = await plotsSheet(shop, one);
		const { number } = await recutWith(shop, one, sheet);
		const applied = await Promise.allSettled([
			applyRecut(shop, one, sheet, number),
			applyRecut(shop, other, sheet, number),
		]);
		expect(outcomes(applied).filter((result) => result === 'done')).toHaveLength(1);
		const back = await Promise.allSettled([
			putBackRecut(shop, one, sheet, number, true),
			putBackRecut(shop, other, sheet, number, true),
		]);
		expect(outcomes(back).filter((result) => result === 'done')).toHaveLength(1);
		expect(await whole(sheet)).toEqual([...'abcdefghi']);
		expect((await deskSheet(shop, one, sheet)).revision).toBe(3);
	});

	it('one saves the draft while the other applies: both are kept, in one order or the other', async () => {
		for (let round = 0; round < 5; round++) {
			const sheet = await plotsSheet(shop, one);
			const { number } = await recutWith(shop, one, sheet);
			const { draft, revision } = await deskSheet(shop, one, sheet);
			const document = { ...draft, locks: { c: { ink: 2, cost: 1 } } };
			const [saved, applied] = await Promise.allSettled([
				saveDraft(shop, other, sheet, { revision, document }),
				applyRecut(shop, one, sheet, number),
			]);
			expect(outcomes([applied])).toEqual(['done']);
			const came = saved.status === 'fulfilled' ? saved.value.status : String(saved.reason);
			const locks = (await deskSheet(shop, one, sheet)).draft.locks;
			// saved first: the lock followed; applied first: the one who saved was told, and nothing was lost
			if (came === 'saved') expect(locks.c?.ink).toBe(2);
			else expect([came, locks]).toEqual(['stale', {}]);
			expect(await whole(sheet)).toContain('b2');
		}
	});

	it('one deletes the sheet while the other applies: nothing is left half done', async () => {
		const sheet = await plotsSheet(shop, one);
		const { number } = await recutWith(shop, one, sheet);
		const before = await shop.db.selectFrom('boundary_sets').select('id').execute();
		await Promise.allSettled([
			applyRecut(shop, one, sheet, number),
			removeSheet(shop, other, sheet),
		]);
		await expect(deskSheet(shop, one, sheet)).rejects.toThrow('no such sheet');
		const left = await shop.db.selectFrom('boundary_sets').select('id').execute();
		expect(left).toHaveLength(before.length - 2);
	});
});
