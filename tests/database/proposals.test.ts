import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Wishes } from '../../src/lib/engines/territories/territory-draft.ts';
import { runRebalance } from '../../src/lib/server/jobs/rebalance.job.ts';
import { Conflict, NotFound, Unfit } from '../../src/lib/server/services/outcomes.ts';
import { adoptProposal } from '../../src/lib/server/services/proposal-adopt.service.ts';
import {
	cancelProposal,
	dropProposal,
	duplicateProposal,
	renameProposal,
} from '../../src/lib/server/services/proposal-keep.service.ts';
import {
	editProposal,
	recheckProposal,
} from '../../src/lib/server/services/proposal-plan.service.ts';
import {
	beginProposal,
	listOfProposals,
	openProposal,
	proposalProgress,
} from '../../src/lib/server/services/proposals.service.ts';
import { deskTerritories } from '../../src/lib/server/services/territories.service.ts';
import {
	fieldKey,
	plainOf,
	saveOver,
	territoriesOf,
	within,
	type Plain,
} from '../support/planner.ts';
import { createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
beforeAll(async () => {
	shop = await createWorkshop();
});
afterAll(() => shop.close());

const never = new AbortController().signal;
/** Two columns to the west, four to the east: 12 and 24 visits of 36 where 18 each would be even. */
const lopsided = (_key: string, _row: number, column: number) => (column < 2 ? 'west' : 'east');

async function lopsidedPlain(slug: string): Promise<Plain> {
	const plain = await plainOf(shop, slug, { rows: 6, columns: 6 });
	await saveOver(shop, plain, territoriesOf(plain.keys, lopsided));
	return plain;
}

/** Asks for a proposal and has it worked out at once. */
async function propose(plain: Plain, wishes: Wishes, name = 'Even') {
	const { planner, sheet } = plain;
	const { number } = await beginProposal(shop, planner, sheet, { name, wishes });
	await runRebalance(shop, shop.asked[shop.asked.length - 1], never);
	return openProposal(shop, planner, sheet, number);
}

describe('a proposal', () => {
	let plain: Plain;
	beforeAll(async () => {
		plain = await lopsidedPlain('proposals');
	});

	it('waits until its job runs, then holds a plan that evens out', async () => {
		const { planner, sheet, visits, keys } = plain;
		const asked = { name: 'Even', wishes: within(visits, 0.05) };
		const { number } = await beginProposal(shop, planner, sheet, asked);
		expect(number).toBe(1);
		expect(await openProposal(shop, planner, sheet, 1)).toMatchObject({
			...{ state: 'waiting', sentence: 'Waits for its turn.', assignment: null, outcome: null },
		});
		await runRebalance(shop, shop.asked[shop.asked.length - 1], never);
		const made = await openProposal(shop, planner, sheet, 1);
		expect(made).toMatchObject({ state: 'kept', stale: null, revision: 0, share: 1 });
		expect(made.territoryKeys).toEqual(['west', 'east']);
		expect(made.computed).toEqual(made.assignment);
		expect(made.today.filter((t) => t === 0)).toHaveLength(12);
		// within 5 % of 18 only 18 itself is a whole number, so six fields at least go west
		const west = made.assignment?.filter((t) => t === 0).length;
		expect(west).toBe(18);
		const moved = made.assignment?.filter((t, i) => t !== made.today[i]).length;
		expect(made.outcome).toMatchObject({ moved, cost: moved, faults: [], misses: [], outside: 0 });
		expect(made.outcome?.lowerBound).toBeLessThanOrEqual(moved ?? 0);
		expect(moved).toBe(6);
		expect(made.outcome?.largest[visits]).toBe(0);
		expect(made.sentence).toMatch(
			/^Moved 6 regions(, at least \d needed|; no plan does with less)?\./,
		);
		expect(Object.keys(made.inks).sort()).toEqual(['east', 'west']);
		expect(made.changedInks).toEqual([]);
		expect(keys).toHaveLength(36);
	});

	it('is on the list, newest first, and is worked out once', async () => {
		const { planner, sheet, visits } = plain;
		await propose(plain, within(visits, 0.2), 'Roomy');
		const list = await listOfProposals(shop, planner, sheet);
		expect(list.map(({ number, name }) => [number, name])).toEqual([
			[2, 'Roomy'],
			[1, 'Even'],
		]);
		const shown = await deskTerritories(shop, planner, sheet);
		expect(shown.proposals).toEqual(list);
		for (const id of shop.asked) await runRebalance(shop, id, never);
		expect(await listOfProposals(shop, planner, sheet)).toEqual(list);
		expect(await proposalProgress(shop, planner, sheet)).toEqual([
			{ number: 2, state: 'kept', step: '', share: 1 },
			{ number: 1, state: 'kept', step: '', share: 1 },
		]);
	});

	it('is renamed, copied and dropped', async () => {
		const { planner, sheet } = plain;
		await renameProposal(shop, planner, sheet, 2, 'With room');
		const copy = await duplicateProposal(shop, planner, sheet, 2);
		const copied = await openProposal(shop, planner, sheet, copy.number);
		const original = await openProposal(shop, planner, sheet, 2);
		expect(copied).toMatchObject({ name: 'With room, copy', assignment: original.assignment });
		expect(copied.outcome).toEqual(original.outcome);
		await dropProposal(shop, planner, sheet, copy.number);
		await expect(openProposal(shop, planner, sheet, copy.number)).rejects.toThrow(NotFound);
		expect(await listOfProposals(shop, planner, sheet)).toHaveLength(2);
	});
});

describe('a plan that cannot be', () => {
	it('tells by how much a tolerance fails', async () => {
		// one field has 100 of 135 visits, where half would be 67.5
		const values = Array.from({ length: 36 }, (_, i) => (i === 0 ? 100 : 1));
		const plain = await plainOf(shop, 'heavy', { rows: 6, columns: 6 }, values);
		await saveOver(shop, plain, territoriesOf(plain.keys, lopsided));
		const made = await propose(plain, within(plain.visits, 0.05));
		expect(made).toMatchObject({ state: 'impossible', assignment: null });
		expect(made.outcome?.reason).toBe('unit-too-heavy');
		expect(made.outcome?.witness?.regions).toEqual([0]);
		expect(made.sentence).toContain('No plan within 5 %');
		expect(made.sentence).toContain('Field 0.0');
		// 100 visits against a target of 67.5: 48.15 % above it, so 48.2 % would do
		const relief = made.outcome?.relief.find(({ kind }) => kind === 'tolerance');
		expect(relief?.sentence).toBe('A tolerance of 48.2 % for Visits would do.');
	});

	it('names the region whose figure is missing', async () => {
		const values = Array.from({ length: 36 }, (_, i) => (i === 7 ? null : 1));
		const plain = await plainOf(shop, 'missing', { rows: 6, columns: 6 }, values);
		await saveOver(shop, plain, territoriesOf(plain.keys, lopsided));
		const made = await propose(plain, within(plain.visits, 0.05));
		expect(made).toMatchObject({ state: 'impossible', outcome: { reason: 'missing-value' } });
		expect(made.sentence).toContain('Field 1.1');
	});

	it('is not asked for without territories, or by a measure that is not there', async () => {
		const plain = await plainOf(shop, 'unasked', { rows: 2, columns: 2 });
		const { planner, sheet, visits } = plain;
		const ask = (wishes: Wishes) => beginProposal(shop, planner, sheet, { name: 'No', wishes });
		await expect(ask(within(visits, 0.1))).rejects.toThrow('There is no territory that stays.');
		await saveOver(shop, plain, territoriesOf(plain.keys, lopsided));
		const gone = '00000000-0000-4000-8000-000000000000';
		await expect(ask(within(gone, 0.1))).rejects.toThrow(Unfit);
		const lost = { name: 'Lost', wishes: within(visits, 0.1), revision: 9 };
		await expect(beginProposal(shop, planner, sheet, lost)).rejects.toThrow(Conflict);
	});

	it('is not asked for an eleventh time at once', async () => {
		const plain = await lopsidedPlain('eleven');
		const { planner, sheet, visits } = plain;
		const ask = () =>
			beginProposal(shop, planner, sheet, { name: 'Again', wishes: within(visits, 0.1) });
		for (let i = 0; i < 10; i++) await ask();
		await expect(ask()).rejects.toThrow('10 proposals are being worked out already.');
		await cancelProposal(shop, planner, sheet, 3);
		await ask();
	});
});

describe('edits by hand', () => {
	let plain: Plain;
	beforeAll(async () => {
		plain = await lopsidedPlain('by-hand');
		await propose(plain, within(plain.visits, 0.2));
	});
	const edit = (moves: Record<string, string>, revision: number) =>
		editProposal(shop, plain.planner, plain.sheet, 1, { revision, moves });

	it('are counted anew, and the plan as computed is kept beside', async () => {
		const before = await openProposal(shop, plain.planner, plain.sheet, 1);
		const place = before.assignment?.findIndex((t, i) => t === 0 && before.today[i] === 1) ?? -1;
		const result = await edit({ [plain.keys[place]]: 'east' }, 0);
		if (result.status !== 'saved') throw new Error('not saved');
		expect(result.saved.revision).toBe(1);
		expect(result.saved.note.outcome?.moved).toBe((before.outcome?.moved ?? 0) - 1);
		const after = await openProposal(shop, plain.planner, plain.sheet, 1);
		expect(after.assignment?.[place]).toBe(1);
		expect(after.computed).toEqual(before.computed);
		expect(after.outcome).toEqual(result.saved.note.outcome);
		expect(after.sentence).toBe(result.saved.note.sentence);
	});

	it('that break a rule are kept and told, and cannot be adopted', async () => {
		// the far corner to the west: an island of its own
		const result = await edit({ [fieldKey(5, 5)]: 'west' }, 1);
		if (result.status !== 'saved') throw new Error('not saved');
		const { faults } = result.saved.note.outcome ?? { faults: [] };
		expect(faults).toEqual(['west is torn: Field 5.5 is not joined to the rest.']);
		const adopt = (outside: boolean) =>
			adoptProposal(shop, plain.planner, plain.sheet, 1, { revision: 2, outside });
		await expect(adopt(true)).rejects.toThrow('It breaks a rule: west is torn');
		expect((await edit({ [fieldKey(5, 5)]: 'east' }, 2)).status).toBe('saved');
	});

	it('of whoever was second are not saved', async () => {
		const late = await edit({ [fieldKey(0, 0)]: 'east' }, 1);
		expect(late).toMatchObject({ status: 'stale', stale: { revision: 3 } });
		const both = await Promise.all([
			edit({ [fieldKey(0, 2)]: 'west' }, 3),
			edit({ [fieldKey(1, 2)]: 'west' }, 3),
		]);
		expect(both.map(({ status }) => status).sort()).toEqual(['saved', 'stale']);
	});

	it('name only what is there', async () => {
		const { revision } = await openProposal(shop, plain.planner, plain.sheet, 1);
		await expect(edit({ nowhere: 'west' }, revision)).rejects.toThrow('“nowhere”');
		await expect(edit({ [fieldKey(0, 0)]: 'south' }, revision)).rejects.toThrow('“south”');
		const short = { revision, assignment: [0, 1] };
		const problem = editProposal(shop, plain.planner, plain.sheet, 1, short);
		await expect(problem).rejects.toThrow('every region');
	});
});

describe('adopting', () => {
	it('makes the plan the territories, once, and makes other proposals stale', async () => {
		const plain = await lopsidedPlain('adopting');
		const { planner, sheet, visits } = plain;
		await propose(plain, within(visits, 0.05), 'One');
		const other = await propose(plain, within(visits, 0.2), 'Two');
		expect(other.stale).toBeNull();
		const adopt = () => adoptProposal(shop, planner, sheet, 1, { revision: 0, outside: false });
		const both = await Promise.allSettled([adopt(), adopt()]);
		expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
		const refusal = both.find(({ status }) => status === 'rejected') as PromiseRejectedResult;
		expect(refusal.reason).toBeInstanceOf(Conflict);
		const made = await openProposal(shop, planner, sheet, 1);
		expect(made.state).toBe('adopted');
		const shown = await deskTerritories(shop, planner, sheet);
		expect(shown.revision).toBe(2);
		const west = Object.values(shown.draft.assignment).filter((key) => key === 'west');
		expect(west).toHaveLength(18);
		const [two] = shown.proposals;
		expect(two.stale).toBe('The territories have been changed since.');
		const late = { revision: 0, outside: true };
		await expect(adoptProposal(shop, planner, sheet, 2, late)).rejects.toThrow(
			'The territories have been changed since. Check the proposal against them first.',
		);
		const dropped = dropProposal(shop, planner, sheet, 1);
		await expect(dropped).rejects.toThrow('It was adopted, so it is kept.');
	});

	it('of a stale proposal waits until it was checked against the present', async () => {
		const plain = await lopsidedPlain('recheck');
		const { planner, sheet, visits } = plain;
		const made = await propose(plain, within(visits, 0.05));
		const { draft } = await deskTerritories(shop, planner, sheet);
		// three of the six fields move by hand meanwhile
		const moved = plain.keys.filter((_, i) => made.assignment?.[i] === 0 && made.today[i] === 1);
		const early = Object.fromEntries(moved.slice(0, 3).map((key) => [key, 'west']));
		await saveOver(shop, plain, { ...draft, assignment: { ...draft.assignment, ...early } });
		const checked = await recheckProposal(shop, planner, sheet, 1);
		if (checked.status !== 'saved') throw new Error('not saved');
		expect(checked.saved.note).toMatchObject({ stale: null, outcome: { moved: 3, lowerBound: 0 } });
		const adoption = { revision: checked.saved.revision, outside: false };
		expect(await adoptProposal(shop, planner, sheet, 1, adoption)).toEqual({ revision: 3 });
	});

	it('outside a tolerance takes an explicit yes', async () => {
		const plain = await lopsidedPlain('outside');
		const { planner, sheet, visits } = plain;
		const made = await propose(plain, within(visits, 0.05));
		const whole = made.today;
		await editProposal(shop, planner, sheet, 1, { revision: 0, assignment: whole });
		const edited = await openProposal(shop, planner, sheet, 1);
		expect(edited.outcome).toMatchObject({ moved: 0, outside: 2, faults: [] });
		expect(edited.outcome?.misses[0]).toContain('west is -33.33 %');
		const adopt = (outside: boolean) =>
			adoptProposal(shop, planner, sheet, 1, { revision: 1, outside });
		await expect(adopt(false)).rejects.toThrow('Say yes to adopt it all the same.');
		await adopt(true);
	});

	it('takes a leaver off the list once everything is handed out, and a new hire onto it', async () => {
		const plain = await plainOf(shop, 'leaver', { rows: 6, columns: 6 });
		const { planner, sheet, visits } = plain;
		const thirds = (_key: string, _row: number, column: number) => `t${Math.floor(column / 2)}`;
		const draft = territoriesOf(plain.keys, thirds);
		const hire = { ...draft.territories[0], key: 'new', name: 'New', base: fieldKey(5, 5) };
		const territories = [
			draft.territories[0],
			{ ...draft.territories[1], closing: true },
			draft.territories[2],
			hire,
		];
		await saveOver(shop, plain, { ...draft, territories });
		const made = await propose(plain, within(visits, 0.1));
		expect(made.state).toBe('kept');
		expect(made.outcome?.compulsory).toBe(12);
		expect(made.sentence).toContain('12 of them had to, whatever the plan.');
		await adoptProposal(shop, planner, sheet, made.number, { revision: 0, outside: false });
		const after = await deskTerritories(shop, planner, sheet);
		expect(after.draft.territories.map(({ key }) => key)).toEqual(['t0', 't2', 'new']);
		const loads = ['t0', 't2', 'new'].map(
			(key) => Object.values(after.draft.assignment).filter((one) => one === key).length,
		);
		// a third of 36 each, and a tenth more or less is 11 to 13
		for (const load of loads) expect(Math.abs(load - 12)).toBeLessThanOrEqual(1);
		expect(after.draft.assignment[fieldKey(5, 5)]).toBe('new');
	});
});

describe('when the ground changes', () => {
	it('figures that were replaced make a proposal stale', async () => {
		const plain = await lopsidedPlain('figures');
		const { planner, sheet, visits, keys } = plain;
		await propose(plain, within(visits, 0.05));
		await shop.db
			.updateTable('measures')
			.set({ values: keys.map((_, i) => (i === 0 ? 2 : 1)) })
			.where('id', '=', visits)
			.execute();
		const shown = await openProposal(shop, planner, sheet, 1);
		expect(shown.stale).toBe('Figures it was computed from have changed since.');
		const edit = editProposal(shop, planner, sheet, 1, { revision: 0, moves: {} });
		await expect(edit).rejects.toThrow('Check the proposal against them first.');
	});

	it('a boundary set replaced meanwhile ends what waits, and hides plans of the old regions', async () => {
		const plain = await lopsidedPlain('replaced');
		const { planner, sheet, sheetId, visits } = plain;
		const wishes = within(visits, 0.05);
		await propose(plain, wishes);
		const { number } = await beginProposal(shop, planner, sheet, { name: 'Late', wishes });
		const waiting = shop.asked[shop.asked.length - 1];
		const other = await plainOf(shop, 'replacing', { rows: 3, columns: 3 });
		const set = await shop.db
			.selectFrom('sheets')
			.select('boundary_set_id')
			.where('id', '=', other.sheetId)
			.executeTakeFirstOrThrow();
		await shop.db.updateTable('sheets').set(set).where('id', '=', sheetId).execute();
		await runRebalance(shop, waiting, never);
		expect(await openProposal(shop, planner, sheet, number)).toMatchObject({
			state: 'failed',
			sentence: 'The boundaries were replaced before it was worked out. Ask for it again.',
		});
		const old = await openProposal(shop, planner, sheet, 1);
		expect(old).toMatchObject({
			assignment: null,
			stale: 'The boundaries have been replaced since.',
		});
		const adopt = adoptProposal(shop, planner, sheet, 1, { revision: 0, outside: true });
		await expect(adopt).rejects.toThrow(Conflict);
		await expect(recheckProposal(shop, planner, sheet, 1)).rejects.toThrow('Ask for it again.');
	});
});

describe('a plan that the checker refuses', () => {
	it('is not stored, and the proposal says that it failed here', async () => {
		const plain = await lopsidedPlain('refused');
		const { planner, sheet, visits } = plain;
		const asked = { name: 'Broken', wishes: within(visits, 0.05) };
		const { number } = await beginProposal(shop, planner, sheet, asked);
		const pool = {
			...shop.pool,
			run: async () => ({ faults: ['#3 is in two territories'] }),
		} as unknown as typeof shop.pool;
		await runRebalance({ ...shop, pool }, shop.asked[shop.asked.length - 1], never);
		expect(await openProposal(shop, planner, sheet, number)).toMatchObject({
			...{ state: 'failed', assignment: null, outcome: null },
			sentence: 'It could not be worked out because of a fault here. Nothing was kept.',
		});
	});
});
