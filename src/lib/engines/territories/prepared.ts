import { blocksOf } from './blocks.ts';
import { missingValues } from './missing-values.ts';
import { slack, type Prepared } from './prepare.ts';
import type { Impossible, TerritoryProblem } from './problem.ts';
import { todaySteps } from './today-steps.ts';
import { tornParts } from './torn-parts.ts';
import { costsOf, validate } from './validate.ts';

/**
 * What follows from a problem at once. Linear time, apart from the steps of the reach rule (territories
 * squared).
 *
 * - A territory that closes binds nothing: its base is free and it has no target.
 * - `fixed` reaches over `together`: a unit tied to a fixed one is fixed too. Where rules contradict each
 *   other (frozen before base before lock) `preCheck` tells.
 * - `open` is 0 for frozen and for closing territories.
 * - Which part of a torn territory counts as torn off: `tornParts`, by the load of the first measure with
 *   a tolerance.
 *
 * @returns Impossible `missing-value` when a measure has no usable value somewhere, `no-plan` when no
 * territory stays
 * @throws RangeError for a programmer's error: see `validate`
 */
export function prepare(problem: TerritoryProblem): Prepared | Impossible {
	validate(problem);
	const { graph, territories } = problem;
	const fault = missingValues(problem) ?? nobodyStays(problem);
	if (fault) return fault;
	const bound = problem.measures.flatMap(({ tolerance }, m) => (tolerance === null ? [] : [m]));
	const loads = new Float64Array(bound.length * graph.count);
	bound.forEach((m, row) => loads.set(problem.measures[m].values, row * graph.count));
	const stays = Uint8Array.from(territories, ({ closing }) => (closing ? 0 : 1));
	const together = blocksOf(graph.count, problem.together ?? []);
	return {
		problem,
		graph,
		units: graph.count,
		territories: territories.length,
		bound,
		...limitsOf(problem, bound),
		loads,
		fixed: fixedOf(problem, together.blocks),
		open: Uint8Array.from(territories, ({ frozen, closing }) => (frozen || closing ? 0 : 1)),
		stays,
		...together,
		apart: apartOf(problem.apart ?? []),
		cost: costsOf(problem),
		steps: problem.reach === null ? null : todaySteps(graph, problem.today, territories),
		compulsory: compulsoryOf(problem, bound.length > 0 ? loads.subarray(0, graph.count) : null),
	};
}

function nobodyStays({ territories }: TerritoryProblem): Impossible | null {
	if (territories.some(({ closing }) => !closing)) return null;
	return {
		status: 'impossible',
		reason: 'no-plan',
		message: 'No territory stays, so the units have nowhere to go.',
		witness: { units: [], territories: Array.from(territories.keys()) },
		relief: [],
	};
}

function limitsOf({ measures, territories }: TerritoryProblem, bound: number[]) {
	const k = territories.length;
	const targets = new Float64Array(bound.length * k);
	const least = new Float64Array(bound.length * k);
	const greatest = new Float64Array(bound.length * k);
	const capacities = territories.reduce((sum, t) => sum + (t.closing ? 0 : t.capacity), 0);
	bound.forEach((m, row) => {
		const total = measures[m].values.reduce((sum, value) => sum + value, 0);
		const tolerance = (measures[m].tolerance ?? 0) + slack;
		territories.forEach(({ capacity, closing }, t) => {
			if (closing) return;
			const target = (capacity / capacities) * total;
			targets[row * k + t] = target;
			least[row * k + t] = target * (1 - tolerance);
			greatest[row * k + t] = target * (1 + tolerance);
		});
	});
	return { targets, least, greatest };
}

function fixedOf({ today, territories, locks }: TerritoryProblem, blocks: number[][]): Int32Array {
	const fixed = locks ? Int32Array.from(locks) : new Int32Array(today.length).fill(-1);
	territories.forEach(({ base, closing }, t) => {
		if (base >= 0 && !closing) fixed[base] = t;
	});
	today.forEach((t, u) => {
		if (t >= 0 && territories[t].frozen && !territories[t].closing) fixed[u] = t;
	});
	for (const block of blocks) {
		const pinned = block.find((u) => fixed[u] >= 0);
		if (pinned === undefined) continue;
		for (const u of block) if (fixed[u] < 0) fixed[u] = fixed[pinned];
	}
	return fixed;
}

function apartOf(pairs: readonly (readonly [number, number])[]): Map<number, number[]> {
	const apart = new Map<number, Set<number>>();
	const add = (u: number, v: number) => {
		const others = apart.get(u) ?? new Set();
		apart.set(u, others.add(v));
	};
	for (const [a, b] of pairs) {
		add(a, b);
		add(b, a);
	}
	return new Map([...apart].map(([u, others]) => [u, [...others].sort((a, b) => a - b)]));
}

function compulsoryOf(problem: TerritoryProblem, load: Float64Array | null): Uint8Array {
	const { graph, today, territories } = problem;
	const compulsory = Uint8Array.from(today, (t) => (t < 0 || territories[t].closing ? 1 : 0));
	for (const { parts } of tornParts(graph, today, territories, load)) {
		for (const part of parts.slice(1)) for (const u of part) compulsory[u] = 1;
	}
	return compulsory;
}
