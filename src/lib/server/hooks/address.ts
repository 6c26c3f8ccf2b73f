import { redirect, type Handle } from '@sveltejs/kit';
import { config } from '../config.ts';

const loopback = new Set(['localhost', '127.0.0.1', '[::1]']);

/**
 * Sends a reader who came by another of this machine's own names to the one that forms are checked against;
 * otherwise the page would open and its forms be refused.
 */
export const handleAddress: Handle = ({ event, resolve }) => {
	const typed = `http://${event.request.headers.get('host') ?? ''}`;
	const ours = new URL(config().origin);
	if (event.request.method === 'GET' && event.route.id !== '/health' && URL.canParse(typed)) {
		const { hostname, port } = new URL(typed);
		const elsewhere = hostname !== ours.hostname && port === ours.port;
		if (elsewhere && loopback.has(hostname) && loopback.has(ours.hostname)) {
			redirect(307, ours.origin + event.url.pathname + event.url.search);
		}
	}
	return resolve(event);
};
