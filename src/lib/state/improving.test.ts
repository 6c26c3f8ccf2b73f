import { beforeEach, describe, expect, it } from 'vitest';
import { goalFigures } from '$lib/engines/colouring/goal-figures';
import { Improver } from '$lib/engines/colouring/improve';
import type { GoalWish } from '$lib/engines/colouring/goal-wish';
import { checkColouring } from '$lib/engines/colouring';
import type { DeskSheet, DraftSaved } from '$lib/schemas/desk';
import { blankDraft } from '../../../tests/support/blank-draft';
import { Desk } from './desk.svelte';
import { lock } from './draft-edits';
import { addGoal, changeGoal, moveGoal, removeGoal } from './goal-edits';
import { Improving, problemFor, type ImproveAsk, type ImproveNews } from './improving.svelte';

/** Nine regions in a row, inked 0 1 0 1 ...: two inks carry five and four. */
const keys = [...'abcdefghi'];
const inks = keys.map((_, region) => region % 2);
const row = (goals: GoalWish[]) =>
	({
		...{ id: 's', revision: 1, savedAt: '2026-12-01T09:00:00Z', lastInks: inks },
		draft: blankDraft({ inks: 3, goals }),
		colouring: {
			...{ status: 'coloured', inks, inksUsed: 3, lowerBound: 2, sentence: '' },
			proof: { kind: 'not-proved', regions: [] },
		},
		boundarySet: { planar: true },
		regions: { key: keys, name: keys, areaKm2: keys.map(() => 1) },
		borders: {
			a: Uint32Array.from({ length: 8 }, (_, border) => border),
			b: Uint32Array.from({ length: 8 }, (_, border) => border + 1),
			kind: new Uint8Array(8),
			metres: new Float64Array(8).fill(100),
			at: new Float64Array(16),
		},
		rights: ['colours.edit'],
	}) as unknown as DeskSheet;

/** The improver, in place of the browser's worker; takes one slice when told to. */
class ImproverHere {
	static last: ImproverHere;
	onmessage: ((event: { data: ImproveNews }) => void) | null = null;
	ended = false;
	#improver: Improver | null = null;
	#asked: ImproveAsk | null = null;
	constructor() {
		ImproverHere.last = this;
	}
	postMessage(asked: ImproveAsk) {
		const { problem, colouring, wishes, inks: most, seed } = structuredClone(asked);
		this.#asked = asked;
		this.#improver = new Improver(problem, colouring, wishes, { inks: most, seed });
		this.onmessage?.({ data: { before: goalFigures(problem, colouring, wishes, most) } });
	}
	slice() {
		if (!this.#improver || !this.#asked) throw new Error('nothing was asked');
		this.#improver.run(10_000);
		const { steps, done, ended, best } = this.#improver;
		const { problem, wishes, inks: most } = this.#asked;
		const found = { best, figures: goalFigures(problem, best, wishes, most) };
		this.onmessage?.({ data: { steps, done, ended, found, weakest: null } });
	}
	terminate() {
		this.ended = true;
	}
}

function open(goals: GoalWish[] = [{ kind: 'even-count', give: 0 }]) {
	const desk: Desk = new Desk({
		...{ sheet: row(goals), address: '', userName: null, keeper: null, sentence: () => '' },
		save: async (revision, document, sent) => ({
			kind: 'saved',
			saved: {
				...{ revision: revision + 1, savedAt: '', document: { ...document } },
				colouring: { ...desk.answer, ...(sent && { inks: [...sent] }) },
			} as DraftSaved,
		}),
	});
	const improving = new Improving(desk, () => new ImproverHere() as unknown as Worker);
	return { desk, improving };
}

let desk: Desk;
let improving: Improving;
beforeEach(() => {
	({ desk, improving } = open());
	improving.start(desk.colouring.saved);
});

describe('improving', () => {
	it('shows the best so far without touching the draft, with figures before and now', () => {
		ImproverHere.last.slice();
		expect(improving.state).toBe('done');
		expect(improving.shows).toBe(true);
		expect(desk.draft.dirty).toBe(false);
		const [{ before, now }] = improving.figures;
		expect('loads' in before && before.loads.map(({ load }) => load)).toEqual([5, 4, 0]);
		expect('loads' in now && now.loads.map(({ load }) => load)).toEqual([3, 3, 3]);
		const problem = problemFor(desk, desk.draft.document, null);
		const result = { status: 'coloured', colouring: desk.inks, inksUsed: 3 } as const;
		const proof = { kind: 'not-proved' as const, regions: [] };
		expect(checkColouring(problem, { ...result, lowerBound: 1, proof })).toEqual([]);
		expect([...desk.inks]).not.toEqual(inks);
	});

	it('becomes one step once it is kept, and one undo brings back what was', async () => {
		ImproverHere.last.slice();
		const found = [...desk.inks];
		improving.keep();
		expect(improving.state).toBe('idle');
		expect(desk.draft.undoLabel).toBe('arrange the inks');
		expect([...desk.inks]).toEqual(found);
		await desk.draft.saveNow();
		expect([...desk.colouring.saved!]).toEqual(found);
		desk.draft.undo();
		expect([...desk.inks]).toEqual(inks);
	});

	it('is kept with the draft as it stands after a save meanwhile', async () => {
		desk.draft.change('aim', addGoal('distinct'));
		improving.start(desk.colouring.saved);
		ImproverHere.last.slice();
		await desk.draft.saveNow();
		improving.heard();
		expect(improving.shows).toBe(true);
		const { document } = desk.draft;
		improving.keep();
		expect(desk.draft.document).toEqual(document);
		expect(desk.draft.document).not.toBe(document);
	});

	it('goes back when it is dropped, and stops when the draft changes underneath', () => {
		ImproverHere.last.slice();
		improving.drop();
		expect([...desk.inks]).toEqual(inks);
		improving.start(desk.colouring.saved);
		const worker = ImproverHere.last;
		desk.draft.change('lock a', lock(['a'], 0));
		improving.heard();
		expect(improving.state).toBe('idle');
		expect(worker.ended).toBe(true);
	});

	it('leaves the choice when it is stopped', () => {
		ImproverHere.last.slice();
		improving.stop();
		expect(ImproverHere.last.ended).toBe(true);
		expect(improving.shows).toBe(true);
	});

	it('says what keeps it from starting', () => {
		expect(open([]).improving.hindrance).toBe('Choose at least one aim.');
		expect(open().improving.hindrance).toBe('');
	});
});

describe('aims of a draft', () => {
	const kinds = (draft: ReturnType<typeof blankDraft>) => draft.goals.map(({ kind }) => kind);

	it('are added once, moved, changed and removed, each a step of its own', () => {
		let draft = addGoal('even-count')(blankDraft());
		draft = addGoal('distinct')(draft);
		expect(addGoal('distinct')(draft)).toBe(draft);
		expect(kinds(moveGoal('distinct', -1)(draft))).toEqual(['distinct', 'even-count']);
		expect(moveGoal('distinct', 1)(draft)).toBe(draft);
		const chosen = changeGoal('distinct', { readers: ['deutan'], give: 0.1 })(draft);
		expect(chosen.goals[1]).toEqual({ kind: 'distinct', give: 0.1, readers: ['deutan'] });
		expect(changeGoal('distinct', { readers: undefined })(chosen).goals[1]).toEqual({
			...{ kind: 'distinct', give: 0.1 },
		});
		expect(kinds(removeGoal('even-count')(draft))).toEqual(['distinct']);
	});
});
