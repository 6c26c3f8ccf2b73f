import type { RegionGraph } from '../graph/region-graph.ts';
import { buildGraph } from '../graph/build-graph.ts';
import type { Territory } from './problem.ts';

/** Steps on today's territory graph are counted up to here; `tooFar` is beyond or unreachable. */
export const mostSteps = 254;
export const tooFar = 255;

/**
 * Steps from each territory to each on today's territory graph, `steps[a * k + b]`. Two territories are
 * next to each other when any two of their units are joined. The base of a territory that stays belongs
 * to its area even where it lies in another territory today, which is then next to it: so a new hire has
 * a place on the graph. Closing territories are part of it; a territory without units and base is too
 * far from all.
 */
export function todaySteps(
	graph: RegionGraph,
	today: Int32Array,
	territories: readonly Territory[],
): Uint8Array {
	const k = territories.length;
	const next = todayGraph(graph, today, territories);
	const steps = new Uint8Array(k * k).fill(tooFar);
	const queue = new Uint32Array(k);
	for (let from = 0; from < k; from++) {
		const row = steps.subarray(from * k, from * k + k);
		row[from] = 0;
		queue[0] = from;
		let tail = 1;
		for (let head = 0; head < tail && row[queue[head]] < mostSteps; head++) {
			const t = queue[head];
			for (let i = next.offsets[t]; i < next.offsets[t + 1]; i++) {
				const other = next.targets[i];
				if (row[other] !== tooFar) continue;
				row[other] = row[t] + 1;
				queue[tail++] = other;
			}
		}
	}
	return steps;
}

function todayGraph(
	{ offsets, targets, count }: RegionGraph,
	today: Int32Array,
	territories: readonly Territory[],
): RegionGraph {
	const settler = new Int32Array(count).fill(-1);
	territories.forEach(({ base, closing }, t) => {
		if (base >= 0 && !closing) settler[base] = t;
	});
	const a: number[] = [];
	const b: number[] = [];
	const join = (s: number, t: number) => {
		if (s < 0 || t < 0 || s === t) return;
		a.push(s);
		b.push(t);
	};
	for (let u = 0; u < count; u++) {
		join(today[u], settler[u]);
		for (let i = offsets[u]; i < offsets[u + 1]; i++) {
			const v = targets[i];
			if (v > u) join(today[u], today[v]);
			join(settler[u], today[v]);
			if (v > u) join(settler[u], settler[v]);
		}
	}
	return buildGraph(territories.length, a, b);
}
