import { Kysely, PostgresDialect, type Transaction } from 'kysely';
import pg from 'pg';
import { config } from '../config.ts';
import { log } from '../log.ts';
import type { Database } from './schema.ts';

/** What a repository is given: the database, or the transaction its service has opened. */
export type Db = Kysely<Database>;
export type Trx = Transaction<Database>;

let shared: Db | null = null;

/** This process's connections, made on first use. */
export const database = (): Db => (shared ??= connect(config().databaseUrl));

/** @param connections the largest number of connections held at once */
export function connect(url: string, connections = 10): Db {
	const types = { getTypeParser: parserFor } as pg.CustomTypesConfig;
	const pool = new pg.Pool({
		connectionString: url,
		max: connections,
		connectionTimeoutMillis: 5000,
		types,
	});
	// An idle connection that the server drops would otherwise end the whole process.
	pool.on('error', (error) => log.warn({ error: error.message }, 'a database connection was lost'));
	return new Kysely<Database>({ dialect: new PostgresDialect({ pool }) });
}

/** bigint columns hold counts and sizes far below 2^53: as numbers, where pg would hand out strings. */
function parserFor(...[oid, format]: Parameters<typeof pg.types.getTypeParser>) {
	if ((oid as number) === pg.types.builtins.INT8) return Number;
	return pg.types.getTypeParser(oid, format);
}

/** Runs all of it or nothing of it. */
export const inTransaction = <T>(work: (trx: Trx) => Promise<T>): Promise<T> =>
	database().transaction().execute(work);

/** Ends this process's connections. */
export async function disconnect(): Promise<void> {
	const open = shared;
	shared = null;
	await open?.destroy();
}
