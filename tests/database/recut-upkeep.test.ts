import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { Conflict, NotFound, Refused } from '../../src/lib/server/services/outcomes.ts';
import { applyRecut } from '../../src/lib/server/services/recut-apply.service.ts';
import {
	addMends,
	beginFileRecut,
	beginReading,
	takeBackMend,
} from '../../src/lib/server/services/recut-begin.service.ts';
import { putBackRecut } from '../../src/lib/server/services/recut-put-back.service.ts';
import {
	cancelRecut,
	dropRecut,
	retryRecut,
} from '../../src/lib/server/services/recut-work.service.ts';
import { readRecut, sheetRecuts } from '../../src/lib/server/services/recuts.service.ts';
import { deskSheet, removeSheet } from '../../src/lib/server/services/sheet.service.ts';
import { after, before, plotsSheet, readOut, recutWith } from '../support/recut-sheets.ts';
import { walkOfRecuts } from '../support/recut-walk.ts';
import {
	createMember,
	createWorkshop,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'upkeep', 'cartographer');
});
afterAll(() => shop.close());

const keysOf = async (sheet: number) => (await deskSheet(shop, member, sheet)).regions.key;
const sets = async () => {
	const rows = await shop.db.selectFrom('boundary_sets').select('id').execute();
	return rows.map(({ id }) => id).sort();
};
const left = async () => ({ sets: await sets(), files: (await shop.stored()).sort() });

describe('mends and other readings of the same file', () => {
	let sheet: number;
	beforeAll(async () => {
		sheet = await plotsSheet(shop, member);
	});
	const drop = { kind: 'drop', key: 'i' } as const;
	const merge = { kind: 'merge', key: 'h', into: 'g' } as const;

	it('a mend is replayed on the file, and kept with the boundaries', async () => {
		const { number } = await addMends(shop, member, sheet, [drop]);
		const recut = await readOut(shop, member, sheet, number);
		expect(recut).toMatchObject({ kind: 'mends', state: 'ready', words: 'Leaves out i.' });
		expect(recut.change?.counts).toMatchObject({ kept: 8, gone: 1 });
		await applyRecut(shop, member, sheet, number);
		expect(await keysOf(sheet)).toEqual([...'abcdefgh']);
		expect((await deskSheet(shop, member, sheet)).boundarySet.mends).toEqual([drop]);
		expect(await shop.stored()).toHaveLength(1);
	});

	it('one more goes on top of those there are; the same one twice is refused', async () => {
		await expect(addMends(shop, member, sheet, [drop])).rejects.toBeInstanceOf(Refused);
		const { number } = await addMends(shop, member, sheet, [merge]);
		const recut = await readOut(shop, member, sheet, number);
		expect(recut.options.mends).toEqual([drop, merge]);
		await applyRecut(shop, member, sheet, number);
		expect(await keysOf(sheet)).toEqual([...'abcdefg']);
	});

	it('one can be taken back without the others', async () => {
		const { number } = await takeBackMend(shop, member, sheet, drop);
		await readOut(shop, member, sheet, number);
		await applyRecut(shop, member, sheet, number);
		expect(await keysOf(sheet)).toEqual([...'abcdefgi']);
		await expect(takeBackMend(shop, member, sheet, drop)).rejects.toBeInstanceOf(NotFound);
	});

	it('refuses a mend by hand that names no region of the file', async () => {
		const wrong = addMends(shop, member, sheet, [{ kind: 'drop', key: 'nowhere' }]);
		await expect(wrong).rejects.toThrow('nowhere');
		const self = addMends(shop, member, sheet, [{ kind: 'merge', key: 'a', into: 'a' }]);
		await expect(self).rejects.toThrow('itself');
	});

	it('is read in another way, with its mends or without', async () => {
		const fields = { keyField: 'called', nameField: 'code' };
		const { number } = await beginReading(shop, member, sheet, { ...fields, mends: 'drop' });
		const recut = await readOut(shop, member, sheet, number);
		expect(recut.options).toEqual(fields);
		expect(recut.words).toBe('Reads plots.geojson again: keys from called, names from code.');
		expect(recut.change?.counts).toMatchObject({ renamed: 7 });
		await dropRecut(shop, member, sheet, number);
		const other = await beginReading(shop, member, sheet, { toleranceMetres: 2, mends: 'keep' });
		const kept = await readOut(shop, member, sheet, other.number);
		expect(kept.options).toEqual({ toleranceMetres: 2, mends: [merge] });
		await dropRecut(shop, member, sheet, other.number);
	});
});

describe('re-cuts that were compared with boundaries of before', () => {
	it('have to be read again, on top of what was applied since', async () => {
		const sheet = await plotsSheet(shop, member);
		const one = await addMends(shop, member, sheet, [{ kind: 'drop', key: 'i' }]);
		const two = await addMends(shop, member, sheet, [{ kind: 'drop', key: 'h' }]);
		await readOut(shop, member, sheet, one.number);
		await readOut(shop, member, sheet, two.number);
		await expect(retryRecut(shop, member, sheet, two.number)).rejects.toBeInstanceOf(Conflict);
		await applyRecut(shop, member, sheet, one.number);
		const stale = await readRecut(shop, member, sheet, two.number);
		expect(stale).toMatchObject({ stale: true, state: 'ready' });
		expect(stale.hindrance).toContain('read again');
		await expect(applyRecut(shop, member, sheet, two.number)).rejects.toBeInstanceOf(Conflict);
		await retryRecut(shop, member, sheet, two.number);
		const again = await readOut(shop, member, sheet, two.number);
		expect(again).toMatchObject({
			stale: false,
			state: 'ready',
			change: { regions: { before: 8, after: 7 } },
		});
		await applyRecut(shop, member, sheet, two.number);
		expect(await keysOf(sheet)).toEqual([...'abcdefg']);
	});

	it('only the one applied last is put back, then the one before it', async () => {
		const sheet = await plotsSheet(shop, member);
		const first = await recutWith(shop, member, sheet);
		await applyRecut(shop, member, sheet, first.number);
		const second = await recutWith(shop, member, sheet, after.slice(1));
		await applyRecut(shop, member, sheet, second.number);
		const early = putBackRecut(shop, member, sheet, first.number, true);
		await expect(early).rejects.toThrow('Put that one back first');
		await putBackRecut(shop, member, sheet, second.number, false);
		await putBackRecut(shop, member, sheet, first.number, false);
		expect(await keysOf(sheet)).toEqual([...'abcdefghi']);
	});
});

describe('what a sheet holds', () => {
	it('at most five are open; one that is dropped makes room and leaves nothing', async () => {
		const sheet = await plotsSheet(shop, member);
		const stood = await left();
		const ready = await recutWith(shop, member, sheet);
		for (let i = 0; i < 4; i++) await addMends(shop, member, sheet, [{ kind: 'drop', key: 'i' }]);
		const many = beginFileRecut(shop, member, sheet, uploadRequest('x.geojson', 'x'));
		await expect(many).rejects.toThrow('open already');
		await expect(addMends(shop, member, sheet, [{ kind: 'drop', key: 'h' }])).rejects.toThrow('5');
		expect(await sheetRecuts(shop, member, sheet)).toHaveLength(5);
		for (const { number } of await sheetRecuts(shop, member, sheet)) {
			if (number === ready.number) await dropRecut(shop, member, sheet, number);
			else await cancelRecut(shop, member, sheet, number);
		}
		expect(await sheetRecuts(shop, member, sheet)).toEqual([]);
		expect(await left()).toEqual(stood);
	});

	it('a file that cannot be read is refused in words and forgotten', async () => {
		const sheet = await plotsSheet(shop, member);
		const stood = await left();
		const request = uploadRequest('broken.geojson', '{"type":"FeatureCollection","features":[');
		const { number } = await beginFileRecut(shop, member, sheet, request);
		const recut = await readOut(shop, member, sheet, number);
		expect(recut).toMatchObject({ state: 'refused', refusal: { code: 'file-truncated' } });
		expect(await left()).toEqual(stood);
	});

	it('a sheet that is deleted takes its re-cuts, their boundaries and their files with it', async () => {
		const stood = await left();
		const sheet = await plotsSheet(shop, member);
		const tried = await recutWith(shop, member, sheet, after.slice(2));
		await applyRecut(shop, member, sheet, tried.number);
		await putBackRecut(shop, member, sheet, tried.number, false);
		await dropRecut(shop, member, sheet, tried.number);
		const applied = await recutWith(shop, member, sheet);
		await applyRecut(shop, member, sheet, applied.number);
		await recutWith(shop, member, sheet, before.slice(1));
		const { number } = await addMends(shop, member, sheet, [{ kind: 'drop', key: 'z' }]);
		await readOut(shop, member, sheet, number);
		await removeSheet(shop, member, sheet);
		expect(await left()).toEqual(stood);
	});

	it('an applied one is neither dropped nor cancelled', async () => {
		const sheet = await plotsSheet(shop, member);
		const { number } = await recutWith(shop, member, sheet);
		await applyRecut(shop, member, sheet, number);
		await expect(dropRecut(shop, member, sheet, number)).rejects.toBeInstanceOf(Conflict);
		await expect(cancelRecut(shop, member, sheet, number)).rejects.toBeInstanceOf(Conflict);
	});
});

describe('another team', () => {
	it('finds none of it, by whatever number', async () => {
		const sheet = await plotsSheet(shop, member);
		await recutWith(shop, member, sheet);
		const stranger = await createMember(shop.db, 'strangers', 'cartographer', 'admin');
		const { rememberedAnswers: _, ...services } = walkOfRecuts(() => shop, sheet);
		for (const [name, [, call]] of Object.entries(services)) {
			await expect(call(stranger), name).rejects.toBeInstanceOf(NotFound);
		}
	});
});
