import type { Row } from '../database/schema.ts';
import { knownAnswers } from '../services/reading-answers.service.ts';
import { askRecut, failRecut, readyRecut, refuseRecut } from '../services/recut-end.service.ts';
import { standingOn, standingSide } from '../services/recut-standing.ts';
import { runClaimed, wakeSilent, type ClaimedJob } from './claimed-job.ts';
import type { RecutOutcome } from './recut.work.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** Reads the boundaries of one re-cut, has them compared in a thread, and stores what came of it. */
export const runRecut = (shop: Workshop, recutId: string, shutdown: AbortSignal) =>
	runClaimed(shop, recutJob(shop), recutId, shutdown);

/** Takes up again every re-cut that was left lying. */
export const wakeSilentRecuts = (shop: Workshop) =>
	wakeSilent(shop, 'recuts', (recutId) => shop.queue.send(shop.db, 'recut', { recutId }));

const recutJob = (shop: Workshop): ClaimedJob<'recuts', RecutOutcome> => ({
	table: 'recuts',
	work: (recut, signal, progress) => read(shop, recut, signal, progress),
	settle: (claim, outcome) => {
		if (outcome.status === 'accepted') return readyRecut(shop, claim, outcome);
		return outcome.question
			? askRecut(shop, claim, outcome.question, outcome.taken)
			: refuseRecut(shop, claim, outcome);
	},
	fail: (claim, message) => failRecut(shop, claim, message),
	words: {
		firstStep: 'Reading',
		stopped: (times) => `It was tried ${times} times and the reader stopped each time.`,
		outOfMemory: 'Reading and comparing took more memory than one reader may use.',
		fault: 'The boundaries could not be read and compared because of a fault here.',
	},
});

/**
 * The keys of the sheet's own file stay what they are, or what somebody says: what is remembered of others
 * must not change them by the way.
 */
async function answersFor(shop: Workshop, { team_id, kind }: Row<'recuts'>) {
	const known = await knownAnswers(shop.db, team_id);
	return kind === 'file' ? known : known.filter(({ about }) => about !== 'columns');
}

async function read(
	shop: Workshop,
	recut: Row<'recuts'>,
	signal: AbortSignal,
	progress: (progress: Progress) => void,
): Promise<RecutOutcome> {
	const before = await standingSide(shop.db, recut.from_set);
	const standing = await standingOn(shop.db, recut.sheet_id);
	const answers = await answersFor(shop, recut);
	const file = await shop.files.local(recut.file_digest ?? '');
	try {
		const { file_name: fileName, options } = recut;
		const input = { path: file.path, fileName, options, answers, before, standing };
		return await shop.pool.run('readRecutFile', input, { signal, progress });
	} finally {
		await file.release();
	}
}
