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

/** nodes and simplex iterations for whole numbers, and units up to which they are tried */
const budgets = {
	quick: { iterations: 0, columns: 0 },
	normal: { iterations: 60_000, columns: 60_000 },
	thorough: { iterations: 600_000, columns: 200_000 },
};

/**
 * A number that no plan costs less than. The best of: what territories over their limit must shed
 * (milliseconds); prices of the program of every plan's moves without whole numbers (seconds at 33,000
 * units; weak duality, checked apart from the solver); the same program in whole numbers, where effort
 * allows. Ends early when `incumbentCost` is met: that plan is then the cheapest there is.
 */
export async function lowerBound(
	prepared: Prepared,
	{ incumbentCost = Infinity, watch = {} }: { incumbentCost?: number; watch?: Watch } = {},
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
	const { program } = boundProgram(prepared, terms, prepared.units > 10_000 ? 2 : 3);
	const { iterations, columns } = budgets[prepared.problem.effort];
	const { cancelled } = watch;
	watch.progress?.('Finding the fewest moves any plan needs', 0.3);
	const relaxed = { ...program, integer: new Uint8Array(program.columns) };
	const priced = await solveProgram(relaxed, { cancelled, iterations: 2_000_000 });
	if (priced.status !== 'optimal' && priced.status !== 'limit') return best;
	const total = (bound: number) => lifted(bound + terms.certainCost, terms.step);
	if (raise(total(priced.bound), 'prices') || program.columns > columns) return best;
	if (watch.cancelled?.()) return best;
	watch.progress?.('Finding the fewest moves any plan needs', 0.6);
	const whole = await solveProgram(program, { cancelled, iterations, nodes: 10_000 });
	if (whole.status === 'optimal' || whole.status === 'limit') {
		raise(total(whole.bound), 'an integer program');
	}
	return best;
}
