import path from 'node:path';
import { randomSecret, readJson, writePrivateJson } from './files.mjs';

/**
 * What is made up on the first start and kept afterwards: a new one would end every session.
 * @param {string} dataDir
 * @returns {{authSecret: string}}
 */
export function keptSecrets(dataDir) {
	const file = path.join(dataDir, 'secrets.json');
	const kept = readJson(file);
	if (kept?.authSecret) return kept;
	const fresh = { authSecret: randomSecret() };
	writePrivateJson(file, fresh);
	return fresh;
}
