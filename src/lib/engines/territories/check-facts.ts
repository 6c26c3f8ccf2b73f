import type { TerritoryProblem } from './problem.ts';

/**
 * What the checkers work out for themselves from a problem. Nothing here is shared with what prepares,
 * searches or proves.
 */

export const tolerated = 1e-9;

export function neighboursOf({ graph }: TerritoryProblem, unit: number): number[] {
	return Array.from(graph.targets.subarray(graph.offsets[unit], graph.offsets[unit + 1]));
}

/** Targets of a measure by territory, NaN for those that close. */
export function targetsOf({ measures, territories }: TerritoryProblem, measure: number): number[] {
	let total = 0;
	for (const value of measures[measure].values) total += value;
	let capacities = 0;
	for (const t of territories) if (!t.closing) capacities += t.capacity;
	return territories.map((t) => (t.closing ? NaN : (total * t.capacity) / capacities));
}

/** Everything reached from `start` by stepping to neighbours that pass. */
export function spread(
	problem: TerritoryProblem,
	start: number,
	passes: (unit: number) => boolean,
): Set<number> {
	const reached = new Set<number>([start]);
	const waiting = [start];
	while (waiting.length > 0) {
		const unit = waiting.pop() as number;
		for (const other of neighboursOf(problem, unit)) {
			if (reached.has(other) || !passes(other)) continue;
			reached.add(other);
			waiting.push(other);
		}
	}
	return reached;
}

/** A unit's companions: all that must end where it ends, itself included. */
export function companionsOf({ together, graph }: TerritoryProblem): number[][] {
	const group: number[][] = Array.from({ length: graph.count }, (_, u) => [u]);
	for (const [a, b] of together ?? []) {
		if (group[a] === group[b]) continue;
		const [small, large] =
			group[a].length < group[b].length ? [group[a], group[b]] : [group[b], group[a]];
		for (const u of small) {
			large.push(u);
			group[u] = large;
		}
	}
	return group;
}

/**
 * For each unit the territories to which rules tie it or one of its companions: lock, base, frozen.
 * Companions share one set; it has several members when rules contradict each other.
 */
export function tiesOf(problem: TerritoryProblem, companions: number[][]): Set<number>[] {
	const { territories, locks, today } = problem;
	const shared = new Map<number[], Set<number>>();
	for (const group of companions) if (!shared.has(group)) shared.set(group, new Set());
	const ties = companions.map((group) => shared.get(group) as Set<number>);
	locks?.forEach((t, u) => t >= 0 && ties[u].add(t));
	today.forEach((t, u) => t >= 0 && territories[t].frozen && ties[u].add(t));
	territories.forEach(({ base, closing }, t) => {
		if (base >= 0 && !closing) ties[base].add(t);
	});
	return ties;
}

/** Territories within `reach` steps of each on today's map; null without such a rule. */
export function withinReach(problem: TerritoryProblem): Set<number>[] | null {
	const { reach, territories, today, graph } = problem;
	if (reach === null) return null;
	const holders: Set<number>[] = Array.from({ length: graph.count }, () => new Set());
	today.forEach((t, u) => t >= 0 && holders[u].add(t));
	territories.forEach((t, number) => {
		if (!t.closing && t.base >= 0) holders[t.base].add(number);
	});
	const beside: Set<number>[] = territories.map((_, number) => new Set([number]));
	for (let u = 0; u < graph.count; u++) {
		for (const other of [u, ...neighboursOf(problem, u)]) {
			for (const a of holders[u]) for (const b of holders[other]) beside[a].add(b);
		}
	}
	let within = territories.map((_, number) => new Set([number]));
	for (let step = 0; step < Math.min(reach, territories.length); step++) {
		within = within.map((near) => new Set([...near].flatMap((t) => [...beside[t]])));
	}
	return within;
}

/** For every unit, whether it may end in a territory by the rules on it and its companions. */
export function mayEnd(problem: TerritoryProblem): (unit: number, territory: number) => boolean {
	const { territories, today } = problem;
	const companions = companionsOf(problem);
	const within = withinReach(problem);
	const ties = tiesOf(problem, companions);
	return (unit, t) => {
		const { closing, frozen } = territories[t];
		const group = companions[unit];
		if (closing || (frozen && group.some((u) => today[u] !== t))) return false;
		if (ties[unit].size > 0) return ties[unit].size === 1 && ties[unit].has(t);
		return group.every((u) => today[u] < 0 || !within || within[today[u]].has(t));
	};
}

export const sumOver = (values: Float64Array, units: Iterable<number>) => {
	let sum = 0;
	for (const u of units) sum += values[u];
	return sum;
};
