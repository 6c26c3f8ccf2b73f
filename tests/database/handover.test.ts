import { createHash, randomUUID } from 'node:crypto';
import { sql } from 'kysely';
import Papa from 'papaparse';
import readXlsxFile from 'read-excel-file/node';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { operations } from '../../src/lib/schemas/api/operations.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { handoverAnswer } from '../../src/lib/server/api/handover-answer.ts';
import {
	createHandover,
	handoverList,
	readHandover,
} from '../../src/lib/server/services/handover.service.ts';
import { answerLetter, readLetter } from '../../src/lib/server/services/handover-link.service.ts';
import { endLetter, sendLetters } from '../../src/lib/server/services/handover-letters.service.ts';
import { handoverBytes } from '../../src/lib/server/services/handover-table.ts';
import {
	approveHandover,
	changeMoveState,
	changeReason,
	confirmHandover,
	withdrawHandover,
} from '../../src/lib/server/services/handover-work.service.ts';
import { NotFound } from '../../src/lib/server/services/outcomes.ts';
import { join, newTeam, openHouse } from '../support/house.ts';
import { adopt, evenedOut, firm, plannedSheet, saveTerritories } from '../support/planned-sheet.ts';
import { createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let bench: TestWorkshop;
let shop: TestWorkshop;
let planner: Member;
let approver: Member;
let designer: Member;
let sheet: Awaited<ReturnType<typeof plannedSheet>>;

beforeAll(async () => {
	house = await openHouse();
	bench = await createWorkshop();
	shop = { ...bench, db: house.db };
	const { team } = await newTeam(house.db, 'Quellorn');
	planner = await join(house.db, team, 'planner', 'cartographer');
	approver = await join(house.db, team, 'approver');
	designer = await join(house.db, team, 'designer');
	sheet = await plannedSheet(shop, planner);
});
afterAll(async () => {
	await bench.close();
	await house.close();
});

const wished = { effectiveOn: '2099-01-01', note: '' };
const read = (handover: number) => readHandover(shop, planner, 1, handover);

/** A list of the one adopted proposal; what stood before is withdrawn. */
async function newList(): Promise<number> {
	const lists = await withdrawOpen();
	const isApproved = ({ state }: { state: string }) => state === 'approved';
	if (lists.some((list) => isApproved(list) && list.proposal.number === sheet.proposal)) {
		sheet.proposal = await adopt(house.db, sheet.sheet, sheet.today);
	}
	return createHandover(shop, planner, 1, { ...wished, proposal: sheet.proposal });
}

async function withdrawOpen() {
	const { lists } = await handoverList(shop, planner, 1);
	const open = lists.find(({ state }) => state === 'open');
	if (open) await withdrawHandover(shop, planner, 1, open.number);
	return lists;
}

const press = () => ({ press: randomUUID() });
const send = (list: number, more: object = {}) =>
	sendLetters(shop, planner, 1, list, { ...press(), ...more });
const emailOf = (key: string) => firm.territories.find(({ key: own }) => own === key)?.email ?? '';
const secretOf = (key: string) => house.mailbox.linkTo(emailOf(key)).split('/').at(-1) ?? '';
const mailsTo = (key: string) => house.mailbox.mails.filter(({ to }) => to.includes(emailOf(key)));

/** The house's limits on mails would otherwise stop these tests, which send far more than people do. */
const forgetLimits = () => house.db.deleteFrom('rate_limits').execute();

describe('a list', () => {
	it('holds every move of the adopted proposal, with figures and the reason', async () => {
		const list = await read(await newList());
		const expected = firm.rows.flatMap(({ code, territory }, at) =>
			territory === firm.fair[at] ? [] : [[code, territory, firm.fair[at]]],
		);
		expect(list.moves.map(({ region, from, to }) => [region.key, from?.key, to.key])).toEqual(
			expected,
		);
		expect(list.measures).toMatchObject([
			{ name: 'visits', unit: 'hours a year' },
			{ name: 'potential', unit: 'thousand skells' },
		]);
		for (const { region, figures, state } of list.moves) {
			const row = firm.rows.find(({ code }) => code === region.key);
			expect(figures).toEqual({ visits: row?.hours, potential: row?.potential });
			expect(state).toBe('proposed');
		}
		const reasoned = (reason: string) => list.moves.filter((move) => move.reason === reason);
		const leaver = firm.territories.find(({ note }) => note.startsWith('closes'))?.key;
		const ofLeaver = expected.filter(([, from]) => from === leaver).length;
		expect(reasoned('the territory closes')).toHaveLength(ofLeaver);
		expect(reasoned('cut off from its territory today')).toHaveLength(1);
		const rest = expected.length - ofLeaver - 1;
		expect(reasoned('evens out visits')).toHaveLength(rest);
		expect(list).toMatchObject({
			stale: null,
			digest: null,
			intact: null,
			proposed: expected.length,
		});
	});

	it('adds up what each territory gains and loses', async () => {
		const list = await read(await newList());
		for (const { key, gains, losses, balance } of list.territories) {
			const hours = (owner: string[]) =>
				firm.rows.reduce((sum, row, at) => sum + (owner[at] === key ? row.hours : 0), 0);
			const today = firm.rows.map(({ territory }) => territory);
			expect(balance.visits).toBe(hours(firm.fair) - hours(today));
			expect(gains + losses).toBeGreaterThan(0);
		}
	});

	it('takes a day in the past only when that is meant', async () => {
		await withdrawOpen();
		const past = { proposal: sheet.proposal, effectiveOn: '2020-05-01', note: '' };
		await expect(createHandover(shop, planner, 1, past)).rejects.toThrow('has passed');
		const number = await createHandover(shop, planner, 1, { ...past, past: 'yes' });
		expect((await read(number)).effectiveOn).toBe('2020-05-01');
	});

	it('is one at a time for a proposal, and only of one that was adopted', async () => {
		await newList();
		const again = createHandover(shop, planner, 1, { ...wished, proposal: sheet.proposal });
		await expect(again).rejects.toMatchObject({ code: 'listed' });
		const missing = createHandover(shop, planner, 1, { ...wished, proposal: 99 });
		await expect(missing).rejects.toBeInstanceOf(NotFound);
		await house.db.updateTable('proposals').set({ state: 'kept' }).execute();
		const kept = createHandover(shop, planner, 1, { ...wished, proposal: sheet.proposal });
		await expect(kept).rejects.toThrow('Adopt the proposal first');
		await house.db.updateTable('proposals').set({ state: 'adopted' }).execute();
	});

	it('is one when two ask at once', async () => {
		await withdrawOpen();
		const make = () => createHandover(shop, planner, 1, { ...wished, proposal: sheet.proposal });
		const both = await Promise.allSettled([make(), make()]);
		expect(both.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
	});

	it('needs a word for a dispute, and keeps who said what', async () => {
		const list = await newList();
		await changeReason(shop, planner, 1, list, { move: 2, reason: 'nearer to the depot' });
		const dispute = { move: 2, state: 'disputed', word: 'my best customer' } as const;
		await changeMoveState(shop, planner, 1, list, dispute);
		const { moves, disputed } = await read(list);
		expect(disputed).toBe(1);
		expect(moves[1]).toMatchObject({ reason: 'nearer to the depot', word: 'my best customer' });
		expect(moves[1].by).toBe('planner and cartographer');
		const row = { ordinal: 2, state: 'disputed', word: '' } as const;
		await expect(
			house.db.updateTable('handover_moves').set(row).where('ordinal', '=', 2).execute(),
		).rejects.toThrow('check constraint');
	});
});

describe('approving', () => {
	it('waits for disputes to be settled, then freezes the list under its digest', async () => {
		const list = await newList();
		const seen = async () => (await read(list)).seen;
		const dispute = { move: 1, state: 'disputed', word: 'no' } as const;
		await changeMoveState(shop, planner, 1, list, dispute);
		await expect(approveHandover(shop, approver, 1, list, await seen())).rejects.toMatchObject({
			code: 'disputed',
		});
		await changeMoveState(shop, planner, 1, list, { move: 1, state: 'accepted', word: '' });
		await expect(approveHandover(shop, approver, 1, list, 'f'.repeat(64))).rejects.toMatchObject({
			code: 'changed',
		});
		const digest = await approveHandover(shop, approver, 1, list, await seen());
		const approved = await read(list);
		expect(approved).toMatchObject({ state: 'approved', digest, intact: true });
		expect(approved.approvedBy).toBe('approver');
		expect(approved.moves.every(({ state }) => state === 'approved')).toBe(true);
		expect(digestByHand(approved, await dataDigest(list))).toBe(digest);
		await expect(
			changeReason(shop, planner, 1, list, { move: 1, reason: 'x' }),
		).rejects.toMatchObject({ code: 'closed' });
		await expect(withdrawHandover(shop, planner, 1, list)).rejects.toMatchObject({
			code: 'closed',
		});
	});

	it('leaves nothing that the database would let change', async () => {
		const { id } = await house.db
			.selectFrom('handovers')
			.select('id')
			.where('state', '=', 'approved')
			.executeTakeFirstOrThrow();
		const changes = [
			sql`update handover_moves set to_name = 'X' where handover_id = ${id}`,
			sql`delete from handover_moves where handover_id = ${id}`,
			sql`insert into handover_moves (handover_id, ordinal, region_key, region_name, to_key, to_name, state)
				values (${id}, 999, 'x', 'x', 'x', 'x', 'proposed')`,
			sql`update handovers set state = 'open' where id = ${id}`,
			sql`update handovers set effective_on = '2030-01-01' where id = ${id}`,
			sql`update handovers set digest = '0' where id = ${id}`,
			sql`update handovers set note = 'x' where id = ${id}`,
			sql`delete from handover_answers where handover_id = ${id}`,
		];
		for (const change of changes) await expect(change.execute(house.db)).rejects.toThrow();
	});

	it('is the approver’s, and working on it the planner’s', async () => {
		const { lists } = await handoverList(shop, approver, 1);
		const [{ number }] = lists;
		const { seen } = await read(number);
		for (const work of [
			approveHandover(shop, planner, 1, number, seen),
			changeReason(shop, approver, 1, number, { move: 1, reason: 'x' }),
			readHandover(shop, designer, 1, number),
			handoverList(shop, designer, 1),
		]) {
			await expect(work).rejects.toBeInstanceOf(Forbidden);
		}
	});
});

describe('a list whose ground has changed', () => {
	const lastStale = async (list: number) => (await read(list)).stale;

	it('says so when figures are replaced, and is approved only once confirmed', async () => {
		const list = await newList();
		const { hours } = sheet.measures;
		const values = firm.rows.map((row) => row.hours + 1);
		await house.db.updateTable('measures').set({ values }).where('id', '=', hours).execute();
		expect(await lastStale(list)).toMatch(/[Ff]igures/);
		expect((await handoverList(shop, approver, 1)).lists[0].stale).not.toBeNull();
		const approve = async () => approveHandover(shop, approver, 1, list, (await read(list)).seen);
		await expect(approve()).rejects.toMatchObject({ code: 'stale' });
		await confirmHandover(shop, planner, 1, list);
		expect(await lastStale(list)).toBeNull();
		// its figures stay those of the day it was made
		expect((await read(list)).moves[0].figures.visits).not.toBe(values[0]);
		await approve();
	});

	it('cannot be confirmed once its moves lead elsewhere', async () => {
		const list = await newList();
		const [{ region, from }] = (await read(list)).moves;
		const evened = evenedOut(sheet.today);
		const assignment = { ...evened.assignment, [region.key]: from?.key ?? '' };
		await saveTerritories(house.db, sheet.sheet.id, 3, { ...evened, assignment });
		const { stale, moves } = await read(list);
		expect(stale).toMatch(/territories/);
		expect(moves.filter(({ contradicted }) => contradicted)).toHaveLength(1);
		await expect(confirmHandover(shop, planner, 1, list)).rejects.toMatchObject({
			code: 'adrift',
		});
		await withdrawOpen();
		const again = createHandover(shop, planner, 1, { ...wished, proposal: sheet.proposal });
		await expect(again).rejects.toThrow(/changed since|list of this proposal/);
		await saveTerritories(house.db, sheet.sheet.id, 4, evened);
	});

	it('does not mind another name, person or address', async () => {
		const list = await newList();
		const evened = evenedOut(sheet.today);
		const territories = evened.territories.map((one) => ({ ...one, person: 'New Person' }));
		await saveTerritories(house.db, sheet.sheet.id, 5, { ...evened, territories });
		expect(await lastStale(list)).toBeNull();
		await saveTerritories(house.db, sheet.sheet.id, 6, evened);
	});
});

describe('letters', () => {
	it('go to each territory that gains or loses, with its own moves and no figures', async () => {
		await forgetLimits();
		const list = await newList();
		const { territories, moves } = await read(list);
		house.mailbox.mails.length = 0;
		const reached = territories.filter(({ email }) => email !== '');
		const result = await send(list);
		expect(result).toEqual({
			...{ sent: reached.length, failed: 0 },
			withoutAddress: territories.length - reached.length,
		});
		expect(house.mailbox.mails.flatMap(({ to }) => to).sort()).toEqual(
			reached.map(({ email }) => email).sort(),
		);
		// its territory is gone from the list by now, and the leaver is told nonetheless
		expect(mailsTo('T13')).toHaveLength(1);
		for (const { key } of reached) {
			const [{ text }] = mailsTo(key);
			for (const { region, from, to } of moves) {
				const own = from?.key === key || to.key === key;
				// one name may be the beginning of another, so the comma after it counts
				expect(text.includes(`- ${region.name},`), `${key} ${region.name}`).toBe(own);
			}
			expect(text).not.toMatch(/hours a year|skells/);
		}
		expect(
			(await read(list)).territories.every(({ letter, email }) =>
				email === '' ? letter === null : letter?.state === 'sent',
			),
		).toBe(true);
	});

	it('carry figures when the sender says so', async () => {
		await forgetLimits();
		const list = await newList();
		const { moves } = await read(list);
		const { key } = moves[0].to;
		await send(list, { territory: key, figures: 'yes' });
		const { text } = mailsTo(key).at(-1) ?? { text: '' };
		expect(text).toContain(`visits ${moves[0].figures.visits} hours a year`);
		expect((await readLetter(shop, secretOf(key), 'a'))?.measures).toHaveLength(2);
	});

	it('are sent once for one press, even when it comes twice at once', async () => {
		await forgetLimits();
		const list = await newList();
		house.mailbox.mails.length = 0;
		const once = press();
		await Promise.all([
			sendLetters(shop, planner, 1, list, once),
			sendLetters(shop, planner, 1, list, once),
		]);
		const [{ to }] = (await read(list)).moves;
		expect(mailsTo(to.key)).toHaveLength(1);
		await sendLetters(shop, planner, 1, list, { ...once, territory: to.key });
		await send(list);
		expect(mailsTo(to.key)).toHaveLength(1);
	});

	it('that fail are told, and can be sent again', async () => {
		await forgetLimits();
		const list = await newList();
		const { key } = (await read(list)).moves[0].to;
		const limit = { key: `mails-to:${emailOf(key)}`, hits: 99 };
		const hour = sql<Date>`to_timestamp(floor(extract(epoch from now()) / 3600) * 3600)`;
		await house.db
			.insertInto('rate_limits')
			.values({ ...limit, window_start: hour })
			.execute();
		const { failed } = await send(list);
		expect(failed).toBe(1);
		const letterOf = async () =>
			(await read(list)).territories.find((one) => one.key === key)?.letter;
		expect(await letterOf()).toMatchObject({ state: 'failed', failure: /Too many/ });
		await forgetLimits();
		expect(await send(list)).toMatchObject({ sent: 1, failed: 0 });
		expect(await letterOf()).toMatchObject({ state: 'sent', failure: null });
	});

	it('let a hostile name through as words only', async () => {
		await forgetLimits();
		const list = await newList();
		const [{ to }] = (await read(list)).moves;
		const region_name = '<img src=x>\n\nhttps://evil.example/';
		await house.db
			.updateTable('handover_moves')
			.set({ region_name })
			.where('ordinal', '=', 1)
			.where('state', '=', 'proposed')
			.execute();
		await send(list, { territory: to.key });
		const { html } = mailsTo(to.key).at(-1) ?? { html: '' };
		expect(html).toContain('&lt;img src=x&gt;');
		expect(html).not.toMatch(/<img|href="https:\/\/evil/);
	});
});

describe('the link in a letter', () => {
	async function sentList() {
		await forgetLimits();
		const list = await newList();
		await send(list);
		const { moves } = await read(list);
		const move = moves.find(({ from, to }) => from && emailOf(from.key) && emailOf(to.key));
		if (!move?.from) throw new Error('no move between two with addresses');
		return { list, move, gainer: move.to.key, loser: move.from.key };
	}
	const answer = (key: string, ordinal: number, given: 'accepted' | 'disputed', word = '') =>
		answerLetter(shop, secretOf(key), 'a', [{ ordinal, answer: given, word }]);

	it('shows its own moves, without figures and without anything else of the team', async () => {
		const { list, gainer } = await sentList();
		const page = await readLetter(shop, secretOf(gainer), 'a');
		const { moves } = await read(list);
		const own = moves.filter(({ from, to }) => from?.key === gainer || to.key === gainer);
		expect(page?.moves.map(({ ordinal }) => ordinal)).toEqual(own.map(({ ordinal }) => ordinal));
		expect(page).toMatchObject({ team: 'Quellorn', measures: [], answered: false });
		expect(page?.moves.every(({ figures }) => Object.keys(figures).length === 0)).toBe(true);
		expect(JSON.stringify(page)).not.toMatch(/@|visits \d/);
		const others = firm.territories.filter(({ person }) => person !== '');
		for (const { person } of others) expect(JSON.stringify(page)).not.toContain(person);
	});

	it('takes answers under the address of the letter: one dispute is enough', async () => {
		const { list, move, gainer, loser } = await sentList();
		const stateOf = async () => (await read(list)).moves[move.ordinal - 1];
		expect(await answer(gainer, move.ordinal, 'accepted')).toBe(1);
		expect((await stateOf()).state).toBe('proposed');
		await answer(loser, move.ordinal, 'disputed', 'my best customer');
		expect(await stateOf()).toMatchObject({
			...{ state: 'disputed', word: 'my best customer', by: emailOf(loser) },
		});
		await changeMoveState(shop, planner, 1, list, {
			...{ move: move.ordinal, state: 'accepted', word: 'agreed by telephone' },
		});
		expect((await stateOf()).state).toBe('accepted');
		expect(await answer(loser, move.ordinal, 'disputed', 'my best customer')).toBe(0);
		expect(await answer(loser, move.ordinal, 'accepted')).toBe(1);
		const log = await house.db.selectFrom('activity').selectAll().execute();
		const own = log.filter(({ action }) => action === 'handover.answered');
		expect(own.at(-1)?.detail).toMatchObject({ author: emailOf(loser), accepted: 1 });
		expect(JSON.stringify(log)).not.toContain(secretOf(loser));
	});

	it('answers for no move of another', async () => {
		const { list, gainer } = await sentList();
		const { moves } = await read(list);
		const foreign = moves.find(({ from, to }) => from?.key !== gainer && to.key !== gainer);
		const stranger = answer(gainer, foreign?.ordinal ?? 0, 'accepted');
		await expect(stranger).rejects.toBeInstanceOf(NotFound);
	});

	it('ends when it is sent again, ended, too old, or the list is withdrawn', async () => {
		const { list, gainer, loser } = await sentList();
		const first = secretOf(gainer);
		await send(list, { territory: gainer });
		const second = secretOf(gainer);
		expect(await readLetter(shop, first, 'a')).toBeNull();
		expect(await readLetter(shop, second, 'a')).not.toBeNull();
		await endLetter(shop, planner, 1, list, gainer);
		expect(await readLetter(shop, second, 'a')).toBeNull();
		const old = secretOf(loser);
		await house.db
			.updateTable('handover_letters')
			.set({ expires_at: new Date(Date.now() - 1000) })
			.where('territory_key', '=', loser)
			.execute();
		expect(await readLetter(shop, old, 'a')).toBeNull();
		await send(list);
		const renewed = secretOf(loser);
		expect(await readLetter(shop, renewed, 'a')).not.toBeNull();
		await withdrawHandover(shop, planner, 1, list);
		expect(await readLetter(shop, renewed, 'a')).toBeNull();
		await expect(answerLetter(shop, renewed, 'a', [])).rejects.toBeInstanceOf(NotFound);
	});

	it('takes no answer once the list is approved, and shows it still', async () => {
		const { list, move, gainer } = await sentList();
		await approveHandover(shop, approver, 1, list, (await read(list)).seen);
		expect(await readLetter(shop, secretOf(gainer), 'a')).toMatchObject({ approved: true });
		await expect(answer(gainer, move.ordinal, 'accepted')).rejects.toMatchObject({
			code: 'closed',
		});
	});

	it('is not found by guessing, and guesses are counted', async () => {
		await forgetLimits();
		const guess = () => readLetter(shop, randomUUID(), 'a guesser');
		expect(await guess()).toBeNull();
		await house.db
			.updateTable('rate_limits')
			.set({ hits: 240 })
			.where('key', '=', 'links-address:a guesser')
			.execute();
		await expect(guess()).rejects.toThrow('Too many tries');
	});

	it('is kept as a digest only', async () => {
		const { gainer } = await sentList();
		const rows = await house.db.selectFrom('handover_letters').selectAll().execute();
		expect(JSON.stringify(rows)).not.toContain(secretOf(gainer));
	});
});

describe('lists over the API', () => {
	it('answer what the API’s description says, without letters or addresses', async () => {
		const list = await newList();
		const { lists } = await handoverList(shop, planner, 1);
		expect(operations.listHandovers.answer.parse({ handovers: lists }).handovers).toHaveLength(
			lists.length,
		);
		const answer = operations.readHandover.answer.parse(handoverAnswer(await read(list)));
		expect(answer.moves).toHaveLength((await read(list)).moves.length);
		expect(JSON.stringify(answer)).not.toContain('quellorn.example');
	});
});

describe('files of a list', () => {
	it('hold every move, by papaparse 5.7.1 and read-excel-file 9.3.17', async () => {
		const list = await read(await newList());
		const csv = await handoverBytes(list, 'csv');
		const text = new TextDecoder().decode(csv.bytes);
		const { data } = Papa.parse<Record<string, string>>(text, {
			header: true,
			skipEmptyLines: true,
		});
		expect(csv.name).toBe(`handover-${list.number}.csv`);
		expect(data.map((row) => row.region)).toEqual(list.moves.map(({ region }) => region.key));
		expect(data[0]['visits (hours a year)']).toBe(String(list.moves[0].figures.visits));
		const xlsx = await handoverBytes(list, 'xlsx');
		const [moves, territories] = await readXlsxFile(Buffer.from(xlsx.bytes));
		expect(moves.data).toHaveLength(1 + list.moves.length);
		expect(moves.data[1][6]).toBe(list.moves[0].figures.visits);
		expect(moves.data[1][0]).toBe(list.moves[0].region.key);
		expect(territories.data).toHaveLength(1 + list.territories.length);
	});

	it('run no formula that stands in a name', async () => {
		const list = await newList();
		await house.db
			.updateTable('handover_moves')
			.set({ region_name: '=1+1' })
			.where('ordinal', '=', 1)
			.where('state', '=', 'proposed')
			.execute();
		const { bytes } = await handoverBytes(await read(list), 'csv');
		expect(new TextDecoder().decode(bytes)).toContain(",'=1+1,");
	});
});

const dataDigest = async (number: number): Promise<string> => {
	const { data_digest } = await house.db
		.selectFrom('handovers')
		.select('data_digest')
		.where('number', '=', number)
		.executeTakeFirstOrThrow();
	return data_digest;
};

/** The digest once more without the product's code: members sorted by name, as RFC 8785, 3.2.3 asks. */
function digestByHand(list: Awaited<ReturnType<typeof read>>, data: string): string {
	const sorted = (value: unknown): unknown =>
		Array.isArray(value)
			? value.map(sorted)
			: value !== null && typeof value === 'object'
				? Object.fromEntries(
						Object.entries(value)
							.sort(([a], [b]) => (a < b ? -1 : 1))
							.map(([name, inner]) => [name, sorted(inner)]),
					)
				: value;
	const content = {
		...{ format: 'merestone-handover-1', sheet: 1, number: list.number },
		...{ proposal: list.proposal, effectiveOn: list.effectiveOn, note: list.note },
		measures: list.measures.map(({ name, unit }) => ({ name, unit })),
		dataDigest: data,
		moves: list.moves.map(({ region, from, to, figures, reason, word }) => ({
			...{ region, from, to, figures, reason, word },
		})),
	};
	return createHash('sha256')
		.update(JSON.stringify(sorted(content)))
		.digest('hex');
}
