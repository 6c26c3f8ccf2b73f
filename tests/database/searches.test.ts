import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bordersForSheet } from '../../src/lib/engines/borders/index.ts';
import type { ColouringResult, Proof } from '../../src/lib/engines/colouring/index.ts';
import { Forbidden } from '../../src/lib/server/access/member.ts';
import { runSearch } from '../../src/lib/server/jobs/search.job.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { Conflict, NotFound } from '../../src/lib/server/services/outcomes.ts';
import {
	beginSearch,
	readSearch,
	sheetSearches,
	stopSearch,
} from '../../src/lib/server/services/searches.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { mycielskiSheet, type Coloured, type MycielskiSheet } from '../support/mycielski-sheet.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
beforeAll(async () => void (shop = await createWorkshop()));
afterAll(() => shop.close());

const never = new AbortController().signal;
const desk = ({ analyst, sheet }: MycielskiSheet) => deskSheet(shop, analyst, sheet);

const ask = async ({ analyst, sheet }: MycielskiSheet) => {
	const { number } = await beginSearch(shop, analyst, sheet, { times: 1 });
	return { number, id: shop.asked.at(-1) ?? '' };
};

/** Asks and has it done at once, with the effort that usually answers at the desk. */
async function searched(made: MycielskiSheet, meanwhile?: () => Promise<unknown>) {
	const { number, id } = await ask(made);
	await meanwhile?.();
	await runSearch(shop, id, never, 'normal');
	return readSearch(shop, made.analyst, made.sheet, number);
}

const open: Proof = { kind: 'not-proved', regions: [] };

/** As if the first try had found so many inks and no proof. */
const withInks = (inks: number) => (known: Coloured) => ({
	...known,
	...{ inksUsed: inks, lowerBound: 3, proof: open },
	colouring: known.colouring.with(0, inks - 1),
});
const unproved = (known: Coloured) => ({ ...known, lowerBound: 4, proof: open });

/** Whether any two that border look alike, from the borders themselves. */
async function clashes(made: MycielskiSheet): Promise<number> {
	const { regions, borders, draft, colouring } = await desk(made);
	if (colouring?.status !== 'coloured') throw new Error('not coloured');
	const { a, b } = bordersForSheet(regions.key, borders, draft);
	let count = 0;
	for (let i = 0; i < a.length; i++) {
		if (colouring.inks[a[i]] === colouring.inks[b[i]]) count++;
	}
	return count;
}

describe('a search for fewer inks', () => {
	let made: MycielskiSheet;
	beforeAll(async () => {
		made = await mycielskiSheet(shop, 'fewer', 5, 'fewest', withInks(6));
	});

	it('stores a colouring with fewer and the proof, signed by whoever asked', async () => {
		const before = await desk(made);
		expect(before.colouring).toMatchObject({ inksUsed: 6, proof: open });
		const found = await searched(made);
		expect(found).toMatchObject({ state: 'stored', gain: 'fewer-inks', question: 'inks' });
		expect(found.storedRevision).toBe(before.revision + 1);
		const after = await desk(made);
		expect(after).toMatchObject({ revision: before.revision + 1, draft: before.draft });
		expect(after.savedBy).toBe('analyst of fewer');
		expect(after.colouring).toMatchObject({ inksUsed: 5, lowerBound: 5 });
		expect(await clashes(made)).toBe(0);
	});

	it('leaves nothing more to ask', async () => {
		await expect(ask(made)).rejects.toThrow('Nothing is open');
	});

	it('is not forgotten with the next change that leaves the proof standing', async () => {
		const { revision, draft, colouring, regions } = await desk(made);
		if (colouring?.status !== 'coloured') throw new Error('not coloured');
		const locks = { [regions.key[0]]: { ink: colouring.inks[0], cost: 1 } };
		const saved = await saveDraft(shop, made.analyst, made.sheet, {
			...{ revision, document: { ...draft, locks } },
		});
		expect(saved).toMatchObject({
			status: 'saved',
			saved: { colouring: { inksUsed: 5, lowerBound: 5, inks: colouring.inks } },
		});
	});
});

describe('a search that finds a proof only', () => {
	it('leaves every ink as it is shown by then', async () => {
		const made = await mycielskiSheet(shop, 'proved', 5, 'fewest', unproved);
		const { colouring } = await desk(made);
		if (colouring?.status !== 'coloured') throw new Error('not coloured');
		const arranged = colouring.inks.map((ink) => (ink < 2 ? 1 - ink : ink));
		const found = await searched(made, async () => {
			const { revision, draft } = await desk(made);
			await saveDraft(shop, made.analyst, made.sheet, {
				...{ revision, document: draft, inks: arranged },
			});
		});
		expect(found).toMatchObject({ state: 'stored', gain: 'proof' });
		expect(found.sentence).toContain('proved');
		const after = await desk(made);
		expect(after.colouring).toMatchObject({
			...{ inks: arranged, inksUsed: 5, proof: { kind: 'refutation' } },
		});
	});
});

describe('a search for an answer', () => {
	it('stores the colouring or the reason', async () => {
		const undecided = (): ColouringResult => ({
			...{ status: 'undecided', lowerBound: 3, message: 'not settled' },
		});
		const can = await mycielskiSheet(shop, 'answer', 5, 5, undecided);
		expect(await searched(can)).toMatchObject({ state: 'stored', gain: 'answer' });
		expect(await clashes(can)).toBe(0);
		const cannot = await mycielskiSheet(shop, 'no-answer', 5, 4, undecided);
		expect(await searched(cannot)).toMatchObject({ state: 'stored', gain: 'answer' });
		expect((await desk(cannot)).colouring).toMatchObject({ status: 'impossible' });
	});
});

describe('a search for a cheaper release', () => {
	it('stores a cheaper one, and then that no cheaper one is enough', async () => {
		const made = await mycielskiSheet(shop, 'release', 4, 4, (known) => known);
		const { draft, revision } = await desk(made);
		// three that border in a row, all locked to one ink: to release the middle one is enough
		const [{ a, b }] = draft.added;
		const other = draft.added.find((pair) => pair.a !== a && (pair.a === b || pair.b === b));
		if (!other) throw new Error('every region of the graph has two neighbours');
		const third = other.a === b ? other.b : other.a;
		const locks = Object.fromEntries([a, b, third].map((key) => [key, { ink: 0, cost: 1 }]));
		const document = { ...draft, locks };
		await saveDraft(shop, made.analyst, made.sheet, { revision, document });
		const { colouring, regions } = await desk(made);
		if (colouring?.status !== 'impossible') throw new Error('locks alike must collide');
		const regionOf = (key: string) => regions.key.indexOf(key);
		expect(colouring.explanation.release).toMatchObject({ locks: [regionOf(b)], proved: true });
		const dear = { locks: [a, third].map(regionOf), cost: 2, proved: false, lowerBound: 0 };
		const explanation = { ...colouring.explanation, release: dear };
		await shop.db
			.updateTable('drafts')
			.set({ explanation: JSON.stringify({ status: 'impossible', explanation }) })
			.where('sheet_id', '=', made.sheetId)
			.where('revision', '=', revision + 1)
			.execute();
		const found = await searched(made);
		expect(found).toMatchObject({ state: 'stored', gain: 'cheaper-release', question: 'release' });
		expect(found.sentence).toContain('cost 1 in all');
		expect((await desk(made)).colouring).toMatchObject({
			explanation: { release: { locks: [regionOf(b)], cost: 1, proved: true } },
		});
		await expect(ask(made)).rejects.toThrow('Nothing is open');
	});
});

describe('a search about a draft that moved on', () => {
	it('is kept with its result, and the sheet stays as it is', async () => {
		const made = await mycielskiSheet(shop, 'moved', 5, 'fewest', withInks(6));
		const { revision, draft } = await desk(made);
		const locked = { [made.keys[0]]: { ink: 5, cost: 1 } };
		const kept = await searched(made, () =>
			saveDraft(shop, made.analyst, made.sheet, {
				...{ revision, document: { ...draft, locks: locked } },
			}),
		);
		expect(kept).toMatchObject({ state: 'kept', gain: 'fewer-inks', storedRevision: null });
		expect(kept.sentence).toContain(`For revision ${revision}:`);
		expect(kept.inks).toHaveLength(23);
		expect((await desk(made)).revision).toBe(revision + 1);
	});

	it('counts a change of looks as none', async () => {
		const made = await mycielskiSheet(shop, 'looks', 5, 'fewest', withInks(6));
		const { revision, draft } = await desk(made);
		const layout = { ...draft.layout, title: 'Renamed meanwhile' };
		const found = await searched(made, () =>
			saveDraft(shop, made.designer, made.sheet, {
				...{ revision, document: { ...draft, layout } },
			}),
		);
		expect(found).toMatchObject({ state: 'stored', storedRevision: revision + 2 });
		expect((await desk(made)).draft.layout.title).toBe('Renamed meanwhile');
	});
});

describe('who may search, and how many at once', () => {
	let made: MycielskiSheet;
	beforeAll(async () => {
		made = await mycielskiSheet(shop, 'rights', 6, 'fewest', withInks(7));
	});

	it('is one at a time, stopped by whoever may change colours, and then stays as it is', async () => {
		const { id, number } = await ask(made);
		await expect(ask(made)).rejects.toBeInstanceOf(Conflict);
		const { analyst, designer, sheet } = made;
		await expect(stopSearch(shop, designer, sheet, number)).rejects.toBeInstanceOf(Forbidden);
		await stopSearch(shop, analyst, sheet, number);
		await expect(stopSearch(shop, analyst, sheet, number)).rejects.toBeInstanceOf(Conflict);
		await runSearch(shop, id, never, 'quick');
		const [note] = await sheetSearches(shop, designer, sheet);
		expect(note).toMatchObject({ number, state: 'cancelled', storedRevision: null });
	});

	it('is asked about the revision that is looked at', async () => {
		const asked = beginSearch(shop, made.analyst, made.sheet, { times: 1, revision: 1 });
		await expect(asked).rejects.toThrow('saved again');
	});

	it('ends its thread soon when it is stopped half way', async () => {
		const { id, number } = await ask(made);
		const running = runSearch(shop, id, never);
		const state = async () => (await sheetSearches(shop, made.analyst, made.sheet))[0];
		while (!(await state()).step.includes('inks')) {
			await new Promise((done) => setTimeout(done, 50));
		}
		await stopSearch(shop, made.analyst, made.sheet, number);
		const started = performance.now();
		await running;
		expect(performance.now() - started).toBeLessThan(3_000);
		expect(await state()).toMatchObject({ state: 'cancelled' });
	});

	it('is nobody’s business in another team', async () => {
		const stranger = await createMember(shop.db, 'searchers', 'analyst');
		const { sheet } = made;
		const attempts = [
			() => beginSearch(shop, stranger, sheet, { times: 1 }),
			() => stopSearch(shop, stranger, sheet, 1),
			() => sheetSearches(shop, stranger, sheet),
			() => readSearch(shop, stranger, sheet, 1),
		];
		for (const attempt of attempts) await expect(attempt()).rejects.toBeInstanceOf(NotFound);
		const { designer } = made;
		const asked = beginSearch(shop, designer, sheet, { times: 1 });
		await expect(asked).rejects.toBeInstanceOf(Forbidden);
		await expect(readSearch(shop, designer, sheet, 99)).rejects.toBeInstanceOf(NotFound);
	});
});
