import { transposed } from './build-graph.ts';
import type { RegionGraph } from './region-graph.ts';

/**
 * The same graph with the vertex `order[i]` called i. `order` holds every vertex once; `position` is
 * its inverse.
 */
export function renumber(
	graph: RegionGraph,
	order: Uint32Array,
): { graph: RegionGraph; position: Uint32Array } {
	const { count, offsets, targets } = graph;
	const position = new Uint32Array(count);
	for (let i = 0; i < count; i++) position[order[i]] = i;
	const rows = new Uint32Array(targets.length);
	const rowOffsets = new Uint32Array(count + 1);
	let length = 0;
	for (let i = 0; i < count; i++) {
		const v = order[i];
		for (let e = offsets[v]; e < offsets[v + 1]; e++) rows[length++] = position[targets[e]];
		rowOffsets[i + 1] = length;
	}
	return {
		graph: { count, offsets: rowOffsets, targets: transposed(count, rowOffsets, rows) },
		position,
	};
}
