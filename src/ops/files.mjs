import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The checkout. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/** Where everything that is kept between starts lives. */
export const dataDirectory = () => path.resolve(root, process.env.MERESTONE_DATA || '.data');

/**
 * The folder itself may be passed through (the database's own user has to), what is in it may not be read.
 * @param {string} directory
 */
export function prepareDataDirectory(directory) {
	mkdirSync(directory, { recursive: true });
	chmodSync(directory, process.getuid?.() === 0 ? 0o711 : 0o700);
}

/** @param {string} file @returns {any} the parsed content, or null where there is no such file */
export function readJson(file) {
	return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
}

/**
 * Written beside and moved into place, readable by the owner only.
 * @param {string} file @param {unknown} value
 */
export function writePrivateJson(file, value) {
	mkdirSync(path.dirname(file), { recursive: true });
	const beside = `${file}.${process.pid}`;
	writeFileSync(beside, JSON.stringify(value, null, '\t') + '\n', { mode: 0o600 });
	renameSync(beside, file);
}

/** @param {number} bytes */
export const randomSecret = (bytes = 32) => randomBytes(bytes).toString('base64url');
