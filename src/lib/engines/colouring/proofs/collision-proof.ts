import type { ColouringProblem, Explanation } from '../problem.ts';
import { clauseProof, type ClauseBudget } from './clause-proof.ts';
import { expandReserved } from './expand-reserved.ts';
import { inksToWrite } from './part-clauses.ts';
import type { Claim } from './proof-form.ts';

type Collision = Extract<Claim, { claim: 'cannot be kept' }>;

const BUDGET: ClauseBudget = { conflicts: 200_000 };

/**
 * The clause proof of an explanation: that its locks (none: the rules alone) cannot be kept on the
 * regions it names. Null when the budget does not suffice to show it there.
 */
export function collisionProof(
	given: ColouringProblem,
	explanation: Pick<Explanation, 'locks' | 'regions'>,
	budget: ClauseBudget = BUDGET,
): Collision | null {
	const problem = expandReserved(given);
	const limit = given.inks === 'fewest' ? 'any' : given.inks;
	const locks = [...explanation.locks].sort((a, b) => a - b);
	const regions = [...new Set([...explanation.regions, ...locks])].sort((a, b) => a - b);
	const part = { problem, regions, locks: new Set(locks) };
	const evidence = clauseProof({ ...part, inks: inksToWrite(part, limit) }, budget);
	return evidence && { claim: 'cannot be kept', inks: limit, locks, evidence };
}
