import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { root } from './files.mjs';

const inputs = [
	...['src', 'static', 'package-lock.json', 'package.json', 'tsconfig.json'],
	...['svelte.config.js', 'vite.config.ts', 'tailwind.config.ts'],
];
/** The build's own note of what it was made from. */
export const stampFile = path.join(root, 'build/sources.txt');

/** One digest over everything that the build reads; tests aside. */
export function sourcesDigest() {
	const hash = createHash('sha256');
	for (const file of inputs.flatMap((input) => filesBelow(path.join(root, input)))) {
		hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
	}
	return hash.digest('hex');
}

export const isBuilt = () =>
	existsSync(stampFile) && readFileSync(stampFile, 'utf8') === sourcesDigest();

/** @param {string} place @returns {string[]} */
function filesBelow(place) {
	if (!existsSync(place)) return [];
	if (!statSync(place).isDirectory()) return [place];
	return readdirSync(place)
		.filter((name) => !/\.test\.ts$/.test(name))
		.sort()
		.flatMap((name) => filesBelow(path.join(place, name)));
}
