import { mayEndIn, type Prepared } from './prepare.ts';

/** What every bound needs: who must move whatever is done, and how far territories are. */
export interface BoundTerms {
	/** 1 for a unit that cannot stay: it has no territory, a closing one, or is tied to another */
	certain: Uint8Array;
	/** cost of those moves together */
	certainCost: number;
	/** every cost is a whole number of these; 0 when they have no common part */
	step: number;
}

export function boundTerms(prepared: Prepared): BoundTerms {
	const { problem, units, cost } = prepared;
	const certain = new Uint8Array(units);
	let certainCost = 0;
	for (let unit = 0; unit < units; unit++) {
		const from = problem.today[unit];
		if (from >= 0 && mayStay(prepared, unit, from)) continue;
		certain[unit] = 1;
		certainCost += cost[unit];
	}
	return { certain, certainCost, step: costStep(cost) };
}

function mayStay(prepared: Prepared, unit: number, from: number): boolean {
	if (prepared.problem.territories[from].frozen) return true;
	return mayEndIn(prepared, unit, from);
}

/** The largest number of which every cost is a whole multiple, where costs are whole; else 0. */
export function costStep(cost: Float64Array): number {
	let step = 0;
	for (const value of cost) {
		if (!Number.isInteger(value) || value > 2 ** 40) return 0;
		let [a, b] = [step, value];
		while (b > 0) [a, b] = [b, a % b];
		step = a;
	}
	return step;
}

/** A bound from a solver, made safe against its rounding and lifted to the next possible cost. */
export function lifted(bound: number, step: number): number {
	if (!Number.isFinite(bound)) return 0;
	const safe = bound - 1e-6 * Math.max(1, Math.abs(bound));
	return Math.max(0, step > 0 ? Math.ceil(safe / step) * step : safe);
}
