import type { RegionGraph } from '../graph/region-graph.ts';

const STARTS = 200;

/** A large clique, at most `enough`: from each start the neighbour with most neighbours, again and again. */
export function greedyClique(graph: RegionGraph, enough: number): number[] {
	const degree = (v: number) => graph.offsets[v + 1] - graph.offsets[v];
	const starts = Array.from({ length: graph.count }, (_, v) => v);
	starts.sort((a, b) => degree(b) - degree(a) || a - b);
	let best: number[] = [];
	for (const start of starts.slice(0, STARTS)) {
		const clique = [start];
		let candidates = neighbours(graph, start);
		while (candidates.length > 0) {
			const next = candidates.reduce((a, b) => (degree(b) > degree(a) ? b : a));
			clique.push(next);
			const near = new Set(neighbours(graph, next));
			candidates = candidates.filter((v) => near.has(v));
		}
		if (clique.length > best.length) best = clique;
		if (best.length >= enough) break;
	}
	return best.slice(0, enough);
}

function neighbours({ offsets, targets }: RegionGraph, v: number): number[] {
	return Array.from(targets.subarray(offsets[v], offsets[v + 1]));
}
