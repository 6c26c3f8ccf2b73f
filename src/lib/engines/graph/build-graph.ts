import type { RegionGraph } from './region-graph.ts';

/**
 * The graph of `count` vertices with an edge for every pair (a[i], b[i]).
 *
 * Pairs may come doubled and in either order. Time and memory are linear: rows are filled by counting
 * and sorted by transposing twice, so no row is ever sorted by comparison.
 *
 * @throws RangeError when a pair leaves 0..count-1, joins a vertex to itself, or the lists differ in length
 */
export function buildGraph(count: number, a: ArrayLike<number>, b: ArrayLike<number>): RegionGraph {
	checkPairs(count, a, b);
	const offsets = rowOffsets(count, a, b);
	const unsorted = fillRows(offsets, a, b);
	return dropDoubles({ count, offsets, targets: transposed(count, offsets, unsorted) });
}

function checkPairs(count: number, a: ArrayLike<number>, b: ArrayLike<number>): void {
	if (a.length !== b.length) throw new RangeError('Both lists of ends must be equally long.');
	for (let i = 0; i < a.length; i++) {
		const u = a[i];
		const v = b[i];
		if (!(u >= 0 && u < count && v >= 0 && v < count) || u === v) {
			throw new RangeError(`Pair ${i} (${u}, ${v}) is no edge of a graph of ${count} vertices.`);
		}
	}
}

function rowOffsets(count: number, a: ArrayLike<number>, b: ArrayLike<number>): Uint32Array {
	const offsets = new Uint32Array(count + 1);
	for (let i = 0; i < a.length; i++) {
		offsets[a[i] + 1]++;
		offsets[b[i] + 1]++;
	}
	for (let v = 0; v < count; v++) offsets[v + 1] += offsets[v];
	return offsets;
}

function fillRows(offsets: Uint32Array, a: ArrayLike<number>, b: ArrayLike<number>): Uint32Array {
	const next = offsets.slice(0, -1);
	const targets = new Uint32Array(2 * a.length);
	for (let i = 0; i < a.length; i++) {
		targets[next[a[i]]++] = b[i];
		targets[next[b[i]]++] = a[i];
	}
	return targets;
}

/**
 * The same symmetric rows, each ascending: walking the rows in order visits the vertices in order, so
 * appending every vertex to the rows of its neighbours leaves them sorted.
 */
export function transposed(count: number, offsets: Uint32Array, rows: Uint32Array): Uint32Array {
	const next = offsets.slice(0, -1);
	const sorted = new Uint32Array(rows.length);
	for (let v = 0; v < count; v++) {
		for (let i = offsets[v]; i < offsets[v + 1]; i++) sorted[next[rows[i]]++] = v;
	}
	return sorted;
}

function dropDoubles({ count, offsets, targets }: RegionGraph): RegionGraph {
	const kept = new Uint32Array(count + 1);
	let length = 0;
	for (let v = 0; v < count; v++) {
		const start = offsets[v];
		for (let i = start; i < offsets[v + 1]; i++) {
			if (i > start && targets[i] === targets[i - 1]) continue;
			targets[length++] = targets[i];
		}
		kept[v + 1] = length;
	}
	return {
		count,
		offsets: kept,
		targets: length === targets.length ? targets : targets.slice(0, length),
	};
}
