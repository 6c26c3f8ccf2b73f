import type { S3Client } from '@aws-sdk/client-s3';
import { FilesAway } from './store.ts';

/** Where a store's objects lie. */
export interface Bucket {
	client: S3Client;
	name: string;
}

const missing = new Set(['NoSuchKey', 'NotFound']);

export const isMissing = (problem: unknown): boolean =>
	problem instanceof Error && missing.has(problem.name);

/**
 * What the service was asked, with every fault of it told as `FilesAway`; an object that is not there as
 * `absent` says, where that may be.
 */
export async function asFilesAway<T>(ask: () => Promise<T>, absent?: () => Error): Promise<T> {
	try {
		return await ask();
	} catch (problem) {
		if (absent && isMissing(problem)) throw absent();
		throw FilesAway.because(problem);
	}
}
