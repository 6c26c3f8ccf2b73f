import { describe, expect, it } from 'vitest';
import type { TieGround } from '$lib/engines/editions/edge-ties';
import type { SearchFound, SearchNote } from '$lib/schemas/search';
import type { DeskSheet } from '$lib/schemas/desk';
import { blankDraft } from '../../../tests/support/blank-draft';
import { Desk } from './desk.svelte';
import { EdgeTies } from './edge-ties.svelte';
import { canBeLookedAt, lookAtSearch } from './look-at-search';
import { followedWords, marksOf, stateWords, tieWords } from './tie-edits';

const inks = ['#111111', '#222222'].map((hex, i) => ({ name: `Ink ${i + 1}`, hex }));
const keys = ['a', 'b', 'c'];
const sheet = {
	...{ id: 's', revision: 1, savedAt: '', colouring: null, lastInks: [0, 1, 0] },
	draft: blankDraft({ palette: { id: 'p', name: 'P', inks } }),
	boundarySet: { planar: true },
	regions: { key: keys, name: keys, areaKm2: [1, 1, 1] },
	borders: {
		...{ a: Uint32Array.of(0, 1), b: Uint32Array.of(1, 2), kind: new Uint8Array(2) },
		...{ metres: Float64Array.of(9, 9), at: new Float64Array(4) },
	},
	rights: ['colours.edit'],
} as unknown as DeskSheet;

const newDesk = () =>
	new Desk({
		...{ sheet, address: '/t/sheets/1', userName: null, keeper: null, sentence: () => '' },
		save: () => new Promise(() => undefined),
	});

const ground: TieGround = {
	...{ sheet: 7, name: 'North', edition: 2, revision: 9 },
	inks: [...inks, { name: 'Moss', hex: '#999999' }],
	same: [{ key: 'a', ink: 1 }],
	beside: [
		{ key: 'b', ink: 0, metres: 40, other: 'Y' },
		{ key: 'c', ink: 2, metres: 40, other: 'Z' },
	],
};
const answers =
	(bodies: Record<string, unknown>): typeof fetch =>
	async (address) => {
		const body = bodies[String(address)];
		if (body === undefined) throw new TypeError('no connection');
		return new Response(JSON.stringify(body));
	};

describe('a tie on the desk', () => {
	it('is looked at on the sheet, made in one step, and undone', async () => {
		const desk = newDesk();
		const edge = new EdgeTies(desk, answers({ '/t/sheets/1/ties/7?within=1': ground }));
		await edge.look(7, 1);
		expect(desk.evidence).toMatchObject({ strong: [0], light: [1, 2], framed: true });
		expect(desk.draft.dirty).toBe(false);
		edge.tie();
		expect(edge.ground).toBeNull();
		const { document } = desk.draft;
		expect(document.locks.a).toEqual({ ink: 1, cost: 1, tie: 7 });
		expect(document.forbidden).toEqual([{ key: 'b', ink: 0, tie: 7 }]);
		expect(marksOf(document, 7)).toBe('1 lock, 1 forbidden ink');
		expect(desk.draft.undoLabel).toBe('tie to sheet 7');
		desk.draft.undo();
		expect(desk.draft.document).toEqual(sheet.draft);
		desk.draft.redo();
		edge.takeBack(7);
		expect(desk.draft.document).toEqual(sheet.draft);
	});

	it('is not made when the connection is lost', async () => {
		const desk = newDesk();
		const edge = new EdgeTies(desk, answers({}));
		await edge.refresh(7, 1);
		expect(edge.failure).toContain('lost');
		expect(desk.draft.dirty).toBe(false);
		expect(edge.busy).toBe(false);
	});

	it('is told in words: what it would do, what it follows, how it stands', async () => {
		const edge = new EdgeTies(newDesk(), answers({ '/t/sheets/1/ties/7?within=1': ground }));
		await edge.look(7, 1);
		if (!edge.rules) throw new Error('looked at');
		expect(tieWords(ground, edge.rules)).toEqual([
			'1 region is on both sheets; 1 will be locked to the inks there.',
			'2 regions lie beside regions of sheet 7 and may not have their inks.',
			'This palette does not have Moss; regions in it bind nothing here.',
		]);
		expect(followedWords({ edition: null, revision: 4 })).toBe('the draft, revision 4');
		const state = { sheet: 7, name: 'North', stale: true, latest: { edition: 3, revision: 12 } };
		expect(stateWords(state)).toBe('Its edition 3 has been issued since.');
		expect(stateWords({ ...state, name: null })).toContain('not there any more');
		expect(stateWords({ ...state, stale: false })).toBe('');
	});
});

describe('what a longer try found for other rules', () => {
	const note = { number: 3, revision: 5, state: 'kept', gain: 'fewer-inks', sentence: 'S.' };
	const found = { ...note, inks: [1, 0, 1] } as unknown as SearchFound;

	it('is looked at and cannot be kept', async () => {
		const desk = newDesk();
		expect(canBeLookedAt(found)).toBe(true);
		const address = '/t/sheets/1/searches/3';
		expect(await lookAtSearch(desk, found, answers({ [address]: found }))).toBe('');
		expect([...desk.paints]).toEqual([1, 0, 1]);
		desk.trial.keep();
		expect(desk.draft.dirty).toBe(false);
		desk.trial.drop();
		expect([...desk.paints]).toEqual([0, 1, 0]);
		const other = { ...found, inks: [0] };
		expect(await lookAtSearch(desk, found, answers({ [address]: other }))).toContain('boundaries');
	});

	it('is not offered where the sheet has it already', () => {
		expect(canBeLookedAt({ ...found, state: 'stored' } as SearchNote)).toBe(false);
	});
});
