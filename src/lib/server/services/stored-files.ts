import type { Trx } from '../database/connection.ts';
import type { FileStore } from '../files/index.ts';
import { digestIsUsed, lockDigest } from '../repositories/files.repository.ts';

/**
 * Drops the bytes with this digest unless a row still refers to them. To be called last in the transaction
 * that removed a reference.
 */
export async function dropUnused(trx: Trx, files: FileStore, digest: string): Promise<void> {
	await lockDigest(trx, digest);
	if (!(await digestIsUsed(trx, digest))) await files.delete(digest);
}
