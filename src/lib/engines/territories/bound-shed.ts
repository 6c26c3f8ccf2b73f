import type { BoundTerms } from './bound-terms.ts';
import type { Prepared } from './prepare.ts';

/**
 * What the territories over their limit must shed at least: in each the cheapest way to lose the excess,
 * units in part allowed, the worst measure counted. Sheds of different territories are different moves,
 * so they add up, on top of the moves that are certain. Linear time, apart from sorting.
 */
export function shedBound(prepared: Prepared, { certain, certainCost, step }: BoundTerms): number {
	const { problem, units, territories, fixed } = prepared;
	const staying: number[][] = Array.from({ length: territories }, () => []);
	for (let unit = 0; unit < units; unit++) {
		if (!certain[unit]) staying[problem.today[unit]].push(unit);
	}
	let bound = certainCost;
	for (let t = 0; t < territories; t++) {
		const loose = staying[t].filter((unit) => fixed[unit] < 0);
		let most = 0;
		prepared.bound.forEach((_, m) => {
			const load = (unit: number) => prepared.loads[m * units + unit];
			const total = staying[t].reduce((sum, unit) => sum + load(unit), 0);
			const excess = total - prepared.greatest[m * territories + t];
			if (prepared.stays[t]) most = Math.max(most, cheapest(prepared, loose, load, excess));
		});
		bound += step > 0 ? Math.ceil(most / step - 1e-9) * step : most;
	}
	return bound;
}

function cheapest(
	{ cost }: Prepared,
	loose: number[],
	load: (unit: number) => number,
	excess: number,
): number {
	if (!(excess > 0)) return 0;
	const order = loose
		.filter((unit) => load(unit) > 0)
		.sort((a, b) => cost[a] * load(b) - cost[b] * load(a) || a - b);
	let spent = 0;
	for (const unit of order) {
		const part = Math.min(1, excess / load(unit));
		spent += part * cost[unit];
		excess -= load(unit);
		if (excess <= 0) break;
	}
	return spent;
}
