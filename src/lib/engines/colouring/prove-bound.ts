import { smallestLastOrder } from '../graph/smallest-last.ts';
import { structuralBound } from './bounds.ts';
import { certify } from './certify.ts';
import { checkProof } from './check-proof.ts';
import { effortOf } from './effort.ts';
import { prepare } from './prepare.ts';
import type { ColouringProblem, Proof } from './problem.ts';

/**
 * The proof that no colouring of a problem has fewer than `inks` inks, whether or not so many do;
 * `not-proved` when none was found within the effort. The problem is without faults.
 */
export function proveBound(problem: ColouringProblem, inks: number): Proof {
	const prepared = prepare(problem);
	if (prepared.clash) return { kind: 'not-proved', regions: [] };
	const { order } = smallestLastOrder(prepared.graph);
	const steps = effortOf(problem).boundSteps;
	const bound = structuralBound(prepared.graph, order, { enough: inks, steps });
	return certify(problem, prepared, bound, inks);
}

/** What is wrong with such a proof, in plain sentences. */
export function checkBound(problem: ColouringProblem, inks: number, proof: Proof): string[] {
	if (proof.kind === 'not-proved') return ['There is no proof.'];
	const claim = { inksUsed: inks, lowerBound: inks, colouring: new Int32Array(0), proof };
	return checkProof(problem, { status: 'coloured', ...claim });
}
