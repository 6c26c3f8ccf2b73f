import type { Handle } from '@sveltejs/kit';

const changes = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

/**
 * Refuses whatever another site's page makes a signed-in browser send. It stands in place of the
 * framework's own check, which would also refuse programs that upload a file to the API: those send no
 * origin, and are known by their token alone, never by a cookie.
 */
export const handleOrigin: Handle = ({ event, resolve }) => {
	const { request, route, url } = event;
	const fromProgram = route.id?.startsWith('/api/v1/') ?? false;
	if (changes.has(request.method) && !fromProgram) {
		if (request.headers.get('origin') !== url.origin) {
			return new Response('This form was sent from another site.', { status: 403 });
		}
	}
	return resolve(event);
};
