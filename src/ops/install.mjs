import path from 'node:path';
import { mustRun } from './children.mjs';
import { readJson, root } from './files.mjs';
import { timed } from './say.mjs';

/**
 * Installs the pinned packages when any of them is missing or another version than the lock says.
 * Compares contents, not times: a clone gives every file the time of the clone.
 */
export async function ensureDependencies() {
	if (installedAsLocked()) return;
	await timed('Installing the packages (about 3 minutes the first time)', () =>
		mustRun('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']),
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
