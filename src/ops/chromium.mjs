import path from 'node:path';
import { aptInstall, executable } from './debian.mjs';
import { Explained } from './say.mjs';

/** @returns {string} the path of a Chromium that the browser tests can drive, installed when missing */
export function ensureChromium() {
	const found = findChromium();
	if (found) return found;
	aptInstall(['chromium'], 'Chromium');
	const installed = findChromium();
	if (!installed) throw new Explained('Chromium was installed but cannot be found on the path.');
	return installed;
}

function findChromium() {
	const folders = (process.env.PATH ?? '').split(path.delimiter).concat('/usr/bin');
	const places = folders.flatMap((folder) =>
		['chromium', 'chromium-browser'].map((name) => path.join(folder, name)),
	);
	return [process.env.CHROMIUM ?? '', ...places].find((file) => file && executable(file));
}
