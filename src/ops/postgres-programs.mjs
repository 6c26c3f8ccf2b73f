import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { aptInstall, executable } from './debian.mjs';
import { Explained } from './say.mjs';

/**
 * Finds the server's programs, installing Debian's package where there are none.
 * @param {string | null} major the version that made the cluster, which alone can open it
 * @returns {string} the folder with initdb, pg_ctl and psql
 */
export function postgresPrograms(major) {
	const found = findPrograms(major);
	if (found) return found;
	if (major && findPrograms(null)) {
		throw new Explained(
			`The database was made by PostgreSQL ${major}, which is not installed here any more. ` +
				`Install postgresql-${major}, or set MERESTONE_DATA to a new folder to begin afresh.`,
		);
	}
	installPostgres();
	const installed = findPrograms(major);
	if (!installed) throw new Explained('PostgreSQL was installed but its programs cannot be found.');
	return installed;
}

/** Debian starts a cluster of its own with the package unless told not to; this product brings its own. */
function installPostgres() {
	const settings = '/etc/postgresql-common/createcluster.conf';
	if (process.getuid?.() === 0 && !existsSync(settings)) {
		mkdirSync(path.dirname(settings), { recursive: true });
		writeFileSync(settings, 'create_main_cluster = false\n');
	}
	aptInstall(['postgresql'], 'PostgreSQL');
}

/** @param {string | null} major */
function findPrograms(major) {
	const debian = '/usr/lib/postgresql';
	const versions = existsSync(debian) ? readdirSync(debian) : [];
	const folders = versions
		.filter((version) => !major || version === major)
		.sort((a, b) => Number(b) - Number(a))
		.map((version) => path.join(debian, version, 'bin'));
	const onPath = major ? [] : (process.env.PATH ?? '').split(path.delimiter);
	return [...folders, ...onPath].find((folder) =>
		['initdb', 'pg_ctl', 'psql'].every((name) => executable(path.join(folder, name))),
	);
}

/**
 * PostgreSQL refuses to run as root, so root lends the work to the package's own user.
 * @returns {{uid?: number, gid?: number}}
 */
export function postgresUser() {
	if (process.getuid?.() !== 0) return {};
	const line = readFileSync('/etc/passwd', 'utf8')
		.split('\n')
		.find((entry) => entry.startsWith('postgres:'));
	if (!line) throw new Explained('There is no user "postgres" to run the database as.');
	const [, , uid, gid] = line.split(':');
	return { uid: Number(uid), gid: Number(gid) };
}

/**
 * Runs one of the server's programs to its end.
 * @param {string} program @param {string[]} args
 * @param {{env?: Record<string, string>, input?: string, mayFail?: boolean}} [options]
 */
export function runPostgres(program, args, { env = {}, input, mayFail = false } = {}) {
	const result = spawnSync(program, args, {
		...postgresUser(),
		cwd: '/',
		env: { PATH: process.env.PATH, LC_ALL: 'C.UTF-8', ...env },
		input,
		encoding: 'utf8',
		stdio: ['pipe', 'pipe', 'pipe'],
	});
	if (result.status !== 0 && !mayFail) {
		const reason = result.error?.message ?? (result.stderr || result.stdout);
		throw new Explained(`${path.basename(program)} failed: ${reason.trim()}`);
	}
	return result;
}

/**
 * Whether the database's user can enter and write this folder.
 * @param {string} directory
 */
export function reachable(directory) {
	mkdirSync(directory, { recursive: true });
	const { status } = spawnSync('/bin/sh', ['-c', 'cd "$0" && test -w .', directory], {
		...postgresUser(),
		cwd: '/',
	});
	return status === 0;
}
