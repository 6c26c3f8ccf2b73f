import { randomUUID } from 'node:crypto';
import { Migrator, type Migration } from 'kysely';
import pg from 'pg';
import { connect, type Db } from '../../src/lib/server/database/connection.ts';

/** The product's migrations, loaded as the tests load everything else. */
const migrations = import.meta.glob<Migration>('../../migrations/*.ts');

/** A database of one test file's own on the server that DATABASE_URL names, with all tables. */
export interface TestDatabase {
	url: string;
	db: Db;
	/** ends the connections and removes the database */
	drop(): Promise<void>;
}

export async function createDatabase(): Promise<TestDatabase> {
	const server = process.env.MERESTONE_TEST_SERVER ?? process.env.DATABASE_URL;
	if (!server) throw new Error('DATABASE_URL names no server to test on');
	const name = `merestone_${randomUUID().replaceAll('-', '')}`;
	await onServer(server, `create database ${name}`);
	const url = new URL(server);
	url.pathname = `/${name}`;
	const db = connect(url.href);
	await migrate(db);
	return {
		url: url.href,
		db,
		async drop() {
			await db.destroy();
			await removeDatabase(server, name);
		},
	};
}

async function migrate(db: Db): Promise<void> {
	const entries = Object.entries(migrations).map(async ([path, load]) => [
		path.replace(/^.*\/|\.ts$/g, ''),
		await load(),
	]);
	const provider = { getMigrations: async () => Object.fromEntries(await Promise.all(entries)) };
	const { error } = await new Migrator({ db, provider }).migrateToLatest();
	if (error) throw error;
}

/** Forcing may not end the server's own housekeeping in it, which is done in a moment. */
async function removeDatabase(server: string, name: string): Promise<void> {
	const drop = () => onServer(server, `drop database if exists ${name} with (force)`);
	for (let tries = 1; ; tries++) {
		try {
			return await drop();
		} catch (problem) {
			if (tries === 5) throw problem;
			await new Promise((resume) => setTimeout(resume, 1_000 * tries));
		}
	}
}

async function onServer(url: string, statement: string): Promise<void> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	try {
		await client.query(statement);
	} finally {
		await client.end();
	}
}
