import { Explained, say } from './say.mjs';
import { firstFreePort, isFree } from './ports.mjs';

const USUAL_PORT = 4600;

/**
 * @typedef {{host: string, port: number, origin: string}} Address where the web process listens and the
 *   address that people type, which form posts are checked against
 */

/**
 * PORT, HOST and ORIGIN are taken as given; otherwise loopback and the first free port.
 * @param {{port?: number, host?: string, origin?: string}} [wanted]
 * @returns {Promise<Address>}
 */
export async function chooseAddress(wanted = {}) {
	const host = wanted.host ?? (process.env.HOST || '127.0.0.1');
	const port = await choosePort(wanted.port ?? Number(process.env.PORT || 0), host);
	const name = ['0.0.0.0', '::', '127.0.0.1', '::1'].includes(host) ? 'localhost' : host;
	const origin = wanted.origin ?? (process.env.ORIGIN || `http://${name}:${port}`);
	if (!URL.canParse(origin))
		throw new Explained(`ORIGIN must be an address like http://host:port.`);
	return { host, port, origin: new URL(origin).origin };
}

/** @param {number} port @param {string} host */
async function choosePort(port, host) {
	if (port) {
		if (await isFree(port, host)) return port;
		throw new Explained(
			`Port ${port} on ${host} cannot be used: another process listens there, or it needs more rights. ` +
				`Stop that process or set PORT to another number.`,
		);
	}
	const free = await firstFreePort(USUAL_PORT, host);
	if (free !== USUAL_PORT) say(`Port ${USUAL_PORT} is in use; taking ${free}.`);
	return free;
}

/**
 * The address on this machine, whatever name people type.
 * @param {Address} address
 */
export const localUrl = ({ host, port }) =>
	`http://${host === '0.0.0.0' ? '127.0.0.1' : host === '::' ? '[::1]' : host.includes(':') ? `[${host}]` : host}:${port}`;
