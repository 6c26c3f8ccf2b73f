import type { ChildProcess } from 'node:child_process';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type PgBoss from 'pg-boss';
import { openBoss, queueOf } from '../../src/lib/server/jobs/queue.ts';
import { runRebalance } from '../../src/lib/server/jobs/rebalance.job.ts';
import { claimRow, releaseSilent } from '../../src/lib/server/repositories/claims.repository.ts';
import { failProposal } from '../../src/lib/server/services/proposal-end.service.ts';
import { cancelProposal } from '../../src/lib/server/services/proposal-keep.service.ts';
import { beginProposal, openProposal } from '../../src/lib/server/services/proposals.service.ts';
import { plainOf, saveOver, territoriesOf, within, type Plain } from '../support/planner.ts';
import { endWorker, startWorker, until } from '../support/worker.ts';
import { createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let plain: Plain;
let boss: PgBoss;
let worker: ChildProcess | undefined;
const [rows, columns] = [30, 30];
beforeAll(async () => {
	shop = await createWorkshop();
	boss = await openBoss(shop.url, false);
	shop.queue = queueOf(boss);
	// figures from 1 to 7 in no order
	const values = Array.from({ length: rows * columns }, (_, i) => 1 + ((i * i * 31 + i * 17) % 7));
	plain = await plainOf(shop, 'killed', { rows, columns }, values);
	const blocks = (_key: string, row: number, column: number) =>
		`b${Math.floor(row / 10)}-${Math.floor(Math.sqrt(column * 0.9))}`;
	await saveOver(shop, plain, territoriesOf(plain.keys, blocks));
});
afterEach(async () => {
	if (worker) await endWorker(worker, 'SIGKILL');
	worker = undefined;
});
afterAll(async () => {
	await boss.stop({ graceful: false });
	await shop.close();
});

/** Takes some seconds, in which a worker can be killed. */
const ask = async () => {
	const wishes = within(plain.visits, 0.1, { goal: 'least-deviation' });
	const { planner, sheet } = plain;
	return (await beginProposal(shop, planner, sheet, { name: 'Long', wishes })).number;
};
const rowOf = (number: number) =>
	shop.db
		.selectFrom('proposals')
		.selectAll()
		.where('sheet_id', '=', plain.sheetId)
		.where('number', '=', number)
		.executeTakeFirstOrThrow();
const status = (number: number) => async () => {
	const { state, attempts, share, assignment } = await rowOf(number);
	return { state, attempts, share, regions: assignment?.length ?? null };
};
const isRunning = ({ state }: { state: string }) => state === 'running';
const isOver = ({ state }: { state: string }) => state !== 'running' && state !== 'waiting';

describe('a worker that is killed half way through a rebalance', () => {
	it(
		'is followed by one that takes it up and finishes it, once',
		{ timeout: 240_000 },
		async () => {
			worker = startWorker(shop);
			const number = await ask();
			await until(status(number), isRunning, 60);
			await endWorker(worker, 'SIGKILL');
			expect((await status(number)()).state).toBe('running');
			worker = startWorker(shop);
			const done = await until(status(number), isOver, 200);
			expect(['kept', 'undecided']).toContain(done.state);
			expect(done).toMatchObject({ attempts: 2, regions: rows * columns });
			const made = await shop.db
				.selectFrom('activity')
				.select('id')
				.where('action', '=', 'proposal.made')
				.execute();
			expect(made).toHaveLength(1);
		},
	);

	it('told to end instead, hands it back without counting the attempt', async () => {
		worker = startWorker(shop);
		const number = await ask();
		await until(status(number), isRunning, 60);
		await endWorker(worker, 'SIGTERM');
		expect(await rowOf(number)).toMatchObject({ state: 'waiting', attempts: 0, share: 0 });
		await cancelProposal(shop, plain.planner, plain.sheet, number);
	});
});

describe('a rebalance that is cancelled', () => {
	it('ends its thread within a second or so, and stays cancelled', async () => {
		const number = await ask();
		const { id } = await rowOf(number);
		const running = runRebalance(shop, id, new AbortController().signal);
		await until(status(number), isRunning, 30);
		await cancelProposal(shop, plain.planner, plain.sheet, number);
		const started = performance.now();
		await running;
		// half a second to the next beat, a fifth for the thread; the rest is for a busy machine
		expect(performance.now() - started).toBeLessThan(3_000);
		expect(await status(number)()).toMatchObject({ state: 'cancelled', regions: null });
	});
});

describe('what is worked out twice counts once', () => {
	it('a worker that was taken for dead can store nothing any more', async () => {
		const number = await ask();
		const { id } = await rowOf(number);
		const late = await claimRow(shop.db, 'proposals', id);
		await shop.db
			.updateTable('proposals')
			.set({ heard_at: new Date(Date.now() - 60_000) })
			.where('id', '=', id)
			.execute();
		expect(await releaseSilent(shop.db, 'proposals', 15)).toEqual([id]);
		const claim = { id, claim: late?.claim ?? '' };
		expect(await failProposal(shop, claim, 'too late')).toBe(false);
		expect(await rowOf(number)).toMatchObject({ state: 'waiting', result: null });
		await cancelProposal(shop, plain.planner, plain.sheet, number);
	});

	it('one that stopped its worker every time is given up', async () => {
		const number = await ask();
		const { id } = await rowOf(number);
		await shop.db.updateTable('proposals').set({ attempts: 4 }).where('id', '=', id).execute();
		await runRebalance(shop, id, new AbortController().signal);
		const { planner, sheet } = plain;
		expect(await openProposal(shop, planner, sheet, number)).toMatchObject({
			state: 'failed',
			sentence: 'It was tried 4 times and the worker stopped each time.',
		});
	});
});
