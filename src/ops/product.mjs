import path from 'node:path';
import { chooseAddress, localUrl } from './address.mjs';
import { atEnd, runNode } from './children.mjs';
import { prepareDataDirectory } from './files.mjs';
import { waitForHealth } from './health.mjs';
import { answers, freePort } from './ports.mjs';
import { Explained, timed } from './say.mjs';
import { keptSecrets } from './secrets.mjs';
import { isBuilt } from './sources.mjs';
import { Supervised } from './supervised.mjs';

/** Room for the largest boundary file and the form around it; smaller limits stand per route. */
const LARGEST_BODY = '1100M';

/**
 * Migrates, seeds the demo team, builds when sources changed, starts web and worker (and the mail catcher
 * in demo mode) and waits until all are healthy. Whatever was started is ended when any of it fails.
 * @param {{databaseUrl: string, dataDir: string, port?: number, host?: string, origin?: string,
 *   dev?: boolean, env?: Record<string, string>}} options
 * @returns {Promise<{url: string, dataDir: string, stop: () => Promise<void>, failure: Promise<never>}>}
 */
export async function startProduct(options) {
	const { databaseUrl, dataDir, dev = false, env: extra = {}, ...wanted } = options;
	prepareDataDirectory(dataDir);
	const address = await chooseAddress(wanted);
	const env = { ...(await environment(databaseUrl, dataDir, address, dev)), ...extra };
	await timed('Migrating the database', () => runScript('src/ops/migrate.ts', env));
	if (env.MERESTONE_DEMO === '1') {
		await timed('Preparing the demo team', () => runScript('src/ops/seed.ts', env));
	}
	if (dev) await runNode(['node_modules/@sveltejs/kit/svelte-kit.js', 'sync'], env);
	else if (!isBuilt()) await timed('Building', () => runScript('src/ops/build.ts', env));
	const children = new Supervised(path.join(dataDir, 'logs'));
	const stop = atEnd(() => children.stop());
	try {
		await startChildren(children, env, address, dev);
		await Promise.race([waitForHealth(localUrl(address), 120_000), children.failure]);
	} catch (error) {
		await stop();
		throw error;
	}
	return { url: address.origin, dataDir, stop, failure: children.failure };
}

/**
 * @param {string} databaseUrl @param {string} dataDir
 * @param {import('./address.mjs').Address} address @param {boolean} dev
 * @returns {Promise<NodeJS.ProcessEnv>}
 */
async function environment(databaseUrl, dataDir, address, dev) {
	const demo = process.env.MERESTONE_DEMO ?? (process.env.SMTP_URL ? '0' : '1');
	const smtp = process.env.SMTP_URL ?? (demo === '1' ? `smtp://127.0.0.1:${await freePort()}` : '');
	return {
		...process.env,
		NODE_ENV: dev ? 'development' : 'production',
		DATABASE_URL: databaseUrl,
		MERESTONE_DATA: dataDir,
		MERESTONE_DEMO: demo,
		AUTH_SECRET: process.env.AUTH_SECRET || keptSecrets(dataDir).authSecret,
		SMTP_URL: smtp,
		HOST: address.host,
		PORT: String(address.port),
		ORIGIN: address.origin,
		AUTH_URL: address.origin,
		BODY_SIZE_LIMIT: process.env.BODY_SIZE_LIMIT || LARGEST_BODY,
		SHUTDOWN_TIMEOUT: process.env.SHUTDOWN_TIMEOUT || '3',
	};
}

/**
 * @param {Supervised} children @param {NodeJS.ProcessEnv} env
 * @param {import('./address.mjs').Address} address @param {boolean} dev
 */
async function startChildren(children, env, address, dev) {
	if (env.MERESTONE_DEMO === '1' && !process.env.SMTP_URL) {
		children.start('mail-catcher', ['--import', 'tsx', 'src/ops/mail-catcher.ts'], env);
		const port = Number(new URL(env.SMTP_URL ?? '').port);
		if (!(await answers(port, 30_000))) {
			throw new Explained(`The mail catcher did not start.\n${children.lastLines('mail-catcher')}`);
		}
	}
	children.start('worker', ['--import', 'tsx', 'src/workers/worker.ts'], env);
	const vite = ['node_modules/vite/bin/vite.js', 'dev', '--strictPort'];
	const listen = ['--host', address.host, '--port', String(address.port)];
	children.start('web', dev ? [...vite, ...listen] : ['build/index.js'], env);
}

/** @param {string} script @param {NodeJS.ProcessEnv} env */
const runScript = (script, env) => runNode(['--import', 'tsx', script], env);
