import { buildGraph } from '../graph/build-graph.ts';
import { smallestLastOrder } from '../graph/smallest-last.ts';
import { quickColouring, type AttemptSettings } from './attempt.ts';
import { structuralBound, type Bound } from './bounds.ts';
import { effortOf } from './effort.ts';
import { problemFaults } from './faults.ts';
import { fewestInks } from './fewest.ts';
import { byRegion, prepare, type Prepared } from './prepare.ts';
import type { ColouringProblem, ColouringResult, Proof } from './problem.ts';

/**
 * Colours a map: the fewest inks (or the number asked for) such that bordering regions differ and all
 * rules are kept, with the proof why fewer do not do; or why it is impossible; or `undecided` when
 * neither was found within the effort. The same problem and seed give the same answer.
 *
 * @throws RangeError when the problem is not well formed: ask `problemFaults` first
 */
export async function colour(problem: ColouringProblem): Promise<ColouringResult> {
	const [fault] = problemFaults(problem);
	if (fault) throw new RangeError(fault);
	const prepared = prepare(problem);
	if (prepared.clash) return undecided(0, 'Two rules contradict each other.');
	const effort = effortOf(problem);
	const { order, degeneracy } = smallestLastOrder(prepared.graph);
	const enough = problem.inks === 'fewest' ? Infinity : problem.inks + 1;
	const bound = structuralBound(prepared.graph, order, { enough, steps: effort.boundSteps });
	const settings: AttemptSettings = {
		order,
		sides: bound.sides,
		effort,
		seed: problem.seed ?? 0,
		cancelled: problem.cancelled,
	};
	const lowest = Math.max(bound.inks, prepared.inksLocked);
	const highest = problem.inks === 'fewest' ? lowest + degeneracy + 1 : problem.inks;
	const outcome = fewestInks(
		problem.inks === 'fewest' ? lowest : problem.inks,
		highest,
		(inks) => quickColouring(prepared, inks, settings),
		() => ({ status: 'unknown' }),
	);
	if (!outcome) return undecided(lowest, 'No colouring was found within the effort.');
	return coloured(problem, prepared, bound, outcome.ink, outcome.inks);
}

function coloured(
	problem: ColouringProblem,
	prepared: Prepared,
	bound: Bound,
	ink: Int32Array,
	inks: number,
): ColouringResult {
	const colouring = byRegion(prepared, ink);
	const used = colouring.reduce((most, c) => Math.max(most, c + 1), 0);
	const inksUsed = problem.inks === 'fewest' ? inks : used;
	const lowerBound = Math.max(bound.inks, prepared.inksLocked);
	const proof = proofOf(problem, prepared, bound, inksUsed);
	return { status: 'coloured', inksUsed, colouring, lowerBound, proof };
}

function proofOf(
	problem: ColouringProblem,
	prepared: Prepared,
	bound: Bound,
	inksUsed: number,
): Proof {
	const literal = prepared.grouped ? ungroupedBound(problem) : bound;
	if (literal.inks < inksUsed) return { kind: 'not-proved', regions: [] };
	if (prepared.grouped) return literal.proof;
	return { ...literal.proof, regions: literal.proof.regions.map((v) => prepared.regionOf[v]) };
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

function undecided(lowerBound: number, message: string): ColouringResult {
	return { status: 'undecided', lowerBound, message };
}
