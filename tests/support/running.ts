import { mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { freePort } from '../../src/ops/ports.mjs';
import { startProduct } from '../../src/ops/product.mjs';
import { createDatabase } from './database.ts';
import { Visitor } from './visitor.ts';

interface Demo {
	token: string;
	users: { email: string; password: string; roles: string[] }[];
}

/** The whole product, built and running as in use, with a database and a data folder of its own. */
export async function runProduct(env: Record<string, string> = {}) {
	const database = await createDatabase();
	const dataDir = mkdtempSync(path.join(tmpdir(), 'merestone-'));
	const port = await freePort();
	const product = await startProduct({ databaseUrl: database.url, dataDir, port, env });
	const demo: Demo = JSON.parse(readFileSync(path.join(dataDir, 'demo.json'), 'utf8'));
	const mails = path.join(dataDir, 'mail');
	return {
		url: product.url,
		demo,
		db: database.db,
		visitor: () => new Visitor(product.url),
		userWith(...roles: string[]) {
			const user = demo.users.find((one) => one.roles.join() === roles.join());
			if (!user) throw new Error(`no demo member is ${roles.join(' and ')}`);
			return user;
		},
		/** the first address in the newest mail to this person */
		linkTo(person: string): string {
			const texts = readdirSync(mails)
				.sort()
				.map((name) => JSON.parse(readFileSync(path.join(mails, name), 'utf8')))
				.filter((mail: { to: string[] }) => mail.to.includes(person));
			const link = texts.at(-1)?.text.match(/https?:\/\/\S+/)?.[0];
			if (!link) throw new Error(`no mail with a link for ${person}`);
			return link;
		},
		async stop() {
			await product.stop();
			await database.drop();
			rmSync(dataDir, { recursive: true, force: true });
		},
	};
}
