import {
	companionsOf,
	mayEnd,
	neighboursOf,
	sumOver,
	targetsOf,
	tiesOf,
	tolerated,
} from './check-facts.ts';
import type { TerritoryProblem } from './problem.ts';

/**
 * Whether a set of units cannot be shared among the open territories: it is closed (no neighbour outside
 * but frozen ones), so every territory lives wholly inside or outside, and no choice of those that can
 * live inside suits its units and its load.
 */
export function islandHolds(problem: TerritoryProblem, units: number[]): boolean {
	const inside = new Set(units);
	const frozen = (u: number) =>
		problem.today[u] >= 0 && problem.territories[problem.today[u]].frozen;
	if (units.length === 0 || units.some(frozen)) return false;
	const leaks = units.some((u) =>
		neighboursOf(problem, u).some((v) => !inside.has(v) && !frozen(v)),
	);
	if (leaks) return false;
	const { must, can } = dwellers(problem, inside);
	if (must.length > units.length) return true;
	if (must.length === 0 && pieces(problem, inside) > can.length) return true;
	return pieces(problem, inside) === 1 && !someChoice(problem, units, must, can);
}

/** Territories tied to a unit inside, and those tied to no unit at all that may take one inside. */
function dwellers(problem: TerritoryProblem, inside: Set<number>) {
	const may = mayEnd(problem);
	const tied: number[][] = problem.territories.map(() => []);
	tiesOf(problem, companionsOf(problem)).forEach((own, u) => own.forEach((t) => tied[t].push(u)));
	const must: number[] = [];
	const can: number[] = [];
	problem.territories.forEach(({ closing, frozen }, t) => {
		if (closing || frozen) return;
		if (tied[t].some((u) => inside.has(u))) must.push(t);
		else if (tied[t].length === 0 && [...inside].some((u) => may(u, t))) can.push(t);
	});
	return { must, can };
}

function pieces(problem: TerritoryProblem, inside: Set<number>): number {
	const left = new Set(inside);
	let count = 0;
	while (left.size > 0) {
		const [first] = left;
		const waiting = [first];
		left.delete(first);
		count++;
		for (let unit = waiting.pop(); unit !== undefined; unit = waiting.pop()) {
			for (const v of neighboursOf(problem, unit)) if (left.delete(v)) waiting.push(v);
		}
	}
	return count;
}

interface Need {
	load: number;
	tolerance: number;
	targets: number[];
}

function someChoice(
	problem: TerritoryProblem,
	units: number[],
	must: number[],
	can: number[],
): boolean {
	const needs: Need[] = problem.measures.flatMap(({ values, tolerance }, m) =>
		tolerance === null
			? []
			: [{ load: sumOver(values, units), tolerance, targets: targetsOf(problem, m) }],
	);
	const most = units.length - must.length;
	if (can.length > 14) return someNumber(problem, needs, must, can, most);
	const grow = (at: number, chosen: number[]): boolean => {
		if (chosen.length > units.length) return false;
		if (at < can.length) return grow(at + 1, chosen) || grow(at + 1, [...chosen, can[at]]);
		return chosen.length > 0 && needs.every((need) => suits(need, targetSum(need, chosen)));
	};
	return grow(0, must);
}

const targetSum = ({ targets }: Need, chosen: number[]) =>
	chosen.reduce((sum, t) => sum + targets[t], 0);

const suits = ({ load, tolerance }: Need, target: number) =>
	Math.abs(load - target) <= target * (tolerance + tolerated * 1.001);

/** Like every choice, but generous: for each number of guests the reach from its least to its greatest. */
function someNumber(
	{ territories }: TerritoryProblem,
	needs: Need[],
	must: number[],
	can: number[],
	most: number,
): boolean {
	const bySize = [...can].sort((a, b) => territories[b].capacity - territories[a].capacity);
	for (let n = must.length > 0 ? 0 : 1; n <= Math.min(most, can.length); n++) {
		const large = [...must, ...bySize.slice(0, n)];
		const small = [...must, ...bySize.slice(can.length - n)];
		const fits = needs.every((need) => {
			const low = targetSum(need, small) * (1 - need.tolerance - tolerated * 1.001);
			const high = targetSum(need, large) * (1 + need.tolerance + tolerated * 1.001);
			return need.load >= low && need.load <= high;
		});
		if (fits) return true;
	}
	return false;
}
