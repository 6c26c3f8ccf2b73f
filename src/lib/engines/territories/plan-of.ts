import { prepare } from './prepared.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible, Move, Plan, TerritoryProblem } from './problem.ts';

/**
 * What follows from an assignment, as proposals state it; used for found plans and those made by hand.
 * Nothing is judged here: `checkPlan` tells whether the rules are kept.
 *
 * @param assignment territory of every unit, never -1
 * @returns Impossible where the problem itself cannot be prepared (a missing value, nobody stays)
 */
export function planOf(problem: TerritoryProblem, assignment: Int32Array): Plan | Impossible {
	const prepared = prepare(problem);
	return 'status' in prepared ? prepared : planFrom(prepared, assignment);
}

/** The same for a prepared problem. Linear time. */
export function planFrom(prepared: Prepared, assignment: Int32Array): Plan {
	const moves = movesOf(prepared, assignment);
	const costOf = (list: Move[]) => list.reduce((sum, { unit }) => sum + prepared.cost[unit], 0);
	return {
		assignment,
		moves,
		cost: costOf(moves),
		compulsoryCost: costOf(moves.filter(({ compulsory }) => compulsory)),
		deviations: deviationsOf(prepared, assignment),
		cutBorders: cutBordersOf(prepared, assignment),
	};
}

function movesOf({ problem, compulsory }: Prepared, assignment: Int32Array): Move[] {
	const moves: Move[] = [];
	assignment.forEach((to, unit) => {
		const from = problem.today[unit];
		if (from !== to) moves.push({ unit, from, to, compulsory: compulsory[unit] === 1 });
	});
	return moves;
}

/** For every measure, those without a tolerance too. */
function deviationsOf({ problem }: Prepared, assignment: Int32Array): Float64Array[] {
	const { measures, territories } = problem;
	const staying = territories.reduce((sum, t) => sum + (t.closing ? 0 : t.capacity), 0);
	return measures.map(({ values }) => {
		const loads = new Float64Array(territories.length);
		let total = 0;
		assignment.forEach((t, unit) => {
			loads[t] += values[unit];
			total += values[unit];
		});
		return loads.map((load, t) => {
			const { closing, capacity } = territories[t];
			if (closing) return NaN;
			const target = (capacity / staying) * total;
			return (load - target) / target;
		});
	});
}

function cutBordersOf({ problem, graph }: Prepared, assignment: Int32Array) {
	const { today } = problem;
	const cut = { before: 0, after: 0 };
	for (let unit = 0; unit < graph.count; unit++) {
		for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
			const other = graph.targets[i];
			if (other < unit) continue;
			if (today[unit] >= 0 && today[other] >= 0 && today[unit] !== today[other]) cut.before++;
			if (assignment[unit] !== assignment[other]) cut.after++;
		}
	}
	return cut;
}
