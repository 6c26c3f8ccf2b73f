import { OAuth2Server, type MutableToken } from 'oauth2-mock-server';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runProduct } from '../support/running.ts';
import type { Visitor } from '../support/visitor.ts';

/** The ways in over HTTP: password, mailed link, the organisation's own sign-in, and what keeps others out. */
let product: Awaited<ReturnType<typeof runProduct>>;
let organisation: OAuth2Server;
let claims: Record<string, unknown> = {};

beforeAll(async () => {
	organisation = new OAuth2Server();
	await organisation.issuer.keys.generate('RS256');
	await organisation.start(0, '127.0.0.1');
	const issuer = `http://127.0.0.1:${organisation.address().port}`;
	organisation.issuer.url = issuer;
	organisation.service.on('beforeTokenSigning', (token: MutableToken) => {
		Object.assign(token.payload, claims);
	});
	const oidc = { OIDC_ISSUER: issuer, OIDC_ID: 'merestone', OIDC_SECRET: 'for tests' };
	product = await runProduct({ ...oidc, OIDC_NAME: 'the Survey' });
}, 300_000);
afterAll(async () => {
	await product?.stop();
	await organisation?.stop();
});

const placeOf = (response: Response) => response.headers.get('location');
/** Whether the product knows who this is, by a page that only the signed-in see. */
const isIn = async (visitor: Visitor) => (await visitor.get('/teams')).status === 200;

describe('by password', () => {
	it('leads to the page that was asked for, with a cookie no script can read', async () => {
		const visitor = product.visitor();
		const asked = await visitor.get('/tavaroe-survey/members?x=1');
		expect(asked.status).toBe(303);
		const signInPage = placeOf(asked) ?? '';
		expect(signInPage).toBe('/sign-in?to=%2Ftavaroe-survey%2Fmembers%3Fx%3D1');
		const { email, password } = product.userWith('designer');
		const to = '/tavaroe-survey/members?x=1';
		const response = await visitor.post('/sign-in?/password', { email, password, to });
		expect([response.status, placeOf(response)]).toEqual([303, to]);
		const cookie = response.headers.getSetCookie().find((line) => line.includes('session-token'));
		expect(cookie).toMatch(/HttpOnly/);
		expect(cookie).toMatch(/SameSite=Lax/i);
		expect(await isIn(visitor)).toBe(true);
	});

	it.each(['//evil.example', 'https://evil.example/', '/\\evil.example', 'javascript:alert(1)'])(
		'never leads to %s',
		async (to) => {
			const { email, password } = product.userWith('designer');
			const response = await product.visitor().post('/sign-in?/password', { email, password, to });
			expect(placeOf(response)).toBe('/teams');
		},
	);

	it('is refused with a sentence, and without a cookie', async () => {
		const visitor = product.visitor();
		const response = await visitor.signIn({ email: 'nobody@x.example', password: 'wrong' });
		expect(await response.text()).toContain('E-mail and password do not fit together.');
		expect(visitor.cookies.size).toBe(0);
	});

	it('ends on both sides by signing out', async () => {
		const visitor = product.visitor();
		await visitor.signIn(product.userWith('designer'));
		const kept = new Map(visitor.cookies);
		await visitor.post('/sign-out', {});
		expect(await isIn(visitor)).toBe(false);
		for (const [name, value] of kept) visitor.cookies.set(name, value);
		expect(await isIn(visitor)).toBe(false);
	});

	it('ends when the session is past its end', async () => {
		const visitor = product.visitor();
		await visitor.signIn(product.userWith('designer'));
		await product.db
			.updateTable('Session')
			.set({ expires: new Date(Date.now() - 1000) })
			.where('sessionToken', '=', visitor.cookies.get('authjs.session-token') ?? '')
			.execute();
		expect(await isIn(visitor)).toBe(false);
	});
});

describe('by a mailed link', () => {
	const ask = (visitor: Visitor, email: string) =>
		visitor.post('/sign-in?/link', { email, providerId: 'nodemailer', redirectTo: '/teams' });

	it('makes an account for a new address, works once, and only when its button is pressed', async () => {
		const visitor = product.visitor();
		const end = await visitor.follow(await ask(visitor, 'New.Person@Partners.example'));
		expect(new URL(end.url).pathname).toBe('/sign-in/sent');
		const link = product.linkTo('new.person@partners.example');
		expect(new URL(link).origin).toBe(product.url);
		expect((await visitor.get(link)).status).toBe(200);
		expect(await isIn(visitor)).toBe(false);
		const pressed = `/auth/callback/nodemailer${new URL(link).search}`;
		await visitor.follow(await visitor.get(pressed));
		expect(await isIn(visitor)).toBe(true);
		const second = product.visitor();
		const refused = await second.follow(await second.get(pressed));
		expect(await refused.text()).toContain('This link has been used or is too old.');
		expect(await isIn(second)).toBe(false);
	});

	it('is kept as a digest only', async () => {
		await ask(product.visitor(), 'kept@partners.example');
		const token = new URL(product.linkTo('kept@partners.example')).searchParams.get('token') ?? '';
		const rows = await product.db.selectFrom('VerificationToken').selectAll().execute();
		expect(rows.length).toBeGreaterThan(0);
		expect(JSON.stringify(rows)).not.toContain(token);
	});

	it('leads to this site whatever host the request names', async () => {
		const visitor = product.visitor();
		await visitor.ask('/sign-in?/link', {
			method: 'POST',
			headers: {
				origin: product.url,
				'x-forwarded-host': 'evil.example',
				'content-type': 'application/x-www-form-urlencoded',
			},
			body: new URLSearchParams({ email: 'host@partners.example', providerId: 'nodemailer' }),
		});
		expect(new URL(product.linkTo('host@partners.example')).origin).toBe(product.url);
	});

	it('is not sent without end to one mailbox', async () => {
		const visitor = product.visitor();
		for (let n = 0; n < 6; n += 1) await ask(visitor, 'flooded@partners.example');
		const response = await ask(visitor, 'flooded@partners.example');
		expect(await response.text()).toContain('Too many tries.');
	});
});

describe('by the organisation', () => {
	async function arrive(who: Record<string, unknown>, visitor = product.visitor()) {
		claims = who;
		const started = await visitor.post('/sign-in?/organisation', {
			providerId: 'oidc',
			redirectTo: '/teams',
		});
		return { visitor, end: await visitor.follow(started) };
	}

	it('signs in and makes an account, keeping no token of the other side', async () => {
		const { visitor } = await arrive({
			sub: 'a1',
			email: 'Org.Person@survey.example',
			name: 'Org',
		});
		expect(await isIn(visitor)).toBe(true);
		const account = await product.db
			.selectFrom('Account')
			.innerJoin('User', 'User.id', 'Account.userId')
			.selectAll('Account')
			.select('email')
			.where('providerAccountId', '=', 'a1')
			.executeTakeFirstOrThrow();
		expect(account).toMatchObject({ email: 'org.person@survey.example', provider: 'oidc' });
		expect([account.access_token, account.refresh_token, account.id_token]).toEqual([
			null,
			null,
			null,
		]);
		const again = await arrive({ sub: 'a1', email: 'org.person@survey.example', name: 'Org' });
		expect(await isIn(again.visitor)).toBe(true);
	});

	it('does not take over an account that has the same address', async () => {
		const { email } = product.userWith('admin');
		const { visitor, end } = await arrive({ sub: 'impostor', email });
		expect(await isIn(visitor)).toBe(false);
		expect(await end.text()).toContain('There is an account with this e-mail already.');
	});

	it('is tied to an account by the one who is signed in to it', async () => {
		const visitor = product.visitor();
		await visitor.signIn(product.userWith('planner'));
		claims = { sub: 'planner-there', email: product.userWith('planner').email };
		const fields = { providerId: 'oidc', redirectTo: '/account' };
		await visitor.follow(await visitor.post('/account?/organisation', fields));
		const later = await arrive(claims);
		const page = await (await later.visitor.get('/account')).text();
		expect(page).toContain(product.userWith('planner').email);
	});

	it('is refused for an address that the organisation has not confirmed', async () => {
		const who = { sub: 'b1', email: 'unproved@survey.example', email_verified: false };
		const { visitor, end } = await arrive(who);
		expect(await isIn(visitor)).toBe(false);
		expect(await end.text()).toContain('has not confirmed your e-mail address');
	});

	it('may be reached from a form on our pages, by the policy that is sent with them', async () => {
		const policy = (await product.visitor().get('/sign-in')).headers.get('content-security-policy');
		expect(policy).toContain(`form-action 'self' ${organisation.issuer.url}`);
	});
});

describe('what keeps others out', () => {
	it('refuses a form that stood on another site', async () => {
		const { email, password } = product.userWith('admin');
		const visitor = product.visitor();
		const response = await visitor.post(
			'/sign-in?/password',
			{ email, password },
			'https://evil.example',
		);
		expect(response.status).toBe(403);
		expect(visitor.cookies.size).toBe(0);
	});

	it('sends strict headers with pages and with everything else', async () => {
		for (const path of ['/', '/health', '/no-such-page']) {
			const { headers } = await product.visitor().get(path);
			expect(headers.get('x-content-type-options'), path).toBe('nosniff');
			expect(headers.get('x-frame-options'), path).toBe('DENY');
			expect(headers.get('x-request-id'), path).toMatch(/^[0-9a-f-]{36}$/);
			const policy = headers.get('content-security-policy') ?? '';
			expect(policy, path).toMatch(/default-src '(self|none)'/);
			expect(policy, path).toContain("frame-ancestors 'none'");
			expect(policy, path).not.toContain('unsafe-inline');
			// RFC 6797, 7.2: not to be sent over plain http
			expect(headers.has('strict-transport-security'), path).toBe(false);
		}
	});

	it('refuses a body that is larger than a form can be, before reading it', async () => {
		const big = 'x'.repeat(2 * 1024 * 1024);
		const response = await product
			.visitor()
			.post('/sign-in?/password', { email: big, password: 'x' });
		expect(response.status).toBe(413);
	});

	it('keeps the rest of Auth.js closed', async () => {
		for (const path of ['session', 'csrf', 'providers', 'signin', 'signout']) {
			expect((await product.visitor().get(`/auth/${path}`)).status, path).toBe(404);
		}
	});

	it('shows the caught mail to the demo’s admin alone', async () => {
		const admin = product.visitor();
		await admin.signIn(product.userWith('admin'));
		expect((await admin.get('/mail')).status).toBe(200);
		const designer = product.visitor();
		await designer.signIn(product.userWith('designer'));
		expect((await designer.get('/mail')).status).toBe(404);
		expect((await product.visitor().get('/mail')).status).toBe(303);
	});

	it('tells health to everybody and nothing more', async () => {
		const response = await product.visitor().get('/health');
		expect(await response.json()).toEqual({ status: 'ok', database: 'ok', worker: 'ok' });
	});
});
