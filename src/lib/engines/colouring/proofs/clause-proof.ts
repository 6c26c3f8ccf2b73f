import { Sat } from '../../solver/sat.ts';
import { partClauses, type Part } from './part-clauses.ts';
import type { ClauseEvidence } from './proof-form.ts';

/** Conflicts for one refutation; parts that are shown are small. */
export interface ClauseBudget {
	conflicts: number;
	cancelled?: () => boolean;
}

/**
 * A refutation of a part, in the form of a proof file; null when the part can be coloured or the
 * conflicts run out. A part of more than a million variables is not tried.
 */
export function clauseProof(part: Part, budget: ClauseBudget): ClauseEvidence | null {
	const { regions, inks, borders } = part;
	const variables = regions.length * inks.length;
	if (variables > 1_000_000) return null;
	const sat = new Sat({ proof: true });
	for (let i = 0; i < variables; i++) sat.newVariable();
	for (const clause of partClauses(part)) sat.addClause(clause);
	if (sat.solve([], budget) !== 'unsat') return null;
	return {
		kind: 'clauses',
		regions: [...regions],
		inks: [...inks],
		...(borders ? { borders: [...borders] } : {}),
		format: 'drup',
		clauses: sat.proofText(),
	};
}
