import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { decodeCoverage } from '../../src/lib/engines/boundaries/index.ts';
import { noTerritories } from '../../src/lib/engines/territories/territory-draft.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { readDraft, saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { issueEdition, sheetEditions } from '../../src/lib/server/services/edition.service.ts';
import { measureSheetGaps } from '../../src/lib/server/services/gaps.service.ts';
import { feedMeasure } from '../../src/lib/server/services/measure-feed.service.ts';
import { deskMeasures } from '../../src/lib/server/services/measures.service.ts';
import { Conflict, Unfit } from '../../src/lib/server/services/outcomes.ts';
import { applyRecut } from '../../src/lib/server/services/recut-apply.service.ts';
import { decideRecut } from '../../src/lib/server/services/recut-decide.service.ts';
import { putBackRecut } from '../../src/lib/server/services/recut-put-back.service.ts';
import { readRecut, recutGeometry } from '../../src/lib/server/services/recuts.service.ts';
import { deskSheet, sheetGeometry } from '../../src/lib/server/services/sheet.service.ts';
import {
	deskTerritories,
	saveTerritories,
} from '../../src/lib/server/services/territories.service.ts';
import { before, plotsFile, plotsSheet, recutWith, type Plot } from '../support/recut-sheets.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let cartographer: Member;
let planner: Member;
let approver: Member;
let sheet: number;
beforeAll(async () => {
	shop = await createWorkshop();
	cartographer = await createMember(shop.db, 'recuts', 'cartographer');
	planner = await createMember(shop.db, 'recuts', 'planner');
	approver = await createMember(shop.db, 'recuts', 'approver');
	sheet = await plotsSheet(shop, cartographer);
	await decideThings();
});
afterAll(() => shop.close());

const desk = () => deskSheet(shop, cartographer, sheet);
const entry = (key: string, base: string | null) => ({
	...{ key, name: `Territory ${key}`, person: '', email: '', base, capacity: 1 },
	...{ frozen: false, vacant: false, closing: false },
});

/** Locks, a border struck, two territories and a count: what has to follow. */
async function decideThings() {
	const { draft, revision } = await desk();
	const document = {
		...draft,
		locks: { a: { ink: 1, cost: 2 }, i: { ink: 0, cost: 1 } },
		struck: [{ a: 'b', b: 'c', reason: 'A wall stands there.' }],
		apart: [['a', 'i']] as [string, string][],
	};
	await saveDraft(shop, cartographer, sheet, { revision, document });
	const assignment = {
		a: 'west',
		d: 'west',
		g: 'west',
		b: 'east',
		c: 'east',
		e: 'east',
		i: 'east',
	};
	await saveTerritories(shop, planner, sheet, {
		revision: 0,
		document: {
			...noTerritories,
			territories: [entry('west', 'd'), entry('east', 'b')],
			assignment,
		},
	});
	const values = { a: 1, b: 2, c: 4, d: 8, e: 16, f: 32, g: 64, h: 128, i: 256 };
	await feedMeasure(shop, planner, sheet, 'Visits', {
		...{ unit: 'visits', values, mode: 'replace', confidential: false },
	});
}

/** What people see of a sheet, to be compared before and after. */
async function picture() {
	const { draft, colouring, regions, boundarySet } = await desk();
	const { draft: document, inks } = await deskTerritories(shop, planner, sheet);
	const { measures } = await deskMeasures(shop, planner, sheet);
	return { draft, colouring, regions, set: boundarySet.id, document, inks, measures };
}

describe('another file for a sheet', () => {
	it('is compared with what stands, and changes nothing', async () => {
		const stood = await picture();
		const recut = await recutWith(shop, cartographer, sheet);
		expect(recut).toMatchObject({
			number: 1,
			kind: 'file',
			state: 'ready',
			stale: false,
			hindrance: null,
		});
		// by construction: see tests/support/recut-sheets.ts
		expect(recut.change?.regions).toEqual({ before: 9, after: 9 });
		expect(recut.change?.counts).toEqual({
			...{ kept: 4, renamed: 1, split: 1, merged: 2, redrawn: 0, new: 1, gone: 1 },
		});
		const outcomes = recut.change?.groups.map(({ outcome, before, after }) => [
			outcome,
			before.map(({ key }) => key),
			after.map(({ key }) => key),
		]);
		expect(outcomes).toContainEqual(['renamed', ['a'], ['z']]);
		expect(outcomes).toContainEqual(['split', ['b'], ['b1', 'b2']]);
		expect(outcomes).toContainEqual(['merged', ['d', 'e'], ['de']]);
		expect(await picture()).toEqual(stood);
	});

	it('loses and gains the borders that it should, a renamed region being the same one', async () => {
		const { change } = await readRecut(shop, cartographer, sheet, 1);
		const lines = (list: { a: string; b: string; before: unknown; after: unknown }[] = []) =>
			list
				.filter(({ before, after }) => JSON.stringify([before, after]).includes('"line"'))
				.map(({ a, b }) => `${a}-${b}`);
		const gained = [
			'b1-b2',
			'b1-de',
			'b1-z',
			'b2-c',
			'b2-de',
			'c-n',
			'de-f',
			'de-g',
			'de-h',
			'de-z',
		];
		expect(lines(change?.pairs.gained).sort()).toEqual(gained);
		const lost = ['b-c', 'b-e', 'b-z', 'd-e', 'd-g', 'd-z', 'e-f', 'e-h', 'f-i', 'h-i'];
		expect(lines(change?.pairs.lost).sort()).toEqual(lost);
	});

	it('shows both sides before it is applied', async () => {
		const keysOf = async (side: 'before' | 'after') => {
			const { read } = await recutGeometry(shop, cartographer, sheet, 1, side);
			return decodeCoverage(new Uint8Array(await read())).keys;
		};
		expect(await keysOf('before')).toEqual([...'abcdefghi']);
		expect(await keysOf('after')).toContain('b2');
	});

	it('foresees what follows and what does not', async () => {
		const { report } = await readRecut(shop, cartographer, sheet, 1);
		expect(report.map(({ stage }) => stage)).toEqual(
			expect.arrayContaining(['draft', 'territories', 'measures']),
		);
		expect(report).toContainEqual(
			expect.objectContaining({ keys: ['i'], outcome: 'dropped', now: [] }),
		);
		const designer = await createMember(shop.db, 'recuts', 'designer');
		const seen = await readRecut(shop, designer, sheet, 1);
		expect(new Set(seen.report.map(({ stage }) => stage))).toEqual(new Set(['draft']));
	});
});

describe('deciding which region goes on as which', () => {
	it('takes a word for what no area tells, and takes it back', async () => {
		await decideRecut(shop, cartographer, sheet, 1, [{ before: 'i', after: ['n'] }]);
		const decided = await readRecut(shop, cartographer, sheet, 1);
		expect(decided.change?.counts).toMatchObject({ gone: 0, new: 0, renamed: 2 });
		expect(decided.decisions).toHaveLength(1);
		expect(decided.change?.groups).toContainEqual(
			expect.objectContaining({ outcome: 'renamed', by: 'hand' }),
		);
		await decideRecut(shop, cartographer, sheet, 1, []);
		const back = await readRecut(shop, cartographer, sheet, 1);
		expect(back.change?.counts).toMatchObject({ gone: 1, new: 1, renamed: 1 });
	});

	it('refuses what cannot be, in words', async () => {
		const wrong = decideRecut(shop, cartographer, sheet, 1, [{ before: 'i', after: ['nowhere'] }]);
		await expect(wrong).rejects.toBeInstanceOf(Unfit);
		await expect(wrong).rejects.toThrow('nowhere');
	});
});

describe('applying it', () => {
	let stood: Awaited<ReturnType<typeof picture>>;
	let revision: number;
	it('gives the sheet the new regions, coloured, with everything on them', async () => {
		stood = await picture();
		({ revision } = await desk());
		await issueEdition(shop, approver, sheet, revision, 'Before the re-cut');
		await applyRecut(shop, cartographer, sheet, 1, revision);
		const now = await picture();
		expect(now.set).not.toBe(stood.set);
		expect((await desk()).revision).toBe(revision + 1);
		expect(Object.keys(now.draft.locks)).toEqual(['z']);
		expect(now.draft.locks.z).toMatchObject({ ink: 1, cost: 2 });
		expect(now.draft.struck).toMatchObject([{ a: 'b2', b: 'c', reason: 'A wall stands there.' }]);
		expect(now.draft.apart).toEqual([]);
		expect(now.document.assignment).toEqual({
			...{ z: 'west', g: 'west', b1: 'east', b2: 'east', c: 'east' },
			// d and e were as large and of two territories; which one it goes to is told
			de: expect.stringMatching(/^(west|east)$/),
		});
		expect(now.document.territories.map(({ base }) => base)).toEqual(['de', 'b1']);
	});

	it('colours near to what was: the locked region keeps its ink and no neighbours are alike', async () => {
		const { colouring, borders, regions, draft } = await desk();
		if (colouring?.status !== 'coloured') throw new Error('not coloured');
		expect(colouring.inks[regions.key.indexOf('z')]).toBe(1);
		const struck = new Set(draft.struck.map(({ a, b }) => `${a}-${b}`));
		borders.a.forEach((a, i) => {
			const b = borders.b[i];
			if (borders.kind[i] !== 0 || struck.has(`${regions.key[a]}-${regions.key[b]}`)) return;
			expect(colouring.inks[a]).not.toBe(colouring.inks[b]);
		});
	});

	it('adds figures up where regions were merged, and leaves out what nobody knows', async () => {
		const { measures } = await deskMeasures(shop, planner, sheet);
		const { key } = (await desk()).regions;
		const values = Object.fromEntries(key.map((one, i) => [one, measures[0].values[i]]));
		expect(measures[0]).toMatchObject({ name: 'Visits', stale: false });
		expect(values).toEqual({
			...{ z: 1, b1: null, b2: null, c: 4, de: 24, f: 32, g: 64, h: 128, n: null },
		});
	});

	it('keeps the edition as it was issued, and earlier drafts readable', async () => {
		const { editions } = { editions: await sheetEditions(shop, cartographer, sheet) };
		expect(JSON.stringify(editions)).toContain('Before the re-cut');
		const earlier = await readDraft(shop, cartographer, sheet, revision);
		expect(earlier.boundarySetId).toBe(stood.set);
		expect(earlier.colouring).toEqual(stood.colouring);
	});

	it('is not applied twice', async () => {
		await expect(applyRecut(shop, cartographer, sheet, 1)).rejects.toBeInstanceOf(Conflict);
	});

	it('is put back whole, and can be applied again', async () => {
		const applied = await picture();
		expect((await readRecut(shop, cartographer, sheet, 1)).loses).toEqual([]);
		await putBackRecut(shop, cartographer, sheet, 1, false);
		expect(await picture()).toEqual(stood);
		expect(await readRecut(shop, cartographer, sheet, 1)).toMatchObject({
			state: 'put-back',
			hindrance: null,
		});
		await applyRecut(shop, cartographer, sheet, 1);
		const again = await picture();
		expect({ ...again, colouring: null, inks: null }).toEqual({
			...applied,
			colouring: null,
			inks: null,
		});
		const { tag } = await sheetGeometry(shop, cartographer, sheet);
		expect(tag).toBe(again.set);
	});

	it('takes later work away only from somebody who is sure, and says what it takes', async () => {
		const { draft, revision: now } = await desk();
		const document = { ...draft, locks: {} };
		await saveDraft(shop, cartographer, sheet, { revision: now, document });
		const { loses } = await readRecut(shop, cartographer, sheet, 1);
		expect(loses).toEqual(['The draft was saved once since; it goes back to how it was before.']);
		await expect(putBackRecut(shop, cartographer, sheet, 1, false)).rejects.toThrow(
			'saved once since',
		);
		expect((await desk()).revision).toBe(now + 1);
		await putBackRecut(shop, cartographer, sheet, 1, true);
		expect((await picture()).draft).toEqual(stood.draft);
		// what was taken away stays among the revisions
		expect((await readDraft(shop, cartographer, sheet, now + 1)).document.locks).toEqual({});
	});
});

describe('gaps across water', () => {
	it('are measured on the new boundaries as far as before, so that the rule still counts', async () => {
		const plots = [...before, ['far', 34, 2, 44, 8] as Plot];
		const file = plotsFile(plots);
		const made = await ingest(shop, cartographer, 'islands.geojson', file);
		const island = made.sheet ?? 0;
		await measureSheetGaps(shop, cartographer, island, 10);
		const { draft, revision } = await deskSheet(shop, cartographer, island);
		const struck = [{ a: 'c', b: 'far', reason: 'Nobody sees both.' }];
		const document = { ...draft, waterKm: 10, struck };
		await saveDraft(shop, cartographer, island, { revision, document });
		const later = plots.filter(([key]) => key !== 'i');
		const recut = await recutWith(shop, cartographer, island, later);
		expect(recut.change?.pairs.counts.gained).toBe(0);
		await applyRecut(shop, cartographer, island, recut.number);
		const now = await deskSheet(shop, cartographer, island);
		expect(now.boundarySet.gapsKm).toBe(10);
		// 0.04 degrees of longitude at 10 degrees north are 4.4 km (111.32 km a degree at the equator, WGS 84)
		const pair = now.borders.a.findIndex(
			(a, i) => now.regions.key[a] === 'c' && now.regions.key[now.borders.b[i]] === 'far',
		);
		expect(now.borders.metres[pair] / 1000).toBeCloseTo(0.04 * 111.32 * Math.cos(Math.PI / 18), 1);
		expect(now.draft).toMatchObject({ waterKm: 10, struck });
	});
});
