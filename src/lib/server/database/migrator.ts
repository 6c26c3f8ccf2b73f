import { promises as fs } from 'node:fs';
import path from 'node:path';
import { FileMigrationProvider, Migrator } from 'kysely';
import type { Db } from './connection.ts';

/**
 * Brings the tables up to date, each migration once, in the order of its date. Two processes that try at
 * the same time wait for each other.
 * @returns the names of the migrations that ran now
 */
export async function migrateToLatest(
	db: Db,
	folder = path.resolve('migrations'),
): Promise<string[]> {
	const provider = new FileMigrationProvider({ fs, path, migrationFolder: folder });
	const { error, results = [] } = await new Migrator({ db, provider }).migrateToLatest();
	if (error) throw error;
	return results.map((result) => result.migrationName);
}
