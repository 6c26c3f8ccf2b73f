import { smallestLastOrder } from '../graph/smallest-last.ts';
import { exactColouring, quickColouring, type AttemptSettings } from './attempt.ts';
import { structuralBound, type Bound } from './bounds.ts';
import { certify } from './certify.ts';
import { effortOf } from './effort.ts';
import { inksBanned } from './bans.ts';
import { explain } from './explain.ts';
import { problemFaults } from './faults.ts';
import { fewestInks, type FewestOutcome } from './fewest.ts';
import { towardsGoal } from './goal.ts';
import { leastInks } from './least-inks.ts';
import { mendedPrevious } from './mended-previous.ts';
import { byRegion, prepare, type Prepared } from './prepare.ts';
import type { ColouringProblem, ColouringResult } from './problem.ts';

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
	if (prepared.clash) return impossible(problem, 0);
	const { bound, settings } = measured(problem, prepared);
	const least = leastInks(prepared, bound);
	const outcome = search(problem, prepared, least, settings);
	if (outcome === 'impossible') return impossible(problem, least);
	if (outcome === 'undecided') return undecided(problem, least);
	return coloured(problem, prepared, bound, outcome);
}

async function impossible(problem: ColouringProblem, least: number): Promise<ColouringResult> {
	const explanation = await explain(problem);
	if (explanation) return { status: 'impossible', explanation };
	const message = 'No colouring was found; the effort did not suffice to say which rules collide.';
	return { status: 'undecided', lowerBound: least, message };
}

function measured(problem: ColouringProblem, { graph }: Prepared) {
	const effort = effortOf(problem);
	const { order } = smallestLastOrder(graph);
	const enough = problem.inks === 'fewest' ? Infinity : problem.inks + 1;
	const bound = structuralBound(graph, order, { enough, steps: effort.boundSteps });
	const settings: AttemptSettings = {
		order,
		sides: bound.sides,
		clique: bound.clique,
		effort,
		seed: problem.seed ?? 0,
		cancelled: problem.cancelled,
	};
	return { bound, settings };
}

function search(
	problem: ColouringProblem,
	prepared: Prepared,
	lowest: number,
	settings: AttemptSettings,
): FewestOutcome | 'impossible' | 'undecided' {
	const quick = (inks: number) => quickColouring(prepared, inks, settings);
	const exact = (inks: number) => exactColouring(prepared, inks, settings);
	if (problem.inks === 'fewest') {
		const highest = lowest + problem.regions + inksBanned(prepared.bans);
		const atHand = (fewerThan: number) => mendedPrevious(problem, prepared, settings, fewerThan);
		const tries = { quick, exact, atHand, told: problem.bounds };
		return fewestInks(lowest, highest, tries) ?? 'undecided';
	}
	const { inks } = problem;
	if (inks < lowest) return 'impossible';
	const ink = quick(inks);
	if (ink) return { inks, ink, lowerBound: lowest };
	const answer = exact(inks);
	if (answer.status === 'coloured') return { inks, ink: answer.ink, lowerBound: lowest };
	return answer.status === 'refuted' ? 'impossible' : 'undecided';
}

function coloured(
	problem: ColouringProblem,
	prepared: Prepared,
	bound: Bound,
	outcome: FewestOutcome,
): ColouringResult {
	const { ink, changes, objective } = towardsGoal(problem, prepared, outcome.ink, outcome.inks);
	const colouring = byRegion(prepared, ink);
	const used = colouring.reduce((most, c) => Math.max(most, c + 1), 0);
	const inksUsed = problem.inks === 'fewest' ? outcome.inks : used;
	const proof = certify(problem, prepared, bound, inksUsed);
	const lowerBound = proof.kind === 'not-proved' ? outcome.lowerBound : inksUsed;
	return {
		status: 'coloured',
		inksUsed,
		colouring,
		lowerBound,
		proof,
		...(changes && { changes }),
		...(objective !== undefined && { objective }),
	};
}

function undecided(problem: ColouringProblem, lowerBound: number): ColouringResult {
	const message = problem.cancelled?.()
		? 'The run was stopped before a colouring was found.'
		: 'Within this effort neither a colouring was found nor shown to be impossible.';
	return { status: 'undecided', lowerBound, message };
}
