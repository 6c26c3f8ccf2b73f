import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { readDraft, saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let analyst: Member;
let designer: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	const cartographer = await createMember(shop.db, 'arrange', 'cartographer');
	analyst = await createMember(shop.db, 'arrange', 'analyst');
	designer = await createMember(shop.db, 'arrange', 'designer');
	await ingest(shop, cartographer, 'states.geojson', bytesOf(conterminousStates()));
});
afterAll(() => shop.close());

const desk = () => deskSheet(shop, analyst, 1);

async function shown() {
	const sheet = await desk();
	if (sheet.colouring?.status !== 'coloured') throw new Error('not coloured');
	return { ...sheet, colouring: sheet.colouring };
}

async function save(inks: number[], change: Partial<Draft> = {}, member = analyst) {
	const { revision, draft } = await desk();
	const result = await saveDraft(shop, member, 1, {
		...{ revision, inks },
		document: { ...draft, ...change },
	});
	if (result.status !== 'saved') throw new Error('not saved');
	return result.saved;
}

/** The colouring with two inks exchanged on the whole sheet: as good as the one before, and another. */
const exchanged = (inks: number[], one: number, two: number) =>
	inks.map((ink) => (ink === one ? two : ink === two ? one : ink));

const logged = () =>
	shop.db.selectFrom('activity').select(['action', 'detail']).orderBy('id').execute();

describe('an arrangement that keeps every rule', () => {
	it('is stored as shown, with the proof, and undo stores the one before again', async () => {
		const before = await shown();
		const inks = exchanged(before.colouring.inks, 0, 1);
		const saved = await save(inks);
		expect(saved.revision).toBe(before.revision + 1);
		expect(saved.colouring).toEqual({ ...before.colouring, inks });
		expect((await shown()).colouring.inks).toEqual(inks);
		expect((await logged()).at(-1)).toMatchObject({ action: 'draft.arranged' });

		const undone = await save(before.colouring.inks);
		expect(undone.revision).toBe(before.revision + 2);
		expect((await shown()).colouring).toEqual(before.colouring);
		expect((await readDraft(shop, analyst, 1, saved.revision)).colouring).toEqual(saved.colouring);
	});

	it('writes nothing when document and inks are as they are stored', async () => {
		const before = await shown();
		const saved = await save(before.colouring.inks);
		expect(saved.revision).toBe(before.revision);
		expect(saved.colouring).toEqual(before.colouring);
	});

	it('goes with a change of the rules, and later colourings stay near to it', async () => {
		const before = await shown();
		const inks = exchanged(before.colouring.inks, 1, 2);
		const [first, second] = before.regions.key;
		const lock = { ink: inks[0], cost: 1 };
		const saved = await save(inks, { locks: { [first]: lock } });
		expect(saved.colouring).toMatchObject({ status: 'coloured', inks });
		expect((await logged()).at(-1)).toMatchObject({
			...{ action: 'draft.saved', detail: { parts: ['locks'], arranged: true } },
		});

		const { revision, draft } = await desk();
		const locks = { ...draft.locks, [second]: { ink: inks[1], cost: 1 } };
		const next = await saveDraft(shop, analyst, 1, { revision, document: { ...draft, locks } });
		if (next.status !== 'saved') throw new Error('not saved');
		expect(next.saved.colouring).toMatchObject({ status: 'coloured', inks });
		await save(before.colouring.inks, { locks: {} });
	});

	it('goes with a change that binds nothing', async () => {
		const { colouring, draft } = await shown();
		const inks = exchanged(colouring.inks, 0, 2);
		const goals: Draft['goals'] = [{ kind: 'even-count', give: 0 }];
		const saved = await save(inks, { goals });
		expect(saved.colouring).toEqual({ ...colouring, inks });
		expect(saved.document.goals).toEqual(goals);
		await save(colouring.inks, { goals: draft.goals });
	});

	it('may use as many inks as the draft names, and then stands without a proof', async () => {
		const before = await shown();
		const inks = before.colouring.inks.with(0, 4);
		const saved = await save(inks, { inks: 5 });
		expect(saved.colouring).toMatchObject({
			...{ status: 'coloured', inks, inksUsed: 5, proof: { kind: 'not-proved' } },
		});
		await save(before.colouring.inks, { inks: 'fewest' });
		expect((await shown()).colouring).toEqual(before.colouring);
	});
});

describe('an arrangement that does not hold', () => {
	const clashing = (
		inks: number[],
		a: ArrayLike<number>,
		b: ArrayLike<number>,
		kind: Uint8Array,
	) => {
		const line = kind.indexOf(0);
		return inks.with(a[line], inks[b[line]]);
	};

	it.each<[string, (inks: number[], sheet: Awaited<ReturnType<typeof shown>>) => number[]]>([
		['is too short', (inks) => inks.slice(1)],
		['is too long', (inks) => [...inks, 0]],
		['is empty', () => []],
		['takes an ink more than are needed', (inks) => inks.with(0, 4)],
		['takes an ink that no palette has', (inks) => inks.with(0, 255)],
		[
			'gives two that border one ink',
			(inks, { borders }) => clashing(inks, borders.a, borders.b, Uint8Array.from(borders.kind)),
		],
	])('writes nothing when it %s', async (_case, spoil) => {
		const before = await shown();
		const saved = await save(spoil(before.colouring.inks, before));
		expect(saved.revision).toBe(before.revision);
		expect(saved.colouring).toEqual(before.colouring);
	});

	it('makes room for a colouring of our own where rules changed with it', async () => {
		const before = await shown();
		const [first, second] = before.regions.key;
		const { inks } = before.colouring;
		const other = (inks[0] + 1) % 4;
		const forbidden = [{ key: first, ink: inks[0] }];
		for (const change of [{ locks: { [first]: { ink: other, cost: 1 } } }, { forbidden }]) {
			const saved = await save(inks, change);
			if (saved.colouring.status !== 'coloured') throw new Error('not coloured');
			expect(saved.colouring.inks).not.toEqual(inks);
			expect(saved.colouring.inks[0]).not.toBe(inks[0]);
			await save(inks, { locks: {}, forbidden: [] });
		}
		const far = before.regions.key.findIndex((_, i) => i > 1 && inks[i] !== inks[1]);
		const alike: Draft['alike'] = [[second, before.regions.key[far]]];
		const saved = await save(inks, { alike });
		if (saved.colouring.status === 'coloured') {
			expect(saved.colouring.inks[1]).toBe(saved.colouring.inks[far]);
		}
		await save(inks, { alike: [] });
	});

	it('helps nobody past locks that collide', async () => {
		const before = await shown();
		const line = Array.from(before.borders.kind).indexOf(0);
		const [one, two] = [before.borders.a[line], before.borders.b[line]];
		const { key } = before.regions;
		const locks = { [key[one]]: { ink: 2, cost: 1 }, [key[two]]: { ink: 2, cost: 1 } };
		const saved = await save(before.colouring.inks, { locks });
		expect(saved.colouring).toMatchObject({ status: 'impossible' });
		const again = await save(before.colouring.inks);
		expect(again).toMatchObject({ revision: saved.revision, colouring: { status: 'impossible' } });
		await save(before.colouring.inks, { locks: {} });
		expect((await shown()).colouring).toEqual(before.colouring);
	});
});

describe('who may arrange', () => {
	it('is whoever may change colours', async () => {
		const { colouring, draft, revision } = await shown();
		const inks = exchanged(colouring.inks, 0, 1);
		await expect(save(inks, {}, designer)).rejects.toBeInstanceOf(Forbidden);
		const layout = { ...draft.layout, title: 'Retitled' };
		await expect(save(inks, { layout }, designer)).rejects.toBeInstanceOf(Forbidden);
		expect((await desk()).revision).toBe(revision);
		const saved = await save(colouring.inks, { layout }, designer);
		expect(saved).toMatchObject({ revision: revision + 1, colouring });
	});

	it('is told of another who arranged at once', async () => {
		const { colouring, draft: document, revision } = await shown();
		const results = await Promise.all(
			[exchanged(colouring.inks, 0, 1), exchanged(colouring.inks, 2, 3)].map((inks) =>
				saveDraft(shop, analyst, 1, { revision, document, inks }),
			),
		);
		expect(results.map(({ status }) => status).sort()).toEqual(['saved', 'stale']);
		expect((await desk()).revision).toBe(revision + 1);
	});
});
