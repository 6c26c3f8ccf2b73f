import { canLeave, type ContiguityScratch } from './contiguity.ts';
import type { Stream } from './least-streams.ts';
import type { SearchState } from './search-state.ts';

/**
 * Carries out streams by moving border units one at a time, those first that cost least and leave the
 * fewest borders cut, while every territory stays in one piece. What no unit can carry is left undone.
 */
export function realiseStreams(
	state: SearchState,
	scratch: ContiguityScratch,
	streams: readonly Stream[],
	cutWeight: number,
): void {
	const left = streams.map(({ units }) => units);
	for (let moved = true; moved;) {
		moved = false;
		streams.forEach(({ from, to }, i) => {
			if (left[i] < 0.3) return;
			const unit = bestUnit(state, scratch, from, to, left[i], cutWeight);
			if (unit < 0) return;
			left[i] -= weight(state, unit, from);
			state.move(unit, to);
			moved = true;
		});
	}
}

/** Load of a unit in mean units of `territory`, the largest over the measures. */
function weight({ terms, loads, sizes }: SearchState, unit: number, territory: number): number {
	const { bound, loads: own, units, territories } = terms.prepared;
	let most = 0;
	for (let m = 0; m < bound.length; m++) {
		const mean = loads[m * territories + territory] / sizes[territory];
		if (mean > 0) most = Math.max(most, own[m * units + unit] / mean);
	}
	return most;
}

function bestUnit(
	state: SearchState,
	scratch: ContiguityScratch,
	from: number,
	to: number,
	room: number,
	cutWeight: number,
): number {
	const { prepared, movable, grouped, may, row, apart } = state.terms;
	const { members, sizes, assignment } = state;
	let best = -1;
	let least = Infinity;
	for (let k = 0; k < sizes[from]; k++) {
		const unit = members[from][k];
		if (!movable[unit] || grouped[unit] || !may[row[unit] * prepared.territories + to]) continue;
		if (!borders(state, unit, to)) continue;
		const carried = weight(state, unit, from);
		if (carried > room + 0.5 || carried < 0.05) continue;
		const price = (moveCost(state, unit, from, to) + 1e-3) / Math.min(carried, room);
		const energy = price + cutWeight * state.cutChange(unit, from, to);
		if (energy >= least || sizes[from] < 2) continue;
		if (apart[unit]?.some((other) => assignment[other] === to)) continue;
		if (!canLeave(prepared.graph, assignment, unit, scratch)) continue;
		best = unit;
		least = energy;
	}
	return best;
}

function borders({ assignment, terms }: SearchState, unit: number, to: number): boolean {
	const { offsets, targets } = terms.prepared.graph;
	for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
		if (assignment[targets[i]] === to) return true;
	}
	return false;
}

function moveCost({ terms }: SearchState, unit: number, from: number, to: number): number {
	const home = terms.prepared.problem.today[unit];
	if (from === home) return terms.cost[unit];
	return to === home ? -terms.cost[unit] : 0;
}
