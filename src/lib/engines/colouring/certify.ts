import { buildGraph } from '../graph/build-graph.ts';
import { smallestLastOrder } from '../graph/smallest-last.ts';
import { newBoard } from './board.ts';
import { structuralBound, type Bound } from './bounds.ts';
import { effortOf } from './effort.ts';
import type { Prepared } from './prepare.ts';
import type { ColouringProblem, Proof } from './problem.ts';
import { refute } from './refute.ts';
import { ruleRefutation } from './rule-refutation.ts';
import { peel } from './whole.ts';

/**
 * The proof that fewer than `inks` inks do not do, in the user's regions: the structural one when it
 * reaches so far, else a refutation; `not-proved` when neither was found.
 */
export function certify(
	problem: ColouringProblem,
	prepared: Prepared,
	bound: Bound,
	inks: number,
): Proof {
	const { grouped, regionOf, graph } = prepared;
	const named = (vertices: number[]) => vertices.map((v) => regionOf[v]);
	const plain = grouped ? ungroupedBound(problem) : bound;
	if (plain.inks >= inks) {
		return grouped ? plain.proof : { ...plain.proof, regions: named(plain.proof.regions) };
	}
	const none: Proof = { kind: 'not-proved', regions: [] };
	if (problem.cancelled?.()) return none;
	if (grouped || prepared.fixed || prepared.bans) {
		const small = byStructure(problem, prepared, bound, inks - 1);
		return small ?? byRules(problem, prepared, inks - 1) ?? none;
	}
	if (graph.count * inks > effortOf(problem).solverSize) return none;
	const { effort, effortTimes, seed, cancelled } = problem;
	const refuted = refute(graph, inks - 1, { effort, effortTimes, seed, cancelled });
	if (!refuted) return none;
	const refutation = { inks: inks - 1, format: 'drup' as const, clauses: refuted.clauses };
	const borders = refuted.borders?.map(([a, b]): [number, number] => [regionOf[a], regionOf[b]]);
	const regions = named(refuted.regions);
	return { kind: 'refutation', regions, ...(borders && { borders }), refutation };
}

/** The bound of the borders alone: with regions kept alike, its proof names real borders. */
function ungroupedBound(problem: ColouringProblem): Bound {
	const { a, b } = problem.borders;
	const graph = buildGraph(problem.regions, a, b);
	const { order } = smallestLastOrder(graph);
	return structuralBound(graph, order, {
		enough: Infinity,
		steps: effortOf(problem).boundSteps,
	});
}

/** Conflicts on the few regions of a clique, a ring or a wheel. */
const smallConflicts = 1_000;

/** The regions that show the bound of the borders may need more inks when some are not theirs to have. */
function byStructure(
	problem: ColouringProblem,
	{ vertexOf }: Prepared,
	{ proof }: Bound,
	inks: number,
): Proof | null {
	const shown = new Set(proof.regions);
	const regions: number[] = [];
	for (let r = 0; r < problem.regions; r++) if (shown.has(vertexOf[r])) regions.push(r);
	if (regions.length === 0 || regions.length * inks > effortOf(problem).solverSize) return null;
	const { cancelled } = problem;
	return ruleRefutation(problem, regions, inks, { conflicts: smallConflicts, cancelled });
}

/** Looks only at regions that may fail: those that cannot be set aside, and the locked ones. */
function byRules(problem: ColouringProblem, prepared: Prepared, inks: number): Proof | null {
	const high = problem.locks?.findIndex((ink) => ink >= inks) ?? -1;
	if (high >= 0) return ruleRefutation(problem, [high], inks, { conflicts: 1 });
	const { graph, fixed, bans, vertexOf } = prepared;
	const { core } = peel(newBoard(graph, inks, fixed, bans));
	const chosen = new Uint8Array(graph.count);
	for (const v of core) {
		chosen[v] = 1;
		for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
			if (fixed && fixed[graph.targets[e]] >= 0) chosen[graph.targets[e]] = 1;
		}
	}
	const regions: number[] = [];
	for (let r = 0; r < problem.regions; r++) if (chosen[vertexOf[r]]) regions.push(r);
	const { wholeConflicts, solverSize } = effortOf(problem);
	if (regions.length * inks > solverSize) return null;
	const budget = { conflicts: wholeConflicts, cancelled: problem.cancelled };
	return ruleRefutation(problem, regions, inks, budget);
}
