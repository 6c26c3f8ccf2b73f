import fc from 'fast-check';
import { expect, it } from 'vitest';
import { tableOf } from '../../../../../tests/support/joins.ts';
import { checkJoin, joinTable, suggestRegions } from '../index.ts';
import { editDistance } from './edit-distance.ts';
import { fold } from './fold.ts';

/** Short texts over few letters, so that they often meet. */
const label = fc.string({ unit: fc.constantFrom(...'01aAäßñ-. '.split('')), maxLength: 4 });
const worlds = fc.record({
	keys: fc.uniqueArray(label.filter(Boolean), { minLength: 1, maxLength: 12 }),
	cells: fc.array(fc.oneof(label, fc.nat(12), fc.constant(null)), { minLength: 1, maxLength: 20 }),
	by: fc.constantFrom('key' as const, 'name' as const),
});

it('every join passes the checker, and the order of rows changes no match', () => {
	fc.assert(
		fc.property(worlds, fc.infiniteStream(fc.nat()), ({ keys, cells, by }, random) => {
			const regions = { keys, names: keys.map((key) => key.toUpperCase()) };
			const table = tableOf({ Unit: cells });
			const join = joinTable(table, { column: 0, by }, regions);
			expect(checkJoin(table, join, regions)).toEqual([]);
			const draws = cells.map(() => random.next().value as number);
			const order = cells.map((_, i) => i).sort((a, b) => draws[a] - draws[b]);
			const turned = joinTable(
				tableOf({ Unit: order.map((i) => cells[i]) }),
				{ column: 0, by },
				regions,
			);
			expect([...turned.region]).toEqual(order.map((i) => join.region[i]));
			expect(turned.how).toEqual(order.map((i) => join.how[i]));
			expect(turned.missing).toEqual(join.missing);
		}),
		{ numRuns: 400 },
	);
});

it('suggests exactly what measuring every region finds', () => {
	fc.assert(
		fc.property(
			fc.uniqueArray(
				fc.string({ unit: fc.constantFrom(...'abc'.split('')), minLength: 1, maxLength: 7 }),
				{
					minLength: 1,
					maxLength: 20,
				},
			),
			fc.string({ unit: fc.constantFrom(...'abc'.split('')), minLength: 1, maxLength: 9 }),
			(keys, text) => {
				const most = Math.max(1, Math.floor(text.length / 3));
				const all = keys
					.map((key, region) => ({ region, distance: editDistance(fold(text), fold(key), 99) }))
					.filter(({ distance }) => distance <= most)
					.sort((a, b) => a.distance - b.distance || a.region - b.region);
				// ends are marked, so texts of one letter may share no pair with what they are near to
				fc.pre(text.length > 2);
				expect(suggestRegions(text, { keys, names: keys }, 'key')).toEqual(all.slice(0, 3));
			},
		),
		{ numRuns: 400 },
	);
});
