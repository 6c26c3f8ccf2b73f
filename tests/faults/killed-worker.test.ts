import type { ChildProcess } from 'node:child_process';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type PgBoss from 'pg-boss';
import type { Member } from '../../src/lib/server/access/member.ts';
import { openBoss, queueOf } from '../../src/lib/server/jobs/queue.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import { acceptIntake } from '../../src/lib/server/services/intake-end.service.ts';
import { claimRow, releaseSilent } from '../../src/lib/server/repositories/claims.repository.ts';
import {
	beginIntake,
	cancelIntake,
	intakeStatus,
} from '../../src/lib/server/services/intake.service.ts';
import { deskSheet, sheetList } from '../../src/lib/server/services/sheet.service.ts';
import { bytesOf, conterminousStates, usAtlas } from '../support/atlas.ts';
import { endWorker, startWorker, until } from '../support/worker.ts';
import {
	createMember,
	createWorkshop,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
let boss: PgBoss;
let worker: ChildProcess | undefined;
const counties = bytesOf(usAtlas('counties'));
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

const upload = async (bytes: Uint8Array) =>
	(await beginIntake(shop, member, uploadRequest('counties.geojson', bytes))).id;
const status = (id: string) => () => intakeStatus(shop, member, id);
const isReading = ({ state }: { state: string }) => state === 'reading';
const isOver = ({ state }: { state: string }) => state !== 'reading' && state !== 'waiting';

describe('a worker that is killed in the middle of a file', () => {
	it('the next one takes the file up and finishes it, once', async () => {
		worker = startWorker(shop);
		const id = await upload(counties);
		await until(status(id), isReading, 60);
		await endWorker(worker, 'SIGKILL');
		expect((await status(id)()).state).toBe('reading');
		worker = startWorker(shop);
		const done = await until(status(id), isOver, 100);
		expect(done).toMatchObject({ state: 'done', attempts: 2 });
		expect(await sheetList(shop, member)).toHaveLength(1);
		const { boundarySet } = await deskSheet(shop, member, done.sheet ?? 0);
		// 3,142 counties and county equivalents in the states (Census), and those of the territories
		expect(boundarySet.regionCount).toBeGreaterThanOrEqual(3_142);
	});

	it('one that is told to end hands the file back without counting the attempt', async () => {
		worker = startWorker(shop);
		const id = await upload(counties);
		await until(status(id), isReading, 60);
		await endWorker(worker, 'SIGTERM');
		expect(await status(id)()).toMatchObject({ state: 'waiting', attempts: 0 });
		await cancelIntake(shop, member, id);
	});
});

describe('what is read twice counts once', () => {
	it('a reader that was taken for dead can store nothing any more', async () => {
		const id = await upload(bytesOf(conterminousStates()));
		const late = await claimRow(shop.db, 'intakes', id);
		await shop.db
			.updateTable('intakes')
			.set({ heard_at: new Date(Date.now() - 60_000) })
			.where('id', '=', id)
			.execute();
		expect(await releaseSilent(shop.db, 'intakes', 15)).toEqual([id]);
		await runIntake(shop, id, new AbortController().signal);
		const before = await sheetList(shop, member);
		const file = await shop.files.local(late?.file_digest ?? '');
		const outcome = await shop.pool.run('readFile', {
			...{ path: file.path, fileName: 'late.geojson', options: {}, answers: [], title: 'Late' },
		});
		if (outcome.status !== 'accepted') throw new Error('the file is good');
		const claim = { id, claim: late?.claim ?? '' };
		expect(await acceptIntake(shop, claim, outcome)).toBe(false);
		expect(await sheetList(shop, member)).toEqual(before);
	});

	it('a job that comes again finds nothing to do', async () => {
		const before = await sheetList(shop, member);
		const rows = await shop.db.selectFrom('intakes').select('id').execute();
		for (const { id } of rows) await runIntake(shop, id, new AbortController().signal);
		expect(await sheetList(shop, member)).toEqual(before);
	});
});

describe('a reading that is cancelled', () => {
	it('ends at once and leaves nothing', async () => {
		const stored = await shop.stored();
		const id = await upload(bytesOf({ ...usAtlas('counties'), name: 'another digest' }));
		const reading = runIntake(shop, id, new AbortController().signal);
		await until(status(id), isReading, 30);
		await cancelIntake(shop, member, id);
		await reading;
		expect(await status(id)()).toMatchObject({ state: 'cancelled', sheet: null });
		expect(await shop.stored()).toEqual(stored);
	});
});
