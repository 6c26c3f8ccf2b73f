import path from 'node:path';
import { atEnd, endChildren, exitOnSignals, isEnding } from './children.mjs';
import { dataDirectory, prepareDataDirectory, readJson } from './files.mjs';
import { ensureDependencies } from './install.mjs';
import { startPostgres } from './postgres.mjs';
import { startProduct } from './product.mjs';
import { Explained, say, timed } from './say.mjs';
import { claim } from './start-lock.mjs';

/**
 * `npm start`, and with --dev `npm run dev`: from whatever is there to a product that answers, in the order
 * packages, database, web and worker. Ctrl-C, or a failure of any of them, ends all of it.
 */

async function main() {
	const dataDir = dataDirectory();
	prepareDataDirectory(dataDir);
	atEnd(claim(dataDir));
	await ensureDependencies();
	const databaseUrl = process.env.DATABASE_URL || (await ownDatabase(dataDir));
	const dev = process.argv.includes('--dev');
	const product = await startProduct({ databaseUrl, dataDir, dev });
	greet(product.url, dataDir);
	await product.failure;
}

/** @param {string} dataDir */
async function ownDatabase(dataDir) {
	const database = await timed('Starting PostgreSQL', () => startPostgres(dataDir));
	return database.url;
}

/** @param {string} url @param {string} dataDir */
function greet(url, dataDir) {
	say(`\nMerestone is ready: ${url}\n`);
	const demo = process.env.SMTP_URL ? null : readJson(path.join(dataDir, 'demo.json'));
	if (demo) {
		say('Demo sign-ins (e-mail, password, roles):');
		for (const { email, password, roles } of demo.users) {
			say(`  ${email.padEnd(36)} ${password.padEnd(18)} ${roles.join(', ')}`);
		}
		say(`\nMails that the demo would send: ${url}/mail (signed in as the admin).`);
	}
	say(`Logs: ${path.join(dataDir, 'logs')}. Stop with Ctrl-C.`);
}

exitOnSignals();
main().catch(async (error) => {
	if (isEnding()) return;
	process.stderr.write(`\n${error instanceof Explained ? error.message : error.stack}\n`);
	await endChildren();
	process.exit(1);
});
