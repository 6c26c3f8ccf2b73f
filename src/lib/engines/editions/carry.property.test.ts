import fc from 'fast-check';
import { expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { acceptedFeatures } from '../../../../tests/support/read-boundaries.ts';
import { dissolved, gridCells } from '../../../../tests/support/recut-lands.ts';
import { matchRegions } from '../boundaries/recut/index.ts';
import { carryNumbers } from '../measures/index.ts';
import { carryTerritories } from '../territories/index.ts';
import { draftFaults } from '../territories/draft-faults.ts';
import { noTerritories, type TerritoryDraft } from '../territories/territory-draft.ts';
import { carryDraft, carryInks, type Draft } from './index.ts';

const [rows, columns] = [3, 4];
const cells = gridCells(rows, columns);
const keys = cells.map((_, cell) => `r${cell}`);
const readLand = (regions: Record<string, number[]>) => acceptedFeatures(dissolved(cells, regions));
const first = await readLand(Object.fromEntries(keys.map((key, cell) => [key, [cell]])));
const pairOf = (i: number): [string, string] => [
	first.coverage.keys[first.borders.a[i]],
	first.coverage.keys[first.borders.b[i]],
];
const at = <T>(list: readonly T[], i: number) => list[i % list.length];

const numbers = fc.uniqueArray(fc.nat(keys.length - 1), { maxLength: 5 });
/** Pairs of cells that stand `steps` apart in number, so that none is listed twice. */
const pairs = (steps: number) =>
	numbers.map((list) => list.map((i): [string, string] => [keys[i], at(keys, i + steps)]));
const struck = fc
	.uniqueArray(fc.nat(first.borders.a.length - 1), { maxLength: 4 })
	.map((list) => list.map((i) => ({ a: pairOf(i)[0], b: pairOf(i)[1], reason: `ridge ${i}` })));
const added = pairs(7).map((list) => list.map(([a, b]) => ({ a, b, reason: 'a bridge' })));

const groups = fc.uniqueArray(
	fc.record({
		kind: fc.constantFrom('alike' as const, 'different' as const),
		name: fc.constantFrom('North', 'South', '__proto__'),
		keys: fc.uniqueArray(fc.constantFrom(...keys), { minLength: 2 }),
	}),
	{ maxLength: 3, selector: ({ kind, name }) => `${kind} ${name}` },
);

/** Every other lock and ban is one that an adjoining sheet asks for. */
const mark = (i: number) => (i % 2 ? { tie: 4 } : {});

const draft: fc.Arbitrary<Draft> = fc
	.record({
		groups,
		locked: numbers,
		banned: numbers,
		reserved: fc.uniqueArray(fc.nat(5), { maxLength: 2 }),
		ties: fc.constantFrom<Draft['ties']>(
			[],
			[{ sheet: 4, name: 'Next', edition: null, revision: 2 }],
		),
		goals: fc.constantFrom<Draft['goals']>([], [{ kind: 'even-area', give: 0.25 }]),
		alike: pairs(2),
		apart: pairs(5),
		struck,
		added,
	})
	.map(({ locked, banned, ...rest }) =>
		blankDraft({
			...rest,
			locks: Object.fromEntries(
				locked.map((i) => [
					keys[i],
					{ ink: i % 2, cost: 1 + i, by: 'Ann', at: 'noon', ...mark(i) },
				]),
			),
			forbidden: banned.map((i) => ({ key: keys[i], ink: i % 3, ...mark(i) })),
		}),
	);

const names = ['n', 's', 'w'];
const territories: fc.Arbitrary<TerritoryDraft> = fc
	.record({
		held: fc.array(fc.nat(3), { minLength: keys.length, maxLength: keys.length }),
		bases: fc.array(fc.nat(), { minLength: 3, maxLength: 3 }),
		locked: numbers,
		together: pairs(1),
		apart: pairs(5),
		links: pairs(7),
	})
	.map(({ held, bases, locked, together, apart, links }) => {
		const own = names.map((_, t) => keys.filter((_, cell) => held[cell] === t));
		return {
			...noTerritories,
			territories: names.map((key, t) => ({
				...{ key, name: key, person: '', email: '', capacity: 1 },
				...{ frozen: false, vacant: false, closing: false },
				base: own[t].length > 0 ? at(own[t], bases[t]) : null,
			})),
			assignment: Object.fromEntries(
				keys.flatMap((key, cell) => (held[cell] < 3 ? [[key, names[held[cell]]]] : [])),
			),
			locks: Object.fromEntries(
				locked.map((i) => [keys[i], { territory: at(names, i), reason: 'so' }]),
			),
			...{ together, apart },
			handLinks: links.map(([a, b]) => ({ a, b, reason: 'a ferry' })),
		};
	});

const deeds = fc.array(fc.constantFrom('keep', 'rename', 'merge', 'drop'), {
	minLength: keys.length,
	maxLength: keys.length,
});

/** The land after it, of at least one region. */
function recut(plan: string[]): Record<string, number[]> {
	const land: Record<string, number[]> = {};
	const isTaken = new Set<number>();
	plan.forEach((deed, cell) => {
		if (isTaken.has(cell) || (deed === 'drop' && cell > 0)) return;
		const next = cell + 1;
		const isMerged = deed === 'merge' && next % columns !== 0;
		if (isMerged) isTaken.add(next);
		land[deed === 'rename' ? `n${cell}` : keys[cell]] = isMerged ? [cell, next] : [cell];
	});
	return land;
}

it('changes nothing over the same boundaries', () => {
	const match = matchRegions(first.coverage, first.coverage);
	fc.assert(
		fc.property(draft, territories, (sheet, areas) => {
			const result = carryDraft(sheet, match, { borders: first.borders });
			expect(result.draft).toEqual(sheet);
			expect(result.rows.every(({ outcome }) => outcome === 'followed')).toBe(true);
			const own = carryTerritories(areas, match, { borders: first.borders });
			expect(own.draft).toEqual(areas);
			expect(own.rows.every(({ outcome }) => outcome === 'followed')).toBe(true);
		}),
	);
});

it('comes back as it was when regions were kept or renamed, and back again', async () => {
	await fc.assert(
		fc.asyncProperty(
			draft,
			territories,
			deeds,
			fc.array(fc.nat(9), { minLength: keys.length, maxLength: keys.length }),
			async (sheet, areas, plan, values) => {
				const names = plan.map((deed) => (deed === 'rename' ? 'rename' : 'keep'));
				const later = await readLand(recut(names));
				const there = matchRegions(first.coverage, later.coverage);
				const back = matchRegions(later.coverage, first.coverage);
				const carried = carryDraft(sheet, there, { borders: later.borders });
				const again = carryDraft(carried.draft, back, { borders: first.borders });
				expect(again.draft).toEqual(sheet);
				const moved = carryTerritories(areas, there, { borders: later.borders });
				expect(carryTerritories(moved.draft, back, { borders: first.borders }).draft).toEqual(
					areas,
				);
				expect([...carryInks(carryInks(values, there), back)]).toEqual(values);
				const figures = carryNumbers(values, there, false).values;
				expect(carryNumbers(figures, back, false).values).toEqual(values);
			},
		),
		{ numRuns: 25 },
	);
});

it('names regions of the new land only, tells of every rule, and leaves no fault in territories', async () => {
	await fc.assert(
		fc.asyncProperty(draft, territories, deeds, async (sheet, areas, plan) => {
			const later = await readLand(recut(plan));
			const match = matchRegions(first.coverage, later.coverage);
			const { draft: carried, rows } = carryDraft(sheet, match, { borders: later.borders });
			const known = new Set(later.coverage.keys);
			const named = [
				...Object.keys(carried.locks),
				...carried.forbidden.map(({ key }) => key),
				...[carried.alike, carried.apart].flat(2),
				...carried.groups.flatMap((group) => group.keys),
				...[carried.struck, carried.added].flat().flatMap(({ a, b }) => [a, b]),
			];
			expect(named.filter((key) => !known.has(key))).toEqual([]);
			for (const { kind, keys: members } of carried.groups) {
				expect(members.length).toBeGreaterThan(1);
				expect(new Set(members).size).toBe(members.length);
				expect(kind === 'alike' || members.length <= keys.length).toBe(true);
			}
			const rules = [
				sheet.groups,
				sheet.forbidden,
				sheet.alike,
				sheet.apart,
				sheet.struck,
				sheet.added,
			].flat();
			expect(rows.length).toBeGreaterThanOrEqual(rules.length + Object.keys(sheet.locks).length);
			const ground = { keys: later.coverage.keys, borders: later.borders };
			const own = carryTerritories(areas, match, { borders: later.borders });
			expect(draftFaults(ground, own.draft)).toEqual([]);
		}),
		{ numRuns: 40 },
	);
});
