import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import Papa from 'papaparse';
import type { Member } from '../../src/lib/server/access/member.ts';
import { borderFile } from '../../src/lib/server/services/border-files.service.ts';
import { saveDraft } from '../../src/lib/server/services/draft.service.ts';
import { measureSheetGaps } from '../../src/lib/server/services/gaps.service.ts';
import { Unfit } from '../../src/lib/server/services/outcomes.ts';
import { sheetPieces } from '../../src/lib/server/services/pieces.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { Forbidden } from '../../src/lib/server/access/member.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'gaps', 'cartographer');
	const read = await ingest(shop, member, 'strait.geojson', strait, { keyField: 'key' });
	expect(read.state).toBe('done');
});
afterAll(() => shop.close());

const square = (x: number, y: number, width = 1) => [
	[x, y],
	[x + width, y],
	[x + width, y + width],
	[x, y + width],
	[x, y],
];
const feature = (key: string, ...rings: number[][][]) => ({
	type: 'Feature',
	properties: { key },
	geometry: { type: 'MultiPolygon', coordinates: rings.map((ring) => [ring]) },
});
/**
 * At the equator: west and mid share a line, east lies 0.1 degree of longitude beyond, far 0.5 further;
 * west has a second part beyond far.
 */
const strait = JSON.stringify({
	type: 'FeatureCollection',
	features: [
		feature('west', square(0, 0), square(5, 0, 0.2)),
		feature('mid', square(1, 0)),
		feature('east', square(2.1, 0)),
		feature('far', square(3.6, 0)),
	],
});
/** Kilometres along a parallel: a cos(lat) / sqrt(1 - e2 sin2(lat)) a radian, by the axes of WGS 84. */
function along(degrees: number, latitude: number): string {
	const [turn, sine] = [(degrees * Math.PI) / 180, Math.sin((latitude * Math.PI) / 180)];
	const radius =
		(6378.137 * Math.sqrt(1 - sine ** 2)) / Math.sqrt(1 - 0.00669437999014 * sine ** 2);
	return (radius * turn).toFixed(2);
}

const desk = () => deskSheet(shop, member, 1);
const across = async () => {
	const { borders, regions } = await desk();
	return [...borders.a.keys()]
		.filter((i) => borders.kind[i] === 4)
		.map((i) => {
			const ends = [regions.key[borders.a[i]], regions.key[borders.b[i]]];
			return `${ends.sort().join('-')} ${(borders.metres[i] / 1000).toFixed(2)}`;
		});
};
async function saveRule(change: object) {
	const { draft, revision } = await desk();
	return saveDraft(shop, member, 1, { revision, document: { ...draft, ...change } });
}

describe('gaps across water', () => {
	it('are measured as far as asked, kept, and seen at once by whoever has the boundaries at hand', async () => {
		expect(await across()).toEqual([]);
		const first = await measureSheetGaps(shop, member, 1, 20);
		expect(first).toEqual({ withinKm: 20, pairs: 1, cut: false });
		expect(await across()).toEqual([`east-mid ${along(0.1, 1)}`]);
		const second = await measureSheetGaps(shop, member, 1, 60);
		expect(second).toMatchObject({ withinKm: 60, cut: false });
		expect((await across()).sort()).toEqual([
			`east-far ${along(0.5, 1)}`,
			`east-mid ${along(0.1, 1)}`,
			`far-west ${along(0.4, 0.2)}`,
		]);
		expect((await desk()).boundarySet.gapsKm).toBe(60);
	});

	it('are not measured twice, nor taken back by a shorter distance', async () => {
		const rows = () => shop.db.selectFrom('activity').select('action').execute();
		const before = (await rows()).length;
		expect(await measureSheetGaps(shop, member, 1, 5)).toMatchObject({ withinKm: 60, pairs: 3 });
		expect((await rows()).length).toBe(before);
	});

	it('count by the sheet’s rule, in the colouring that is saved and in the files alike', async () => {
		const { a } = (await desk()).borders;
		expect(a).toHaveLength(4);
		const edges = async () => {
			const file = await borderFile(shop, member, 1, 'col', AbortSignal.timeout(60_000));
			return new TextDecoder().decode(file.bytes).match(/^p edge .*$/m)![0];
		};
		expect(await edges()).toBe('p edge 4 1');
		const saved = await saveRule({ waterKm: 20 });
		expect(saved).toMatchObject({
			saved: { colouring: { inksUsed: 2 }, document: { waterKm: 20 } },
		});
		expect(await edges()).toBe('p edge 4 2');
		await saveRule({ waterKm: 60, leastMetres: 1_000 });
		expect(await edges()).toBe('p edge 4 4');
		await saveRule({ waterKm: 0, leastMetres: 1_000_000 });
		expect(await edges()).toBe('p edge 4 0');
		const csv = await borderFile(shop, member, 1, 'csv', AbortSignal.timeout(60_000));
		const { data } = Papa.parse<Record<string, string>>(new TextDecoder().decode(csv.bytes), {
			header: true,
			skipEmptyLines: true,
		});
		expect(data.map((row) => row['why not']).sort()).toEqual([
			...['across water does not count', 'across water does not count'],
			...['across water does not count', 'shorter than the shortest line that counts'],
		]);
	});

	it('sign what is decided by hand, and keep a draft that was saved before there were these rules', async () => {
		const struck = [{ a: 'mid', b: 'west', reason: 'a wall' }];
		await saveRule({ struck });
		const { draft } = await desk();
		expect(draft.struck).toEqual([
			{ ...struck[0], by: 'cartographer of gaps', at: expect.any(String) },
		]);
		const sheet = await shop.db
			.selectFrom('sheets')
			.select(['id', 'revision'])
			.executeTakeFirstOrThrow();
		const { leastMetres: _least, waterKm: _water, ...older } = draft;
		await shop.db
			.updateTable('drafts')
			.set({ document: JSON.stringify(older) })
			.where('sheet_id', '=', sheet.id)
			.where('revision', '=', sheet.revision)
			.execute();
		expect((await desk()).draft).toEqual({ ...draft, leastMetres: 0, waterKm: null });
	});

	it('are for those who may edit borders', async () => {
		const guest = await createMember(shop.db, 'gaps', 'designer');
		await expect(measureSheetGaps(shop, guest, 1, 100)).rejects.toBeInstanceOf(Forbidden);
	});

	it('say so when the work runs out before the distance, and keep what is known', async () => {
		const poor = { ...shop, pool: { ...shop.pool, run: async () => nothing as never } };
		await expect(measureSheetGaps(poor, member, 1, 150)).rejects.toBeInstanceOf(Unfit);
		const half = { ...shop.pool, run: async () => ({ ...nothing, withinKm: 75 }) as never };
		const cut = await measureSheetGaps({ ...shop, pool: half }, member, 1, 150);
		expect(cut).toMatchObject({ withinKm: 75, cut: true });
	});
});
const nothing = { gaps: { a: [], b: [], metres: [], lon: [], lat: [] }, withinKm: 10 };

describe('pieces', () => {
	const listed = async () => {
		const { regions } = await desk();
		const pieces = await sheetPieces(shop, member, 1);
		return pieces.region.map((region, i) => `${regions.key[region]} ${pieces.kind[i]}`);
	};
	it('are kept when a file is read', async () => {
		expect(await listed()).toEqual(['west main', 'west island', 'east island', 'far island']);
		const { n } = await shop.db
			.selectFrom('pieces')
			.select(({ fn }) => fn.countAll<number>().as('n'))
			.executeTakeFirstOrThrow();
		expect(Number(n)).toBe(4);
	});
	it('are worked out for boundaries that were read before, and kept then', async () => {
		const kept = await sheetPieces(shop, member, 1);
		await shop.db.deleteFrom('pieces').execute();
		expect(await sheetPieces(shop, member, 1)).toEqual(kept);
		await shop.db.deleteFrom('pieces').where('region', '=', 0).execute();
		expect((await sheetPieces(shop, member, 1)).region).toEqual([2, 3]);
	});
});
