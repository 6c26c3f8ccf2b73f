import { smallestLastOrder, type RegionGraph } from '../../../src/lib/engines/graph/index.ts';

/** The two usual heuristics, written plainly, to stand beside the engine in the same run. */

/** Smallest-last greedy colouring (D. Matula, L. Beck 1983): the number of inks. */
export function greedySmallestLast(graph: RegionGraph): number {
	const { order } = smallestLastOrder(graph);
	const ink = new Int32Array(graph.count).fill(-1);
	let inks = 0;
	for (let i = order.length - 1; i >= 0; i--) {
		ink[order[i]] = lowestFree(graph, ink, order[i]);
		inks = Math.max(inks, ink[order[i]] + 1);
	}
	return inks;
}

/** DSATUR (D. Brélaz, Comm. ACM 22, 1979) with buckets by saturation: the number of inks. */
export function dsatur(graph: RegionGraph): number {
	const { count, offsets, targets } = graph;
	const ink = new Int32Array(count).fill(-1);
	const saturation = new Uint8Array(count);
	const around: Set<number>[] = Array.from({ length: count }, () => new Set());
	const degree = (v: number) => offsets[v + 1] - offsets[v];
	const byDegree = Array.from({ length: count }, (_, v) => v).sort((v, w) => degree(v) - degree(w));
	const buckets: number[][] = [byDegree];
	let inks = 0;
	for (let done = 0; done < count;) {
		let level = buckets.length - 1;
		while (buckets[level].length === 0) level--;
		const v = buckets[level].pop() as number;
		if (ink[v] >= 0 || saturation[v] !== level) continue;
		ink[v] = lowestFree(graph, ink, v);
		inks = Math.max(inks, ink[v] + 1);
		done++;
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const w = targets[e];
			if (ink[w] >= 0 || around[w].has(ink[v])) continue;
			around[w].add(ink[v]);
			(buckets[++saturation[w]] ??= []).push(w);
		}
	}
	return inks;
}

function lowestFree({ offsets, targets }: RegionGraph, ink: Int32Array, v: number): number {
	const taken = new Set<number>();
	for (let e = offsets[v]; e < offsets[v + 1]; e++) taken.add(ink[targets[e]]);
	let free = 0;
	while (taken.has(free)) free++;
	return free;
}
