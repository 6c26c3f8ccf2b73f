import type { Handle } from '@sveltejs/kit';
import { config } from '../config.ts';

const always: Record<string, string> = {
	'x-content-type-options': 'nosniff',
	'referrer-policy': 'strict-origin-when-cross-origin',
	'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
	'cross-origin-opener-policy': 'same-origin',
	'cross-origin-resource-policy': 'same-origin',
	'x-frame-options': 'DENY',
};

/** Pages bring a policy of their own from the framework; whatever else is sent may load nothing at all. */
const nothing = "default-src 'none'; frame-ancestors 'none'";

export const handleHeaders: Handle = async ({ event, resolve }) => {
	const response = await resolve(event);
	const { headers } = response;
	for (const [name, value] of Object.entries(always)) {
		if (!headers.has(name)) headers.set(name, value);
	}
	if (event.url.protocol === 'https:') {
		headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains');
	}
	headers.set('content-security-policy', policy(headers.get('content-security-policy')));
	if (event.locals.user && !headers.has('cache-control')) {
		headers.set('cache-control', 'private, no-store');
	}
	return response;
};

/** A sign-in form may end at the organisation's own sign-in server, so the policy has to name it. */
export function policy(given: string | null, issuer = config().oidc?.issuer): string {
	if (!given) return nothing;
	if (!issuer) return given;
	return given.replace("form-action 'self'", `form-action 'self' ${new URL(issuer).origin}`);
}
