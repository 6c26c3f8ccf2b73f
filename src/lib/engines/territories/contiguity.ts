import type { RegionGraph } from '../graph/region-graph.ts';

/** Room for contiguity tests on one graph; makes every test free of allocation. Serves any assignment. */
export interface ContiguityScratch {
	stamps: Uint32Array;
	queue: Uint32Array;
	now: number;
}

const lastStamp = 0xffffffff;

export function contiguityScratch(units: number): ContiguityScratch {
	return { stamps: new Uint32Array(units), queue: new Uint32Array(units), now: 0 };
}

/**
 * Whether `unit` can be taken out of its territory without tearing it: the territory falls into no more
 * pieces than before. For a connected territory: whether the rest is connected (nothing counts as
 * connected, so the caller asks whether the last unit may go). Works for units without territory (-1) too.
 *
 * First the units next to it are joined among themselves, which settles most cases; else breadth first
 * within the territory until all of them are found.
 */
export function canLeave(
	graph: RegionGraph,
	assignment: Int32Array,
	unit: number,
	scratch: ContiguityScratch,
): boolean {
	const { offsets, targets } = graph;
	const { stamps, queue } = scratch;
	const territory = assignment[unit];
	if (scratch.now > lastStamp - 3) {
		stamps.fill(0);
		scratch.now = 0;
	}
	const wanted = scratch.now + 1;
	const found = scratch.now + 2;
	const passed = scratch.now + 3;
	scratch.now = passed;
	let missing = 0;
	let first = -1;
	for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
		const v = targets[i];
		if (assignment[v] !== territory) continue;
		stamps[v] = wanted;
		missing++;
		if (first < 0) first = v;
	}
	if (missing <= 1) return true;
	stamps[first] = found;
	missing--;
	queue[0] = first;
	let tail = 1;
	for (let head = 0; head < tail; head++) {
		const v = queue[head];
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			const w = targets[i];
			if (stamps[w] !== wanted) continue;
			stamps[w] = found;
			if (--missing === 0) return true;
			queue[tail++] = w;
		}
	}
	stamps[unit] = passed;
	for (let head = 0; head < tail; head++) {
		const v = queue[head];
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			const w = targets[i];
			if (assignment[w] !== territory) continue;
			const stamp = stamps[w];
			if (stamp === found || stamp === passed) continue;
			if (stamp === wanted && --missing === 0) return true;
			stamps[w] = passed;
			queue[tail++] = w;
		}
	}
	return false;
}
