import { breadthFirstOrder } from '../graph/breadth-first.ts';
import { buildGraph } from '../graph/build-graph.ts';
import type { RegionGraph } from '../graph/region-graph.ts';
import { renumber } from '../graph/renumber.ts';
import { alikeGroups } from './alike-groups.ts';
import { banned, bansOf, type Bans } from './bans.ts';
import type { ColouringProblem } from './problem.ts';
import { reservedInks } from './reserved.ts';

/**
 * The problem as the colourers see it: every keep-alike group one vertex, keep-apart pairs edges, and
 * vertices numbered breadth first so that neighbours lie close in memory.
 */
export interface Prepared {
	graph: RegionGraph;
	/** the vertex of each region */
	vertexOf: Uint32Array;
	/** the lowest region of each vertex */
	regionOf: Uint32Array;
	/** ink of each locked vertex, -1 for free; null when nothing is locked */
	fixed: Int32Array | null;
	bans: Bans | null;
	/** some vertex stands for several regions */
	grouped: boolean;
	/** the highest locked ink + 1 */
	inksLocked: number;
	/** two rules contradict each other at once, whatever the number of inks */
	clash: boolean;
}

/** Contracts, renumbers and collects the rules of a problem without faults. Linear time. */
export function prepare(problem: ColouringProblem): Prepared {
	const groups = alikeGroups(problem.regions, problem.alike);
	const { graph, vertexOf, regionOf, inner } = contracted(problem, groups);
	const { fixed, torn } = fixedInks(problem, vertexOf, graph.count);
	const pairs = (problem.forbidden ?? []).map(([r, ink]) => [vertexOf[r], ink] as const);
	const reserved = reservedInks(problem, graph.count, vertexOf);
	const prepared = {
		graph,
		vertexOf,
		regionOf,
		fixed,
		bans: bansOf(graph.count, pairs, reserved),
		grouped: graph.count < problem.regions,
		inksLocked: fixed ? fixed.reduce((most, ink) => Math.max(most, ink + 1), 0) : 0,
		clash: inner || torn,
	};
	prepared.clash ||= locksClash(prepared);
	return prepared;
}

function contracted(problem: ColouringProblem, groups: Uint32Array | null) {
	const { regions } = problem;
	const { a, b } = withApart(problem);
	if (!groups) {
		const raw = buildGraph(regions, a, b);
		const regionOf = breadthFirstOrder(raw);
		const { graph, position } = renumber(raw, regionOf);
		return { graph, vertexOf: position, regionOf, inner: false };
	}
	const dense = new Uint32Array(regions);
	const lowest: number[] = [];
	for (let r = 0; r < regions; r++) {
		dense[r] = groups[r] === r ? lowest.push(r) - 1 : dense[groups[r]];
	}
	const { from, to, inner } = betweenGroups(a, b, dense);
	const raw = buildGraph(lowest.length, from, to);
	const order = breadthFirstOrder(raw);
	const { graph, position } = renumber(raw, order);
	const regionOf = order.map((v) => lowest[v]);
	return { graph, vertexOf: dense.map((v) => position[v]), regionOf, inner };
}

function withApart({ borders, apart }: ColouringProblem) {
	if (!apart || apart.length === 0) return borders;
	const a = [...Array.from(borders.a), ...apart.map((pair) => pair[0])];
	const b = [...Array.from(borders.b), ...apart.map((pair) => pair[1])];
	return { a, b };
}

/** The borders between groups; `inner` when one lies inside a group. */
function betweenGroups(a: ArrayLike<number>, b: ArrayLike<number>, dense: Uint32Array) {
	const from: number[] = [];
	const to: number[] = [];
	let inner = false;
	for (let i = 0; i < a.length; i++) {
		const u = dense[a[i]];
		const v = dense[b[i]];
		if (u === v) inner = true;
		else {
			from.push(u);
			to.push(v);
		}
	}
	return { from, to, inner };
}

/** Locks by vertex; `torn` when a group is locked to two inks. */
function fixedInks({ locks }: ColouringProblem, vertexOf: Uint32Array, vertices: number) {
	if (!locks || locks.every((ink) => ink < 0)) return { fixed: null, torn: false };
	const fixed = new Int32Array(vertices).fill(-1);
	let torn = false;
	for (let r = 0; r < locks.length; r++) {
		if (locks[r] < 0) continue;
		const v = vertexOf[r];
		if (fixed[v] >= 0 && fixed[v] !== locks[r]) torn = true;
		fixed[v] = locks[r];
	}
	return { fixed, torn };
}

function locksClash({ graph, fixed, bans }: Pick<Prepared, 'graph' | 'fixed' | 'bans'>): boolean {
	if (!fixed) return false;
	for (let v = 0; v < graph.count; v++) {
		if (fixed[v] < 0) continue;
		if (banned(bans, v, fixed[v])) return true;
		for (let i = graph.offsets[v]; i < graph.offsets[v + 1]; i++) {
			if (fixed[graph.targets[i]] === fixed[v]) return true;
		}
	}
	return false;
}

/** The ink of every region from the ink of every vertex. */
export function byRegion(prepared: Prepared, ink: Int32Array): Int32Array {
	const colouring = new Int32Array(prepared.vertexOf.length);
	for (let r = 0; r < colouring.length; r++) colouring[r] = ink[prepared.vertexOf[r]];
	return colouring;
}
