import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';

/**
 * Rows that a worker takes up, speaks for while it works, and lets go of. Each has the columns `state`,
 * `step`, `share`, `attempts`, `claim` and `heard_at`, and waits in the state `waiting`.
 */
const working = {
	...{ intakes: 'reading', recuts: 'reading', proposals: 'running', searches: 'running' },
	exports: 'running',
} as const;
export type ClaimTable = keyof typeof working;

type ClaimedRow<T extends ClaimTable> = Row<T> & { claim: string | null; attempts: number };

/** A row as the one who works on it holds it. */
export type Claim = { id: string; claim: string };

/**
 * Takes a row up, if it waits. The answer carries a fresh claim; every later write names it, so that of
 * two workers only the last one counts.
 */
export async function claimRow<T extends ClaimTable>(
	db: Db,
	table: T,
	id: string,
): Promise<ClaimedRow<T> | undefined> {
	const { rows } = await sql<ClaimedRow<T>>`
		update ${sql.table(table)}
		set state = ${working[table]}, claim = gen_random_uuid(), attempts = attempts + 1,
			heard_at = now(), updated_at = now()
		where id = ${id} and state = 'waiting'
		returning *
	`.execute(db);
	return rows[0];
}

/** A sign of life with the progress so far; false when the claim is no longer good (cancelled, taken over). */
export async function heardOf(
	db: Db,
	table: ClaimTable,
	{ id, claim }: Claim,
	{ step, share }: { step: string; share: number },
): Promise<boolean> {
	const { numAffectedRows } = await sql`
		update ${sql.table(table)}
		set step = ${step}, share = ${share}, heard_at = now(), updated_at = now()
		where id = ${id} and claim = ${claim} and state = ${working[table]}
	`.execute(db);
	return (numAffectedRows ?? 0n) > 0n;
}

/** Locks a row that this claim still holds, until the transaction ends. */
export async function holdClaim<T extends ClaimTable>(
	trx: Db,
	table: T,
	{ id, claim }: Claim,
): Promise<Row<T> | undefined> {
	const { rows } = await sql<Row<T>>`
		select * from ${sql.table(table)}
		where id = ${id} and claim = ${claim} and state = ${working[table]}
		for update
	`.execute(trx);
	return rows[0];
}

/** Hands a row back for another to take up, without counting this attempt when `uncounted`. */
export async function handBack(
	db: Db,
	table: ClaimTable,
	{ id, claim }: Claim,
	uncounted: boolean,
): Promise<boolean> {
	const { numAffectedRows } = await sql`
		update ${sql.table(table)}
		set state = 'waiting', step = '', share = 0, claim = null, updated_at = now(),
			attempts = attempts - ${uncounted ? 1 : 0}
		where id = ${id} and claim = ${claim} and state = ${working[table]}
	`.execute(db);
	return (numAffectedRows ?? 0n) > 0n;
}

/**
 * Lets go of every row that nobody has spoken for in so long, waiting or being worked on, and answers
 * which: each is handed to one caller only, and comes up again after as long a silence.
 */
export async function releaseSilent(
	db: Db,
	table: ClaimTable,
	silentSeconds: number,
): Promise<string[]> {
	const { rows } = await sql<{ id: string }>`
		update ${sql.table(table)} set state = 'waiting', claim = null, heard_at = now()
		where state in ('waiting', ${working[table]})
			and coalesce(heard_at, created_at) < now() - make_interval(secs => ${silentSeconds})
		returning id
	`.execute(db);
	return rows.map(({ id }) => id);
}
