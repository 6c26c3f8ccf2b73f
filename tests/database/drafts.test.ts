import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { readDraft, saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { NotFound, Unfit } from '../../src/lib/server/services/outcomes.ts';
import { deskSheet, sheetGeometry } from '../../src/lib/server/services/sheet.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let cartographer: Member;
let analyst: Member;
let designer: Member;
let sheet: number;
beforeAll(async () => {
	shop = await createWorkshop();
	cartographer = await createMember(shop.db, 'drafts', 'cartographer');
	analyst = await createMember(shop.db, 'drafts', 'analyst');
	designer = await createMember(shop.db, 'drafts', 'designer');
	const file = readFileSync('sample-data/tavaroe.geojson');
	const fields = { keyField: 'code', nameField: 'name' };
	sheet = (await ingest(shop, cartographer, 'tavaroe.geojson', file, fields)).sheet ?? 0;
});
afterAll(() => shop.close());

const desk = () => deskSheet(shop, analyst, sheet);

async function save(member: Member, change: (draft: Draft) => Partial<Draft>, revision?: number) {
	const now = await desk();
	const document = { ...now.draft, ...change(now.draft) };
	return saveDraft(shop, member, sheet, { revision: revision ?? now.revision, document });
}

const lock = (key: string, ink: number) => (draft: Draft) => ({
	locks: { ...draft.locks, [key]: { ink, cost: 1, by: 'Somebody else', at: 'long ago' } },
});

describe('saving a draft', () => {
	it('colours it here, keeps the lock and signs it with the one who set it', async () => {
		const before = await desk();
		const region = before.regions.key.indexOf('0101');
		const inks = before.colouring?.status === 'coloured' ? before.colouring.inks : [];
		const ink = (inks[region] + 1) % 4;
		const result = await save(analyst, lock('0101', ink));
		if (result.status !== 'saved') throw new Error('not saved');
		expect(result.saved.revision).toBe(before.revision + 1);
		expect(result.saved.document.locks['0101'].by).toBe('analyst of drafts');
		const after = await desk();
		if (after.colouring?.status !== 'coloured') throw new Error('not coloured');
		expect(after.colouring.inks[region]).toBe(ink);
		// no two that border by line look alike: checked here from the borders, not by the checker
		const { a, b, kind } = after.borders;
		for (let i = 0; i < a.length; i++) {
			if (kind[i] === 0) expect(after.colouring.inks[a[i]]).not.toBe(after.colouring.inks[b[i]]);
		}
		// as few as can be change: the region itself and some around it
		const changed = after.colouring.inks.filter((one, i) => one !== inks[i]);
		expect(changed.length).toBeLessThan(10);
	});

	it('keeps every revision as it was', async () => {
		const first = await readDraft(shop, analyst, sheet, 1);
		expect(first.document.locks).toEqual({});
		expect(first.colouring).toMatchObject({ status: 'coloured' });
		await expect(readDraft(shop, analyst, sheet, 99)).rejects.toBeInstanceOf(NotFound);
	});

	it('keeps work whose locks collide, with the reason in place of a colouring', async () => {
		const before = await desk();
		const border = before.borders.kind.indexOf(0);
		const [one, two] = [
			before.regions.key[before.borders.a[border]],
			before.regions.key[before.borders.b[border]],
		];
		const result = await save(analyst, (draft) => ({
			locks: { ...draft.locks, [one]: { ink: 2, cost: 1 }, [two]: { ink: 2, cost: 1 } },
		}));
		if (result.status !== 'saved') throw new Error('not saved');
		const { colouring } = result.saved;
		if (colouring.status !== 'impossible')
			throw new Error('two bordering locks alike must collide');
		const blamed = colouring.explanation.locks.map((region) => before.regions.key[region]);
		expect(blamed.sort()).toEqual([one, two].sort());
		expect(colouring.sentence).toContain(before.regions.name[before.borders.a[border]]);
		expect((await desk()).colouring).toEqual(colouring);
		await save(analyst, () => ({ locks: before.draft.locks }));
		expect((await desk()).colouring).toMatchObject({ status: 'coloured' });
	});

	it('writes nothing when nothing changed', async () => {
		const before = await desk();
		const result = await save(analyst, () => ({}));
		expect(result).toMatchObject({ status: 'saved', saved: { revision: before.revision } });
	});

	it('leaves the colouring as it is when only its looks change', async () => {
		const before = await desk();
		await save(designer, (draft) => ({ layout: { ...draft.layout, title: 'Another title' } }));
		const after = await desk();
		expect(after.revision).toBe(before.revision + 1);
		expect(after.colouring).toEqual(before.colouring);
	});
});

describe('who may change what', () => {
	const strike = () => ({ struck: [{ a: '0101', b: '0102', reason: 'a river nobody crosses' }] });
	const retitle = (draft: Draft) => ({ layout: { ...draft.layout, title: 'Retitled' } });
	const repaint = (draft: Draft) => ({ palette: { ...draft.palette, name: 'Repainted' } });

	it.each([
		['an analyst strikes no border', () => save(analyst, strike)],
		['an analyst lays nothing out', () => save(analyst, retitle)],
		['a designer locks nothing', () => save(designer, lock('0102', 0))],
		[
			'a designer who also locks changes nothing',
			() => save(designer, (draft) => ({ ...repaint(draft), ...lock('0102', 0)(draft) })),
		],
	])('%s', async (_case, attempt) => {
		const before = await desk();
		await expect(attempt()).rejects.toBeInstanceOf(Forbidden);
		expect((await desk()).revision).toBe(before.revision);
	});

	it('a designer repaints, a cartographer strikes a border', async () => {
		expect(await save(designer, repaint)).toMatchObject({ status: 'saved' });
		expect(await save(cartographer, strike)).toMatchObject({ status: 'saved' });
	});
});

describe('what a draft may not say', () => {
	it('names no region that the sheet does not have', async () => {
		const problem = save(analyst, lock('no such district', 0));
		await expect(problem).rejects.toBeInstanceOf(Unfit);
		await expect(problem).rejects.toThrow('no such district');
	});
});

describe('another team', () => {
	it('knows nothing of the sheet', async () => {
		const stranger = await createMember(shop.db, 'strangers', 'cartographer', 'analyst', 'admin');
		const { draft, revision } = await desk();
		const attempts = [
			() => deskSheet(shop, stranger, sheet),
			() => sheetGeometry(shop, stranger, sheet),
			() => readDraft(shop, stranger, sheet, 1),
			() => saveDraft(shop, stranger, sheet, { revision, document: draft }),
		];
		for (const attempt of attempts) await expect(attempt()).rejects.toBeInstanceOf(NotFound);
	});
});
