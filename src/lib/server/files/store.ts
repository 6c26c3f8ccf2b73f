import type { Readable } from 'node:stream';

/**
 * Where uploaded and exported bytes are kept, each under the SHA-256 digest of its content in lower-case
 * hexadecimals. Equal bytes are stored once; who refers to them is counted in the database.
 */
export interface FileStore {
	/**
	 * Takes bytes in as they arrive and digests them. They are not part of the store until `keep`;
	 * whoever received them must call `keep` or `discard`. Rejects with what `source` fails with, having
	 * left nothing behind.
	 */
	receive(source: Readable): Promise<Received>;
	/** A stream of the bytes with this digest; rejects with `FileMissing`. */
	open(digest: string): Promise<{ stream: Readable; bytes: number }>;
	/** A path on this machine that holds the bytes until `release`, for threads that read by path. */
	local(digest: string): Promise<{ path: string; release(): Promise<void> }>;
	has(digest: string): Promise<boolean>;
	/** Forgets the bytes; no error when they are not there. */
	delete(digest: string): Promise<void>;
	/** Removes what was being received when a process was killed; whatever is younger than a day stays. */
	tidy(): Promise<void>;
}

export interface Received {
	digest: string;
	bytes: number;
	/** where the bytes lie until they are kept */
	path: string;
	/** Makes them part of the store, safe against a power cut once it resolves. */
	keep(): Promise<void>;
	discard(): Promise<void>;
}

export class FileMissing extends Error {
	constructor(readonly digest: string) {
		super(`no stored file has the digest ${digest}`);
	}
}

/** The service that keeps the files cannot be reached, or refuses; `detail` says how. */
export class FilesAway extends Error {
	constructor(readonly detail: string) {
		super('The store of files cannot be reached just now. Nothing was kept; try again in a while.');
	}

	/** Of a fault the name and the message are told, never the request: it carries a signature. */
	static because(problem: unknown): FilesAway {
		if (problem instanceof FilesAway) return problem;
		const told = problem instanceof Error ? `${problem.name}: ${problem.message}` : 'unknown';
		return new FilesAway(told);
	}
}

export const isDigest = (text: string): boolean => /^[0-9a-f]{64}$/.test(text);

/** Digests go into paths: nothing else may. */
export function requireDigest(digest: string): string {
	if (!isDigest(digest)) throw new FileMissing(digest);
	return digest;
}
