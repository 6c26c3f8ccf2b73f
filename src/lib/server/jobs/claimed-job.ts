import type { Row } from '../database/schema.ts';
import { log } from '../log.ts';
import {
	claimRow,
	handBack,
	heardOf,
	releaseSilent,
	type Claim,
	type ClaimTable,
} from '../repositories/claims.repository.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** A worker not heard of for so long is taken for dead; it speaks every half second while it lives. */
export const silentSeconds = 15;
const beatMilliseconds = 500;
const mostAttempts = 4;

/** Work on a row that one worker at a time holds, and what it tells people when it cannot be done. */
export interface ClaimedJob<T extends ClaimTable, Outcome> {
	table: T;
	/** ends the thread when the signal fires */
	work(row: Row<T>, signal: AbortSignal, progress: (progress: Progress) => void): Promise<Outcome>;
	/** stores what came of it; false when the claim no longer holds */
	settle(claim: Claim, outcome: Outcome): Promise<boolean>;
	/** gives up in sight of everybody */
	fail(claim: Claim, message: string): Promise<boolean>;
	words: {
		/** shown before the first step is told */
		firstStep: string;
		/** it took down its worker so many times */
		stopped: (times: number) => string;
		outOfMemory: string;
		fault: string;
	};
}

/**
 * Takes a row up, works on it and stores what came of it. Safe to be called any number of times for the
 * same row, by any number of workers: only a holder of the claim changes anything. Rejects when it should
 * be tried again.
 */
export async function runClaimed<T extends ClaimTable, Outcome>(
	shop: Workshop,
	job: ClaimedJob<T, Outcome>,
	id: string,
	shutdown: AbortSignal,
): Promise<void> {
	const row = await claimRow(shop.db, job.table, id);
	if (!row?.claim) return;
	const claim = { id, claim: row.claim };
	if (row.attempts > mostAttempts) {
		return void (await job.fail(claim, job.words.stopped(mostAttempts)));
	}
	const lost = new AbortController();
	const beat = keepInTouch(shop, job, claim, lost);
	try {
		const signal = AbortSignal.any([lost.signal, shutdown]);
		const outcome = await job.work(row, signal, beat.tell);
		await beat.stop();
		const kept = await job.settle(claim, outcome);
		if (!kept) log.info({ [job.table]: id }, 'it was done, but somebody else has it now');
	} catch (error) {
		await beat.stop();
		if (lost.signal.aborted) return;
		if (shutdown.aborted) return void (await handBack(shop.db, job.table, claim, true));
		await giveBackOrUp(shop, job, claim, row.attempts, error);
	}
}

/** After a fault: once more while attempts are left, except where it would only happen again. */
async function giveBackOrUp<T extends ClaimTable, Outcome>(
	shop: Workshop,
	job: ClaimedJob<T, Outcome>,
	claim: Claim,
	attempt: number,
	error: unknown,
): Promise<void> {
	log.error({ [job.table]: claim.id, attempt, error: String(error) }, 'a job failed');
	if (isOutOfMemory(error)) return void (await job.fail(claim, job.words.outOfMemory));
	if (attempt >= mostAttempts || error instanceof Hopeless) {
		return void (await job.fail(claim, job.words.fault));
	}
	// nobody's row any more: it was cancelled, and what it needed was taken away with it
	if (!(await handBack(shop.db, job.table, claim, false))) return;
	throw error;
}

/** Thrown by work that would fail in the same way again. */
export class Hopeless extends Error {}

const isOutOfMemory = (error: unknown): boolean =>
	error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY';

/** Writes how far the work is, twice a second, and aborts `lost` once the claim is no longer good. */
function keepInTouch<T extends ClaimTable, Outcome>(
	shop: Workshop,
	{ table, words }: ClaimedJob<T, Outcome>,
	claim: Claim,
	lost: AbortController,
): { tell(progress: Progress): void; stop(): Promise<void> } {
	let latest: Progress = { step: words.firstStep, share: 0 };
	let ended = false;
	let speaking: Promise<void> = Promise.resolve();
	const speak = async () => {
		const heard = await heardOf(shop.db, table, claim, latest);
		if (!heard && !ended) lost.abort();
	};
	const timer = setInterval(() => {
		speaking = speaking.then(speak).catch((error: unknown) => {
			log.warn({ [table]: claim.id, error: String(error) }, 'progress could not be written');
		});
	}, beatMilliseconds);
	const stop = async () => {
		ended = true;
		clearInterval(timer);
		await speaking;
	};
	return { tell: (progress) => (latest = progress), stop };
}

/**
 * Asks again for every row that nobody has spoken for lately: its worker was killed, or the database was
 * away when it was asked for.
 */
export async function wakeSilent(
	shop: Workshop,
	table: ClaimTable,
	ask: (id: string) => Promise<void>,
): Promise<void> {
	for (const id of await releaseSilent(shop.db, table, silentSeconds)) {
		log.warn({ [table]: id }, 'work was left lying and is taken up again');
		await ask(id);
	}
}
