import { randomUUID } from 'node:crypto';
import type { RequestEvent, RequestHandler } from '@sveltejs/kit';

type RouteModule = Record<string, RequestHandler | undefined>;

/** The handlers of the API by file, loaded as they are. */
const modules = import.meta.glob<RouteModule>('../../src/routes/api/v1/**/+server.ts');
const root = '../../src/routes/api/v1';

interface Route {
	pattern: RegExp;
	names: string[];
	load: () => Promise<RouteModule>;
}

/** Fixed paths before those with parameters, and the one that takes everything last. */
const routes: Route[] = Object.entries(modules)
	.map(([file, load]) => ({ path: file.slice(root.length).replace(/\/\+server\.ts$/, ''), load }))
	.sort((one, two) => rank(one.path) - rank(two.path))
	.map(({ path, load }) => ({
		names: [...path.matchAll(/\[(?:\.\.\.)?(\w+)\]/g)].map(([, name]) => name),
		pattern: new RegExp(
			`^${path
				.replaceAll('.', '\\.')
				.replace(/\[\\.\\.\\.\w+\]/g, '(.*)')
				.replace(/\[\w+\]/g, '([^/]+)')}$`,
		),
		load,
	}));

function rank(path: string): number {
	return path.includes('[...') ? 1000 : path.split('[').length;
}

/** Calls the API as a program would, below /api/v1, without a network in between. */
export async function callApi(path: string, init: RequestInit = {}): Promise<Response> {
	const url = new URL(`http://localhost/api/v1${path}`);
	const request = new Request(url, init);
	const at = url.pathname.slice('/api/v1'.length);
	const route = routes.find(({ pattern }) => pattern.test(at));
	if (!route) throw new Error(`no route takes ${at}`);
	const values = route.pattern.exec(at)?.slice(1) ?? [];
	const params = Object.fromEntries(
		route.names.map((name, i) => [name, decodeURIComponent(values[i])]),
	);
	const handlers = await route.load();
	const handle = handlers[request.method] ?? handlers.fallback;
	if (!handle) throw new Error(`${at} has no fallback`);
	const locals = { requestId: randomUUID(), user: null, member: null };
	return handle({ request, url, params, locals } as unknown as RequestEvent);
}
