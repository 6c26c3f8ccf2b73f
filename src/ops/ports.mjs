import { connect, createServer } from 'node:net';

/**
 * Whether this process could listen there now.
 * @param {number} port @param {string} host
 * @returns {Promise<boolean>}
 */
export const isFree = (port, host = '127.0.0.1') =>
	new Promise((resolve) => {
		const probe = createServer();
		probe.once('error', () => resolve(false));
		probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
	});

/**
 * A port that was free a moment ago.
 * @param {string} host
 * @returns {Promise<number>}
 */
export const freePort = (host = '127.0.0.1') =>
	new Promise((resolve, reject) => {
		const probe = createServer();
		probe.once('error', reject);
		probe.listen({ port: 0, host }, () => {
			const address = probe.address();
			probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0));
		});
	});

/**
 * The first free port from this one on.
 * @param {number} from @param {string} host
 * @returns {Promise<number>}
 */
export async function firstFreePort(from, host) {
	for (let port = from; port < from + 100; port += 1) if (await isFree(port, host)) return port;
	return freePort(host);
}

/**
 * Waits until something listens there.
 * @param {number} port @param {number} milliseconds
 * @returns {Promise<boolean>}
 */
export async function answers(port, milliseconds) {
	const until = Date.now() + milliseconds;
	while (Date.now() < until) {
		if (await connects(port)) return true;
		await new Promise((resolve) => setTimeout(resolve, 50));
	}
	return false;
}

/** @param {number} port @returns {Promise<boolean>} */
const connects = (port) =>
	new Promise((resolve) => {
		const socket = connect({ port, host: '127.0.0.1' });
		socket.once('connect', () => (socket.destroy(), resolve(true)));
		socket.once('error', () => resolve(false));
	});
