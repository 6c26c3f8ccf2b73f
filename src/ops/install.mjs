import { spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync, mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { readJson, root } from './files.mjs';
import { Explained, timed } from './say.mjs';
import { run } from './steps.mjs';

/**
 * Installs the pinned packages when any of them is missing or another version than the lock says.
 * Compares contents, not times: a clone gives every file the time of the clone.
 */
export async function ensureDependencies() {
	if (installedAsLocked()) return;
	await timed('Installing the packages (about 3 minutes the first time)', () =>
		run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']),
	);
}

/** Whether node_modules holds what the lock file asks for. */
export function installedAsLocked() {
	const wanted = readJson(path.join(root, 'package-lock.json'))?.packages ?? {};
	const present = readJson(path.join(root, 'node_modules/.package-lock.json'))?.packages;
	if (!present) return false;
	return Object.entries(wanted).every(
		([place, entry]) =>
			place === '' || entry.optional || entry.peer || present[place]?.version === entry.version,
	);
}

/**
 * Installs Debian packages: possible for root only.
 * @param {string[]} packages @param {string} purpose
 */
export async function aptInstall(packages, purpose) {
	const command = `apt-get install ${packages.join(' ')}`;
	if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
		throw new Explained(`${purpose} is missing. Install it as root with: ${command}`);
	}
	const options = ['-y', '-qq', '-o', 'DPkg::Lock::Timeout=300', '--no-install-recommends'];
	const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
	await timed(`Installing ${purpose} from Debian's packages`, async () => {
		const first = spawnSync('apt-get', ['install', ...options, ...packages], { env });
		if (first.status === 0) return;
		await run('apt-get', ['update', '-qq', '-o', 'DPkg::Lock::Timeout=300'], env);
		await run('apt-get', ['install', ...options, ...packages], env);
	});
}

/** Debian starts a cluster of its own with the package unless told not to; this product brings its own. */
export async function installPostgres() {
	const settings = '/etc/postgresql-common/createcluster.conf';
	if (process.getuid?.() === 0 && !existsSync(settings)) {
		mkdirSync(path.dirname(settings), { recursive: true });
		writeFileSync(settings, 'create_main_cluster = false\n');
	}
	await aptInstall(['postgresql'], 'PostgreSQL');
}

/** @returns {Promise<string>} the path of a Chromium that the browser tests can drive */
export async function ensureChromium() {
	const found = findChromium();
	if (found) return found;
	await aptInstall(['chromium'], 'Chromium');
	const installed = findChromium();
	if (!installed) throw new Explained('Chromium was installed but cannot be found on the path.');
	return installed;
}

function findChromium() {
	const folders = (process.env.PATH ?? '').split(path.delimiter).concat('/usr/bin');
	const places = folders.flatMap((folder) =>
		['chromium', 'chromium-browser'].map((name) => path.join(folder, name)),
	);
	return [process.env.CHROMIUM_PATH ?? '', ...places].find((file) => file && executable(file));
}

/** @param {string} file */
export function executable(file) {
	try {
		accessSync(file, constants.X_OK);
		return true;
	} catch {
		return false;
	}
}
