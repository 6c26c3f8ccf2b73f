import fc from 'fast-check';
import { expect, it } from 'vitest';
import { PairTally } from './pair-tally.ts';

const regions = 900_000;
const region = fc.oneof(fc.nat(60), fc.nat(regions - 1));

it('adds up as a map of pairs does, in order of the pairs', () =>
	fc.assert(
		fc.property(
			fc.array(fc.tuple(region, region, fc.nat(1), fc.nat(50)), {
				minLength: 1,
				maxLength: 4000,
				size: 'max',
			}),
			(added) => {
				const tally = new PairTally(regions);
				const known = new Map<
					string,
					{ kind: number; metres: number; longest: number; at: number }
				>();
				added.forEach(([p, q, kind, metres], i) => {
					const [a, b] = [Math.min(p, q), Math.max(p, q)];
					const before = known.get(`${a} ${b}`);
					expect(tally.has(q, p)).toBe(before !== undefined);
					tally.add(p, q, kind, metres, i, -i);
					if (!before) known.set(`${a} ${b}`, { kind, metres, longest: metres, at: i });
					else {
						before.metres += metres;
						if (metres > before.longest) Object.assign(before, { longest: metres, at: i });
					}
				});
				const { a, b, kind, metres, at } = tally.list();
				expect(a.length).toBe(known.size);
				a.forEach((first, k) => {
					const row = known.get(`${first} ${b[k]}`);
					expect([kind[k], metres[k], at[2 * k]]).toEqual([row?.kind, row?.metres, row?.at]);
					if (k > 0) expect(first * regions + b[k]).toBeGreaterThan(a[k - 1] * regions + b[k - 1]);
				});
			},
		),
		{ numRuns: 20 },
	));
