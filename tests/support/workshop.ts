import { mkdir, mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Role } from '../../src/lib/server/access/roles.ts';
import type { Db } from '../../src/lib/server/database/connection.ts';
import { folderStore } from '../../src/lib/server/files/index.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import { createPool } from '../../src/lib/server/jobs/pool.ts';
import type { Workshop } from '../../src/lib/server/jobs/workshop.ts';
import { beginIntake, intakeStatus } from '../../src/lib/server/services/intake.service.ts';
import { createDatabase } from './database.ts';

/** A workshop of one test file's own. Jobs that are asked for are noted in `asked`, not done. */
export interface TestWorkshop extends Workshop {
	url: string;
	/** the data folder, as MERESTONE_DATA names it */
	data: string;
	asked: string[];
	/** names of the files in the store, those that are still coming in included */
	stored(): Promise<string[]>;
	close(): Promise<void>;
}

export async function createWorkshop(): Promise<TestWorkshop> {
	const database = await createDatabase();
	const data = await mkdtemp(join(tmpdir(), 'merestone-'));
	const folder = join(data, 'files');
	await mkdir(folder);
	const pool = createPool({ threads: 1 });
	const asked: string[] = [];
	return {
		...{ url: database.url, db: database.db, data, pool, checks: pool, asked },
		files: folderStore(folder),
		queue: {
			send: async (_trx, _name, data) => void asked.push(Object.values<string>(data)[0]),
			stop: async () => undefined,
		},
		async stored() {
			const entries = await readdir(folder, { recursive: true, withFileTypes: true });
			return entries.filter((entry) => entry.isFile()).map(({ name }) => name);
		},
		async close() {
			await pool.close();
			await database.drop();
			await rm(data, { recursive: true, force: true });
		},
	};
}

/** A team, and a person in it with these roles. */
export async function createMember(db: Db, slug: string, ...roles: Role[]): Promise<Member> {
	const team = await db
		.insertInto('teams')
		.values({ slug, name: `Team ${slug}` })
		.onConflict((conflict) => conflict.column('slug').doUpdateSet({ slug }))
		.returningAll()
		.executeTakeFirstOrThrow();
	const name = `${roles.join(' and ')} of ${slug}`;
	const email = `${roles.join('-')}@${slug}.example`;
	const user = await db
		.insertInto('User')
		.values({ name, email, image: null })
		.returning('id')
		.executeTakeFirstOrThrow();
	await db.insertInto('members').values({ team_id: team.id, user_id: user.id, roles }).execute();
	return { team, userId: user.id, tokenId: null, roles, actions: null };
}

/** A form with a file, as a browser sends it. */
export function uploadRequest(
	fileName: string,
	bytes: Uint8Array | string,
	fields: Record<string, string> = {},
): Request {
	const form = new FormData();
	for (const [name, value] of Object.entries(fields)) form.set(name, value);
	form.set('file', new Blob([bytes as Uint8Array<ArrayBuffer>]), fileName);
	return new Request('http://localhost/upload', { method: 'POST', body: form });
}

const never = new AbortController().signal;

/** Uploads a file and has it read at once; answers how that ended. */
export async function ingest(
	shop: Workshop,
	member: Member,
	fileName: string,
	bytes: Uint8Array | string,
	fields: Record<string, string> = {},
) {
	const { id } = await beginIntake(shop, member, uploadRequest(fileName, bytes, fields));
	await runIntake(shop, id, never);
	return intakeStatus(shop, member, id);
}
