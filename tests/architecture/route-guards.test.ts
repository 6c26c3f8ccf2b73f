import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { actions } from '../../src/lib/server/access/roles.ts';
import { waysIn } from '../support/guards.ts';
import { routeRights } from '../support/route-rights.ts';

const inTeam = '(app)/[team]';
const told = (route: string, entry: string) => `${route.replace(`/${inTeam}`, '')} ${entry}`;

describe('every way into a team is guarded', () => {
	const ways = waysIn(inTeam);

	it.each(ways)('$route $entry names the action that it needs', ({ actions: named }) => {
		expect(named.length).toBeGreaterThan(0);
		for (const action of named) expect(actions).toContain(action);
	});

	it('is on the list of rights, and the list holds nothing else', () => {
		const found = ways.map(({ route, entry }) => told(route, entry));
		const listed = routeRights.map(([route, entry]) => `${route} ${entry}`);
		expect([...new Set(found)].sort()).toEqual([...listed].sort());
	});

	it.each(routeRights)('%s %s asks for %s', (route, entry, action) => {
		const matching = ways.filter((way) => told(way.route, way.entry) === `${route} ${entry}`);
		expect(matching.length).toBeGreaterThan(0);
		for (const way of matching) expect(way.actions).toContain(action);
	});

	it('pages without a load of their own stand below one that asks', () => {
		const layout = `src/routes/${inTeam}/+layout.server.ts`;
		expect(existsSync(layout) && readFileSync(layout, 'utf8')).toContain("memberFor(locals, '");
	});
});

describe('every way into the signed-in part asks who it is', () => {
	const ways = waysIn('(app)').filter(({ route }) => !route.startsWith(`/${inTeam}`));

	it.each(ways)('$route $entry', ({ asksUser }) => {
		expect(asksUser).toBe(true);
	});
});
