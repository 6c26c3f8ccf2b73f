import type { Prepared } from './prepare.ts';

/** What the searches ask of the problem at every step, laid out so that a question is one look-up. */
export interface SearchTerms {
	prepared: Prepared;
	/** unit -> row of `may`: its territory of today, or the number of territories for none */
	row: Int32Array;
	/** 1 where units of a row may end in territory t: `may[row * territories + t]` */
	may: Uint8Array;
	/** 1 for a unit that is free to move by itself or with its block */
	movable: Uint8Array;
	/** 1 for a unit whose block has others */
	grouped: Uint8Array;
	/** units apart from each unit, null for none; and every such pair, a < b */
	apart: (Int32Array | null)[];
	apartPairs: Int32Array;
	/** cost of moving each unit over the mean cost, so that one move costs about 1 */
	cost: Float64Array;
	/** cost of one move of the mean: `cost * costScale` is the cost of the problem */
	costScale: number;
	/** one over the mean load of a unit, for each bound measure */
	perUnit: Float64Array;
	/** for each bound measure and territory: turns (load - target) squared into moves, see `penalty` */
	curve: Float64Array;
}

/** The look-ups of `prepared`. */
export function searchTerms(prepared: Prepared): SearchTerms {
	const { problem, units, territories, fixed } = prepared;
	const row = problem.today.map((t) => (t < 0 ? territories : t));
	const costScale = meanCost(prepared);
	const grouped = new Uint8Array(units);
	const movable = new Uint8Array(units);
	for (const block of prepared.blocks) {
		const free = block.every((unit) => fixed[unit] < 0) ? 1 : 0;
		for (const unit of block) {
			movable[unit] = free;
			grouped[unit] = block.length > 1 ? 1 : 0;
		}
	}
	return {
		prepared,
		row,
		may: mayTable(prepared),
		movable,
		grouped,
		...apartTables(prepared),
		cost: prepared.cost.map((cost) => cost / costScale),
		costScale,
		...loadScales(prepared),
	};
}

function meanCost({ cost, fixed }: Prepared): number {
	let sum = 0;
	let count = 0;
	for (let unit = 0; unit < cost.length; unit++) {
		if (fixed[unit] >= 0) continue;
		sum += cost[unit];
		count++;
	}
	return sum > 0 ? sum / count : 1;
}

function mayTable({ territories, open, stays, steps, problem }: Prepared): Uint8Array {
	const may = new Uint8Array((territories + 1) * territories);
	const reach = problem.reach ?? Infinity;
	for (let from = 0; from <= territories; from++) {
		for (let to = 0; to < territories; to++) {
			if (!open[to] || !stays[to]) continue;
			const near =
				!steps || from === territories || from === to || steps[from * territories + to] <= reach;
			may[from * territories + to] = near ? 1 : 0;
		}
	}
	return may;
}

function apartTables({ units, apart }: Prepared) {
	const lists: (Int32Array | null)[] = new Array(units).fill(null);
	const pairs: number[] = [];
	for (const [unit, others] of apart) {
		lists[unit] = Int32Array.from(others);
		for (const other of others) if (unit < other) pairs.push(unit, other);
	}
	return { apart: lists, apartPairs: Int32Array.from(pairs) };
}

function loadScales({ bound, units, territories, loads, targets, greatest }: Prepared) {
	const perUnit = new Float64Array(bound.length);
	const curve = new Float64Array(bound.length * territories);
	for (let m = 0; m < bound.length; m++) {
		let total = 0;
		for (let unit = 0; unit < units; unit++) total += loads[m * units + unit];
		perUnit[m] = total > 0 ? units / total : 0;
		for (let t = 0; t < territories; t++) {
			const at = m * territories + t;
			const band = Math.max(greatest[at] - targets[at], 1 / (perUnit[m] || 1));
			curve[at] = perUnit[m] / band;
		}
	}
	return { perUnit, curve };
}
