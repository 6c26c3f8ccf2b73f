import type { ChildProcess } from 'node:child_process';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type PgBoss from 'pg-boss';
import { openBoss, queueOf } from '../../src/lib/server/jobs/queue.ts';
import { runSearch } from '../../src/lib/server/jobs/search.job.ts';
import { claimRow, releaseSilent } from '../../src/lib/server/repositories/claims.repository.ts';
import { failSearch } from '../../src/lib/server/services/search-end.service.ts';
import {
	beginSearch,
	readSearch,
	stopSearch,
} from '../../src/lib/server/services/searches.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { mycielskiSheet, type Coloured, type MycielskiSheet } from '../support/mycielski-sheet.ts';
import { endWorker, startWorker, until } from '../support/worker.ts';
import { createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let boss: PgBoss;
let made: MycielskiSheet;
let worker: ChildProcess | undefined;
/** As if the first try had found no proof. */
const unproved = (known: Coloured): Coloured => ({
	...{ ...known, lowerBound: 3, proof: { kind: 'not-proved', regions: [] } },
});
beforeAll(async () => {
	shop = await createWorkshop();
	boss = await openBoss(shop.url, false);
	shop.queue = queueOf(boss);
	made = await mycielskiSheet(shop, 'killed', 5, 'fewest', unproved);
});
afterEach(async () => {
	if (worker) await endWorker(worker, 'SIGKILL');
	worker = undefined;
});
afterAll(async () => {
	await boss.stop({ graceful: false });
	await shop.close();
});

const ask = async ({ analyst, sheet }: MycielskiSheet) =>
	(await beginSearch(shop, analyst, sheet, { times: 1 })).number;
const rowOf = ({ sheetId }: MycielskiSheet, number: number) =>
	shop.db
		.selectFrom('searches')
		.selectAll()
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.executeTakeFirstOrThrow();
const isRunning = ({ state }: { state: string }) => state === 'running';
const isOver = ({ state }: { state: string }) => state !== 'running' && state !== 'waiting';

describe('a worker that is killed half way through a search', () => {
	it(
		'is followed by one that takes it up and stores what it finds, once',
		{ timeout: 240_000 },
		async () => {
			const number = await ask(made);
			// taken up by a worker that says nothing any more, as one that was killed
			const { id } = await rowOf(made, number);
			await claimRow(shop.db, 'searches', id);
			const { revision } = await deskSheet(shop, made.analyst, made.sheet);
			worker = startWorker(shop);
			const done = await until(() => rowOf(made, number), isOver, 200);
			expect(done).toMatchObject({ state: 'stored', attempts: 2, stored_revision: revision + 1 });
			const after = await deskSheet(shop, made.analyst, made.sheet);
			expect(after.revision).toBe(revision + 1);
			expect(after.colouring).toMatchObject({ inksUsed: 5, lowerBound: 5 });
			const stored = await shop.db
				.selectFrom('activity')
				.select('id')
				.where('action', '=', 'search.stored')
				.execute();
			expect(stored).toHaveLength(1);
		},
	);

	it('ends without a trace on the sheet, and one told to end hands it back', async () => {
		const long = await mycielskiSheet(shop, 'killed-long', 7, 'fewest', unproved);
		worker = startWorker(shop);
		const number = await ask(long);
		await until(() => rowOf(long, number), isRunning, 60);
		const before = await deskSheet(shop, long.analyst, long.sheet);
		await endWorker(worker, 'SIGKILL');
		expect(await rowOf(long, number)).toMatchObject({ state: 'running', attempts: 1 });
		await shop.db
			.updateTable('searches')
			.set({ heard_at: new Date(Date.now() - 60_000) })
			.where('number', '=', number)
			.where('sheet_id', '=', long.sheetId)
			.execute();
		worker = startWorker(shop);
		const again = await until(
			() => rowOf(long, number),
			({ state, attempts }) => state === 'running' && attempts === 2,
			60,
		);
		expect(again.claim).not.toBeNull();
		await endWorker(worker, 'SIGTERM');
		expect(await rowOf(long, number)).toMatchObject({ state: 'waiting', attempts: 1, share: 0 });
		await stopSearch(shop, long.analyst, long.sheet, number);
		expect(await deskSheet(shop, long.analyst, long.sheet)).toEqual(before);
	});
});

describe('what is searched twice counts once', () => {
	it('a worker that was taken for dead can store nothing, and one that always dies is given up', async () => {
		const other = await mycielskiSheet(shop, 'killed-late', 5, 'fewest', unproved);
		const number = await ask(other);
		const { id } = await rowOf(other, number);
		const late = await claimRow(shop.db, 'searches', id);
		await shop.db
			.updateTable('searches')
			.set({ heard_at: new Date(Date.now() - 60_000) })
			.where('id', '=', id)
			.execute();
		expect(await releaseSilent(shop.db, 'searches', 15)).toEqual([id]);
		expect(await failSearch(shop, { id, claim: late?.claim ?? '' }, 'too late')).toBe(false);
		await shop.db.updateTable('searches').set({ attempts: 4 }).where('id', '=', id).execute();
		await runSearch(shop, id, new AbortController().signal);
		expect(await readSearch(shop, other.analyst, other.sheet, number)).toMatchObject({
			state: 'failed',
			sentence: 'It was tried 4 times and the worker stopped each time.',
		});
	});
});
