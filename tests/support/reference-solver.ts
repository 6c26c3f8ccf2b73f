import { createRequire } from 'node:module';

interface Solver {
	require(formula: unknown): void;
	solve(): unknown;
}

/** logic-solver 2.0.1 (npm), MiniSat by N. Een and N. Sorensson compiled to JavaScript. */
const Logic = createRequire(import.meta.url)('logic-solver') as {
	Solver: new () => Solver;
	or: (...literals: string[]) => unknown;
};

/** Whether a solver that shares nothing with ours finds the clauses (literals v and -v) satisfiable. */
export function satisfiable(clauses: readonly (readonly number[])[]): boolean {
	const solver = new Logic.Solver();
	const term = (literal: number) => (literal > 0 ? `v${literal}` : `-v${-literal}`);
	for (const clause of clauses) solver.require(Logic.or(...clause.map(term)));
	return solver.solve() !== null;
}
