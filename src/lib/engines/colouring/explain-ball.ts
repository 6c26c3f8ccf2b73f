import type { RegionGraph } from '../graph/region-graph.ts';

/** The vertices at most `radius` steps from one of the starts, nearest first. */
export function around(graph: RegionGraph, starts: Iterable<number>, radius: number): number[] {
	const seen = new Set(starts);
	let rim = [...seen];
	for (let step = 0; step < radius && rim.length > 0; step++) {
		const next: number[] = [];
		for (const v of rim) {
			for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
				const w = graph.targets[e];
				if (seen.has(w)) continue;
				seen.add(w);
				next.push(w);
			}
		}
		rim = next;
	}
	return [...seen];
}
