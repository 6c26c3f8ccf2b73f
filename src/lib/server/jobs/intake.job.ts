import { log } from '../log.ts';
import { claimIntake, heardOf, releaseSilent } from '../repositories/intakes.repository.ts';
import {
	acceptIntake,
	failIntake,
	handBackIntake,
	refuseIntake,
} from '../services/intake-end.service.ts';
import type { ReadOutcome } from './read.work.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** A reader not heard of for so long is taken for dead; it speaks every half second while it lives. */
export const silentSeconds = 15;
const beatMilliseconds = 500;
const mostAttempts = 4;

type Claimed = NonNullable<Awaited<ReturnType<typeof claimIntake>>>;

/**
 * Reads one uploaded file: takes it up, has it read in a thread, and stores what came of it. Safe to be
 * called any number of times for the same intake, by any number of workers: only a holder of the claim
 * changes anything. Rejects when the reading should be tried again.
 */
export async function runIntake(
	shop: Workshop,
	intakeId: string,
	shutdown: AbortSignal,
): Promise<void> {
	const intake = await claimIntake(shop.db, intakeId);
	if (!intake?.claim) return;
	const claim = { id: intake.id, claim: intake.claim };
	if (intake.attempts > mostAttempts) {
		const times = `The file was tried ${mostAttempts} times and the reader stopped each time.`;
		return void (await failIntake(shop, claim, times));
	}
	const lost = new AbortController();
	const beat = keepInTouch(shop, claim, lost);
	try {
		const outcome = await read(shop, intake, AbortSignal.any([lost.signal, shutdown]), beat.tell);
		await beat.stop();
		await settle(shop, claim, outcome);
	} catch (error) {
		await beat.stop();
		if (lost.signal.aborted) return;
		if (shutdown.aborted) return void (await handBackIntake(shop, claim, true));
		await giveBackOrUp(shop, intake, claim, error);
	}
}

async function read(
	shop: Workshop,
	intake: Claimed,
	signal: AbortSignal,
	progress: (progress: Progress) => void,
): Promise<ReadOutcome> {
	const file = await shop.files.local(intake.file_digest ?? '');
	try {
		const input = {
			path: file.path,
			fileName: intake.file_name,
			options: intake.options,
			title: intake.sheet_name,
		};
		return await shop.pool.run('readFile', input, { signal, progress });
	} finally {
		await file.release();
	}
}

async function settle(
	shop: Workshop,
	claim: { id: string; claim: string },
	outcome: ReadOutcome,
): Promise<void> {
	const kept =
		outcome.status === 'accepted'
			? await acceptIntake(shop, claim, outcome)
			: await refuseIntake(shop, claim, {
					code: outcome.code,
					message: outcome.message,
					findings: outcome.findings,
				});
	if (!kept) log.info({ intake: claim.id }, 'an upload was read, but somebody else has it now');
}

/** After a fault: once more while attempts are left, except where it would only happen again. */
async function giveBackOrUp(
	shop: Workshop,
	intake: Claimed,
	claim: { id: string; claim: string },
	error: unknown,
): Promise<void> {
	log.error(
		{ intake: intake.id, attempt: intake.attempts, error: String(error) },
		'reading failed',
	);
	if (isOutOfMemory(error)) {
		const message = 'Reading the file took more memory than one reader may use.';
		return void (await failIntake(shop, claim, message));
	}
	if (intake.attempts >= mostAttempts) {
		return void (await failIntake(
			shop,
			claim,
			'The file could not be read because of a fault here.',
		));
	}
	await handBackIntake(shop, claim, false);
	throw error;
}

const isOutOfMemory = (error: unknown): boolean =>
	error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY';

/** Writes how far the reading is, twice a second, and aborts `lost` once the claim is no longer good. */
function keepInTouch(
	shop: Workshop,
	{ id, claim }: { id: string; claim: string },
	lost: AbortController,
): { tell(progress: Progress): void; stop(): Promise<void> } {
	let latest: Progress = { step: 'Reading', share: 0 };
	let ended = false;
	let speaking: Promise<void> = Promise.resolve();
	const speak = async () => {
		const heard = await heardOf(shop.db, id, claim, latest);
		if (!heard && !ended) lost.abort();
	};
	const timer = setInterval(() => {
		speaking = speaking.then(speak).catch((error: unknown) => {
			log.warn({ intake: id, error: String(error) }, 'progress could not be written');
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
 * Asks again for every intake that nobody has spoken for lately: its worker was killed, or the database
 * was away when it was asked for.
 */
export async function wakeSilentIntakes(shop: Workshop): Promise<void> {
	for (const intakeId of await releaseSilent(shop.db, silentSeconds)) {
		log.warn({ intake: intakeId }, 'an upload was left lying and is taken up again');
		await shop.queue.send(shop.db, 'intake', { intakeId });
	}
}
