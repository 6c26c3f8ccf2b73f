import { solveProgram } from '../solver/program.ts';
import { boundProgram } from './bound-program.ts';
import { shedBound } from './bound-shed.ts';
import { boundTerms, lifted } from './bound-terms.ts';
import type { Prepared } from './prepare.ts';
import type { Watch } from './problem.ts';

export interface LowerBound {
	/** no plan that keeps the rules costs less, compulsory moves included */
	value: number;
	/** how it was found, in words that can follow "by" */
	how: string;
}

export interface BoundOptions {
	/** cost of a plan that is known: no bound is claimed above it, and meeting it ends the work */
	incumbentCost?: number;
	/** how many rings of units round a territory are followed one by one; by size and effort unless given */
	rings?: 1 | 2 | 3;
	watch?: Watch;
}

/**
 * How deep a territory's gains are followed unit by unit, and simplex iterations and columns up to which
 * whole numbers are tried. Fewer rings give smaller programs, whose bound rises sooner.
 */
interface Budget {
	rings: number;
	iterations: number;
	columns: number;
}
const largeUnits = 10_000;
const budgets: Record<'quick' | 'normal' | 'thorough', { usual: Budget; large: Budget }> = {
	quick: {
		usual: { rings: 2, iterations: 4_000, columns: 20_000 },
		large: { rings: 1, iterations: 0, columns: 0 },
	},
	normal: {
		usual: { rings: 2, iterations: 20_000, columns: 60_000 },
		large: { rings: 1, iterations: 12_000, columns: 90_000 },
	},
	thorough: {
		usual: { rings: 3, iterations: 600_000, columns: 200_000 },
		large: { rings: 2, iterations: 60_000, columns: 200_000 },
	},
};

/**
 * A number that no plan costs less than. The best of: what territories over their limit must shed
 * (milliseconds); prices of the program of every plan's moves without whole numbers (seconds at 33,000
 * units; weak duality, checked apart from the solver); the same program in whole numbers, where effort
 * allows. Ends early when `incumbentCost` is met: that plan is then the cheapest there is.
 */
export async function lowerBound(
	prepared: Prepared,
	{ incumbentCost = Infinity, rings, watch = {} }: BoundOptions = {},
): Promise<LowerBound> {
	const terms = boundTerms(prepared);
	let best: LowerBound = { value: shedBound(prepared, terms), how: 'what must be shed' };
	const raise = (value: number, how: string) => {
		if (value > best.value) best = { value, how };
		// no claim above a plan that exists: rounding, not proof
		if (best.value > incumbentCost) best = { ...best, value: incumbentCost };
		return best.value >= incumbentCost - 1e-9;
	};
	if (raise(best.value, best.how) || watch.cancelled?.()) return best;
	const { usual, large } = budgets[prepared.problem.effort];
	const budget = prepared.units > largeUnits ? large : usual;
	const { program } = boundProgram(prepared, terms, rings ?? budget.rings);
	const { cancelled } = watch;
	watch.progress?.('Finding the fewest moves any plan needs', 0.3);
	const relaxed = { ...program, integer: new Uint8Array(program.columns) };
	const priced = await solveProgram(relaxed, { cancelled, iterations: 2_000_000 });
	if (priced.status !== 'optimal' && priced.status !== 'limit') return best;
	const total = (bound: number) => lifted(bound + terms.certainCost, terms.step);
	if (raise(total(priced.bound), 'prices') || program.columns > budget.columns) return best;
	if (watch.cancelled?.()) return best;
	watch.progress?.('Finding the fewest moves any plan needs', 0.6);
	const { iterations } = budget;
	const whole = await solveProgram(program, { cancelled, iterations, nodes: 10_000 });
	if (whole.status === 'optimal' || whole.status === 'limit') {
		raise(total(whole.bound), 'an integer program');
	}
	return best;
}
