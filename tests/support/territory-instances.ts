import { Random } from '../../src/lib/engines/colouring/random.ts';
import { buildGraph } from '../../src/lib/engines/graph/build-graph.ts';
import type { Territory, TerritoryProblem } from '../../src/lib/engines/territories/problem.ts';
import { gridPairs, inOnePiece, neighbourMasks, plansOf } from './partitions.ts';
import { scatteredMap } from './planar.ts';

export interface Instance {
	problem: TerritoryProblem;
	pairs: [number, number][];
}

/** Joined pairs of a grid, or of a made-up map of about as many units. */
function pairsOf(random: Random): { units: number; pairs: [number, number][] } {
	const rows = 3 + random.below(2);
	const columns = 3 + random.below(rows === 3 ? 3 : 2);
	if (random.below(2)) return { units: rows * columns, pairs: gridPairs(rows, columns) };
	const { regions, borders } = scatteredMap(rows * columns, random.below(1e6));
	const pairs = Array.from(borders.a, (a, i): [number, number] => [a, borders.b[i]]);
	return { units: regions, pairs };
}

/** Grows territories from seeds in random order, so that most of them are in one piece. */
function grown(units: number, pairs: [number, number][], k: number, random: Random): Int32Array {
	const today = new Int32Array(units).fill(-1);
	for (let t = 0; t < k; t++) {
		let unit = random.below(units);
		while (today[unit] >= 0) unit = (unit + 1) % units;
		today[unit] = t;
	}
	for (let left = units - k; left > 0;) {
		const [a, b] = pairs[random.below(pairs.length)];
		const [from, to] = random.below(2) ? [a, b] : [b, a];
		if (today[from] < 0 || today[to] >= 0) continue;
		today[to] = today[from];
		left--;
	}
	return today;
}

/**
 * A small problem with, by chance, bases, locks, a frozen or closing territory, a new hire, units
 * without territory, torn areas, one or two measures, costs, blocks, pairs apart and a reach rule.
 */
export function smallInstance(seed: number): Instance {
	const random = new Random(seed);
	const chance = (percent: number) => random.below(100) < percent;
	const { units, pairs } = pairsOf(random);
	const k = 2 + random.below(units > 13 ? 2 : 3);
	const today = grown(units, pairs, k, random);
	const unit = () => random.below(units);
	const territories: Territory[] = Array.from({ length: k }, (_, t) => ({
		base: chance(60) ? today.indexOf(t) : -1,
		capacity: chance(25) ? 0.5 : 1,
		frozen: false,
		closing: false,
	}));
	if (chance(15)) territories[k - 1].closing = true;
	if (chance(10)) territories[0].frozen = true;
	if (chance(15)) {
		const base = unit();
		if (!territories.some((t) => t.base === base)) {
			territories.push({ base, capacity: 1, frozen: false, closing: false });
		}
	}
	if (chance(15)) today[unit()] = random.below(k);
	if (chance(15)) today[unit()] = -1;
	const locks = new Int32Array(units).fill(-1);
	const locked = unit();
	// a lock that contradicts a base is told before any search
	if (chance(15) && !territories.some(({ base }) => base === locked)) locks[locked] = 0;
	const values = (most: number) =>
		Float64Array.from({ length: units }, () => 1 + random.below(most));
	const measures = [
		{ name: 'visits', values: values(6), tolerance: 0.05 + 0.05 * random.below(6) },
	];
	if (chance(30)) measures.push({ name: 'sales', values: values(3), tolerance: 0.4 });
	const pair = (): [number, number][] => {
		const [a, b] = [unit(), unit()];
		return a === b ? [] : [[a, b]];
	};
	return {
		pairs,
		problem: {
			graph: buildGraph(
				units,
				pairs.map(([a]) => a),
				pairs.map(([, b]) => b),
			),
			measures,
			today,
			territories,
			locks,
			together: chance(20) ? pair() : [],
			apart: chance(20) ? pair() : [],
			...(chance(25) ? { cost: values(4) } : {}),
			goal: 'fewest-moves',
			reach: chance(20) ? 1 : null,
			seed,
			effort: 'normal',
		},
	};
}

/** What trying every plan tells: how cheap one can be, or that there is none. */
export interface Tried {
	plans: number;
	/** Infinity when there is no plan */
	cost: number;
	best: Int32Array | null;
	/** a dearest plan */
	worst: Int32Array | null;
}

/** Tries every plan; the rules are read from the problem itself. `steps` is the reach between territories. */
export function tryAll(
	{ problem, pairs }: Instance,
	steps: ArrayLike<number> | null,
	tolerances = problem.measures.map((measure) => measure.tolerance),
): Tried {
	const { territories, today } = problem;
	const units = today.length;
	const sets = holdable({ problem, pairs }, steps, tolerances);
	const staying = territories.flatMap(({ closing }, t) => (closing ? [] : [t]));
	const tried: Tried = { plans: 0, cost: Infinity, best: null, worst: null };
	let dearest = -1;
	for (const held of plansOf({ units, sets: staying.map((t) => sets[t]) })) {
		tried.plans++;
		const assignment = new Int32Array(units);
		held.forEach((set, i) => {
			for (let u = 0; u < units; u++) if ((set >> u) & 1) assignment[u] = staying[i];
		});
		let cost = 0;
		for (let u = 0; u < units; u++) {
			if (assignment[u] !== today[u]) cost += problem.cost ? problem.cost[u] : 1;
		}
		if (cost < tried.cost) Object.assign(tried, { cost, best: assignment });
		if (cost > dearest) [dearest, tried.worst] = [cost, assignment];
	}
	return tried;
}

function holdable(
	{ problem, pairs }: Instance,
	steps: ArrayLike<number> | null,
	tolerances: (number | null)[],
) {
	const { territories, today, locks, measures, together = [], apart = [], reach } = problem;
	const units = today.length;
	const near = neighbourMasks(units, pairs);
	const shares = territories.reduce((sum, t) => sum + (t.closing ? 0 : t.capacity), 0);
	const has = (set: number, u: number) => ((set >> u) & 1) === 1;
	const sets: number[][] = territories.map(() => []);
	for (let set = 1; set < 2 ** units; set++) {
		if (together.some(([a, b]) => has(set, a) !== has(set, b))) continue;
		if (apart.some(([a, b]) => has(set, a) && has(set, b))) continue;
		if (!inOnePiece(set, near)) continue;
		const loads = measures.map(({ values }) => {
			let load = 0;
			for (let u = 0; u < units; u++) if (has(set, u)) load += values[u];
			return load;
		});
		territories.forEach((territory, t) => {
			if (territory.closing) return;
			const good = measures.every(({ values }, m) => {
				const tolerance = tolerances[m];
				if (tolerance === null) return true;
				const target = (territory.capacity / shares) * values.reduce((a, b) => a + b);
				return Math.abs(loads[m] - target) <= (tolerance + 1e-9) * target;
			});
			if (!good) return;
			for (let u = 0; u < units; u++) {
				const lock = locks && locks[u] >= 0 ? locks[u] : -1;
				const inside = has(set, u);
				if (lock >= 0 && inside !== (lock === t)) return;
				if (territory.frozen && inside !== (today[u] === t)) return;
				if (inside && u !== territory.base && territories.some((o) => !o.closing && o.base === u))
					return;
				if (u === territory.base && !inside) return;
				const from = today[u];
				if (!inside || from < 0 || from === t || lock === t || u === territory.base) continue;
				if (reach !== null && steps && steps[from * territories.length + t] > reach) return;
			}
			sets[t].push(set);
		});
	}
	return sets;
}
