import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { decodeCoverage } from '../../src/lib/engines/boundaries/index.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import {
	beginSampleIntake,
	cancelIntake,
	intakeStatus,
	listIntakes,
	retryIntake,
} from '../../src/lib/server/services/intake.service.ts';
import { NotFound } from '../../src/lib/server/services/outcomes.ts';
import {
	acceptFinding,
	deskSheet,
	nameSheet,
	removeSheet,
	sheetGeometry,
	sheetList,
} from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'intake', 'cartographer');
});
afterAll(() => shop.close());

const sample = (name: string) => readFileSync(`sample-data/${name}`);

describe('from an uploaded file to a coloured sheet', () => {
	it('takes the 48 states and the District of Columbia', async () => {
		const status = await ingest(shop, member, 'states.geojson', bytesOf(conterminousStates()));
		expect(status).toMatchObject({ state: 'done', share: 1, refusal: null, sheet: 1 });
		const sheet = await deskSheet(shop, member, 1);
		// 49 regions and 107 line borders: the contiguous-USA graph of Knuth, TAOCP 4 fascicle 0;
		// the two point touches are those of the four-state corner
		expect(sheet.boundarySet.regionCount).toBe(49);
		const kinds = [...sheet.borders.kind];
		expect(kinds.filter((kind) => kind === 0)).toHaveLength(107);
		expect(kinds.filter((kind) => kind === 1)).toHaveLength(2);
		// four are needed: Nevada with its ring of five is an odd wheel (Knuth, loc. cit.)
		expect(sheet.colouring).toMatchObject({
			status: 'coloured',
			inksUsed: 4,
			lowerBound: 4,
			proof: { kind: 'odd-wheel' },
		});
		expect(sheet.name).toBe('states');
		expect(sheet.rights).toContain('borders.edit');
	});

	it('lists the sheet and keeps the file once', async () => {
		expect(await sheetList(shop, member)).toMatchObject([
			{ number: 1, name: 'states', regionCount: 49, inksUsed: 4, lastEdition: null },
		]);
		expect(await shop.stored()).toHaveLength(1);
	});

	it('serves the coverage that was read', async () => {
		const { tag, read } = await sheetGeometry(shop, member, 1);
		const sheet = await deskSheet(shop, member, 1);
		expect(tag).toBe(sheet.boundarySet.id);
		expect(decodeCoverage(new Uint8Array(await read())).keys).toEqual(sheet.regions.key);
	});

	it('reads the same republic from GeoJSON and from a zipped shapefile on a grid', async () => {
		const plain = await ingest(shop, member, 'tavaroe.geojson', sample('tavaroe.geojson'));
		const grid = await ingest(shop, member, 'grid.zip', sample('tavaroe-survey-grid.zip'), {
			keyField: 'CODE',
			nameField: 'NAME',
		});
		const [one, two] = [
			await deskSheet(shop, member, plain.sheet ?? 0),
			await deskSheet(shop, member, grid.sheet ?? 0),
		];
		// what sample-data/README.md says the generator put in
		for (const sheet of [one, two]) {
			expect(sheet.boundarySet).toMatchObject({ regionCount: 180, planar: false });
			expect([...sheet.borders.kind].filter((kind) => kind === 0)).toHaveLength(445);
			expect(sheet.colouring).toMatchObject({ status: 'coloured', inksUsed: 4 });
		}
		expect([...two.regions.name].sort()).toEqual([...one.regions.name].sort());
		expect(one.boundarySet.planarWitness?.sentence).toContain('were a region of its own');
	});

	it('names the sheet, and lets findings be accepted once', async () => {
		await nameSheet(shop, member, 1, '<script>alert(1)</script>');
		const sheet = await deskSheet(shop, member, 1);
		expect(sheet.name).toBe('<script>alert(1)</script>');
		const [finding] = sheet.findings;
		await acceptFinding(shop, member, 1, finding.id);
		await expect(acceptFinding(shop, member, 1, finding.id)).rejects.toBeInstanceOf(NotFound);
		const { findings } = await deskSheet(shop, member, 1);
		expect(findings[0].acceptedBy).toBe('cartographer of intake');
	});

	it('keeps a file that two sheets were read from until both are gone', async () => {
		const before = await shop.stored();
		const bytes = bytesOf(conterminousStates());
		const again = await ingest(shop, member, 'again.geojson', bytes);
		expect(await shop.stored()).toEqual(before);
		await removeSheet(shop, member, again.sheet ?? 0);
		expect(await shop.stored()).toEqual(before);
		await expect(deskSheet(shop, member, again.sheet ?? 0)).rejects.toBeInstanceOf(NotFound);
	});

	it('has nothing to cancel or read again once it is done', async () => {
		const { id } = await ingest(shop, member, 'done.geojson', sample('tavaroe.geojson'));
		await expect(cancelIntake(shop, member, id)).rejects.toThrow('not being read');
		await expect(retryIntake(shop, member, id)).rejects.toThrow('only an upload that failed');
	});
});

describe('the sample at hand', () => {
	it('goes the way of every upload and becomes a coloured sheet', async () => {
		const first = await createMember(shop.db, 'newcomers', 'cartographer');
		const { id } = await beginSampleIntake(shop, first);
		expect(shop.asked).toContain(id);
		expect(await intakeStatus(shop, first, id)).toMatchObject({
			state: 'waiting',
			fileName: 'tavaroe.geojson',
			fileBytes: sample('tavaroe.geojson').length,
		});
		await runIntake(shop, id, new AbortController().signal);
		// what sample-data/README.md says the generator put in
		expect(await sheetList(shop, first)).toMatchObject([
			{ number: 1, name: 'Districts of Tavaröe', regionCount: 180, inksUsed: 4 },
		]);
	});

	it('is not given to those who may not upload', async () => {
		const analyst = await createMember(shop.db, 'newcomers', 'analyst');
		await expect(beginSampleIntake(shop, analyst)).rejects.toBeInstanceOf(Forbidden);
	});

	it('says so where the installation comes without the file, and leaves nothing behind', async () => {
		const other = await createMember(shop.db, 'without-sample', 'cartographer');
		const before = await shop.stored();
		await expect(beginSampleIntake(shop, other, shop.data)).rejects.toThrow('tavaroe.geojson');
		expect(await shop.stored()).toEqual(before);
		expect(await listIntakes(shop, other)).toEqual([]);
	});
});
