import { wasStopped } from '../jobs/pool.ts';
import { Refused } from './outcomes.ts';

/** A step of the review that takes longer than this is stopped. */
export const mostSeconds = 120;

/** Runs work on a table in a thread; too long and too large come back as sentences. */
export async function inThread<T>(
	what: string,
	work: (signal: AbortSignal) => Promise<T>,
	seconds = mostSeconds,
): Promise<T> {
	const stop = AbortSignal.timeout(seconds * 1000);
	try {
		return await work(stop);
	} catch (problem) {
		if (wasStopped(problem) && stop.aborted) {
			throw new Refused(
				`${what} took more than ${seconds} seconds and was stopped. Nothing was changed. A file with fewer rows and columns, or the same table as CSV, takes less.`,
			);
		}
		if (isOutOfMemory(problem)) {
			throw new Refused(
				`${what} took more memory than one reader may use. Nothing was changed. Leave out the columns that are not needed and upload it again.`,
			);
		}
		throw problem;
	}
}

const isOutOfMemory = (problem: unknown): boolean =>
	problem instanceof Error && 'code' in problem && problem.code === 'ERR_WORKER_OUT_OF_MEMORY';
