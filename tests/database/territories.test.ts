import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { TerritoryDraft } from '../../src/lib/engines/territories/territory-draft.ts';
import { Forbidden } from '../../src/lib/server/access/member.ts';
import { Conflict, NotFound, Unfit } from '../../src/lib/server/services/outcomes.ts';
import {
	assignFromColumn,
	assignFromScratch,
	previewFromColumn,
} from '../../src/lib/server/services/territories-start.service.ts';
import {
	deskTerritories,
	saveTerritories,
} from '../../src/lib/server/services/territories.service.ts';
import {
	fieldKey,
	plainOf,
	putMeasure,
	saveOver,
	territoriesOf,
	type Plain,
} from '../support/planner.ts';
import { createMember, createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let plain: Plain;
beforeAll(async () => {
	shop = await createWorkshop();
	plain = await plainOf(shop, 'territories', { rows: 6, columns: 6 });
});
afterAll(() => shop.close());

const desk = () => deskTerritories(shop, plain.planner, plain.sheet);
const quarters = (_key: string, row: number, column: number) =>
	`${row < 3 ? 'south' : 'north'}-${column < 3 ? 'west' : 'east'}`;
const save = (document: TerritoryDraft, revision: number) =>
	saveTerritories(shop, plain.planner, plain.sheet, { revision, document });

describe('a sheet without territories', () => {
	it('shows what there is to begin with', async () => {
		const shown = await desk();
		expect(shown).toMatchObject({ revision: 0, savedBy: null, proposals: [], inks: {} });
		expect(shown.draft.territories).toEqual([]);
		expect(shown.measures.map(({ name, total }) => [name, total])).toEqual([['Visits', 36]]);
		// the middle of the first field, and its outline: 4 x 0.1 degrees of about 111 km near the equator
		expect(shown.geometry.at[0]).toBeCloseTo(0.05, 4);
		expect(shown.geometry.outlineMetres[0] / 44_400).toBeCloseTo(1, 1);
	});
});

describe('saving territories', () => {
	it('gives neighbours different inks and keeps every revision', async () => {
		const document = territoriesOf(plain.keys, quarters);
		const saved = await saveOver(shop, plain, document);
		expect(saved).toMatchObject({ revision: 1, inkNote: null, changedInks: [] });
		expect(saved.document).toEqual(document);
		// held apart by hand: south-west and south-east share three sides, and so on round
		const { inks } = saved;
		expect(inks['south-west']).not.toBe(inks['south-east']);
		expect(inks['south-west']).not.toBe(inks['north-west']);
		expect(inks['north-east']).not.toBe(inks['south-east']);
		expect(inks['north-east']).not.toBe(inks['north-west']);
		const shown = await desk();
		expect(shown).toMatchObject({ revision: 1, savedBy: 'planner of territories' });
		expect(shown.draft).toEqual(document);
		const rows = await shop.db.selectFrom('territory_drafts').select('revision').execute();
		expect(rows).toHaveLength(1);
	});

	it('writes nothing when nothing changed', async () => {
		const { draft, revision } = await desk();
		expect(await save(draft, revision)).toMatchObject({ status: 'saved', saved: { revision } });
		expect((await desk()).revision).toBe(revision);
	});

	it('changes no ink when no two territories become neighbours', async () => {
		const { draft, revision, inks } = await desk();
		// one field over the middle line: the four still meet as before
		const assignment = { ...draft.assignment, [fieldKey(0, 3)]: 'south-west' };
		const result = await save({ ...draft, assignment }, revision);
		if (result.status !== 'saved') throw new Error('not saved');
		expect(result.saved.inks).toEqual(inks);
		expect(result.saved.changedInks).toEqual([]);
		// people and names change no ink either
		const territories = result.saved.document.territories.map((entry, place) => ({
			...entry,
			...{ name: `Round ${place}`, person: 'Ada Lind' },
		}));
		const again = await save({ ...result.saved.document, territories }, result.saved.revision);
		expect(again).toMatchObject({ saved: { inks, changedInks: [] } });
	});

	it('tells whoever was second what the first saved, and writes nothing', async () => {
		const { draft, revision } = await desk();
		const first = await save({ ...draft, together: [[fieldKey(0, 0), fieldKey(0, 1)]] }, revision);
		expect(first.status).toBe('saved');
		const second = await save({ ...draft, apart: [[fieldKey(0, 0), fieldKey(5, 5)]] }, revision);
		if (second.status !== 'stale') throw new Error('not stale');
		expect(second.stale.revision).toBe(revision + 1);
		expect(second.stale.document.together).toHaveLength(1);
		expect((await desk()).draft.apart).toEqual([]);
	});

	it('says so when the palette is too short to tell them apart', async () => {
		const small = await plainOf(shop, 'short-palette', { rows: 2, columns: 2 });
		await shop.db
			.updateTable('drafts')
			.set(({ fn, val }) => ({
				document: fn('jsonb_set', [
					'document',
					val('{palette,inks}'),
					val('[{"name":"One","hex":"#eeaa00"}]'),
				]),
			}))
			.where('sheet_id', '=', small.sheetId)
			.execute();
		const saved = await saveOver(shop, small, territoriesOf(small.keys, quartersOfFour));
		expect(saved.inks).toEqual({});
		expect(saved.inkNote).toBe('The territories need 2 inks and the palette has 1.');
	});
});

const quartersOfFour = (_key: string, row: number, column: number) => `t${row}${column}`;

describe('what territories may not say', () => {
	const changed = async (change: (draft: TerritoryDraft) => Partial<TerritoryDraft>) => {
		const { draft, revision } = await desk();
		return save({ ...draft, ...change(draft) }, revision);
	};
	const [a, b] = [fieldKey(0, 0), fieldKey(0, 1)];
	const first = (draft: TerritoryDraft, more: object) => ({
		territories: draft.territories.map((entry, i) => (i === 0 ? { ...entry, ...more } : entry)),
	});

	it.each<[string, string, (draft: TerritoryDraft) => Partial<TerritoryDraft>]>([
		[
			'a region the sheet does not have, of which five are named',
			'The sheet has no region “x0”, “x1”, “x2”, “x3”, “x4” and 2 more.',
			({ assignment }) => ({
				assignment: {
					...assignment,
					...Object.fromEntries(Array.from({ length: 7 }, (_, i) => [`x${i}`, 'south-west'])),
				},
			}),
		],
		[
			'a territory that is not on the list',
			'There is no territory “nowhere”.',
			({ assignment }) => ({ assignment: { ...assignment, [a]: 'nowhere' } }),
		],
		[
			'a lock to a territory that is not on the list',
			'There is no territory “nowhere”.',
			() => ({ locks: { [a]: { territory: 'nowhere', reason: '' } } }),
		],
		[
			'one key for two territories',
			'More than one territory has the key “south-east”.',
			(draft) => first(draft, { key: 'south-east' }),
		],
		[
			'a base outside its own territory',
			'The base lies outside its own territory: “Round 0”.',
			(draft) => first(draft, { base: fieldKey(5, 5) }),
		],
		[
			'a link across water where there is none',
			`There is no border across water: “${a} and ${b}”.`,
			() => ({ waterLinks: [[a, b]] }),
		],
		[
			'a region paired with itself',
			`A region is paired with itself: “${a}”.`,
			() => ({ handLinks: [{ a, b: a, reason: 'a loop' }] }),
		],
	])('%s', async (_case, message, change) => {
		const { revision } = await desk();
		const problem = changed(change);
		await expect(problem).rejects.toBeInstanceOf(Unfit);
		await expect(problem).rejects.toThrow(message);
		expect((await desk()).revision).toBe(revision);
	});

	it('one base for two territories', async () => {
		const problem = changed((draft) => ({
			territories: [
				{ ...draft.territories[0], base: fieldKey(0, 0) },
				{ ...draft.territories[1], base: fieldKey(0, 0) },
			],
			assignment: { [fieldKey(0, 0)]: draft.territories[0].key },
		}));
		await expect(problem).rejects.toThrow('More than one territory has its base in “r0c0”.');
	});
});

describe('territories from a column', () => {
	let half: Plain;
	beforeAll(async () => {
		half = await plainOf(shop, 'columns', { rows: 4, columns: 4 });
	});
	const source = { kind: 'attribute', name: 'half' } as const;

	it('are shown before they are saved, and saved as shown', async () => {
		const preview = await previewFromColumn(shop, half.planner, half.sheet, source);
		expect(preview.document.territories.map(({ key, name }) => [key, name])).toEqual([
			['west', 'West'],
			['east', 'East'],
		]);
		expect([preview.regions, preview.without]).toEqual([[8, 8], 0]);
		const saved = await assignFromColumn(shop, half.planner, half.sheet, { revision: 0, source });
		expect(saved).toMatchObject({ status: 'saved', saved: { revision: 1 } });
		const shown = await deskTerritories(shop, half.planner, half.sheet);
		expect(shown.draft).toEqual(preview.document);
	});

	it('keep what is known of those that were there, by their names', async () => {
		const { draft, revision } = await deskTerritories(shop, half.planner, half.sheet);
		const [west, east] = draft.territories;
		const territories = [{ ...west, person: 'Ada Lind', name: 'WEST' }, east];
		const saved = await saveTerritories(shop, half.planner, half.sheet, {
			revision,
			document: { ...draft, territories, assignment: {} },
		});
		expect(saved.status).toBe('saved');
		const again = { revision: revision + 1, source };
		await assignFromColumn(shop, half.planner, half.sheet, again);
		const after = await deskTerritories(shop, half.planner, half.sheet);
		expect(after.draft.territories).toEqual(territories);
		expect(Object.values(after.draft.assignment)).toHaveLength(16);
	});

	it('are refused for a column that is not there, and when somebody else saved first', async () => {
		const nowhere = { revision: 3, source: { ...source, name: 'no such column' } };
		await expect(assignFromColumn(shop, half.planner, half.sheet, nowhere)).rejects.toThrow(
			NotFound,
		);
		const late = { revision: 1, source };
		await expect(assignFromColumn(shop, half.planner, half.sheet, late)).rejects.toThrow(Conflict);
	});

	it('may come from figures', async () => {
		const districts = await putMeasure(
			...[shop.db, half.sheetId, 'District'],
			half.keys.map((_, i) => (i === 0 ? null : 1 + (i % 2))),
		);
		const from = { kind: 'measure', name: districts } as const;
		const preview = await previewFromColumn(shop, half.planner, half.sheet, from);
		expect(preview.document.territories.map(({ name }) => name)).toEqual([
			'WEST',
			'East',
			'2',
			'1',
		]);
		expect([preview.regions, preview.without]).toEqual([[0, 0, 8, 7], 1]);
	});
});

describe('territories from scratch', () => {
	it('are in one piece each and about even', async () => {
		const open = await plainOf(shop, 'scratch', { rows: 6, columns: 6 });
		const wish = { revision: 0, territories: 4, measure: open.visits, seed: 7 };
		const saved = await assignFromScratch(shop, open.planner, open.sheet, wish);
		if (saved.status !== 'saved') throw new Error('not saved');
		const { territories, assignment } = saved.saved.document;
		expect(territories).toHaveLength(4);
		const names = territories.map(({ name }) => name);
		for (const name of names) expect(name).toMatch(/^Field \d\.\d$/);
		const sizes = territories.map(
			({ key }) => Object.values(assignment).filter((territory) => territory === key).length,
		);
		// 36 visits among four: 9 each, and within a tenth of it only 9 is a whole number
		expect(sizes).toEqual([9, 9, 9, 9]);
		for (const { key } of territories) {
			expect(pieces(open.keys.filter((field) => assignment[field] === key))).toBe(1);
		}
	});

	it('are refused where there are too few regions', async () => {
		const open = await plainOf(shop, 'scratch-few', { rows: 2, columns: 2 });
		const wish = { revision: 0, territories: 5, measure: null, seed: 1 };
		const problem = assignFromScratch(shop, open.planner, open.sheet, wish);
		await expect(problem).rejects.toThrow('There are only 4 regions.');
	});
});

/** In how many pieces fields lie, joined by their sides: counted here, by nothing of the product. */
function pieces(fields: string[]): number {
	const left = new Set(fields);
	let count = 0;
	for (const field of fields) {
		if (!left.delete(field)) continue;
		count++;
		const waiting = [field];
		for (const at of waiting) {
			const [row, column] = at.slice(1).split('c').map(Number);
			for (const [dr, dc] of [
				[0, 1],
				[1, 0],
				[0, -1],
				[-1, 0],
			]) {
				const next = fieldKey(row + dr, column + dc);
				if (left.delete(next)) waiting.push(next);
			}
		}
	}
	return count;
}

describe('who may see and change them', () => {
	it('a designer sees no figures, an analyst changes nothing, another team knows of nothing', async () => {
		const designer = await createMember(shop.db, 'territories', 'designer');
		const analyst = await createMember(shop.db, 'territories', 'analyst');
		const stranger = await createMember(shop.db, 'elsewhere', 'planner');
		await expect(deskTerritories(shop, designer, plain.sheet)).rejects.toThrow(Forbidden);
		const { draft, revision } = await deskTerritories(shop, analyst, plain.sheet);
		const sent = { revision, document: draft };
		await expect(saveTerritories(shop, analyst, plain.sheet, sent)).rejects.toThrow(Forbidden);
		await expect(saveTerritories(shop, stranger, plain.sheet, sent)).rejects.toThrow(NotFound);
		await expect(deskTerritories(shop, stranger, plain.sheet)).rejects.toThrow(NotFound);
	});
});
