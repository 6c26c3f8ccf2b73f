import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../tests/support/blank-draft';
import { draftFaults } from '$lib/engines/territories/draft-faults';
import type { DeskSheet } from '$lib/schemas/desk';
import type { DeskTerritories } from '$lib/schemas/desk-territories';
import { Desk } from './desk.svelte';
import { TerritoryDesk } from './territories.svelte';
import { noTerritories } from '$lib/engines/territories/territory-draft';
import { none } from './hand-out.svelte';

/** Six regions in a row, a to f, with a gap of water between e and f. */
const keys = ['a', 'b', 'c', 'd', 'e', 'f'];
const visits = '00000000-0000-4000-8000-000000000001';

const sheet: DeskSheet = {
	id: 's',
	number: 1,
	name: 'Row',
	revision: 1,
	savedBy: null,
	savedAt: '2026-12-01T09:00:00Z',
	boundarySet: {
		id: 'b',
		fileName: 'row.geojson',
		regionCount: 6,
		planar: true,
		planarWitness: null,
		source: {
			format: 'geojson',
			layer: null,
			crs: '',
			encoding: null,
			features: 6,
			toleranceMetres: 0,
		},
		columns: [],
		found: null,
		mends: [],
		options: {},
		gapsKm: 0,
		levels: [],
	},
	draft: blankDraft(),
	colouring: null,
	lastInks: null,
	regions: {
		key: keys,
		name: keys.map((key) => key.toUpperCase()),
		parts: keys.map(() => 1),
		areaKm2: keys.map(() => 10),
		enclaveOf: keys.map(() => -1),
		group: keys.map(() => null),
	},
	borders: {
		a: Uint32Array.of(0, 1, 2, 3, 4),
		b: Uint32Array.of(1, 2, 3, 4, 5),
		kind: Uint8Array.of(0, 0, 0, 0, 2),
		metres: new Float64Array(5).fill(100),
		at: new Float64Array(10),
	},
	findings: [],
	editions: [],
	measures: null,
	theme: null,
	rights: ['measures.read', 'territories.edit'],
};

const territory = (key: string, name: string) => ({
	...{ key, name, person: '', email: '', base: null, capacity: 1 },
	...{ frozen: false, vacant: false, closing: false },
});

function given(changes: Partial<DeskTerritories['draft']> = {}): DeskTerritories {
	return {
		revision: 1,
		savedBy: null,
		savedAt: '2026-12-01T09:00:00Z',
		draft: {
			...noTerritories,
			territories: [territory('n', 'North'), territory('s', 'South')],
			assignment: { a: 'n', b: 'n', c: 'n', d: 's', e: 's' },
			wishes: { ...noTerritories.wishes, tolerances: { [visits]: 0.1 } },
			...changes,
		},
		inks: { n: 0, s: 1 },
		inkNote: null,
		measures: [
			{
				...{ id: visits, name: 'Visits', unit: 'visits', table: 't', confidential: false },
				...{ values: [10, 20, 30, 25, 15, null], missing: 1, total: 100, stale: false },
			},
		],
		textColumns: [],
		geometry: { at: [], outlineMetres: [] },
		proposals: [],
		handovers: [],
	};
}

function open(changes: Partial<DeskTerritories['draft']> = {}, rights = sheet.rights) {
	const desk = new Desk({
		sheet: { ...sheet, rights },
		address: '/t/sheets/1',
		userName: null,
		save: async () => ({ kind: 'unreachable' }),
		keeper: null,
		sentence: () => '',
	});
	const sent: number[] = [];
	const territories = new TerritoryDesk({
		given: given(changes),
		desk,
		keeper: null,
		save: async (revision, document) => {
			sent.push(revision);
			return {
				kind: 'saved',
				saved: {
					...{ revision: revision + 1, savedAt: '2026-12-01T10:00:00Z', document },
					...{ inks: { n: 0, s: 1 }, inkNote: null, changedInks: [] },
				},
			};
		},
	});
	desk.territories = territories;
	return { desk, territories, hand: territories.hand, sent };
}

describe('the figures', () => {
	it('follow every gesture: loads, targets, deviations, regions', () => {
		const { territories, hand } = open();
		expect([...territories.loads[0].load]).toEqual([60, 40]);
		expect(territories.loads[0].fullTarget).toBe(50);
		expect(territories.outside).toEqual([0, 1]);
		hand.give([0], 's');
		expect([...territories.loads[0].deviation]).toEqual([0, 0]);
		expect(territories.outside).toEqual([]);
		expect([...territories.counts.regions]).toEqual([2, 3]);
		expect(territories.counts.without).toBe(1);
	});

	it('share by capacity, and give a territory that closes no target', () => {
		const { territories } = open({
			territories: [
				{ ...territory('n', 'North'), capacity: 0.5 },
				{ ...territory('s', 'South'), closing: true },
				{ ...territory('w', 'West'), capacity: 1.5 },
			],
		});
		expect([...territories.loads[0].target]).toEqual([25, 0, 75]);
		expect(territories.loads[0].deviation[1]).toBeNaN();
	});

	it('say when a tolerance is hard, and when no plan can meet it', () => {
		expect(open().territories.room[0]).toMatchObject({ room: 'hard' });
		expect(open().territories.room[0].words).toContain(
			'the largest region, C, is 60.0 % of a target',
		);
		const four = ['n', 's', 'w', 'e'].map((key) => territory(key, key));
		expect(open({ territories: four }).territories.room[0].room).toBe('cannot');
	});
});

describe('giving by hand', () => {
	it('is one step a gesture, and undone as one', () => {
		const { territories, hand } = open();
		hand.inHand = 's';
		hand.pick([1, 2]);
		hand.givePicked();
		expect([...territories.assignment]).toEqual([0, 1, 1, 1, 1, -1]);
		expect(hand.picked.size).toBe(0);
		expect(territories.draft.undoLabel).toBe('give 2 regions to South');
		territories.draft.undo();
		expect([...territories.assignment]).toEqual([0, 0, 0, 1, 1, -1]);
	});

	it('tells what came of it, with names', () => {
		const { hand } = open();
		hand.give([2], 's');
		expect(hand.said).toBe(
			'C given to South, from North. South: 70 visits, 40.0 % over. North: 30 visits, 40.0 % under.',
		);
	});

	it('tells of a torn territory at once and does not forbid it', () => {
		const { territories, hand } = open();
		hand.give([1], 's');
		expect(territories.torn).toEqual([
			{ territory: 0, parts: [[2], [0]] },
			{ territory: 1, parts: [[3, 4], [1]] },
		]);
		expect(hand.said).toContain('North is torn: cut off A.');
		territories.draft.undo();
		expect(hand.said).toBe('');
	});

	it('tells of a lock that it goes against, and leaves a base where it is', () => {
		const { hand, territories } = open({
			territories: [{ ...territory('n', 'North'), base: 'a' }, territory('s', 'South')],
			locks: { b: { territory: 'n', reason: 'contract' } },
		});
		hand.give([0, 1], 's');
		expect([...territories.assignment]).toEqual([0, 1, 0, 1, 1, -1]);
		expect(hand.said).toContain('A stays: it is the base of North.');
		expect(hand.said).toContain('B is locked to North.');
	});

	it('takes the base along to a territory without regions, and from one that closes', () => {
		const { hand, territories } = open({
			territories: [
				{ ...territory('n', 'North'), base: 'a', closing: true },
				{ ...territory('s', 'South'), base: 'f' },
			],
			assignment: { a: 'n', b: 'n', c: 'n' },
		});
		hand.give([0, 4], 's');
		expect([...territories.assignment]).toEqual([1, 0, 0, -1, 1, 1]);
		expect(territories.entries[0].base).toBeNull();
		const ground = { keys, borders: sheet.borders };
		expect(draftFaults(ground, territories.document)).toEqual([]);
	});

	it('takes regions away, and says so when nothing changes', () => {
		const { territories, hand } = open();
		hand.give([4], none);
		expect(territories.assignment[4]).toBe(-1);
		const { undoLabel } = territories.draft;
		hand.give([4], none);
		expect(hand.said).toBe('E already with no territory.');
		expect(territories.draft.undoLabel).toBe(undoLabel);
	});

	it('does nothing for one who may only look', () => {
		const { territories, hand } = open({}, ['measures.read']);
		hand.give([2], 's');
		expect([...territories.assignment]).toEqual([0, 0, 0, 1, 1, -1]);
	});
});

describe('what counts as joined', () => {
	it('is a line, a water link that was chosen and a link made by hand', () => {
		const across = { assignment: { d: 's', e: 's', f: 's' } };
		expect(open(across).territories.torn).toHaveLength(1);
		expect(open({ ...across, waterLinks: [['e', 'f']] }).territories.torn).toEqual([]);
		const ferry = { a: 'd', b: 'f', reason: 'ferry' };
		expect(open({ ...across, handLinks: [ferry] }).territories.torn).toEqual([]);
	});
});

describe('the sheet', () => {
	it('paints by territory while it is planned on, and by region after', () => {
		const { desk, territories, hand } = open();
		desk.byTerritory = true;
		expect([...desk.paints]).toEqual([0, 0, 0, 1, 1, -1]);
		hand.give([5], 'n');
		expect(desk.paints[5]).toBe(0);
		expect(desk.inHand).toBe(territories.draft);
		desk.byTerritory = false;
		expect([...desk.paints]).toEqual([-1, -1, -1, -1, -1, -1]);
		expect(desk.inHand).toBe(desk.draft);
	});

	it('shows a proposal in place of today, with what it moves, and leaves today alone', () => {
		const { territories, hand } = open();
		const today = territories.today;
		const moved: number[] = [];
		territories.proposal = {
			name: 'Fewer miles',
			assignment: Int32Array.of(0, 0, 1, 1, 1, 1),
			inks: { n: 1, s: 0 },
			before: today,
			draft: null,
			give: (regions) => moved.push(...regions),
		};
		expect([...territories.regionInks]).toEqual([1, 1, 0, 0, 0, 0]);
		expect(territories.moved).toEqual([2, 5]);
		expect([...territories.loads[0].load]).toEqual([30, 70]);
		hand.give([1], 's');
		expect(moved).toEqual([1]);
		expect(territories.draft.dirty).toBe(false);
	});
});

describe('saving', () => {
	it('sends the whole draft with the revision it began from, and takes the inks that come back', async () => {
		const { territories, hand, sent } = open();
		hand.give([0], 's');
		await territories.draft.saveNow();
		expect(sent).toEqual([1]);
		expect(territories.draft.saving).toBe('saved');
		expect(territories.draft.dirty).toBe(false);
		expect(territories.draft.revision).toBe(2);
	});
});
