import type { RegionGraph } from '../graph/region-graph.ts';
import type { Dice } from './dice.ts';

/** Random trees tried for one split; the most even one is taken. */
const TREES = 6;

/**
 * Splits `units`, which are joined, into two joined parts, the first with as near to `share` of the load
 * as an edge of a random spanning tree allows, the best of several trees. Both parts have at least
 * `least[0]` and `least[1]` units.
 *
 * Source of the method: D. DeFord, M. Duchin, J. Solomon, Recombination: A Family of Markov Chains for
 * Redistricting, Harvard Data Science Review 3 (2021): cutting an edge of a random spanning tree.
 * @returns null when no edge of the trees leaves either part enough units
 */
export function treeSplit(
	graph: RegionGraph,
	units: readonly number[],
	load: Float64Array,
	share: number,
	least: readonly [number, number],
	dice: Dice,
): [number[], number[]] | null {
	const total = units.reduce((sum, unit) => sum + load[unit], 0);
	const place = new Map(units.map((unit, i) => [unit, i]));
	let best: Cut | null = null;
	for (let i = 0; i < TREES && !(best && best.off < 0.002 * total); i++) {
		const tree = randomTree(graph, units, place, dice);
		const cut = bestCut(tree, below(tree, units, load), share * total, least);
		if (cut && cut.off < (best?.off ?? Infinity)) best = cut;
	}
	if (!best) return null;
	const [cut, rest] = parts(best.tree, units, best.at);
	return best.isFirst ? [cut, rest] : [rest, cut];
}

/** An edge of a tree to cut: the one above place `at`. */
interface Cut {
	tree: Tree;
	at: number;
	/** whether what is below becomes the first part */
	isFirst: boolean;
	/** distance of the first part's load from what it should be */
	off: number;
}

function bestCut(
	tree: Tree,
	{ loads, counts }: { loads: Float64Array; counts: Int32Array },
	wanted: number,
	least: readonly [number, number],
): Cut | null {
	let best: Cut | null = null;
	const total = loads[0];
	for (let at = 1; at < counts.length; at++) {
		const rest = counts.length - counts[at];
		for (const isFirst of [true, false]) {
			const [first, second] = isFirst ? [counts[at], rest] : [rest, counts[at]];
			if (first < least[0] || second < least[1]) continue;
			const off = Math.abs((isFirst ? loads[at] : total - loads[at]) - wanted);
			if (!best || off < best.off) best = { tree, at, isFirst, off };
		}
	}
	return best;
}

/** A spanning tree; `order` walks it from the root (place 0 of the order) so that parents come first. */
interface Tree {
	/** places in `units` */
	order: Int32Array;
	/** parent of the i-th of the order, as a place in the order; -1 for the root */
	parent: Int32Array;
}

/** Kruskal's tree over edges in random order. */
function randomTree(
	graph: RegionGraph,
	units: readonly number[],
	place: Map<number, number>,
	dice: Dice,
): Tree {
	const edges: number[] = [];
	units.forEach((unit, i) => {
		for (let k = graph.offsets[unit]; k < graph.offsets[unit + 1]; k++) {
			const j = place.get(graph.targets[k]);
			if (j !== undefined && j > i) edges.push(i, j);
		}
	});
	const joined: number[][] = units.map(() => []);
	const root = Int32Array.from(units.keys());
	const find = (i: number) => {
		while (root[i] !== i) i = root[i] = root[root[i]];
		return i;
	};
	for (let left = edges.length / 2; left > 0; left--) {
		const pick = 2 * dice.below(left);
		const [a, b] = [edges[pick], edges[pick + 1]];
		edges[pick] = edges[2 * left - 2];
		edges[pick + 1] = edges[2 * left - 1];
		const [p, q] = [find(a), find(b)];
		if (p === q) continue;
		root[p] = q;
		joined[a].push(b);
		joined[b].push(a);
	}
	return walked(joined, dice.below(units.length));
}

function walked(joined: number[][], start: number): Tree {
	const order = new Int32Array(joined.length);
	const parent = new Int32Array(joined.length).fill(-1);
	const seen = new Uint8Array(joined.length);
	order[0] = start;
	seen[start] = 1;
	let tail = 1;
	for (let head = 0; head < tail; head++) {
		for (const next of joined[order[head]]) {
			if (seen[next]) continue;
			seen[next] = 1;
			parent[tail] = head;
			order[tail++] = next;
		}
	}
	return { order, parent };
}

/** Load and number of units at and below each place of the order. */
function below({ order, parent }: Tree, units: readonly number[], load: Float64Array) {
	const loads = Float64Array.from(order, (i) => load[units[i]]);
	const counts = new Int32Array(order.length).fill(1);
	for (let at = order.length - 1; at > 0; at--) {
		loads[parent[at]] += loads[at];
		counts[parent[at]] += counts[at];
	}
	return { loads, counts };
}

function parts({ order, parent }: Tree, units: readonly number[], cut: number) {
	const isBelow = new Uint8Array(order.length);
	isBelow[cut] = 1;
	for (let at = cut + 1; at < order.length; at++) isBelow[at] = isBelow[parent[at]];
	const sides: [number[], number[]] = [[], []];
	order.forEach((i, at) => sides[isBelow[at] ? 0 : 1].push(units[i]));
	return sides;
}
