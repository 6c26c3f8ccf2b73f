import { KyselyAdapter, type KyselyAuth } from '@auth/kysely-adapter';
import type { Provider } from '@auth/core/providers';
import Nodemailer from '@auth/core/providers/nodemailer';
import { SvelteKitAuth, type SvelteKitAuthConfig } from '@auth/sveltekit';
import type { Handle } from '@sveltejs/kit';
import { config, type Config } from '../config.ts';
import { database } from '../database/connection.ts';
import { log } from '../log.ts';
import { signInMail } from '../mail/messages.ts';
import { sendMail } from '../mail/transport.ts';
import { SESSION_RENEWAL_SECONDS, SESSION_SECONDS } from '../services/sessions.service.ts';

/** Auth.js: links by mail, the organisation's own sign-in, and the look-up of sessions. */
const { handle, signIn } = SvelteKitAuth(async () => authConfig(config()));
export { signIn };

/** How long a mailed link works. */
export const LINK_MINUTES = 20;

/** Only the ways back into the product are open; everything else about signing in is our own pages. */
const open = /^\/auth\/(callback\/|verify-request$|error$)/;

export const handleAuth: Handle = async (input) => {
	const { pathname } = input.event.url;
	if (!pathname.startsWith('/auth/')) return handle(input);
	if (!open.test(pathname)) return new Response('Not found', { status: 404 });
	const answer = await handle(input);
	// Its redirects cannot be changed; a copy can, and the outer hooks add their headers.
	return new Response(answer.body, answer);
};

function authConfig(settings: Config): SvelteKitAuthConfig {
	return {
		adapter: KyselyAdapter(database() as unknown as KyselyAuth<never>),
		providers: providersOf(settings),
		secret: settings.authSecret,
		trustHost: true,
		session: { strategy: 'database', maxAge: SESSION_SECONDS, updateAge: SESSION_RENEWAL_SECONDS },
		pages: { signIn: '/sign-in', verifyRequest: '/sign-in/sent', error: '/sign-in' },
		callbacks: {
			session: ({ session, user }) => ({
				expires: session.expires,
				user: { id: user.id, email: user.email, name: user.name },
			}),
			signIn: ({ account, profile }) =>
				account?.type !== 'oidc' || Boolean(profile?.email && profile.email_verified !== false),
		},
		logger: {
			error: (error) => log.warn({ error: error.name, why: error.message }, 'a sign-in failed'),
			warn: () => {},
			debug: () => {},
		},
	};
}

/** A provider is offered only when it is set up: one without its server would fail every request. */
function providersOf({ mail, oidc, origin }: Config): Provider[] {
	const providers: Provider[] = [];
	if (mail) providers.push(linkByMail(mail, origin));
	if (oidc) providers.push(organisation(oidc));
	return providers;
}

/**
 * The mailed address leads to a page with a button rather than straight in, because mail scanners open
 * every link and would use it up. It is built on our own origin, never on what a request says its host is.
 */
const linkByMail = (mail: NonNullable<Config['mail']>, origin: string) =>
	Nodemailer({
		server: mail.server,
		from: mail.from,
		maxAge: LINK_MINUTES * 60,
		async sendVerificationRequest({ identifier, url }) {
			const link = `${origin}/sign-in/link${new URL(url).search}`;
			await sendMail(signInMail(identifier, link, LINK_MINUTES));
		},
	});

/** No token of the organisation's server is kept: it has done its work once the person is known. */
const organisation = (oidc: NonNullable<Config['oidc']>): Provider => ({
	id: 'oidc',
	name: oidc.name,
	type: 'oidc',
	issuer: oidc.issuer,
	clientId: oidc.clientId,
	clientSecret: oidc.clientSecret,
	checks: ['pkce', 'state', 'nonce'],
	authorization: { params: { scope: 'openid email profile' } },
	account: () => ({}),
	profile: ({ sub, name, email }) => ({ id: sub, name: name ?? null, email: email?.toLowerCase() }),
});
