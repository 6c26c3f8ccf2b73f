import { buildGraph } from './build-graph.ts';
import { isPlanar } from './left-right-test.ts';
import type { RegionGraph } from './region-graph.ts';

/** Regions that may lie in several parts, and which parts border which. */
export interface PartedGraph {
	regions: number;
	/** the region of each part */
	owner: ArrayLike<number>;
	/** pairs of parts */
	a: ArrayLike<number>;
	b: ArrayLike<number>;
	/** numbers of pairs that no shared line makes, so that they may be what crosses another */
	loose?: readonly number[];
}

/** What has to go for a graph to be planar. */
export interface Splitting {
	/** regions to be split into their parts, ascending */
	regions: number[];
	/** loose pairs to be left out, by number, ascending */
	pairs: number[];
}

/**
 * An irreducible set of regions (and, where those do not suffice, of loose pairs as well) whose splitting
 * into their parts (and leaving out) makes the graph planar: with all of the set it is, and without any
 * one of them it is not. Empty when it is planar as it is; null when it is not even without all of them.
 *
 * Method: QuickXplain (U. Junker, AAAI 2004), about 2k log(n/k) planarity tests for k of n candidates.
 * Splitting more need not keep a graph planar, so the outcome is looked over: what can be spared after
 * all is left out, and where the set does not hold it is made from all candidates.
 */
export function splittingSet(graph: PartedGraph): Splitting | null {
	const flat = (out: readonly number[]) => isPlanar(splitGraph(graph, out));
	if (flat([])) return { regions: [], pairs: [] };
	const regions = inSeveralParts(graph);
	const loose = (graph.loose ?? []).map((pair) => graph.regions + pair);
	const candidates = flat(regions) ? regions : [...regions, ...loose];
	if (candidates.length === 0 || !flat(candidates)) return null;
	const found = smallest(flat, [], false, candidates);
	const kept = spared(flat, flat(found) ? found : candidates).sort((p, q) => p - q);
	return {
		regions: kept.filter((one) => one < graph.regions),
		pairs: kept.filter((one) => one >= graph.regions).map((one) => one - graph.regions),
	};
}

type Flat = (out: readonly number[]) => boolean;

/** The regions of which two parts have borders. */
function inSeveralParts({ regions, owner, a, b }: PartedGraph): number[] {
	const first = new Int32Array(regions).fill(-1);
	const several = new Set<number>();
	for (const ends of [a, b]) {
		for (let i = 0; i < ends.length; i++) {
			const region = owner[ends[i]];
			if (first[region] < 0) first[region] = ends[i];
			else if (first[region] !== ends[i]) several.add(region);
		}
	}
	return [...several].sort((p, q) => p - q);
}

/**
 * The graph in which each part of a region that is split is a vertex, and every other region is one. In
 * `out`: regions to be split, and numbers of pairs that are left out, counted on from the regions.
 */
function splitGraph(graph: PartedGraph, out: readonly number[]): RegionGraph {
	const { regions, owner, a, b } = graph;
	const isOut = new Set(out);
	const vertex = (part: number) => (isOut.has(owner[part]) ? regions + part : owner[part]);
	const from: number[] = [];
	const to: number[] = [];
	for (let i = 0; i < a.length; i++) {
		if (owner[a[i]] === owner[b[i]] || isOut.has(regions + i)) continue;
		from.push(vertex(a[i]));
		to.push(vertex(b[i]));
	}
	return buildGraph(regions + owner.length, from, to);
}

/** Those of `from` that have to go when `held` are gone already. */
function smallest(flat: Flat, held: number[], added: boolean, from: number[]): number[] {
	if (added && flat(held)) return [];
	if (from.length === 1) return from;
	const [left, right] = [from.slice(0, from.length >> 1), from.slice(from.length >> 1)];
	const ofRight = smallest(flat, [...held, ...left], true, right);
	const ofLeft = smallest(flat, [...held, ...ofRight], ofRight.length > 0, left);
	return [...ofLeft, ...ofRight];
}

/** Takes them back one by one, until none can be. */
function spared(flat: Flat, start: number[]): number[] {
	let kept = start;
	for (let again = true; again;) {
		again = false;
		for (const one of kept) {
			const rest = kept.filter((other) => other !== one);
			if (!flat(rest)) continue;
			kept = rest;
			again = true;
			break;
		}
	}
	return kept;
}
