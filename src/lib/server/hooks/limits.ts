import type { Handle, RequestEvent } from '@sveltejs/kit';
import { limits, use } from '../services/limits.service.ts';
import { TooMany } from '../services/outcomes.ts';
import { plainAnswer } from './answer.ts';

const MEGABYTE = 1024 * 1024;
/** They read their body as it comes and count it themselves; a file goes straight to the disk. */
const counted = /^\/(\(app\)\/\[team\]\/(upload|sheets\/\[sheet\]\/measures)$|api\/v1\/)/;
/** whole documents: a line for each region of a large sheet */
const documents =
	/^\/\(app\)\/\[team\]\/sheets\/\[sheet\]\/(draft|territories\/draft|territories\/proposals\/\[proposal\]\/plan)$/;

/** Up to this much is let run past unread, so that the one who sends it gets to hear the answer. */
const letPass = 16 * MEGABYTE;

/** Refuses bodies that are larger than anything this route takes; nothing of them is kept. */
export const handleBodySize: Handle = async ({ event, resolve }) => {
	const { request } = event;
	if (!request.body || bodyLength(request) <= largestBody(event)) return resolve(event);
	const said = 'This is more than can be sent here at once.';
	if (bodyLength(request) <= letPass) {
		await request.body.pipeTo(new WritableStream());
		return plainAnswer(event, 413, said);
	}
	// The rest of the body is still on its way: this connection cannot carry another request.
	return plainAnswer(event, 413, said, { connection: 'close' });
};

/** A body of unknown length counts as endless, except where it is counted while it is read. */
const bodyLength = (request: Request): number =>
	Number(request.headers.get('content-length') ?? Infinity);

function largestBody({ route }: RequestEvent): number {
	if (counted.test(route.id ?? '')) return Infinity;
	return documents.test(route.id ?? '') ? 32 * MEGABYTE : MEGABYTE;
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
