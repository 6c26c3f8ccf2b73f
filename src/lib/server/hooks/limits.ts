import type { Handle, RequestEvent } from '@sveltejs/kit';
import { limits, use } from '../services/limits.service.ts';
import { TooMany } from '../services/outcomes.ts';
import { plainAnswer } from './answer.ts';

const MEGABYTE = 1024 * 1024;
/** They read their body as it comes and count it themselves; a file goes straight to the disk. */
const counted = /^\/(\(app\)\/\[team\]\/upload$|api\/v1\/)/;
const draft = '/(app)/[team]/sheets/[sheet]/draft';

/** Refuses bodies that are larger than anything this route takes, before a byte of them is read. */
export const handleBodySize: Handle = ({ event, resolve }) => {
	const { request } = event;
	if (!request.body || bodyLength(request) <= largestBody(event)) return resolve(event);
	// The rest of the body is still on its way: this connection cannot carry another request.
	return plainAnswer(event, 413, 'This is more than can be sent here at once.', {
		connection: 'close',
	});
};

/** A body of unknown length counts as endless, except where it is counted while it is read. */
const bodyLength = (request: Request): number =>
	Number(request.headers.get('content-length') ?? Infinity);

function largestBody({ route }: RequestEvent): number {
	if (counted.test(route.id ?? '')) return Infinity;
	return route.id === draft ? 32 * MEGABYTE : MEGABYTE;
}

/**
 * Counts what changes something, by person where one is signed in and by address otherwise. The API counts
 * its calls by token.
 */
export const handleRate: Handle = async ({ event, resolve }) => {
	const { request, route, locals } = event;
	const reads = request.method === 'GET' || request.method === 'HEAD';
	if (reads || route.id?.startsWith('/api/v1/')) return resolve(event);
	try {
		if (locals.user) await use(limits.writesByPerson, locals.user.id);
		else await use(limits.writesByAddress, event.getClientAddress());
	} catch (problem) {
		if (!(problem instanceof TooMany)) throw problem;
		const headers = { 'retry-after': String(problem.retryAfter) };
		return plainAnswer(event, 429, problem.message, headers);
	}
	return resolve(event);
};
