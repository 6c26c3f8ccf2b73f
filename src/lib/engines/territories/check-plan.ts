import { spread, sumOver, targetsOf } from './check-facts.ts';
import { ruleFaults } from './check-rules.ts';
import type { Move, Plan, Proposed, TerritoryProblem } from './problem.ts';

/**
 * Everything that is wrong with a plan, in plain sentences (at most 50); empty when it holds. Shares no
 * code with what makes plans: it reads the problem's own lists, recomputes every number and compares.
 * For the best plan of an undecided answer ask with `tolerances: false`.
 */
export function checkPlan(
	problem: TerritoryProblem,
	plan: Plan | Proposed,
	options: { tolerances?: boolean } = {},
): string[] {
	const faults = ruleFaults(problem, plan.assignment, options);
	if (plan.assignment.length !== problem.graph.count) return faults;
	const torn = tornToday(problem);
	return [
		...faults,
		...moveFaults(problem, plan, torn),
		...costFaults(problem, plan, torn),
		...deviationFaults(problem, plan),
		...cutFaults(problem, plan),
		...boundFaults(plan),
	].slice(0, 50);
}

function moveFaults(
	problem: TerritoryProblem,
	{ assignment, moves }: Plan,
	torn: Set<number>,
): string[] {
	const faults: string[] = [];
	const told = new Map<number, Move>();
	for (const move of moves) {
		if (told.has(move.unit)) faults.push(`The move of #${move.unit} is listed twice.`);
		told.set(move.unit, move);
	}
	problem.today.forEach((from, u) => {
		const move = told.get(u);
		const to = assignment[u];
		if (from === to) {
			if (move) faults.push(`#${u} is listed as moved but stays in @${to}.`);
			return;
		}
		if (!move) faults.push(`#${u} goes from @${from} to @${to} but is not listed.`);
		else if (move.from !== from || move.to !== to)
			faults.push(`The move of #${u} is not as listed.`);
		else if (move.compulsory !== isCompulsory(problem, torn, u)) {
			faults.push(`The move of #${u} is ${move.compulsory ? 'not ' : ''}compulsory.`);
		}
	});
	if (told.size > 0 && moves.some((m) => problem.today[m.unit] === undefined)) {
		faults.push('A move is of no unit of the problem.');
	}
	return faults;
}

function isCompulsory({ today, territories }: TerritoryProblem, torn: Set<number>, unit: number) {
	return today[unit] < 0 || territories[today[unit]].closing || torn.has(unit);
}

/** Units outside the rooted part of their territory today. */
function tornToday(problem: TerritoryProblem): Set<number> {
	const { today, territories, measures } = problem;
	const weights = measures.find(({ tolerance }) => tolerance !== null)?.values;
	const torn = new Set<number>();
	const members = territories.map(() => new Set<number>());
	today.forEach((t, u) => t >= 0 && members[t].add(u));
	territories.forEach(({ base }, t) => {
		const left = members[t];
		if (base >= 0) {
			const rooted = spread(problem, base, (u) => today[u] === t);
			for (const u of left) if (!rooted.has(u)) torn.add(u);
			return;
		}
		const parts: number[][] = [];
		while (left.size > 0) {
			const [first] = left;
			const part = [...spread(problem, first, (u) => today[u] === t)].sort((a, b) => a - b);
			for (const u of part) left.delete(u);
			parts.push(part);
		}
		const weight = (part: number[]) => (weights ? sumOver(weights, part) : part.length);
		parts.sort((p, q) => weight(q) - weight(p) || q.length - p.length || p[0] - q[0]);
		for (const part of parts.slice(1)) for (const u of part) torn.add(u);
	});
	return torn;
}

const differ = (a: number, b: number) =>
	!(Math.abs(a - b) <= 1e-7 * Math.max(1, Math.abs(a), Math.abs(b)));

function costFaults(problem: TerritoryProblem, plan: Plan, torn: Set<number>): string[] {
	let [cost, compulsory] = [0, 0];
	problem.today.forEach((from, u) => {
		if (from === plan.assignment[u]) return;
		const own = problem.cost ? problem.cost[u] : 1;
		cost += own;
		if (isCompulsory(problem, torn, u)) compulsory += own;
	});
	const faults: string[] = [];
	if (differ(cost, plan.cost)) faults.push(`The moves cost ${cost}, not ${plan.cost}.`);
	if (differ(compulsory, plan.compulsoryCost)) {
		faults.push(`Compulsory moves cost ${compulsory}, not ${plan.compulsoryCost}.`);
	}
	return faults;
}

function deviationFaults(problem: TerritoryProblem, { assignment, deviations }: Plan): string[] {
	if (deviations.length !== problem.measures.length)
		return ['Deviations of a measure are missing.'];
	return problem.measures.flatMap(({ name, values }, m) => {
		const loads = problem.territories.map(() => 0);
		values.forEach((value, u) => (loads[assignment[u]] += value));
		return targetsOf(problem, m).flatMap((target, t) => {
			const deviation = (loads[t] - target) / target;
			const given = deviations[m][t];
			if (Number.isNaN(deviation) ? Number.isNaN(given) : !differ(deviation, given)) return [];
			return [`The deviation of @${t} for ${name} is ${deviation}, not ${given}.`];
		});
	});
}

function cutFaults({ graph, today }: TerritoryProblem, { assignment, cutBorders }: Plan): string[] {
	const cut = { before: 0, after: 0 };
	for (let u = 0; u < graph.count; u++) {
		for (const v of graph.targets.subarray(graph.offsets[u], graph.offsets[u + 1])) {
			if (v < u) continue;
			if (today[u] >= 0 && today[v] >= 0 && today[u] !== today[v]) cut.before++;
			if (assignment[u] !== assignment[v]) cut.after++;
		}
	}
	return (['before', 'after'] as const).flatMap((when) =>
		cut[when] === cutBorders[when]
			? []
			: [`${cut[when]} borders cut ${when}, not ${cutBorders[when]}.`],
	);
}

function boundFaults(plan: Plan | Proposed): string[] {
	if (!('lowerBound' in plan)) return [];
	const { lowerBound, cost, proved } = plan;
	const room = 1e-6 * Math.max(1, cost);
	if (!(lowerBound <= cost + room)) return [`The bound ${lowerBound} is above the cost ${cost}.`];
	if (proved && lowerBound < cost - room) {
		return [`The cost ${cost} is said to be proved, but the bound is ${lowerBound}.`];
	}
	return [];
}
