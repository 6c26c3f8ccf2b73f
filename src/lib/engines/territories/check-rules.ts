import {
	companionsOf,
	spread,
	sumOver,
	targetsOf,
	tiesOf,
	tolerated,
	withinReach,
} from './check-facts.ts';
import type { TerritoryProblem } from './problem.ts';

/**
 * The rules of the problem that an assignment breaks, in plain sentences (units as #12, territories as
 * @3); empty when it keeps them all. `tolerances: false` leaves the tolerances out.
 */
export function ruleFaults(
	problem: TerritoryProblem,
	assignment: ArrayLike<number>,
	{ tolerances = true } = {},
): string[] {
	const k = problem.territories.length;
	const wrong = Array.from(assignment).findIndex((t) => !(Number.isInteger(t) && t >= 0 && t < k));
	if (assignment.length !== problem.graph.count) return ['Not every unit has a territory.'];
	if (wrong >= 0) return [`#${wrong} has no territory of the problem.`];
	const members: number[][] = problem.territories.map(() => []);
	for (let u = 0; u < assignment.length; u++) members[assignment[u]].push(u);
	return [
		...territoryFaults(problem, assignment, members),
		...unitFaults(problem, assignment),
		...pairFaults(problem, assignment),
		...(tolerances ? toleranceFaults(problem, members) : []),
	];
}

function territoryFaults(
	problem: TerritoryProblem,
	assignment: ArrayLike<number>,
	members: number[][],
): string[] {
	return problem.territories.flatMap(({ closing, base }, t) => {
		const units = members[t];
		if (closing) return units.length > 0 ? [`@${t} closes but has #${units[0]}.`] : [];
		if (units.length === 0) return [`@${t} stays but has no unit.`];
		if (base >= 0 && assignment[base] !== t) return [`@${t} has lost its base #${base}.`];
		const whole = spread(problem, base >= 0 ? base : units[0], (u) => assignment[u] === t);
		const loose = units.find((u) => !whole.has(u));
		return loose === undefined ? [] : [`@${t} is torn: #${loose} is not joined to the rest.`];
	});
}

function unitFaults(problem: TerritoryProblem, assignment: ArrayLike<number>): string[] {
	const { today, territories, locks } = problem;
	const within = withinReach(problem);
	const ties = within ? tiesOf(problem, companionsOf(problem)) : [];
	const faults: string[] = [];
	for (let u = 0; u < assignment.length; u++) {
		const [from, to] = [today[u], assignment[u]];
		if (locks && locks[u] >= 0 && locks[u] !== to)
			faults.push(`#${u} has left its lock @${locks[u]}.`);
		if (from === to) continue;
		if (from >= 0 && territories[from].frozen) faults.push(`#${u} has left frozen @${from}.`);
		if (territories[to].frozen) faults.push(`#${u} has joined frozen @${to}.`);
		if (from < 0 || !within || within[from].has(to)) continue;
		if (ties[u].size > 0) continue;
		faults.push(`#${u} went from @${from} to @${to}, beyond ${problem.reach} steps.`);
	}
	return faults;
}

function pairFaults(
	{ together, apart }: TerritoryProblem,
	assignment: ArrayLike<number>,
): string[] {
	const faults: string[] = [];
	for (const [a, b] of together ?? []) {
		if (assignment[a] !== assignment[b]) faults.push(`#${a} and #${b} are not together.`);
	}
	for (const [a, b] of apart ?? []) {
		if (assignment[a] === assignment[b]) faults.push(`#${a} and #${b} are not apart.`);
	}
	return faults;
}

function toleranceFaults(problem: TerritoryProblem, members: number[][]): string[] {
	return problem.measures.flatMap(({ name, values, tolerance }, m) => {
		if (tolerance === null) return [];
		const targets = targetsOf(problem, m);
		return members.flatMap((units, t) => {
			if (problem.territories[t].closing) return [];
			const deviation = (sumOver(values, units) - targets[t]) / targets[t];
			if (Math.abs(deviation) <= tolerance + tolerated * (1 + 1e-3)) return [];
			return [`@${t} is ${(deviation * 100).toFixed(2)} % from its target of ${name}.`];
		});
	});
}
