import { spawn } from 'node:child_process';
import { root } from './files.mjs';
import { Explained } from './say.mjs';

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

/**
 * Runs a command to its end, its output shown; fails with an explanation when it fails.
 * @param {string} command @param {string[]} args @param {NodeJS.ProcessEnv} [env]
 * @returns {Promise<void>}
 */
export function run(command, args, env = process.env) {
	return new Promise((resolve, reject) => {
		const child = spawn(command, args, { cwd: root, env, stdio: ['ignore', 'inherit', 'inherit'] });
		running.add(child);
		child.once('error', (error) =>
			reject(new Explained(`${command} could not be started: ${error.message}`)),
		);
		child.once('exit', (status) => {
			running.delete(child);
			if (status === 0) resolve();
			else reject(new Explained(`"${command} ${args.join(' ')}" failed, see above.`));
		});
	});
}

/** @param {string[]} args @param {NodeJS.ProcessEnv} [env] */
export const runNode = (args, env) => run(process.execPath, args, env);

/** Ends whatever `run` is waiting for. */
export function endRunning() {
	for (const child of running) child.kill('SIGTERM');
}
