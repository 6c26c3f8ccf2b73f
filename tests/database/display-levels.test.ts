import { gunzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { coverageFaults, decodeCoverage } from '../../src/lib/engines/boundaries/index.ts';
import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import { decodeFirstPicture } from '../../src/lib/engines/sheet/index.ts';
import type { DeskSheetApart } from '../../src/lib/schemas/desk.ts';
import { pictureTag } from '../../src/lib/schemas/first-picture.ts';
import { displayLevel } from '../../src/lib/schemas/display-level.ts';
import { decodeColumns } from '../../src/lib/schemas/sheet-columns.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { firstPictureTag } from '../../src/lib/server/services/first-picture-tag.ts';
import { sheetFirstPicture } from '../../src/lib/server/services/first-picture.service.ts';
import { NotFound } from '../../src/lib/server/services/outcomes.ts';
import { sheetColumns, sheetForPage } from '../../src/lib/server/services/sheet-columns.service.ts';
import {
	deskSheet,
	removeSheet,
	sheetGeometry,
} from '../../src/lib/server/services/sheet.service.ts';
import { fractalNeighbours, fractalText } from '../support/fractal-land.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

/** More regions than come whole, and more points than are drawn as they are. */
const land = { regions: 4_200, inner: 14, seed: 3 };

let shop: TestWorkshop;
let member: Member;
let stranger: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'levels', 'cartographer', 'admin');
	stranger = await createMember(shop.db, 'strangers', 'cartographer', 'admin');
	const bytes = new TextEncoder().encode([...fractalText(land)].join(''));
	await ingest(shop, member, 'land.geojson', bytes);
});
afterAll(() => shop.close());

describe('a large sheet', () => {
	it('has levels of display, each stored as told and sound', async () => {
		const { boundarySet, regions } = await deskSheet(shop, member, 1);
		const full = decodeCoverage(await (await sheetGeometry(shop, member, 1)).read());
		expect(boundarySet.levels.length).toBeGreaterThan(0);
		for (const { level, points } of boundarySet.levels) {
			const { tag, read } = await sheetGeometry(shop, member, 1, level);
			const coverage = decodeCoverage(await read());
			expect(tag).toBe(`${boundarySet.id}-${level}`);
			expect(coverageFaults(coverage)).toEqual([]);
			expect(coverage.keys).toEqual(regions.key);
			expect(coverage.arcPoints.length / 2).toBe(points);
			expect(points).toBeLessThan(full.arcPoints.length / 2);
			// measured on the full geometry, whatever is shown
			expect(coverage.areasKm2).toEqual(full.areasKm2);
			expect(coverage.arcMetres).toEqual(full.arcMetres);
		}
	});

	it('comes to its page without regions and borders, which follow as bytes', async () => {
		const whole = await deskSheet(shop, member, 1);
		const page = await sheetForPage(shop, member, 1);
		expect(page).toMatchObject({ regions: null, borders: null, group: null, name: whole.name });
		expect(JSON.stringify(page).length).toBeLessThan(land.regions + 20_000);
		const packed = await (await sheetColumns(shop, member, 1)).read();
		const { buffer } = Uint8Array.from(gunzipSync(packed));
		const columns = decodeColumns(buffer);
		const { group: _, ...regions } = whole.regions;
		expect(columns).toEqual({ regions, borders: whole.borders });
		// as the rows of the made-up land have it
		let pairs = 0;
		fractalNeighbours(land, () => pairs++);
		expect(columns.borders.a).toHaveLength(pairs);
		expect(page).toMatchObject({ borderCount: pairs });
	});

	it('has a picture to show first, in which every region large enough has its cells', async () => {
		const before = await shop.db.selectFrom('first_pictures').select('tag').execute();
		const { firstPicture: tag } = (await sheetForPage(shop, member, 1)) as DeskSheetApart;
		// it was made when the land was read
		expect(before).toEqual([{ tag }]);
		const packed = await sheetFirstPicture(shop, member, 1, tag);
		const { buffer } = Uint8Array.from(gunzipSync(packed));
		const picture = decodeFirstPicture(buffer);
		expect(new Set(picture.owner).size).toBe(land.regions + 1);
		expect(picture.lines.map(({ rank }) => rank)).toEqual(['region', 'outer']);
		const kept = await shop.db.selectFrom('first_pictures').selectAll().execute();
		expect(kept.map((one) => one.tag)).toEqual([tag]);
		expect(await sheetFirstPicture(shop, member, 1, tag)).toEqual(kept[0].picture);
		expect(pictureTag.safeParse(tag).success).toBe(true);
	});

	it('makes another picture for another layout, none for an ink, and none that was not asked for', async () => {
		const sheet = await deskSheet(shop, member, 1);
		const { layout, palette } = sheet.draft;
		const other = (draft: Partial<Draft>) =>
			firstPictureTag({ ...sheet, draft: { ...sheet.draft, ...draft } });
		const tag = firstPictureTag(sheet);
		const inks = palette.inks.map((ink) => ({ ...ink, hex: '#123456' }));
		expect(other({ palette: { ...palette, inks } })).toBe(tag);
		expect(other({ layout: { ...layout, labels: !layout.labels } })).toBe(tag);
		expect(other({ layout: { ...layout, marginMm: layout.marginMm + 1 } })).not.toBe(tag);
		const unknown = sheetFirstPicture(shop, member, 1, '0'.repeat(32));
		await expect(unknown).rejects.toBeInstanceOf(NotFound);
		await expect(sheetFirstPicture(shop, stranger, 1, tag)).rejects.toBeInstanceOf(NotFound);
	});

	it('gives no level that is not there, and none to another team', async () => {
		const missing = await sheetGeometry(shop, member, 1, 9);
		await expect(missing.read()).rejects.toBeInstanceOf(NotFound);
		await expect(sheetGeometry(shop, stranger, 1, 1)).rejects.toBeInstanceOf(NotFound);
		await expect(sheetColumns(shop, stranger, 1)).rejects.toBeInstanceOf(NotFound);
		for (const text of ['0', '-1', '1.5', 'x', '', '100', '1 or 1=1'])
			expect(displayLevel.safeParse(text).success, text).toBe(false);
	});

	it('takes its levels with it when it is deleted', async () => {
		await removeSheet(shop, member, 1);
		expect(await shop.db.selectFrom('display_levels').selectAll().execute()).toEqual([]);
		expect(await shop.db.selectFrom('first_pictures').selectAll().execute()).toEqual([]);
	});
});
