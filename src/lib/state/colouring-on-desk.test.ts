import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { colour } from '$lib/engines/colouring';
import type { DeskSheet, DraftSaved } from '$lib/schemas/desk';
import type { Draft } from '$lib/engines/editions/draft';
import { blankDraft } from '../../../tests/support/blank-draft';
import type { ColourReply, ColourRequest } from './colourer';
import { Desk } from './desk.svelte';
import { lock, setLayout } from './draft-edits';
import type { Keeper, KeptDraft } from './kept-drafts';

/** Five regions in a row. */
const keys = ['a', 'b', 'c', 'd', 'e'];
const rowOfFive = {
	id: 's',
	revision: 1,
	savedAt: '2026-12-01T09:00:00Z',
	draft: blankDraft({ inks: 2 }),
	colouring: {
		...{ status: 'coloured', inks: [0, 1, 0, 1, 0], inksUsed: 2, lowerBound: 2, sentence: '' },
		proof: { kind: 'edge', regions: [0, 1] },
	},
	lastInks: [0, 1, 0, 1, 0],
	boundarySet: { planar: true },
	regions: { key: keys, name: keys, areaKm2: [1, 1, 1, 1, 1] },
	borders: {
		a: Uint32Array.of(0, 1, 2, 3),
		b: Uint32Array.of(1, 2, 3, 4),
		kind: new Uint8Array(4),
		metres: Float64Array.of(100, 100, 100, 100),
		at: new Float64Array(8),
	},
	rights: ['colours.edit'],
} as unknown as DeskSheet;

/** The engine, in place of the browser's worker. */
class EngineHere {
	onmessage: ((event: { data: ColourReply }) => void) | null = null;
	async postMessage({ id, problem }: ColourRequest) {
		const result = await colour(problem);
		this.onmessage?.({ data: { id, result, milliseconds: 1 } });
	}
	terminate() {}
}

function open(keeper: Keeper<Draft> | null = null) {
	const sent: { document: Draft; inks: readonly number[] | undefined }[] = [];
	const desk = new Desk({
		sheet: rowOfFive,
		address: '',
		userName: null,
		keeper,
		sentence: () => '',
		save: async (revision, document, inks) => {
			sent.push({ document, inks });
			const colouring = { ...desk.answer, ...(inks && { inks: [...inks] }) };
			const saved = { revision: revision + 1, savedAt: '', document, colouring } as DraftSaved;
			return { kind: 'saved', saved };
		},
	});
	desk.work(() => new EngineHere() as unknown as Worker);
	return { desk, sent };
}

const turned = [1, 0, 1, 0, 1];
function tryTurned(desk: Desk) {
	const answer = { ...desk.answer, inks: turned } as NonNullable<Desk['answer']>;
	const { document } = desk.draft;
	desk.trial.show({ label: 'turn', document, inks: Int32Array.from(turned), answer });
}

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());
const settled = () => vi.advanceTimersByTimeAsync(2_000);

describe('a colouring on the desk', () => {
	it('is shown on trial without touching the draft, and dropped by a change of it', async () => {
		const { desk, sent } = open();
		tryTurned(desk);
		expect([...desk.paints]).toEqual(turned);
		expect(desk.draft.dirty).toBe(false);
		desk.draft.change('the title', setLayout({ title: 'T' }));
		expect([...desk.paints]).toEqual([0, 1, 0, 1, 0]);
		await settled();
		expect(sent.map(({ inks }) => inks)).toEqual([undefined]);
	});

	it('is one step once it is kept, sent with the save, and taken back by undo', async () => {
		const { desk, sent } = open();
		tryTurned(desk);
		desk.trial.keep();
		expect(desk.draft.undoLabel).toBe('turn');
		expect([...desk.inks]).toEqual(turned);
		await settled();
		expect(sent.at(-1)?.inks).toEqual(turned);
		desk.draft.undo();
		expect([...desk.inks]).toEqual([0, 1, 0, 1, 0]);
		await settled();
		expect(sent.at(-1)?.inks).toEqual([0, 1, 0, 1, 0]);
	});

	it('is what a lock stays near to before it was ever saved, and goes with the lock', async () => {
		const { desk, sent } = open();
		tryTurned(desk);
		desk.trial.keep();
		desk.draft.change('lock a', lock(['a'], 1));
		await settled();
		expect([...desk.inks]).toEqual(turned);
		expect(sent.at(-1)?.inks).toEqual(turned);
	});

	it('is left to the server where the engine found it from what the server has', async () => {
		const { desk, sent } = open();
		desk.draft.change('lock a', lock(['a'], 1));
		await settled();
		expect([...desk.inks]).toEqual(turned);
		expect(sent.map(({ inks }) => inks)).toEqual([undefined]);
	});

	it('is kept in the browser with the work that the server does not have', async () => {
		let held: KeptDraft<Draft> | null = null;
		const keeper: Keeper<Draft> = {
			keep: async (_, draft) => void (held = { ...structuredClone(draft), keptAt: '' }),
			read: async () => held,
			forget: async () => {},
		};
		const first = open(keeper).desk;
		tryTurned(first);
		first.trial.keep();
		await vi.advanceTimersByTimeAsync(10);
		const { desk, sent } = open(keeper);
		await desk.draft.restore();
		expect([...desk.inks]).toEqual(turned);
		await settled();
		expect(sent.at(-1)?.inks).toEqual(turned);
	});
});
