import type { Prepared } from './prepare.ts';
import type { Move, Plan } from './problem.ts';
import { cutBorders } from './territory-graph.ts';

/**
 * An assignment written out as a plan: its moves against today by unit, what they cost, deviations (NaN
 * for territories that close and for a measure that is 0 everywhere) and cut borders. Whether it keeps
 * the rules is for `checkPlan` to say.
 */
export function planFrom(prepared: Prepared, assignment: Int32Array): Plan {
	const { problem, graph, compulsory, cost } = prepared;
	const moves: Move[] = [];
	let total = 0;
	let owed = 0;
	assignment.forEach((to, unit) => {
		const from = problem.today[unit];
		if (from === to) return;
		moves.push({ unit, from, to, compulsory: compulsory[unit] === 1 });
		total += cost[unit];
		if (compulsory[unit]) owed += cost[unit];
	});
	return {
		assignment: assignment.slice(),
		moves,
		cost: total,
		compulsoryCost: owed,
		deviations: problem.measures.map(({ values }) => deviationsOf(prepared, values, assignment)),
		cutBorders: {
			before: cutBorders(graph, problem.today),
			after: cutBorders(graph, assignment),
		},
	};
}

function deviationsOf(
	{ problem, territories }: Prepared,
	values: Float64Array,
	assignment: Int32Array,
): Float64Array {
	const load = new Float64Array(territories);
	let total = 0;
	values.forEach((value, u) => {
		load[assignment[u]] += value;
		total += value;
	});
	const full = problem.territories.reduce((sum, t) => sum + (t.closing ? 0 : t.capacity), 0);
	return load.map((own, t) => {
		const { closing, capacity } = problem.territories[t];
		const target = (capacity / full) * total;
		return closing || total === 0 ? NaN : (own - target) / target;
	});
}
