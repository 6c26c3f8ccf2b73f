import { buildGraph, type RegionGraph } from '../../src/lib/engines/graph/index.ts';
import { randomFrom } from '../../src/lib/engines/solver/random.ts';
import { rebalance } from '../../src/lib/engines/territories/rebalance.ts';
import type { Territory, TerritoryProblem } from '../../src/lib/engines/territories/problem.ts';
import { bytesOf, usAtlas } from './atlas.ts';
import { accepted } from './read-boundaries.ts';

/** FIPS codes of Alaska, Hawaii and the island territories. */
const outside = new Set(['02', '15', '60', '66', '69', '72', '78']);

/**
 * The counties of the lower 48 states as units, joined where they share a line. Islands are joined to
 * the nearest-numbered county of their state, as a planner would link them by hand.
 */
export async function countyGraph(): Promise<{ graph: RegionGraph; names: string[] }> {
	const counties = usAtlas('counties');
	const features = counties.features.filter(({ id }) => !outside.has(String(id).slice(0, 2)));
	const { borders, coverage } = await accepted(bytesOf({ ...counties, features }));
	const lines = Array.from(borders.kind.keys()).filter((i) => borders.kind[i] === 0);
	const a = lines.map((i) => borders.a[i]);
	const b = lines.map((i) => borders.b[i]);
	const joined = new Set([...a, ...b]);
	for (let unit = 0; unit < coverage.keys.length; unit++) {
		if (joined.has(unit)) continue;
		a.push(unit);
		b.push(unit > 0 ? unit - 1 : 1);
	}
	return { graph: buildGraph(coverage.keys.length, a, b), names: [...coverage.keys] };
}

/** A rectangle of cells joined by their sides. */
export function gridGraph(width: number, height = width): RegionGraph {
	const a: number[] = [];
	const b: number[] = [];
	for (let y = 0; y < height; y++) {
		for (let x = 0; x < width; x++) {
			const cell = y * width + x;
			const east = x + 1 < width ? [cell + 1] : [];
			const south = y + 1 < height ? [cell + width] : [];
			for (const other of [...east, ...south]) {
				a.push(cell);
				b.push(other);
			}
		}
	}
	return buildGraph(width * height, a, b);
}

/** Numbers whose logarithm is normal with spread `sigma` (Box and Muller 1958), the same for a seed. */
export function logNormal(count: number, sigma: number, seed: number): Float64Array {
	const random = randomFrom(seed);
	return Float64Array.from({ length: count }, () => {
		const radius = Math.sqrt(-2 * Math.log(1 - random()));
		return Math.exp(sigma * radius * Math.cos(2 * Math.PI * random()));
	});
}

/**
 * Territories grown from bases spread over the graph (each the farthest from the others among ten drawn):
 * the one with the least load takes a unit next to it, until all are taken. Units that no base reaches
 * stay at -1.
 */
export function grownTerritories(
	graph: RegionGraph,
	load: Float64Array,
	count: number,
	seed: number,
): { today: Int32Array; bases: number[] } {
	const random = randomFrom(seed);
	const bases = spreadBases(graph, count, random);
	const today = new Int32Array(graph.count).fill(-1);
	bases.forEach((unit, t) => (today[unit] = t));
	const held = bases.map((unit) => load[unit]);
	const edge = bases.map((unit) => [unit]);
	for (;;) {
		let t = -1;
		for (let i = 0; i < count; i++) if (edge[i].length && (t < 0 || held[i] < held[t])) t = i;
		if (t < 0) return { today, bases };
		const place = Math.floor(random() ** 2 * edge[t].length);
		const free = freeNeighbour(graph, today, edge[t][place]);
		if (free < 0) {
			edge[t].splice(place, 1);
			continue;
		}
		today[free] = t;
		held[t] += load[free];
		edge[t].push(free);
	}
}

function spreadBases(graph: RegionGraph, count: number, random: () => number): number[] {
	const away = new Int32Array(graph.count).fill(graph.count);
	const bases: number[] = [];
	while (bases.length < count) {
		let base = -1;
		for (let i = 0; i < 10; i++) {
			const unit = Math.floor(random() * graph.count);
			if (away[unit] > 0 && (base < 0 || away[unit] > away[base])) base = unit;
		}
		if (base < 0) continue;
		bases.push(base);
		lowerDistances(graph, away, base);
	}
	return bases;
}

function lowerDistances({ offsets, targets }: RegionGraph, away: Int32Array, base: number): void {
	away[base] = 0;
	const queue = [base];
	for (const unit of queue) {
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			if (away[targets[i]] <= away[unit] + 1) continue;
			away[targets[i]] = away[unit] + 1;
			queue.push(targets[i]);
		}
	}
}

function freeNeighbour({ offsets, targets }: RegionGraph, today: Int32Array, unit: number): number {
	for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
		if (today[targets[i]] < 0) return targets[i];
	}
	return -1;
}

export const plainTerritories = (bases: readonly number[]): Territory[] =>
	bases.map((base) => ({ base, capacity: 1, frozen: false, closing: false }));

/** A problem with one measure and nothing out of the ordinary. */
export function plainProblem(
	graph: RegionGraph,
	values: Float64Array,
	today: Int32Array,
	bases: readonly number[],
	tolerance: number,
): TerritoryProblem {
	return {
		graph,
		measures: [{ name: 'load', values, tolerance }],
		today,
		territories: plainTerritories(bases),
		goal: 'fewest-moves',
		reach: null,
		seed: 1,
		effort: 'normal',
	};
}

/**
 * Territories that are even in `load` within 5 %, compact, in one piece, each with its base locked: a
 * today for benchmarks, before the load changes.
 */
export async function evenTerritories(
	graph: RegionGraph,
	load: Float64Array,
	count: number,
	seed: number,
): Promise<{ today: Int32Array; bases: number[] }> {
	const { today, bases } = grownTerritories(graph, load, count, seed);
	const problem = plainProblem(graph, load, today, bases, 0.05);
	const even = await rebalance({
		...problem,
		goal: 'least-deviation',
		effort: 'quick',
		compactness: 1,
		seed,
	});
	if (even.status !== 'proposed') throw new Error(`seed ${seed} grows no even territories`);
	return { today: even.assignment, bases };
}
