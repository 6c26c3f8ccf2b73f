import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { mayDo } from '../../src/lib/server/access/member.ts';
import { actions } from '../../src/lib/server/access/roles.ts';
import { scopes } from '../../src/lib/server/access/scopes.ts';
import {
	createToken,
	memberForToken,
	readTokens,
	withdrawToken,
} from '../../src/lib/server/services/tokens.service.ts';
import { newTeam, openHouse } from '../support/house.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
beforeAll(async () => {
	house = await openHouse();
});
afterAll(() => house.close());

const wanted = { name: 'Print shop', scopes: ['sheets:read'] as const, days: 30 };

describe('an API token', () => {
	it('acts for its team and is kept only as a digest', async () => {
		const { team, admin } = await newTeam(house.db);
		const token = await createToken(admin, wanted);
		const member = await memberForToken(token);
		expect(member).toMatchObject({ team: { id: team.id }, userId: null, scopes: ['sheets:read'] });
		const rows = await house.db.selectFrom('api_tokens').selectAll().execute();
		expect(JSON.stringify(rows)).not.toContain(token);
		expect(JSON.stringify(await readTokens(admin))).not.toContain(token);
		expect((await readTokens(admin))[0]?.last_used_at).toBeInstanceOf(Date);
	});

	it('may do what its scopes say and nothing that is an admin’s', async () => {
		const { admin } = await newTeam(house.db);
		const member = await memberForToken(await createToken(admin, { ...wanted, scopes }));
		if (!member) throw new Error('the token does not work');
		for (const action of actions.filter((one) => /manage|delete|issue|activity/.test(one))) {
			expect(mayDo(member, action), action).toBe(false);
		}
		const reader = await memberForToken(await createToken(admin, wanted));
		if (!reader) throw new Error('the token does not work');
		const allowed = actions.filter((action) => mayDo(reader, action));
		expect(allowed).toEqual(['team.read', 'sheet.read']);
	});

	it('does nothing once withdrawn, expired, changed or made up', async () => {
		const { admin } = await newTeam(house.db);
		const withdrawn = await createToken(admin, wanted);
		const [row] = await readTokens(admin);
		await withdrawToken(admin, row.id);
		const expired = await createToken(admin, { ...wanted, days: -1 });
		const works = await createToken(admin, wanted);
		const changed = works.slice(0, -1) + (works.endsWith('A') ? 'B' : 'A');
		for (const token of [withdrawn, expired, changed, '', 'merestone_', works.slice(10)]) {
			expect(await memberForToken(token), token).toBeNull();
		}
		expect(await memberForToken(works)).not.toBeNull();
	});

	it('of another team cannot be withdrawn', async () => {
		const { admin } = await newTeam(house.db);
		const other = await newTeam(house.db);
		const token = await createToken(other.admin, wanted);
		const [row] = await readTokens(other.admin);
		await expect(withdrawToken(admin, row.id)).rejects.toThrow('no such token');
		expect(await memberForToken(token)).not.toBeNull();
	});
});
