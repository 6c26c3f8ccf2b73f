import type { ChildProcess } from 'node:child_process';
import type PgBoss from 'pg-boss';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { openBoss, queueOf } from '../../src/lib/server/jobs/queue.ts';
import { runRecut } from '../../src/lib/server/jobs/recut.job.ts';
import { claimRow, releaseSilent } from '../../src/lib/server/repositories/claims.repository.ts';
import { beginFileRecut, beginReading } from '../../src/lib/server/services/recut-begin.service.ts';
import { readyRecut, refuseRecut } from '../../src/lib/server/services/recut-end.service.ts';
import { cancelRecut } from '../../src/lib/server/services/recut-work.service.ts';
import { readRecut, recutStatus } from '../../src/lib/server/services/recuts.service.ts';
import { deskSheet, removeSheet } from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, usAtlas } from '../support/atlas.ts';
import { plotsSheet } from '../support/recut-sheets.ts';
import { endWorker, startWorker, until } from '../support/worker.ts';
import {
	createMember,
	createWorkshop,
	ingest,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
let boss: PgBoss;
let worker: ChildProcess | undefined;
const counties = bytesOf(usAtlas('counties'));
const never = new AbortController().signal;
beforeAll(async () => {
	shop = await createWorkshop();
	boss = await openBoss(shop.url, false);
	shop.queue = queueOf(boss);
	member = await createMember(shop.db, 'killed', 'cartographer');
});
afterEach(async () => {
	if (worker) await endWorker(worker, 'SIGKILL');
	worker = undefined;
});
afterAll(async () => {
	await boss.stop({ graceful: false });
	await shop.close();
});

const sets = async () =>
	(await shop.db.selectFrom('boundary_sets').select('id').orderBy('id').execute()).map(
		({ id }) => id,
	);
const idOf = async (sheetId: string, number: number) =>
	(
		await shop.db
			.selectFrom('recuts')
			.select('id')
			.where('sheet_id', '=', sheetId)
			.where('number', '=', number)
			.executeTakeFirstOrThrow()
	).id;

describe('a worker that is killed while it reads a re-cut', () => {
	it('the next one takes it up and finishes it, once; the sheet is as it was', async () => {
		const sheet = (await ingest(shop, member, 'counties.geojson', counties)).sheet ?? 0;
		const stood = await sets();
		const before = await deskSheet(shop, member, sheet);
		worker = startWorker(shop);
		const request = uploadRequest('counties.geojson', counties);
		const { number } = await beginFileRecut(shop, member, sheet, request);
		const status = () => recutStatus(shop, member, sheet, number);
		await until(status, ({ state }) => state === 'reading', 60);
		await endWorker(worker, 'SIGKILL');
		expect((await status()).state).toBe('reading');
		worker = startWorker(shop);
		const done = await until(
			status,
			({ state }) => state !== 'reading' && state !== 'waiting',
			200,
		);
		expect(done.state).toBe('ready');
		const { change } = await readRecut(shop, member, sheet, number);
		// the very same file: every county goes on as itself
		expect(change?.counts).toMatchObject({ kept: before.regions.key.length, new: 0, gone: 0 });
		expect(change?.pairs.counts).toEqual({ gained: 0, lost: 0, changed: 0 });
		expect(await sets()).toHaveLength(stood.length + 1);
		expect(await deskSheet(shop, member, sheet)).toEqual(before);
	}, 300_000);
});

describe('a re-cut that is read twice counts once', () => {
	it('a reader that was taken for dead can store nothing, and a job that comes again does nothing', async () => {
		const sheet = await plotsSheet(shop, member);
		const { id: sheetId } = await deskSheet(shop, member, sheet);
		const { number } = await beginReading(shop, member, sheet, { mends: 'keep' });
		const id = await idOf(sheetId, number);
		const late = await claimRow(shop.db, 'recuts', id);
		const heard_at = new Date(Date.now() - 60_000);
		await shop.db.updateTable('recuts').set({ heard_at }).where('id', '=', id).execute();
		expect(await releaseSilent(shop.db, 'recuts', 15)).toContain(id);
		await runRecut(shop, id, never);
		const [ready, stood] = [await readRecut(shop, member, sheet, number), await sets()];
		expect(ready.state).toBe('ready');
		const claim = { id, claim: late?.claim ?? '' };
		const nothing = { status: 'accepted' } as Parameters<typeof readyRecut>[2];
		expect(await readyRecut(shop, claim, nothing)).toBe(false);
		const refusal = { code: 'x', message: 'x', findings: [], question: null, taken: [] };
		expect(await refuseRecut(shop, claim, { status: 'refused', ...refusal })).toBe(false);
		await runRecut(shop, id, never);
		expect(await readRecut(shop, member, sheet, number)).toEqual(ready);
		expect(await sets()).toEqual(stood);
	});

	it('one that is cancelled, or whose sheet is deleted, in the middle leaves nothing', async () => {
		const sheet = (await ingest(shop, member, 'more.geojson', counties)).sheet ?? 0;
		const { id: sheetId } = await deskSheet(shop, member, sheet);
		const [stood, files] = [await sets(), (await shop.stored()).length];
		const other = bytesOf({ ...usAtlas('counties'), name: 'another digest' });
		for (const end of ['cancel', 'delete']) {
			const request = uploadRequest('other.geojson', other);
			const { number } = await beginFileRecut(shop, member, sheet, request);
			const reading = runRecut(shop, await idOf(sheetId, number), never);
			const status = () => recutStatus(shop, member, sheet, number);
			await until(status, ({ state }) => state === 'reading', 60);
			if (end === 'cancel') await cancelRecut(shop, member, sheet, number);
			else await removeSheet(shop, member, sheet);
			await reading;
			expect(await sets()).toHaveLength(end === 'cancel' ? stood.length : stood.length - 1);
			expect(await shop.stored()).toHaveLength(files);
		}
	});
});
