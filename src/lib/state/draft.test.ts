import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Draft } from '$lib/engines/editions/draft';
import type { DraftSaved } from '$lib/schemas/desk';
import { blankDraft } from '../../../tests/support/blank-draft';
import { DraftState } from './draft.svelte';
import { lock } from './draft-edits';
import type { Keeper, KeptDraft } from './kept-drafts';
import { rebase } from './rebase';
import type { SaveAnswer } from './save-draft';

type Answer = SaveAnswer<Draft, DraftSaved>;
const base = blankDraft();

function keeperOf(
	kept: KeptDraft<Draft> | null = null,
): Keeper<Draft> & { held: KeptDraft<Draft> | null } {
	return {
		held: kept,
		async keep(_, draft) {
			this.held = { ...draft, keptAt: '2026-12-01T10:00:00Z' };
		},
		async read() {
			return this.held;
		},
		async forget() {
			this.held = null;
		},
	};
}

function open(answers: Answer[], keeper = keeperOf()) {
	const sent: { revision: number; document: Draft }[] = [];
	const draft = new DraftState({
		place: 's',
		revision: 3,
		document: base,
		savedAt: '2026-12-01T09:00:00Z',
		keeper,
		rebase,
		save: async (revision, document) => {
			sent.push({ revision, document });
			return answers.shift() ?? savedAs(revision + 1, document);
		},
	});
	return { draft, sent, keeper };
}

const savedAs = (revision: number, document: Draft): Answer => ({
	kind: 'saved',
	saved: {
		revision,
		savedAt: '2026-12-01T11:00:00Z',
		document,
		colouring: { status: 'undecided', lowerBound: 2, message: '', sentence: '' },
	},
});
const theirs = blankDraft({ locks: { d: { ink: 1, cost: 1 } } });
const stale: Answer = {
	kind: 'stale',
	stale: { revision: 9, savedBy: 'Ilse', savedAt: '2026-12-01T10:30:00Z', document: theirs },
};

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('DraftState', () => {
	it('saves a moment after the last change, and forgets what it kept in the browser', async () => {
		const { draft, sent, keeper } = open([]);
		draft.change('lock a', lock(['a'], 0));
		draft.change('lock b', lock(['b'], 1));
		expect(keeper.held?.document).toBe(draft.document);
		await vi.advanceTimersByTimeAsync(2_000);
		expect(sent.map(({ revision }) => revision)).toEqual([3]);
		expect(draft.saving).toBe('saved');
		expect(draft.revision).toBe(4);
		expect(keeper.held).toBeNull();
	});

	it('goes back and forward, and drops what was undone once something else is done', () => {
		const { draft } = open([]);
		draft.change('lock a', lock(['a'], 0));
		draft.undo();
		expect(draft.document).toBe(base);
		draft.redo();
		expect(Object.keys(draft.document.locks)).toEqual(['a']);
		draft.undo();
		draft.change('lock b', lock(['b'], 0));
		expect(draft.redoLabel).toBeNull();
	});

	it('has nothing to save, and keeps nothing, once a change is taken back before it was sent', async () => {
		const { draft, sent, keeper } = open([]);
		draft.change('lock a', lock(['a'], 1));
		expect(draft.saving).toBe('waiting');
		draft.undo();
		await vi.advanceTimersByTimeAsync(5_000);
		expect(draft.saving).toBe('saved');
		expect(sent).toEqual([]);
		expect(keeper.held).toBeNull();
	});

	it('makes one step of a run of typing', () => {
		const { draft } = open([]);
		for (const title of ['A', 'Ab', 'Abc'])
			draft.change('the title', (now) => ({ ...now, layout: { ...now.layout, title } }), true);
		draft.undo();
		expect(draft.document).toBe(base);
	});

	it('overwrites nothing when somebody else saved first', async () => {
		const { draft, sent } = open([stale]);
		draft.change('lock a', lock(['a'], 0));
		await vi.advanceTimersByTimeAsync(2_000);
		expect(draft.saving).toBe('stale');
		draft.change('lock b', lock(['b'], 0));
		await vi.advanceTimersByTimeAsync(60_000);
		expect(sent).toHaveLength(1);

		expect(draft.putMineOnTop()).toEqual([]);
		await vi.advanceTimersByTimeAsync(2_000);
		expect(sent[1].revision).toBe(9);
		expect(Object.keys(sent[1].document.locks).sort()).toEqual(['a', 'b', 'd']);
	});

	it('takes theirs when asked to', async () => {
		const { draft, keeper } = open([stale]);
		draft.change('lock a', lock(['a'], 0));
		await vi.advanceTimersByTimeAsync(2_000);
		await draft.takeTheirs();
		expect(draft.document).toBe(theirs);
		expect(draft.revision).toBe(9);
		expect(keeper.held).toBeNull();
	});

	it('keeps the work and tries again while the server cannot be reached', async () => {
		const { draft, sent, keeper } = open([{ kind: 'unreachable' }, { kind: 'unreachable' }]);
		draft.change('lock a', lock(['a'], 0));
		await vi.advanceTimersByTimeAsync(1_000);
		expect(draft.saving).toBe('offline');
		expect(keeper.held).not.toBeNull();
		await vi.advanceTimersByTimeAsync(30_000);
		expect(sent).toHaveLength(3);
		expect(draft.saving).toBe('saved');
	});

	it('keeps the work when the sign-in has ended, until it is saved by hand', async () => {
		const { draft, keeper } = open([{ kind: 'signed-out' }]);
		draft.change('lock a', lock(['a'], 0));
		await vi.advanceTimersByTimeAsync(60_000);
		expect(draft.saving).toBe('signed-out');
		expect(keeper.held?.document).toBe(draft.document);
		await draft.saveNow();
		expect(draft.saving).toBe('saved');
	});

	it('brings back what never reached the server', async () => {
		const document = lock(['a'], 0)(base);
		const kept = { revision: 3, base, document, keptAt: '2026-12-01T08:00:00Z' };
		const { draft, sent } = open([], keeperOf(kept));
		await draft.restore();
		expect(draft.document).toBe(document);
		expect(draft.restoredFrom).toBe('2026-12-01T08:00:00Z');
		await vi.advanceTimersByTimeAsync(2_000);
		expect(sent[0].document).toBe(document);
	});

	it('asks before it puts kept work on top of a newer revision', async () => {
		const kept = { revision: 1, base, document: lock(['a'], 0)(base), keptAt: '' };
		const { draft, sent } = open([], keeperOf(kept));
		await draft.restore();
		expect(draft.saving).toBe('stale');
		await vi.advanceTimersByTimeAsync(60_000);
		expect(sent).toEqual([]);
		draft.putMineOnTop();
		await vi.advanceTimersByTimeAsync(2_000);
		expect(Object.keys(sent[0].document.locks)).toEqual(['a']);
	});
});
