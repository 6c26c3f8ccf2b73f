import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { colour } from '$lib/engines/colouring';
import { explain } from '$lib/engines/colouring/explain';
import type { Explanation } from '$lib/engines/colouring/problem';
import type { DeskSheet, DraftSaved } from '$lib/schemas/desk';
import { blankDraft } from '../../../../tests/support/blank-draft';
import type { ColourReply, ColourRequest } from '../colourer';
import { Desk } from '../desk.svelte';
import { lock, setLayout } from '../draft-edits';
import type { WayQuestion, WayReply } from './way-worker';
import { WaysOut } from './ways-out.svelte';

/** Five regions in a row, two inks. */
const keys = ['a', 'b', 'c', 'd', 'e'];
const rowOfFive = {
	...{ id: 's', revision: 1, savedAt: '2026-12-01T09:00:00Z', draft: blankDraft({ inks: 2 }) },
	colouring: {
		...{ status: 'coloured', inks: [0, 1, 0, 1, 0], inksUsed: 2, lowerBound: 2, sentence: '' },
		proof: { kind: 'edge', regions: [0, 1] },
	},
	lastInks: [0, 1, 0, 1, 0],
	boundarySet: { planar: true },
	regions: { key: keys, name: keys.map((key) => key.toUpperCase()), areaKm2: [1, 1, 1, 1, 1] },
	borders: {
		a: Uint32Array.of(0, 1, 2, 3),
		b: Uint32Array.of(1, 2, 3, 4),
		kind: new Uint8Array(4),
		metres: Float64Array.of(100, 100, 100, 100),
		at: new Float64Array(8),
	},
	rights: ['colours.edit'],
} as unknown as DeskSheet;

class EngineHere {
	onmessage: ((event: { data: ColourReply }) => void) | null = null;
	async postMessage({ id, problem }: ColourRequest) {
		const result = await colour(problem);
		this.onmessage?.({ data: { id, result, milliseconds: 1 } });
	}
	terminate() {}
}

/** The worker of ways, in place of the browser's; held back until it is let go on. */
class WaysHere {
	static asked: WayQuestion[] = [];
	static hold: Promise<void> | null = null;
	onmessage: ((event: { data: WayReply }) => void) | null = null;
	ended = false;
	async postMessage(question: WayQuestion) {
		WaysHere.asked.push(structuredClone(question));
		await WaysHere.hold;
		const reply = await this.answer(question);
		if (!this.ended) this.onmessage?.({ data: reply });
	}
	async answer(question: WayQuestion): Promise<WayReply> {
		if ('way' in question) return { result: await colour(question.way) };
		const releaseFound = (soFar: NonNullable<WayReply['soFar']>) =>
			this.onmessage?.({ data: { soFar } });
		return { release: (await explain({ ...question.release, releaseFound }))?.release ?? null };
	}
	terminate() {
		this.ended = true;
	}
}

beforeEach(() => {
	vi.useFakeTimers();
	WaysHere.asked = [];
	WaysHere.hold = null;
});
afterEach(() => void vi.useRealTimers());
const settled = () => vi.advanceTimersByTimeAsync(2_000);

/** a and b want the same ink of two neighbours, d is locked as well. */
async function collide() {
	const sent: unknown[] = [];
	const desk: Desk = new Desk({
		...{ sheet: rowOfFive, address: '', userName: null, keeper: null, sentence: () => '' },
		save: async (revision, document, inks) => {
			sent.push(inks);
			const saved = { revision: revision + 1, savedAt: '', document, colouring: desk.answer };
			return { kind: 'saved', saved: saved as DraftSaved };
		},
	});
	desk.work(() => new EngineHere() as unknown as Worker);
	desk.draft.change('lock a and b', lock(['a', 'b'], 0));
	await settled();
	if (desk.answer?.status !== 'impossible') throw new Error('no collision');
	return { desk, ways: open(desk, desk.answer.explanation), sent };
}

const open = (desk: Desk, explanation: Explanation) =>
	new WaysOut({
		...{ desk, explanation, sentence: () => 'Kept.' },
		makeWorker: () => new WaysHere() as unknown as Worker,
	});

const stateOf = (ways: WaysOut) =>
	ways.rows.map(({ way, outcome }) => [way.gives, outcome.state] as const);

describe('ways out of a collision', () => {
	it('are worked out one after the other, near to what the sheet shows', async () => {
		const { ways } = await collide();
		expect(stateOf(ways).map(([, state]) => state)).toEqual(['waiting', 'waiting']);
		const done = ways.work();
		void ways.work();
		expect(stateOf(ways).map(([, state]) => state)).toEqual(['working', 'waiting']);
		await done;
		expect(ways.settled).toBe(true);
		expect(WaysHere.asked).toHaveLength(2);
		const changed = ways.rows.map(({ outcome }) => outcome.state === 'works' && outcome.changed);
		expect(changed).toContainEqual([]);
		expect(changed).toContainEqual([0, 1, 2, 3, 4]);
	});

	it('are tried without touching the draft or its steps, and put back', async () => {
		const { desk, ways } = await collide();
		await ways.work();
		const before = { document: desk.draft.document, past: desk.draft.past, inks: [...desk.inks] };
		const row = ways.rows.find(({ way }) => way.label === 'release A');
		if (!row) throw new Error('not listed');
		ways.try(row);
		expect(ways.tries(row)).toBe(true);
		expect([...desk.paints]).toEqual([1, 0, 1, 0, 1]);
		expect(Object.keys(desk.shown.locks)).toEqual(['b']);
		expect(desk.draft.document).toBe(before.document);
		expect(desk.draft.past).toBe(before.past);
		desk.trial.drop();
		expect([...desk.paints]).toEqual(before.inks);
		expect(ways.tries(row)).toBe(false);
	});

	it('are kept as one step, which undo takes back to the collision', async () => {
		const { desk, ways, sent } = await collide();
		await ways.work();
		desk.draft.change('the title', setLayout({ title: 'Later' }));
		const row = ways.rows.find(({ way }) => way.label === 'release A');
		if (row) ways.try(row);
		desk.trial.keep();
		expect(desk.draft.undoLabel).toBe('release A');
		expect(desk.draft.document.layout.title).toBe('Later');
		expect(desk.answer?.status).toBe('coloured');
		await settled();
		expect(sent.at(-1)).toEqual([1, 0, 1, 0, 1]);
		desk.draft.undo();
		expect(desk.answer?.status).toBe('impossible');
		expect(desk.draft.undoLabel).toBe('the title');
	});

	it('say what still collides where a way is not enough', async () => {
		const { desk } = await collide();
		desk.draft.change('lock e', lock(['d', 'e'], 0));
		await settled();
		if (desk.answer?.status !== 'impossible') throw new Error('no collision');
		const { explanation } = desk.answer;
		const unknown = { ...explanation, release: { ...explanation.release!, lowerBound: 0 } };
		const ways = open(desk, { ...unknown, locks: [0, 1] });
		await ways.work();
		const single = ways.rows.filter(({ way }) => way.kind === 'lock');
		expect(single).toHaveLength(2);
		for (const { outcome } of single)
			expect(outcome).toMatchObject({ words: 'Not enough: the locks of D and E still collide.' });
	});

	it('drop one rule after the other where each alone is not enough', async () => {
		const { desk } = await collide();
		desk.draft.undo();
		const alike: [string, string][] = [
			['a', 'b'],
			['c', 'd'],
		];
		desk.draft.change('two rules', (draft) => ({ ...draft, alike }));
		await settled();
		if (desk.answer?.status !== 'impossible') throw new Error('no collision');
		const ways = open(desk, desk.answer.explanation);
		await ways.work();
		const [first] = ways.rows;
		expect(first.outcome).toMatchObject({ state: 'fails' });
		ways.takeAnyway(first);
		expect(desk.draft.document.alike).toHaveLength(1);
		await settled();
		if (desk.answer?.status !== 'impossible') throw new Error('no collision');
		const rest = open(desk, desk.answer.explanation);
		await rest.work();
		rest.try(rest.rows[0]);
		desk.trial.keep();
		expect(desk.draft.document.alike).toEqual([]);
		expect(desk.answer?.status).toBe('coloured');
	});

	it('end when they are not wanted any more', async () => {
		const { ways } = await collide();
		let go = () => {};
		WaysHere.hold = new Promise((settle) => (go = settle));
		void ways.work();
		ways.stop();
		go();
		await settled();
		expect(stateOf(ways).map(([, state]) => state)).toEqual(['working', 'waiting']);
	});

	it('let the search for the cheapest release run on, and keep what it found', async () => {
		const { desk } = await collide();
		if (desk.answer?.status !== 'impossible') throw new Error('no collision');
		const { explanation } = desk.answer;
		const open2 = { locks: [0, 1], cost: 2, proved: false, lowerBound: 0 };
		const ways = open(desk, { ...explanation, release: open2 });
		await ways.lookOn();
		expect(ways.release).toMatchObject({ cost: 1, proved: true, lowerBound: 1 });
		expect(ways.rows[0].way.gives).toMatch(/^Release [AB]$/);
		expect(ways.settled).toBe(true);
		expect(WaysHere.asked[0]).toMatchObject({ release: { effort: 'thorough' } });
	});

	it('keep the better release when the search is ended by hand', async () => {
		const { desk } = await collide();
		if (desk.answer?.status !== 'impossible') throw new Error('no collision');
		const { explanation } = desk.answer;
		const known = { locks: [0, 1], cost: 2, proved: false, lowerBound: 1 };
		const ways = open(desk, { ...explanation, release: known });
		WaysHere.hold = new Promise(() => {});
		void ways.lookOn();
		expect(ways.looking).toBe(true);
		WaysHere.hold = null;
		await ways.enough();
		expect(ways.looking).toBe(false);
		expect(ways.release).toMatchObject({ cost: 2, lowerBound: 1, proved: false });
		expect(ways.settled).toBe(true);
	});
});
