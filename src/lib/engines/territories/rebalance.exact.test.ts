import { describe, expect, it } from 'vitest';
import { smallInstance, tryAll } from '../../../../tests/support/territory-instances.ts';
import { checkPlan } from './check-plan.ts';
import { checkWitness } from './check-witness.ts';
import { prepare } from './prepared.ts';
import { rebalance } from './rebalance.ts';

/** Seeded instances small enough that every plan can be tried, by code that shares nothing with the engine. */
describe('rebalance against trying every plan', () => {
	it('claims no proof, bound or impossibility that does not hold, and finds the cheapest plan', async () => {
		const seen = { proposed: 0, proved: 0, cheapest: 0, impossible: 0, undecided: 0 };
		for (let seed = 700; seed < 760; seed++) {
			const { problem } = smallInstance(seed);
			const prepared = prepare(problem);
			if ('status' in prepared) continue;
			const tried = tryAll(smallInstance(seed), prepared.steps);
			const result = await rebalance({ ...problem, goal: 'fewest-moves', effort: 'quick' });
			seen[result.status]++;
			if (result.status === 'impossible') {
				expect(tried.plans, `seed ${seed}`).toBe(0);
				expect(checkWitness(problem, result), `seed ${seed}`).toEqual([]);
				continue;
			}
			if (tried.plans > 0)
				expect(result.lowerBound, `seed ${seed}`).toBeLessThanOrEqual(tried.cost + 1e-9);
			if (result.status === 'undecided') continue;
			expect(checkPlan(problem, result), `seed ${seed}`).toEqual([]);
			expect(result.cost, `seed ${seed}`).toBeGreaterThanOrEqual(tried.cost - 1e-9);
			if (result.proved) {
				seen.proved++;
				expect(result.cost, `seed ${seed}`).toBeCloseTo(tried.cost, 6);
			}
			if (result.cost < tried.cost + 1e-9) seen.cheapest++;
		}
		expect(seen.proposed).toBeGreaterThan(15);
		expect(seen.impossible).toBeGreaterThan(2);
		expect(seen.cheapest / seen.proposed).toBeGreaterThan(0.9);
		expect(seen.proved / seen.proposed).toBeGreaterThan(0.9);
	});
});
