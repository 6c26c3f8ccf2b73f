import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { allows, roles, type Role } from '../../src/lib/server/access/roles.ts';
import { routeRights } from '../support/route-rights.ts';
import { runProduct } from '../support/running.ts';
import type { Visitor } from '../support/visitor.ts';

/**
 * Every page, form action and handler of a team on the running product, as each role, as a stranger and
 * as nobody. The sheet named in the paths does not exist: only whether one may is asked here.
 */
let product: Awaited<ReturnType<typeof runProduct>>;
beforeAll(async () => {
	product = await runProduct();
}, 300_000);
afterAll(() => product?.stop());

const values: Record<string, string> = {
	'[sheet]': '999',
	'[intake]': '00000000-0000-4000-8000-000000000000',
	'[revision]': '1',
	'[number]': '1',
	'[proposal]': '1',
	'[table]': '1',
	'[file]': 'sheet.svg',
};
const addressOf = (path: string, team = 'tavaroe-survey') =>
	`/${team}${path.replace(/\[\w+\]/g, (name) => values[name] ?? name)}`;

/** @returns the status of the page, or of what the form's action came to */
async function knock(visitor: Visitor, path: string, entry: string, team?: string) {
	const address = addressOf(path, team);
	if (entry === 'load' || entry === 'GET') return visitor.get(address);
	if (entry === 'POST') return visitor.post(address, {});
	const action = entry.replace('action ', '');
	return visitor.postByScript(action === 'default' ? address : `${address}?/${action}`, {});
}

/** Leaving the team would end the walk. */
const ways = routeRights.filter(([, entry]) => entry !== 'action leave');

async function visitorAs(role: Role): Promise<Visitor> {
	const visitor = product.visitor();
	await visitor.signIn(product.userWith(role));
	return visitor;
}

describe.each(roles)('as %s', (role) => {
	let visitor: Visitor;
	beforeAll(async () => {
		visitor = await visitorAs(role);
	});

	it.each(ways)('%s %s', async (path, entry, action) => {
		const may = allows([role], action);
		// of a page on a sheet that is not there, its layout says so first
		const place = !may && entry === 'load' ? path.replace('[sheet]', '1') : path;
		const { status } = await knock(visitor, place, entry);
		if (may) expect([401, 403, 500]).not.toContain(status);
		else expect(status).toBe(403);
	});
});

describe('as somebody of another team', () => {
	let visitor: Visitor;
	beforeAll(async () => {
		visitor = await visitorAs('admin');
		const made = await visitor.post('/teams/new', { name: 'Elsewhere' });
		expect(made.headers.get('location')).toBe('/elsewhere');
		visitor = product.visitor();
		await visitor.signIn(product.userWith('designer'));
	});

	it.each(ways)('%s %s is not there', async (path, entry) => {
		expect((await knock(visitor, path, entry, 'elsewhere')).status).toBe(404);
	});
});

describe('as nobody', () => {
	it.each(ways)('%s %s asks to sign in', async (path, entry) => {
		const response = await knock(product.visitor(), path, entry);
		const location = `/sign-in?to=${encodeURIComponent(addressOf(path))}`;
		if (entry.startsWith('action ')) {
			expect(await response.json()).toMatchObject({ type: 'redirect', location });
		} else {
			expect([response.status, response.headers.get('location')]).toEqual([303, location]);
		}
	});
});
