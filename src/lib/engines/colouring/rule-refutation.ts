import { Sat } from '../solver/sat.ts';
import type { ColouringProblem, Proof } from './problem.ts';
import { ruleClauses } from './rule-clauses.ts';

/**
 * A refutation of `inks` inks that uses the rules as well as the borders, on the regions it needs; null
 * when they can be coloured or the conflicts run out. `regions` are those to look at, every keep-alike
 * group whole.
 */
export function ruleRefutation(
	problem: ColouringProblem,
	regions: number[],
	inks: number,
	budget: { conflicts: number; cancelled?: () => boolean },
): Proof | null {
	const needed = failedRegions(problem, regions, inks, budget);
	if (!needed) return null;
	const { needs, rules } = ruleClauses(problem, needed, inks);
	const sat = new Sat({ proof: true });
	for (let i = 0; i < needed.length * inks; i++) sat.newVariable();
	for (const clause of [...rules, ...needs]) sat.addClause(clause);
	if (sat.solve([], budget) !== 'unsat') return null;
	const refutation = { inks, format: 'drup' as const, clauses: sat.proofText() };
	return { kind: 'refutation', regions: needed, refutation };
}

/** The regions whose need of an ink clashes, with the whole of their groups. */
function failedRegions(
	problem: ColouringProblem,
	regions: number[],
	inks: number,
	budget: { conflicts: number },
): number[] | null {
	const { needs, rules } = ruleClauses(problem, regions, inks);
	const sat = new Sat();
	for (let i = 0; i < regions.length * (inks + 1); i++) sat.newVariable();
	const wanted = (i: number) => regions.length * inks + i + 1;
	for (const clause of rules) sat.addClause(clause);
	needs.forEach((clause, i) => sat.addClause([...clause, -wanted(i)]));
	const assumptions = regions.map((_, i) => wanted(i));
	if (sat.solve(assumptions, budget) !== 'unsat') return null;
	const failed = new Set(sat.core().map((literal) => regions[literal - wanted(0)]));
	const groups = groupsOf(problem);
	const touched = new Set([...failed].map((r) => groups.get(r) ?? r));
	return regions.filter((r) => touched.has(groups.get(r) ?? r));
}

/** The name of the keep-alike group of each region that is in one. */
function groupsOf({ alike }: ColouringProblem): Map<number, number> {
	const groups = new Map<number, number>();
	for (const [a, b] of alike ?? []) {
		const [from, to] = [groups.get(b) ?? b, groups.get(a) ?? a];
		groups.set(a, to);
		groups.set(b, to);
		for (const [r, group] of groups) if (group === from) groups.set(r, to);
	}
	return groups;
}
