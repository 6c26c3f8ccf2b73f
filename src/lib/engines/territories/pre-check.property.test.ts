import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { everyAssignment, smallProblems } from '../../../../tests/support/small-territories.ts';
import { ruleFaults } from './check-rules.ts';
import { checkWitness } from './check-witness.ts';
import { preCheck } from './pre-check.ts';
import { prepare } from './prepared.ts';
import type { Impossible, TerritoryProblem } from './problem.ts';
import { relieve } from './relieve.ts';

function claimOf(problem: TerritoryProblem): Impossible | null {
	const prepared = prepare(problem);
	return 'status' in prepared ? prepared : preCheck(prepared);
}

function hasPlan(problem: TerritoryProblem): boolean {
	for (const assignment of everyAssignment(problem)) {
		if (ruleFaults(problem, assignment).length === 0) return true;
	}
	return false;
}

describe('witnesses', () => {
	it('are never confirmed where there is a plan', () => {
		const reasons = [
			'unit-too-heavy',
			'lock-cut-off',
			'frozen-outside-tolerance',
			'island-load',
			'missing-value',
		] as const;
		let tried = 0;
		const draw = fc.record({
			problem: smallProblems(6),
			reason: fc.constantFrom(...reasons),
			picks: fc.uniqueArray(fc.nat(5), { minLength: 1 }),
			places: fc.uniqueArray(fc.nat(2), { minLength: 1 }),
		});
		fc.assert(
			fc.property(draw, ({ problem, reason, picks, places }) => {
				if (claimOf(problem) || !hasPlan(problem)) return;
				const units = picks.filter((u) => u < problem.graph.count);
				const territories = places.filter((t) => t < problem.territories.length);
				const witness = { units, territories };
				const claim = { status: 'impossible' as const, reason, message: '', witness, relief: [] };
				tried++;
				expect(checkWitness(problem, claim)).toHaveLength(1);
			}),
			{ numRuns: 2000, seed: 3 },
		);
		expect(tried).toBeGreaterThan(100);
	});
});

describe('pre-checks on small problems of every kind', () => {
	const seen = new Map<string, number>();
	const problems = smallProblems(7);
	const runs = { numRuns: 1500, seed: 7 };

	it('call impossible only what has no plan among all assignments, with a witness that holds', () => {
		fc.assert(
			fc.property(problems, (problem) => {
				const claim = claimOf(problem);
				if (!claim) return;
				seen.set(claim.reason, (seen.get(claim.reason) ?? 0) + 1);
				expect(claim.message).toMatch(/\.$/);
				expect(checkWitness(problem, claim)).toEqual([]);
				if (claim.reason !== 'missing-value') expect(hasPlan(problem), claim.message).toBe(false);
			}),
			runs,
		);
	});

	it('come upon every reason', () => {
		for (const reason of [
			'unit-too-heavy',
			'lock-cut-off',
			'frozen-outside-tolerance',
			'island-load',
			'missing-value',
			'no-plan',
		]) {
			expect(seen.get(reason) ?? 0, reason).toBeGreaterThan(20);
		}
	});

	it('offer reliefs that take the obstacle away, and no smaller tolerance does', () => {
		fc.assert(
			fc.property(problems, (problem) => {
				const claim = claimOf(problem);
				for (const relief of claim?.relief ?? []) {
					const eased = relieve(problem, relief);
					if (!claim || !eased) continue;
					const after = claimOf(eased);
					// another obstacle with the same witness has words of its own
					const told = (c: Impossible | null) =>
						c && [c.reason, c.witness, relief.kind === 'tolerance' || c.message];
					expect(told(after)).not.toEqual(told(claim));
					if (relief.kind !== 'tolerance') continue;
					const short = relieve(problem, { ...relief, value: relief.value - 1e-6 });
					const still = short && claimOf(short);
					expect(still?.witness).toEqual(claim.witness);
				}
			}),
			runs,
		);
	});
});
