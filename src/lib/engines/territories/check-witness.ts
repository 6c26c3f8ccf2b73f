import {
	companionsOf,
	mayEnd,
	spread,
	sumOver,
	targetsOf,
	tiesOf,
	tolerated,
} from './check-facts.ts';
import { islandHolds } from './check-island.ts';
import type { Impossible, TerritoryProblem } from './problem.ts';

/**
 * Whether a witness shows by itself that a problem has no plan: plain faults, empty when it does. Reads
 * the raw problem and shares no code with what found the witness.
 *
 * A claim `no-plan` may rest on a search: when nothing about its witness settles it, it is not faulted
 * here, for nothing but another search could.
 */
export function checkWitness(problem: TerritoryProblem, { reason, witness }: Impossible): string[] {
	const { units, territories } = witness;
	const unknown =
		units.some((u) => !(u in problem.today)) ||
		territories.some((t) => !(t in problem.territories));
	if (unknown) return ['The witness names what is not in the problem.'];
	const holds = {
		'missing-value': () => isMissing(problem, units),
		'unit-too-heavy': () => isTooHeavy(problem, units),
		'lock-cut-off': () => isCutOff(problem, units, territories),
		'frozen-outside-tolerance': () => isFrozenOutside(problem, units, territories),
		'island-load': () => islandHolds(problem, units),
		'no-plan': () => true,
	}[reason];
	return holds() ? [] : [`The witness does not show ${reason}.`];
}

function isMissing({ measures }: TerritoryProblem, units: number[]): boolean {
	const usable = (value: number) => Number.isFinite(value) && value >= 0;
	const isBad = units.length > 0 && units.every((u) => measures.some((m) => !usable(m.values[u])));
	return (
		isBad ||
		measures.some(({ tolerance, values }) => {
			const total = sumOver(values, values.keys());
			return tolerance !== null && !(total > 0 && Number.isFinite(total));
		})
	);
}

/** They must end together, and wherever they may, some measure is above what the tolerance allows. */
function isTooHeavy(problem: TerritoryProblem, units: number[]): boolean {
	if (units.length === 0 || !endTogether(problem, units)) return false;
	const may = mayEnd(problem);
	return problem.territories.every((_, t) => {
		if (!units.every((u) => may(u, t))) return true;
		return problem.measures.some(({ values, tolerance }, m) => {
			if (tolerance === null) return false;
			const deviation = sumOver(values, units) / targetsOf(problem, m)[t] - 1;
			return deviation > tolerance + tolerated / 2;
		});
	});
}

function endTogether(problem: TerritoryProblem, units: number[]): boolean {
	const companions = companionsOf(problem);
	if (units.every((u) => companions[u] === companions[units[0]])) return true;
	const ties = tiesOf(problem, companions);
	const [common] = ties[units[0]];
	return common !== undefined && units.every((u) => ties[u].has(common));
}

function isFrozenOutside(
	problem: TerritoryProblem,
	units: number[],
	[territory]: number[],
): boolean {
	if (territory === undefined || !problem.territories[territory].frozen) return false;
	const own = Array.from(problem.today.keys()).filter((u) => problem.today[u] === territory);
	if (own.length !== units.length || own.some((u) => !units.includes(u))) return false;
	return problem.measures.some(({ values, tolerance }, m) => {
		const target = targetsOf(problem, m)[territory];
		return (
			tolerance !== null &&
			Math.abs(sumOver(values, own) - target) > target * (tolerance + tolerated / 2)
		);
	});
}

/** Any of the ways in which ties among the named units and territories cannot hold. */
function isCutOff(problem: TerritoryProblem, units: number[], territories: number[]): boolean {
	const may = mayEnd(problem);
	const companions = companionsOf(problem);
	const ties = tiesOf(problem, companions);
	if (units.some((u) => problem.territories.every((_, t) => !may(u, t)))) return true;
	const isApart = (problem.apart ?? []).some(([a, b]) => {
		if (!units.includes(a) || !units.includes(b)) return false;
		return companions[a] === companions[b] || [...ties[a]].some((t) => ties[b].has(t));
	});
	const isTorn = territories.some((t) => {
		const tied = units.filter((u) => ties[u].has(t));
		if (tied.length < 2) return false;
		const piece = spread(problem, tied[0], (u) => may(u, t));
		return tied.some((u) => !piece.has(u));
	});
	if (isApart || isTorn) return true;
	const roots: number[][] = problem.territories.map(() => []);
	ties.forEach((own, u) => own.forEach((t) => roots[t].push(u)));
	return units.some((u) => isBeyondAll(problem, u, roots, may));
}

/** Every territory where the unit may end is rooted in units that no chain joins to it. */
function isBeyondAll(
	problem: TerritoryProblem,
	unit: number,
	roots: number[][],
	may: (unit: number, territory: number) => boolean,
): boolean {
	return problem.territories.every((_, t) => {
		if (!may(unit, t)) return true;
		if (roots[t].length === 0) return false;
		const reached = spread(problem, unit, (u) => may(u, t));
		return roots[t].some((u) => !reached.has(u));
	});
}
