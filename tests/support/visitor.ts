/** A browser without pages: keeps cookies, follows no redirect by itself, sends forms as a browser does. */
export class Visitor {
	readonly cookies = new Map<string, string>();

	constructor(readonly origin: string) {}

	async ask(address: string, init: RequestInit = {}): Promise<Response> {
		const headers = new Headers(init.headers);
		if (!headers.has('accept')) headers.set('accept', 'text/html');
		const jar = [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
		if (jar) headers.set('cookie', jar);
		const url = new URL(address, this.origin);
		const response = await fetch(url, { ...init, headers, redirect: 'manual' });
		if (url.origin === this.origin)
			for (const line of response.headers.getSetCookie()) this.keep(line);
		return response;
	}

	get = (address: string): Promise<Response> => this.ask(address);

	/** @param origin what the browser says the form stood on */
	post(address: string, fields: Record<string, string>, origin = this.origin): Promise<Response> {
		const headers = { origin, 'content-type': 'application/x-www-form-urlencoded' };
		return this.ask(address, { method: 'POST', headers, body: new URLSearchParams(fields) });
	}

	/** The same as the page's script sends it: the answer tells what the action alone came to. */
	postByScript(address: string, fields: Record<string, string>): Promise<Response> {
		const headers = {
			...{ origin: this.origin, accept: 'application/json', 'x-sveltekit-action': 'true' },
			'content-type': 'application/x-www-form-urlencoded',
		};
		return this.ask(address, { method: 'POST', headers, body: new URLSearchParams(fields) });
	}

	/** Follows redirects, other servers' included, to where they end. */
	async follow(response: Response): Promise<Response> {
		const next = response.headers.get('location');
		return next ? this.follow(await this.get(next)) : response;
	}

	signIn(user: { email: string; password: string }): Promise<Response> {
		return this.post('/sign-in?/password', { email: user.email, password: user.password });
	}

	private keep(line: string): void {
		const [pair = '', ...attributes] = line.split(';');
		const [name = '', ...value] = pair.split('=');
		const gone = attributes.some((attribute) => /^\s*max-age=0$/i.test(attribute));
		if (gone) this.cookies.delete(name);
		else this.cookies.set(name, value.join('='));
	}
}
