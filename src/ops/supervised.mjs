import { spawn } from 'node:child_process';
import { mkdirSync, openSync, readFileSync, closeSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { root } from './files.mjs';
import { Explained, say } from './say.mjs';

/** How often a child may end by itself within a minute before the whole product is given up. */
const RESTARTS = 4;

/**
 * The processes of one product, each with a log file, started again when one ends unasked.
 * `failure` rejects when one keeps ending.
 */
export class Supervised {
	/** @type {Map<string, import('node:child_process').ChildProcess>} */
	#running = new Map();
	/** @type {Map<string, number[]>} */
	#ends = new Map();
	#closing = false;
	/** @type {(reason: Error) => void} */
	#giveUp = () => {};
	/** @type {Promise<never>} */
	failure = new Promise((_, reject) => (this.#giveUp = reject));

	/** @param {string} logDirectory */
	constructor(logDirectory) {
		this.logDirectory = logDirectory;
		mkdirSync(logDirectory, { recursive: true, mode: 0o700 });
		this.failure.catch(() => {});
	}

	/**
	 * @param {string} name
	 * @param {string[]} args what follows `node` on the command line
	 * @param {NodeJS.ProcessEnv} env
	 */
	start(name, args, env) {
		if (this.#closing) return;
		const log = openSync(this.#logFile(name), 'a', 0o600);
		const leash = pathToFileURL(path.join(root, 'src/ops/leash.mjs')).href;
		const child = spawn(process.execPath, ['--import', leash, ...args], {
			cwd: root,
			env: { ...env, MERESTONE_PROCESS: name },
			detached: true,
			stdio: ['ignore', log, log, 'ipc'],
		});
		closeSync(log);
		this.#running.set(name, child);
		child.once('exit', (code, signal) => {
			this.#running.delete(name);
			if (!this.#closing) this.#again(name, args, env, `${signal ?? `status ${code}`}`);
		});
	}

	/** @param {string} name @param {string[]} args @param {NodeJS.ProcessEnv} env @param {string} how */
	#again(name, args, env, how) {
		const minuteAgo = Date.now() - 60_000;
		const ends = (this.#ends.get(name) ?? []).filter((at) => at > minuteAgo).concat(Date.now());
		this.#ends.set(name, ends);
		if (ends.length > RESTARTS) {
			this.#giveUp(new Explained(`The ${name} keeps ending (${how}).\n${this.lastLines(name)}`));
			return;
		}
		say(`The ${name} ended (${how}); starting it again.`);
		setTimeout(() => !this.#closing && this.start(name, args, env), 250 * ends.length);
	}

	/** Ends all of them, with force after ten seconds. */
	async stop() {
		this.#closing = true;
		await Promise.all([...this.#running.values()].map(endChild));
	}

	/** @param {string} name */
	#logFile(name) {
		return path.join(this.logDirectory, `${name}.log`);
	}

	/** @param {string} name */
	lastLines(name, count = 20) {
		return readFileSync(this.#logFile(name), 'utf8').trimEnd().split('\n').slice(-count).join('\n');
	}
}

/** @param {import('node:child_process').ChildProcess} child */
function endChild(child) {
	if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
	const ended = new Promise((resolve) => child.once('exit', resolve));
	signalGroup(child, 'SIGTERM');
	const force = setTimeout(() => signalGroup(child, 'SIGKILL'), 10_000);
	return ended.finally(() => clearTimeout(force));
}

/**
 * Each child leads a group of its own, so that what it started ends with it.
 * @param {import('node:child_process').ChildProcess} child @param {NodeJS.Signals} signal
 */
function signalGroup(child, signal) {
	if (child.pid === undefined) return;
	try {
		process.kill(-child.pid, signal);
	} catch (error) {
		if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'ESRCH') throw error;
	}
}
