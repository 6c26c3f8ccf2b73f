import type { ChildProcess } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { buffer } from 'node:stream/consumers';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type PgBoss from 'pg-boss';
import { askExport } from '../../src/lib/schemas/export.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { runExport } from '../../src/lib/server/jobs/export.job.ts';
import { openBoss, queueOf } from '../../src/lib/server/jobs/queue.ts';
import { claimRow } from '../../src/lib/server/repositories/claims.repository.ts';
import { failExport } from '../../src/lib/server/services/export-end.service.ts';
import { askForExport, exportFileOf } from '../../src/lib/server/services/exports.service.ts';
import { endWorker, startWorker, until } from '../support/worker.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let boss: PgBoss;
let maker: Member;
let worker: ChildProcess | undefined;
beforeAll(async () => {
	shop = await createWorkshop();
	boss = await openBoss(shop.url, false);
	shop.queue = queueOf(boss);
	maker = await createMember(shop.db, 'killed-exports', 'cartographer', 'designer');
	const file = readFileSync('sample-data/tavaroe.geojson');
	await ingest(shop, maker, 'tavaroe.geojson', file, { keyField: 'code', nameField: 'name' });
});
afterEach(async () => {
	if (worker) await endWorker(worker, 'SIGKILL');
	worker = undefined;
});
afterAll(async () => {
	await boss.stop({ graceful: false });
	await shop.close();
});

const ask = async (wanted: object) =>
	(await askForExport(shop, maker, 1, askExport.parse(wanted))).number;
const rowOf = (number: number) =>
	shop.db.selectFrom('exports').selectAll().where('number', '=', number).executeTakeFirstOrThrow();
const isOver = ({ state }: { state: string }) => state !== 'running' && state !== 'waiting';

describe('a worker that is killed half way through a file', () => {
	it('is followed by one that makes it, once', { timeout: 240_000 }, async () => {
		const number = await ask({ kind: 'svg' });
		const { id } = await rowOf(number);
		// taken up by a worker that says nothing any more, as one that was killed
		await claimRow(shop.db, 'exports', id);
		worker = startWorker(shop);
		const done = await until(() => rowOf(number), isOver, 200);
		expect(done).toMatchObject({ state: 'done', attempts: 2 });
		const bytes = await buffer(await (await exportFileOf(shop, maker, 1, number)).open());
		expect(bytes.length).toBe(done.file_bytes);
		const made = await shop.db
			.selectFrom('activity')
			.select('id')
			.where('action', '=', 'export.made')
			.execute();
		expect(made).toHaveLength(1);
	});
});

describe('one that lost its claim', () => {
	it('neither keeps its file nor tells anybody, and leaves no bytes', async () => {
		const number = await ask({ kind: 'csv' });
		const { id } = await rowOf(number);
		const before = (await shop.stored()).length;
		const never = new AbortController().signal;
		const running = runExport(shop, id, never);
		await until(
			() => rowOf(number),
			({ state }) => state === 'running',
			20,
		);
		// another took it up meanwhile and gave it up
		const { claim } = await rowOf(number);
		await failExport(shop, { id, claim: claim! }, 'It could not be made.');
		await running;
		expect(await rowOf(number)).toMatchObject({ state: 'failed', file_digest: null });
		expect((await shop.stored()).length).toBe(before);
	});
});
