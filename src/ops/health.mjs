import { Explained } from './say.mjs';

/**
 * Waits until web, database and worker all answer.
 * @param {string} url the product's address on this machine
 * @param {number} milliseconds
 */
export async function waitForHealth(url, milliseconds) {
	const until = Date.now() + milliseconds;
	let last = 'nothing answered';
	while (Date.now() < until) {
		last = await ask(`${url}/health`);
		if (last === 'ok') return;
		await new Promise((resolve) => setTimeout(resolve, 150));
	}
	throw new Explained(`The product did not become healthy in ${milliseconds / 1000} s: ${last}`);
}

/** @param {string} address */
async function ask(address) {
	try {
		const response = await fetch(address, { signal: AbortSignal.timeout(5000) });
		const body = await response.text();
		return response.ok ? 'ok' : body;
	} catch (error) {
		return error instanceof Error ? error.message : String(error);
	}
}
