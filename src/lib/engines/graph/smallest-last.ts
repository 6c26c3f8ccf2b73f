import type { RegionGraph } from './region-graph.ts';

/**
 * The vertices in an order in which each has the fewest neighbours among itself and those after it:
 * the first is taken away first. Colouring runs from the end. `degeneracy` is the most neighbours any
 * vertex has after it. Linear time by buckets.
 *
 * Source: D. Matula, L. Beck, Smallest-last ordering and clustering and graph coloring algorithms,
 * J. ACM 30 (1983); array form by V. Batagelj, M. Zaversnik, arXiv:cs/0310049.
 */
export function smallestLastOrder(graph: RegionGraph): {
	order: Uint32Array;
	degeneracy: number;
} {
	const { count, offsets, targets } = graph;
	const degree = new Uint32Array(count);
	for (let v = 0; v < count; v++) degree[v] = offsets[v + 1] - offsets[v];
	const { order, place, start } = bucketed(degree);
	let degeneracy = 0;
	for (let i = 0; i < count; i++) {
		const v = order[i];
		const least = degree[v];
		if (least > degeneracy) degeneracy = least;
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const w = targets[e];
			if (degree[w] > least) demote(w, degree, order, place, start);
		}
	}
	return { order, degeneracy };
}

/** Vertices sorted by degree; where each stands; where each degree starts. */
function bucketed(degree: Uint32Array) {
	const count = degree.length;
	let most = 0;
	for (let v = 0; v < count; v++) if (degree[v] > most) most = degree[v];
	const start = new Uint32Array(most + 2);
	for (let v = 0; v < count; v++) start[degree[v] + 1]++;
	for (let d = 0; d <= most; d++) start[d + 1] += start[d];
	const next = start.slice();
	const order = new Uint32Array(count);
	const place = new Uint32Array(count);
	for (let v = 0; v < count; v++) {
		place[v] = next[degree[v]]++;
		order[place[v]] = v;
	}
	return { order, place, start };
}

/** Lowers the degree of `w` by one: it changes places with the first of its bucket, which shrinks. */
function demote(
	w: number,
	degree: Uint32Array,
	order: Uint32Array,
	place: Uint32Array,
	start: Uint32Array,
): void {
	const from = place[w];
	const to = start[degree[w]]++;
	const other = order[to];
	order[from] = other;
	place[other] = from;
	order[to] = w;
	place[w] = to;
	degree[w]--;
}
