import { randomUUID } from 'node:crypto';
import type { Handle, HandleServerError } from '@sveltejs/kit';
import { log } from '../log.ts';

/** Gives each request a number of its own, which the answer, the log and an error's page all show. */
export const handleRequest: Handle = async ({ event, resolve }) => {
	event.locals.requestId = randomUUID();
	event.locals.user = null;
	event.locals.member = null;
	const began = performance.now();
	const response = await resolve(event);
	response.headers.set('x-request-id', event.locals.requestId);
	log.info(
		{
			request: event.locals.requestId,
			method: event.request.method,
			route: event.route.id,
			status: response.status,
			milliseconds: Math.round(performance.now() - began),
		},
		'answered',
	);
	return response;
};

/** What nobody expected: the log gets all of it, the reader a plain sentence and the request's number. */
export const handleError: HandleServerError = ({ error, event, status, message }) => {
	const { requestId } = event.locals;
	if (status === 404) return { message: 'There is no page at this address.', requestId };
	if (status < 500) return { message, requestId };
	const told = error instanceof Error ? (error.stack ?? error.message) : String(error);
	log.error({ request: requestId, route: event.route.id, error: told }, 'a request failed');
	return {
		message: 'Something went wrong on our side. Nothing that was saved is lost.',
		requestId,
	};
};
