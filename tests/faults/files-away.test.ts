import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { s3Store } from '../../src/lib/server/files/s3.ts';
import { UploadFault } from '../../src/lib/server/files/multipart.ts';
import { FilesAway } from '../../src/lib/server/files/store.ts';
import { beginIntake } from '../../src/lib/server/services/intake.service.ts';
import { fakeObjectStore, type FakeObjectStore } from '../support/object-store.ts';
import {
	createMember,
	createWorkshop,
	ingest,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let fake: FakeObjectStore;
let spool: string;
let member: Member;
beforeAll(async () => {
	fake = await fakeObjectStore();
	spool = await mkdtemp(join(tmpdir(), 'merestone-spool-'));
	shop = { ...(await createWorkshop()), files: s3Store(fake.settings, spool) };
	member = await createMember(shop.db, 'away', 'cartographer');
});
afterAll(async () => {
	await shop.close();
	await fake.close();
	await rm(spool, { recursive: true, force: true });
});

const ring = [
	[0, 0],
	[1, 0],
	[1, 1],
	[0, 0],
];
const file = JSON.stringify({
	type: 'Feature',
	properties: { name: 'one' },
	geometry: { type: 'Polygon', coordinates: [ring] },
});
const intakes = () => shop.db.selectFrom('intakes').selectAll().execute();

describe('a store of files that is away', () => {
	it('is told as 503 with words, and nothing half kept', async () => {
		await fake.stop();
		const refused = beginIntake(shop, member, uploadRequest('one.geojson', file));
		await expect(refused).rejects.toBeInstanceOf(UploadFault);
		await expect(refused).rejects.toMatchObject({
			status: 503,
			code: 'files-away',
			message: expect.stringContaining('Nothing was kept; try again'),
		});
		// a file of several parts is told as soon as the service does not take one
		const large = uploadRequest('large.geojson', new Uint8Array(30_000_000));
		await expect(beginIntake(shop, member, large)).rejects.toMatchObject({ status: 503 });
		expect(await intakes()).toEqual([]);
		expect(await readdir(spool)).toEqual([]);
		expect(shop.asked).toEqual([]);
	});

	it('leaves no row where it goes away between arriving and being kept', async () => {
		await fake.start();
		const received = shop.files.receive.bind(shop.files);
		shop.files.receive = async (source) => {
			const file = await received(source);
			await fake.stop();
			return file;
		};
		const refused = beginIntake(shop, member, uploadRequest('one.geojson', file));
		await expect(refused).rejects.toBeInstanceOf(FilesAway);
		shop.files.receive = received;
		await fake.start();
		expect(await intakes()).toEqual([]);
		expect(await readdir(spool)).toEqual([]);
		expect((await fake.objects()).filter((name) => !name.startsWith('incoming'))).toEqual([]);
	});

	it('takes the same file in once it is back', async () => {
		expect(await ingest(shop, member, 'one.geojson', file)).toMatchObject({ state: 'done' });
		expect(await readdir(spool)).toEqual([]);
	});
});
