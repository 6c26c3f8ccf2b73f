import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Explained } from './say.mjs';

/**
 * One product at a time works on a data folder.
 * @param {string} dataDir
 * @returns {() => void} gives the folder free again
 */
export function claim(dataDir) {
	const file = path.join(dataDir, 'start.pid');
	const other = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0;
	if (other && other !== process.pid && isStart(other)) {
		throw new Explained(
			`Merestone already runs on ${dataDir} (process ${other}). Stop it with Ctrl-C there, ` +
				`or set MERESTONE_DATA to another folder for a second one.`,
		);
	}
	writeFileSync(file, String(process.pid), { mode: 0o600 });
	return () => rmSync(file, { force: true });
}

/** A number may have been given to another program since. @param {number} pid */
function isStart(pid) {
	const commandLine = `/proc/${pid}/cmdline`;
	return existsSync(commandLine) && readFileSync(commandLine, 'utf8').includes('start.mjs');
}
