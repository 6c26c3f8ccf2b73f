import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import { tieRules, withoutTie, withTie } from '../../src/lib/engines/editions/index.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { issueEdition } from '../../src/lib/server/services/edition.service.ts';
import { Conflict, NotFound } from '../../src/lib/server/services/outcomes.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { sheetTies, tieGround } from '../../src/lib/server/services/ties.service.ts';
import { acceptedFeatures, collection } from '../support/read-boundaries.ts';
import { bentCells, dissolved } from '../support/recut-lands.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

/** A land of 60 cells on two sheets; one region lies on both, cut by the edge. */
const [rows, columns] = [6, 10];
const cells = bentCells(rows, columns, [0.4, -0.8, 0.2, 0.9, -0.3, 0.6, -0.5]);
const inWest = (cell: number) => cell % columns < columns / 2;
const cut = [24, 25];
const nameOf = (cell: number) => (cut.includes(cell) ? 'cut' : `d${cell}`);
const regions = (wanted: (cell: number) => boolean) => {
	const own: Record<string, number[]> = {};
	cells.forEach((_, cell) => {
		if (wanted(cell)) (own[nameOf(cell)] ??= []).push(cell);
	});
	return own;
};
const fileOf = (wanted: (cell: number) => boolean) =>
	JSON.stringify(collection(dissolved(cells, regions(wanted))));

let shop: TestWorkshop;
let analyst: Member;
let cartographer: Member;
let approver: Member;
let [west, east] = [0, 0];
const usual = { keyField: 'id' };
beforeAll(async () => {
	shop = await createWorkshop();
	cartographer = await createMember(shop.db, 'edges', 'cartographer');
	analyst = await createMember(shop.db, 'edges', 'analyst');
	approver = await createMember(shop.db, 'edges', 'approver');
	const upload = async (name: string, file: string) =>
		(await ingest(shop, cartographer, name, file, usual)).sheet ?? 0;
	west = await upload('west.geojson', fileOf(inWest));
	east = await upload(
		'east.geojson',
		fileOf((cell) => !inWest(cell)),
	);
	const far = collection(
		dissolved(bentCells(2, 2, [0]).map(moved), { f0: [0], f1: [1], f2: [2, 3] }),
	);
	await upload('far.geojson', JSON.stringify(far));
});
afterAll(() => shop.close());

/** The same far away. */
const moved = (cell: (typeof cells)[number]) => {
	const [ring] = cell.geometry.coordinates as [number, number][][];
	const geometry = {
		type: 'Polygon' as const,
		coordinates: [ring.map(([x, y]) => [x - 60, y - 30])],
	};
	return { ...cell, geometry };
};

const desk = (sheet: number) => deskSheet(shop, analyst, sheet);
const groundOf = () => tieGround(shop, analyst, east, { sheet: west, within: 1 });

async function save(sheet: number, change: (draft: Draft) => Draft, inks?: number[]) {
	const { revision, draft } = await desk(sheet);
	const sent = { revision, document: change(draft), ...(inks && { inks }) };
	const result = await saveDraft(shop, analyst, sheet, sent);
	if (result.status !== 'saved') throw new Error('not saved');
	return result.saved;
}

async function inksOf(sheet: number): Promise<Map<string, number>> {
	const { colouring, regions: columns } = await desk(sheet);
	if (colouring?.status !== 'coloured') throw new Error('not coloured');
	const { inks } = colouring;
	return new Map(columns.key.map((key, region) => [key, inks[region]]));
}

/** Pairs of the whole land that look alike across the edge, and whether the cut region does not. */
async function faultsAcross(): Promise<string[]> {
	const { borders, coverage } = await acceptedFeatures(
		dissolved(cells, Object.fromEntries(cells.map((_, cell) => [`${cell}`, [cell]]))),
	);
	const [inks, others] = [await inksOf(west), await inksOf(east)];
	const inkOf = (cell: number) => (inWest(cell) ? inks : others).get(nameOf(cell));
	const faults: string[] = [];
	borders.a.forEach((a, i) => {
		const pair = [a, borders.b[i]].map((region) => Number(coverage.keys[region]));
		if (borders.kind[i] !== 0 || inWest(pair[0]) === inWest(pair[1])) return;
		const isSame = nameOf(pair[0]) === nameOf(pair[1]);
		if ((inkOf(pair[0]) === inkOf(pair[1])) !== isSame) faults.push(pair.map(nameOf).join('-'));
	});
	return faults;
}

/** West with inks turned round: as good, and other than before. */
const turned = async () => {
	const { colouring } = await desk(west);
	if (colouring?.status !== 'coloured') throw new Error('not coloured');
	return colouring.inks.map((ink) => (ink + 1) % colouring.inksUsed);
};

describe('two halves of a land as two sheets', () => {
	it('adjoin, and others come later', async () => {
		const { adjoining, states } = await sheetTies(shop, analyst, east);
		expect(adjoining.map(({ number, meets }) => [number, meets])).toEqual([
			[west, true],
			[3, false],
		]);
		expect(states).toEqual([]);
	});

	it('once tied, no two that touch across the edge look alike', async () => {
		await save(west, (draft) => draft, await turned());
		expect(await faultsAcross()).not.toEqual([]);
		const ground = await groundOf();
		expect(ground).toMatchObject({ sheet: west, edition: null });
		expect(ground.same.map(({ key }) => key)).toEqual(['cut']);
		const saved = await save(east, withTie(ground));
		expect(saved.colouring.status).toBe('coloured');
		expect(saved.document.ties).toMatchObject([{ sheet: west, by: 'analyst of edges' }]);
		expect(saved.document.locks.cut).toMatchObject({ tie: west, by: 'analyst of edges' });
		expect(await faultsAcross()).toEqual([]);
		expect((await sheetTies(shop, analyst, east)).states).toMatchObject([{ stale: false }]);
	});

	it('are told when the other has changed, and follow it when the tie is refreshed', async () => {
		await save(west, (draft) => draft, await turned());
		expect(await faultsAcross()).not.toEqual([]);
		expect((await sheetTies(shop, analyst, east)).states).toMatchObject([
			{ sheet: west, stale: true, latest: { edition: null } },
		]);
		await save(east, withTie(await groundOf()));
		expect(await faultsAcross()).toEqual([]);
		const layout = { ...(await desk(west)).draft.layout, title: 'Retitled' };
		const { revision, draft } = await desk(west);
		await saveDraft(shop, cartographer, west, { revision, document: { ...draft, layout } });
		expect((await sheetTies(shop, analyst, east)).states).toMatchObject([{ stale: false }]);
	});

	it('follow the latest edition rather than the draft', async () => {
		const issued = await desk(west);
		await issueEdition(shop, approver, west, issued.revision, 'First');
		await save(west, (draft) => draft, await turned());
		expect((await sheetTies(shop, analyst, east)).states).toMatchObject([
			{ stale: true, latest: { edition: 1, revision: issued.revision } },
		]);
		const ground = await groundOf();
		expect(ground).toMatchObject({ edition: 1, revision: issued.revision });
		const colouring = issued.colouring?.status === 'coloured' ? issued.colouring : null;
		const inCut = issued.regions.key.indexOf('cut');
		expect(ground.same).toEqual([{ key: 'cut', ink: colouring?.inks[inCut] }]);
		await save(east, withTie(ground));
		expect((await sheetTies(shop, analyst, east)).states).toMatchObject([{ stale: false }]);
	});

	it('blame the tie when own locks go against it, and are free once it is taken back', async () => {
		const ground = await groundOf();
		const [beside] = tieRules(ground, (await desk(east)).draft).forbidden;
		const own = { [beside.key]: { ink: beside.ink, cost: 1 } };
		const clash = await save(east, (draft) => ({ ...draft, locks: { ...draft.locks, ...own } }));
		expect(clash.colouring.status).toBe('impossible');
		expect(tieRules(ground, clash.document).against).toEqual([
			{ key: beside.key, ink: beside.ink, why: 'beside' },
		]);
		const freed = await save(east, withoutTie(west));
		expect(freed.colouring.status).toBe('coloured');
		expect(freed.document).toMatchObject({ ties: [], forbidden: [], locks: own });
		expect(Object.keys(freed.document.locks)).toEqual([beside.key]);
	});
});

describe('what cannot be tied', () => {
	it('is the sheet itself, another team’s, or one that is not there', async () => {
		const attempt = (member: Member, sheet: number, other: number) =>
			tieGround(shop, member, sheet, { sheet: other, within: 1 });
		await expect(attempt(analyst, east, east)).rejects.toBeInstanceOf(Conflict);
		await expect(attempt(analyst, east, 99)).rejects.toBeInstanceOf(NotFound);
		const stranger = await createMember(shop.db, 'edge-strangers', 'analyst');
		await expect(attempt(stranger, east, west)).rejects.toBeInstanceOf(NotFound);
		await expect(sheetTies(shop, stranger, east)).rejects.toBeInstanceOf(NotFound);
		const none = await attempt(analyst, east, 3);
		expect(none).toMatchObject({ same: [], beside: [] });
	});
});
