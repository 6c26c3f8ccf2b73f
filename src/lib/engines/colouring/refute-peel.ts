import type { RegionGraph } from '../graph/region-graph.ts';

/**
 * The vertices left when those with fewer than `inks` neighbours are taken away again and again. What
 * was taken away can always be coloured last, so the rest alone decides.
 */
export function peel({ count, offsets, targets }: RegionGraph, inks: number): number[] {
	const degree = new Uint32Array(count);
	const gone: number[] = [];
	for (let v = 0; v < count; v++) {
		degree[v] = offsets[v + 1] - offsets[v];
		if (degree[v] < inks) gone.push(v);
	}
	const taken = new Uint8Array(count);
	for (const v of gone) taken[v] = 1;
	for (let i = 0; i < gone.length; i++) {
		for (let e = offsets[gone[i]]; e < offsets[gone[i] + 1]; e++) {
			const w = targets[e];
			if (taken[w] === 1 || --degree[w] >= inks) continue;
			taken[w] = 1;
			gone.push(w);
		}
	}
	const left: number[] = [];
	for (let v = 0; v < count; v++) if (taken[v] === 0) left.push(v);
	return left;
}
