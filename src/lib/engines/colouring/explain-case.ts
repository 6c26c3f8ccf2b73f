import type { RegionGraph } from '../graph/region-graph.ts';
import { banned, bannedInks, inksBanned, type Bans } from './bans.ts';
import { prepare } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';

/** The locks that ask one ink of one vertex; a vertex stands for regions that are kept alike. */
export interface Demand {
	vertex: number;
	ink: number;
	/** the locked regions, ascending */
	regions: number[];
	/** of dropping all of them */
	cost: number;
}

/** A problem as those see it who look for what collides in it. */
export interface Case {
	graph: RegionGraph;
	inks: number;
	bans: Bans | null;
	demands: Demand[];
	/** the demands made of each vertex that has any */
	demandsAt: Map<number, number[]>;
	/** the regions of each vertex, ascending */
	members: number[][];
	/** a pair that must differ although both are kept alike */
	torn: readonly [number, number] | null;
}

export function readCase(problem: ColouringProblem): Case {
	const { graph, vertexOf, bans } = prepare(problem);
	const members: number[][] = Array.from({ length: graph.count }, () => []);
	for (let r = 0; r < problem.regions; r++) members[vertexOf[r]].push(r);
	const demands = readDemands(problem, vertexOf);
	const demandsAt = new Map<number, number[]>();
	demands.forEach(({ vertex }, d) => {
		demandsAt.set(vertex, [...(demandsAt.get(vertex) ?? []), d]);
	});
	const inks = problem.inks === 'fewest' ? enoughInks(graph, demands, bans) : problem.inks;
	return { graph, inks, bans, demands, demandsAt, members, torn: tornPair(problem, vertexOf) };
}

function readDemands(problem: ColouringProblem, vertexOf: Uint32Array): Demand[] {
	const byName = new Map<string, Demand>();
	problem.locks?.forEach((ink, region) => {
		if (ink < 0) return;
		const vertex = vertexOf[region];
		const demand = byName.get(`${vertex} ${ink}`) ?? { vertex, ink, regions: [], cost: 0 };
		demand.regions.push(region);
		demand.cost += problem.lockCosts?.[region] ?? 1;
		byName.set(`${vertex} ${ink}`, demand);
	});
	return [...byName.values()];
}

/** So many inks that free vertices can always be coloured last: more would not help either. */
export function enoughInks(graph: RegionGraph, demands: Demand[], bans: Bans | null): number {
	let named = inksBanned(bans);
	for (const { ink } of demands) named = Math.max(named, ink + 1);
	let degree = 0;
	for (let v = 0; v < graph.count; v++) {
		degree = Math.max(degree, graph.offsets[v + 1] - graph.offsets[v]);
	}
	return named + degree + 1;
}

/**
 * How many of the inks a vertex may have, whatever becomes of its locks: a reserved ink that it is locked
 * to does not count, as it goes with the lock.
 */
export function choices({ bans, inks }: Case, vertex: number): number {
	if (bans === null) return inks;
	const opened = bans.reserved?.opened(vertex, inks) ?? 0;
	return inks - bannedInks(bans, vertex, inks).size - opened;
}

/** Whether a demand asks what no colouring of its vertex alone could give. */
export const isHopeless = ({ inks, bans }: Case, { vertex, ink }: Demand) =>
	ink >= inks || banned(bans, vertex, ink);

function tornPair({ borders, apart }: ColouringProblem, vertexOf: Uint32Array) {
	for (let i = 0; i < borders.a.length; i++) {
		if (vertexOf[borders.a[i]] === vertexOf[borders.b[i]]) {
			return [borders.a[i], borders.b[i]] as const;
		}
	}
	return apart?.find(([a, b]) => vertexOf[a] === vertexOf[b]) ?? null;
}
