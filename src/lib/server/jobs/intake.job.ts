import type { Row } from '../database/schema.ts';
import {
	acceptIntake,
	askIntake,
	failIntake,
	refuseIntake,
} from '../services/intake-end.service.ts';
import { knownAnswers } from '../services/reading-answers.service.ts';
import { mostWhole } from '../../schemas/sheet-apart.ts';
import { log } from '../log.ts';
import { sheetOfIntake } from '../repositories/intakes.repository.ts';
import { prepareFirstPicture } from '../services/first-picture.service.ts';
import { runClaimed, wakeSilent, type ClaimedJob } from './claimed-job.ts';
import type { ReadOutcome } from './read.work.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** Reads one uploaded file: takes it up, has it read in a thread, and stores what came of it. */
export const runIntake = (shop: Workshop, intakeId: string, shutdown: AbortSignal) =>
	runClaimed(shop, intakeJob(shop), intakeId, shutdown);

/** Takes up again every upload that was left lying. */
export const wakeSilentIntakes = (shop: Workshop) =>
	wakeSilent(shop, 'intakes', (intakeId) => shop.queue.send(shop.db, 'intake', { intakeId }));

const intakeJob = (shop: Workshop): ClaimedJob<'intakes', ReadOutcome> => ({
	table: 'intakes',
	work: (intake, signal, progress) => read(shop, intake, signal, progress),
	settle: async (claim, outcome) => {
		if (outcome.status === 'accepted') {
			const kept = await acceptIntake(shop, claim, outcome);
			if (kept) await prepare(shop, claim.id);
			return kept;
		}
		return outcome.question
			? askIntake(shop, claim, outcome.question, outcome.taken)
			: refuseIntake(shop, claim, outcome);
	},
	fail: (claim, message) => failIntake(shop, claim, message),
	words: {
		firstStep: 'Reading',
		stopped: (times) => `The file was tried ${times} times and the reader stopped each time.`,
		outOfMemory: 'Reading the file took more memory than one reader may use.',
		fault: 'The file could not be read because of a fault here.',
	},
});

/** What can be made again is no reason to call a sheet that stands a failure. */
async function prepare(shop: Workshop, intakeId: string): Promise<void> {
	try {
		const made = await sheetOfIntake(shop.db, intakeId);
		if (!made || made.region_count <= mostWhole) return;
		await prepareFirstPicture(shop, { id: made.team_id, slug: '', name: '' }, made.number);
	} catch (error) {
		log.warn({ intake: intakeId, error: String(error) }, 'the first picture is left for later');
	}
}

async function read(
	shop: Workshop,
	intake: Row<'intakes'>,
	signal: AbortSignal,
	progress: (progress: Progress) => void,
): Promise<ReadOutcome> {
	const file = await shop.files.local(intake.file_digest ?? '');
	try {
		const input = {
			path: file.path,
			fileName: intake.file_name,
			options: intake.options,
			answers: await knownAnswers(shop.db, intake.team_id),
			title: intake.sheet_name,
		};
		return await shop.pool.run('readFile', input, { signal, progress });
	} finally {
		await file.release();
	}
}
