import type { KuratowskiWitness } from './kuratowski-check.ts';
import type { RegionGraph } from './region-graph.ts';

/** The witness with every path rerouted the shortest way that avoids the others, until none shortens. */
export function shortenPaths(graph: RegionGraph, witness: KuratowskiWitness): KuratowskiWitness {
	const paths = witness.paths.map((path) => path.slice());
	const inUse = new Set([...witness.hubs, ...paths.flat()]);
	for (let shortened = true; shortened;) {
		shortened = false;
		for (let i = 0; i < paths.length; i++) {
			const path = paths[i];
			if (path.length === 2) continue;
			for (const v of path.slice(1, -1)) inUse.delete(v);
			const shorter = shortestPath(graph, path[0], path[path.length - 1], inUse);
			if (shorter.length < path.length) {
				paths[i] = shorter;
				shortened = true;
			}
			for (const v of paths[i]) inUse.add(v);
		}
	}
	return { ...witness, paths };
}

/** Breadth first; the vertices of `avoid` may only be the ends. */
function shortestPath(
	{ offsets, targets }: RegionGraph,
	from: number,
	to: number,
	avoid: Set<number>,
): number[] {
	const parent = new Map([[from, -1]]);
	const queue = [from];
	for (let head = 0; head < queue.length && !parent.has(to); head++) {
		const v = queue[head];
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const w = targets[e];
			if (parent.has(w) || (w !== to && avoid.has(w))) continue;
			parent.set(w, v);
			queue.push(w);
		}
	}
	const path: number[] = [];
	for (let v = to; v !== -1; v = parent.get(v) as number) path.push(v);
	return path.reverse();
}
