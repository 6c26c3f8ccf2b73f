import { Sat } from '../solver/sat.ts';
import { checkParting } from './check-parting.ts';
import { PartingClauses } from './part-inks-clauses.ts';
import { problemFaults } from './faults.ts';
import type { ColouringProblem, Rule } from './problem.ts';

export interface PartingQuestion {
	/** the rules to keep: locks, forbidden and reserved inks, alike and apart; its goal is passed over */
	problem: ColouringProblem;
	/** pairs of inks that may not lie on two sides of a border */
	unsafe: readonly (readonly [number, number])[];
	/** how many inks there are: those of the palette */
	inks: number;
	/** the colouring to stay near to, -1 where a region has none */
	from: Int32Array;
	/** most conflicts of the solver in all, 200,000 when absent */
	conflicts?: number;
}

export type Parting =
	| {
			status: 'parted';
			colouring: Int32Array;
			/** highest ink used + 1 */
			inksUsed: number;
			/** regions whose ink is another than in `from` */
			changes: number;
	  }
	| {
			status: 'impossible';
			/** locked regions that force it: with any one of them free, and the same rules, it could be done */
			locks: number[];
			/** rules that force it, in the same sense; both empty: the borders alone, with so many inks */
			rules: Rule[];
			inks: number;
			/** the smallest larger number of inks, up to two more, that would do; null when unknown or none */
			inksThatWouldDo: number | null;
	  }
	| { status: 'undecided'; message: string };

/** Regions times inks that are put to the solver. */
const largest = 400_000;
const usualConflicts = 200_000;

/**
 * Another colouring of the same map in which unsafe inks never touch: every rule of the problem kept, no
 * more inks than there are, the fewest that will do from the number in use now on.
 *
 * Guarantee: `parted` only when `checkParting`, which shares no code with this, finds no fault. `impossible`
 * is certain for `inks` inks; `locks` and `rules` together force it, and none of them can be spared unless
 * the effort ran out. Deterministic; the effort is counted in conflicts.
 * Throws a RangeError when the problem is not well formed.
 * Method: satisfiability, one variable a region and ink; a clause for each border and order of an unsafe
 * pair; what is refused is narrowed to a core by leaving out one after the other.
 */
export function partInks(question: PartingQuestion): Parting {
	const [fault] = problemFaults(question.problem);
	if (fault) throw new RangeError(fault);
	const { problem, from } = question;
	const cap = problem.inks === 'fewest' ? question.inks : Math.min(question.inks, problem.inks);
	if (problem.regions * cap > largest)
		return { status: 'undecided', message: 'The map is too large for this question.' };
	const purse = { left: question.conflicts ?? usualConflicts };
	const now = from.reduce((most, ink) => Math.max(most, ink + 1), 1);
	for (let inks = Math.min(now, cap); inks <= cap; inks++) {
		const clauses = new PartingClauses(question, inks);
		const answer = ask(clauses, clauses.all(), purse);
		if (answer === 'sat') return parted(question, clauses.colouring());
		if (answer === 'unknown') return undecided;
		if (inks === cap) return impossible(question, clauses, purse);
	}
	return undecided;
}

const undecided: Parting = {
	status: 'undecided',
	message: 'Neither such a colouring nor a reason against it was found within the effort.',
};

interface Purse {
	left: number;
}

function ask(
	clauses: PartingClauses,
	held: readonly number[],
	purse: Purse,
): ReturnType<Sat['solve']> {
	const before = clauses.sat.conflicts;
	const answer = clauses.solve(held, { conflicts: Math.max(1, purse.left) });
	purse.left -= clauses.sat.conflicts - before;
	return answer;
}

function parted(question: PartingQuestion, colouring: Int32Array): Parting {
	const faults = checkParting(question, colouring);
	if (faults.length) throw new Error(`a colouring that parts inks has faults: ${faults[0]}`);
	const changes = colouring.reduce((sum, ink, r) => sum + Number(ink !== question.from[r]), 0);
	const inksUsed = colouring.reduce((most, ink) => Math.max(most, ink + 1), 0);
	return { status: 'parted', colouring, inksUsed, changes };
}

function impossible(question: PartingQuestion, clauses: PartingClauses, purse: Purse): Parting {
	let core = clauses.failed();
	for (const one of core) {
		if (!core.includes(one) || purse.left <= 0) continue;
		const rest = core.filter((other) => other !== one);
		if (ask(clauses, rest, purse) === 'unsat') core = clauses.failed();
	}
	const { locks, rules } = clauses.named(core);
	const inks = clauses.inks;
	return {
		status: 'impossible',
		locks,
		rules,
		inks,
		inksThatWouldDo: moreInks(question, inks, purse),
	};
}

function moreInks(question: PartingQuestion, inks: number, purse: Purse): number | null {
	for (const more of [inks + 1, inks + 2]) {
		if (question.problem.regions * more > largest || purse.left <= 0) return null;
		const clauses = new PartingClauses(question, more);
		if (ask(clauses, clauses.all(), purse) === 'sat') return more;
	}
	return null;
}
