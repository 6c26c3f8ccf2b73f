import { canLeave, contiguityScratch } from './contiguity.ts';
import type { SearchTerms } from './search-terms.ts';

/**
 * Gives every territory that stays but has neither base nor unit a first unit to grow from: one without
 * territory, far from those that have one; else one at the edge of the territory with the most units.
 */
export function seedEmpty(terms: SearchTerms, assignment: Int32Array): void {
	const { prepared } = terms;
	const sizes = new Int32Array(prepared.territories);
	for (const t of assignment) if (t >= 0) sizes[t]++;
	for (let t = 0; t < prepared.territories; t++) {
		if (sizes[t] > 0 || !prepared.open[t]) continue;
		const unit = farthestFree(terms, assignment, t) ?? fromLargest(terms, assignment, sizes, t);
		if (unit === null) continue;
		if (assignment[unit] >= 0) sizes[assignment[unit]]--;
		assignment[unit] = t;
		sizes[t]++;
	}
}

function mayBegin({ movable, grouped, may, row, prepared }: SearchTerms, unit: number, t: number) {
	const isFree = movable[unit] === 1 && grouped[unit] === 0;
	return isFree && may[row[unit] * prepared.territories + t] === 1;
}

function farthestFree(terms: SearchTerms, assignment: Int32Array, t: number): number | null {
	const { graph, units } = terms.prepared;
	const seen = new Uint8Array(units);
	const queue: number[] = [];
	for (let unit = 0; unit < units; unit++) if (assignment[unit] >= 0) queue.push(unit);
	if (queue.length === units) return null;
	if (queue.length === 0) queue.push(0);
	for (const unit of queue) seen[unit] = 1;
	let far: number | null = null;
	for (const unit of queue) {
		if (assignment[unit] < 0 && mayBegin(terms, unit, t)) far = unit;
		for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
			const next = graph.targets[i];
			if (seen[next]) continue;
			seen[next] = 1;
			queue.push(next);
		}
	}
	return far;
}

function fromLargest(
	terms: SearchTerms,
	assignment: Int32Array,
	sizes: Int32Array,
	t: number,
): number | null {
	const { graph, units } = terms.prepared;
	const scratch = contiguityScratch(units);
	let best: number | null = null;
	for (let unit = 0; unit < units; unit++) {
		const from = assignment[unit];
		if (from < 0 || sizes[from] < 2 || !mayBegin(terms, unit, t)) continue;
		if (best !== null && sizes[from] <= sizes[assignment[best]]) continue;
		if (canLeave(graph, assignment, unit, scratch)) best = unit;
	}
	return best;
}
