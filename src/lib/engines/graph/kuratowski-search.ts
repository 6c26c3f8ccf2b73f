import type { KuratowskiWitness } from './kuratowski-check.ts';
import { isPlanar } from './left-right-test.ts';
import type { RegionGraph } from './region-graph.ts';
import { shortenPaths } from './shorten-paths.ts';
import { isFlat, tidied, type Strand } from './strands.ts';
import { inducedSubgraph } from './subgraph.ts';

/**
 * A short witness in a graph that is not planar. First a small set of vertices that is not planar:
 * the fewest in breadth-first order that are not, again from the last of them inwards. Then edges are
 * left out in chunks and singly, loose ends cut and vertices of degree 2 passed over, until only a
 * subdivision of K5 or K3,3 is left. Then each path is rerouted the shortest way round the others.
 */
export function findWitness(graph: RegionGraph): KuratowskiWitness {
	const vertices = smallPart(graph);
	let strands = tidied(edgesWithin(graph, vertices));
	for (let chunk = strands.length >> 1; chunk >= 1; chunk >>= 1) {
		strands = withoutChunks(strands, chunk);
	}
	return shortenPaths(graph, named(strands));
}

/** Vertices whose own graph is not planar, each shrink starting from the one that was needed last. */
function smallPart(graph: RegionGraph): number[] {
	let vertices = [...Array(graph.count).keys()];
	for (let start = 0; ;) {
		const part = inducedSubgraph(graph, vertices);
		const order = orderFrom(part, start);
		const needed = fewestOf(part, order);
		if (needed === vertices.length) return vertices;
		start = needed - 1;
		vertices = Array.from(order.subarray(0, needed), (i) => vertices[i]);
	}
}

/** Breadth first from `start`, then from the others. */
function orderFrom({ count, offsets, targets }: RegionGraph, start: number): Uint32Array {
	const order = new Uint32Array(count);
	const seen = new Uint8Array(count);
	let tail = 0;
	let head = 0;
	for (let i = 0; i < count; i++) {
		const root = (start + i) % count;
		if (seen[root]) continue;
		seen[root] = 1;
		for (order[tail++] = root; head < tail; head++) {
			for (let e = offsets[order[head]]; e < offsets[order[head] + 1]; e++) {
				if (seen[targets[e]]) continue;
				seen[targets[e]] = 1;
				order[tail++] = targets[e];
			}
		}
	}
	return order;
}

/** How many of the first vertices are not planar; with fewer they are. */
function fewestOf(graph: RegionGraph, order: Uint32Array): number {
	let low = 0;
	let high = order.length;
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if (isPlanar(inducedSubgraph(graph, order.subarray(0, middle)))) low = middle;
		else high = middle;
	}
	return high;
}

function edgesWithin(graph: RegionGraph, vertices: number[]): Strand[] {
	const { count, offsets, targets } = inducedSubgraph(graph, vertices);
	const strands: Strand[] = [];
	for (let v = 0; v < count; v++) {
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			if (targets[e] > v) strands.push([vertices[v], vertices[targets[e]]]);
		}
	}
	return strands;
}

/**
 * Leaves out every chunk of so many strands that can be spared. A chunk that was needed once stays
 * needed when less is left, so none is tried twice; joined strands are new and are tried again.
 */
function withoutChunks(strands: Strand[], chunk: number): Strand[] {
	const needed = new Set<Strand>();
	for (;;) {
		const tried = strands.filter((strand) => !needed.has(strand)).slice(0, chunk);
		if (tried.length === 0) return strands;
		const out = new Set(tried);
		const rest = strands.filter((strand) => !out.has(strand));
		if (isFlat(rest)) for (const strand of tried) needed.add(strand);
		else strands = tidied(rest);
	}
}

/** Reads off the hubs; for K3,3 those joined to the first come last. */
function named(strands: Strand[]): KuratowskiWitness {
	const ends = (strand: Strand) => [strand[0], strand[strand.length - 1]];
	const hubs = [...new Set(strands.flatMap(ends))].sort((a, b) => a - b);
	if (hubs.length === 5) return { kind: 'K5', hubs, paths: strands };
	const across = strands.filter((s) => ends(s).includes(hubs[0])).flatMap(ends);
	const far = hubs.filter((v) => v !== hubs[0] && across.includes(v));
	const near = hubs.filter((v) => !far.includes(v));
	return { kind: 'K3,3', hubs: [...near, ...far], paths: strands };
}
