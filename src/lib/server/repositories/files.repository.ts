import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

/**
 * Holds every other transaction that keeps or drops the bytes with this digest until this one ends, so
 * that nobody drops what another is just about to refer to.
 */
export async function lockDigest(trx: Db, digest: string): Promise<void> {
	await sql`select pg_advisory_xact_lock(hashtextextended(${digest}, 7))`.execute(trx);
}

/** Whether any row refers to the bytes with this digest. */
export async function digestIsUsed(db: Db, digest: string): Promise<boolean> {
	const { rows } = await sql<{ used: boolean }>`
		select exists (select from boundary_sets where file_digest = ${digest})
			or exists (select from intakes where file_digest = ${digest})
			or exists (select from recuts where file_digest = ${digest})
			or exists (select from edition_files where digest = ${digest})
			or exists (select from exports where file_digest = ${digest})
			or exists (select from measure_tables where state <> 'dropped'
				and (file_digest = ${digest} or source ->> 'kept' = ${digest})) as used
	`.execute(db);
	return rows[0]?.used ?? false;
}
