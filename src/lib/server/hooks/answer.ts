import type { ActionResult, RequestEvent } from '@sveltejs/kit';

/**
 * What hooks answer by themselves. They return rather than throw, so that the answer passes the hooks
 * outside of them, which add its headers. A form sent by the page's script gets the form's own kind of result.
 */
export function plainAnswer(
	{ request }: RequestEvent,
	status: number,
	message: string,
	headers: Record<string, string> = {},
): Response {
	if (sentByScript(request)) {
		const result: ActionResult = { type: 'error', status, error: { message } };
		return Response.json(result, { status, headers });
	}
	if (request.headers.get('accept')?.includes('application/json')) {
		return Response.json({ message }, { status, headers });
	}
	const type = { 'content-type': 'text/plain; charset=utf-8' };
	return new Response(message, { status, headers: { ...type, ...headers } });
}

export function elsewhere({ request }: RequestEvent, location: string): Response {
	if (sentByScript(request)) {
		const result: ActionResult = { type: 'redirect', status: 303, location };
		return Response.json(result);
	}
	return new Response(null, { status: 303, headers: { location } });
}

const sentByScript = (request: Request): boolean => request.headers.has('x-sveltekit-action');
