import { spawn } from 'node:child_process';
import { root } from './files.mjs';
import { Explained } from './say.mjs';

/**
 * What has to be ended when this process ends, the latest first.
 * @typedef {() => void | Promise<void>} End
 * @type {Set<End>}
 */
const ends = new Set();
/** Set once, so that two signals end everything once. @type {Promise<void> | null} */
let ending = null;

/**
 * Registers something to be ended.
 * @param {End} end
 * @returns {() => Promise<void>} ends it now instead
 */
export function atEnd(end) {
	ends.add(end);
	return async () => {
		if (ends.delete(end)) await end();
	};
}

/** Ends whatever was registered and still runs, the latest first. */
export function endChildren() {
	ending ??= (async () => {
		for (const end of [...ends].reverse()) await end();
	})();
	return ending;
}

/** Whether the end has begun: what fails from here on fails because of it. */
export const isEnding = () => ending !== null;

/** Ctrl-C, a closed terminal or a plain kill end everything that was started. */
export function exitOnSignals(status = 0) {
	for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
		process.on(signal, () => void endChildren().then(() => process.exit(status)));
	}
}

/**
 * Runs a command to its end, its output shown.
 * @param {string} command @param {string[]} args
 * @param {NodeJS.ProcessEnv} [extra] added to this process's environment
 * @returns {Promise<number>} its exit status
 */
export function run(command, args, extra = {}) {
	return new Promise((resolve, reject) => {
		const env = { ...process.env, ...extra };
		const child = spawn(command, args, { cwd: root, env, stdio: ['ignore', 'inherit', 'inherit'] });
		const end = () => void child.kill('SIGTERM');
		ends.add(end);
		child.once('error', (error) =>
			reject(new Explained(`${command} could not be started: ${error.message}`)),
		);
		child.once('exit', (status) => {
			ends.delete(end);
			resolve(status ?? 1);
		});
	});
}

/**
 * Runs a command that has to succeed.
 * @param {string} command @param {string[]} args @param {NodeJS.ProcessEnv} [extra]
 */
export async function mustRun(command, args, extra) {
	const status = await run(command, args, extra);
	if (status !== 0) throw new Explained(`"${command} ${args.join(' ')}" failed, see above.`);
}

/** @param {string[]} args @param {NodeJS.ProcessEnv} [extra] */
export const runNode = (args, extra) => mustRun(process.execPath, args, extra);
