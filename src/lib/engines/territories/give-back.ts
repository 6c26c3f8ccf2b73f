import { canLeave, type ContiguityScratch } from './contiguity.ts';
import type { SearchState } from './search-state.ts';

/**
 * Gives moved units back to their territory of today, the costliest first, while both territories stay
 * within tolerance and in one piece; then pairs of them at once, where one alone would break a tolerance.
 * Ends when nothing more can be given back; the cost only falls.
 */
export function giveBack(state: SearchState, scratch: ContiguityScratch): void {
	for (;;) {
		const before = state.cost;
		const moved = movedUnits(state);
		for (const unit of moved) tryBack(state, scratch, unit, -1);
		for (const unit of movedUnits(state)) {
			for (const other of partners(state, unit)) {
				if (tryBack(state, scratch, unit, other)) break;
			}
		}
		if (state.cost >= before - 1e-9) return;
	}
}

/** Units away from home that may and can go back on their own, the costliest first. */
function movedUnits({ assignment, terms }: SearchState): number[] {
	const { prepared, movable, grouped, cost } = terms;
	const { today } = prepared.problem;
	const moved: number[] = [];
	for (let unit = 0; unit < assignment.length; unit++) {
		if (assignment[unit] === today[unit] || cost[unit] <= 0) continue;
		if (movable[unit] && !grouped[unit] && isOpenHome(terms.prepared, unit)) moved.push(unit);
	}
	return moved.sort((a, b) => cost[b] - cost[a] || a - b);
}

function isOpenHome({ problem, open, stays }: SearchState['terms']['prepared'], unit: number) {
	const home = problem.today[unit];
	return home >= 0 && open[home] === 1 && stays[home] === 1;
}

/** Moved units whose way back shares a territory with that of `unit`. */
function partners(state: SearchState, unit: number): number[] {
	const { today } = state.terms.prepared.problem;
	const ends = new Set([state.assignment[unit], today[unit]]);
	return movedUnits(state).filter(
		(other) => other !== unit && (ends.has(state.assignment[other]) || ends.has(today[other])),
	);
}

function tryBack(
	state: SearchState,
	scratch: ContiguityScratch,
	unit: number,
	other: number,
): boolean {
	const { today } = state.terms.prepared.problem;
	const { outsideCount, assignment } = state;
	const from = assignment[unit];
	const otherFrom = other < 0 ? -1 : assignment[other];
	if (from === today[unit] || (other >= 0 && otherFrom === today[other])) return false;
	if (!step(state, scratch, unit, today[unit])) return false;
	const both = other < 0 || step(state, scratch, other, today[other]);
	if (both && state.outsideCount <= outsideCount) return true;
	if (both && other >= 0) state.move(other, otherFrom);
	state.move(unit, from);
	return false;
}

/** Moves `unit` to the bordering territory `to` if its own stays in one piece and nobody there is apart. */
function step(state: SearchState, scratch: ContiguityScratch, unit: number, to: number): boolean {
	const { assignment, sizes, terms } = state;
	const { graph } = terms.prepared;
	let borders = false;
	for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1] && !borders; i++) {
		borders = assignment[graph.targets[i]] === to;
	}
	if (!borders || sizes[assignment[unit]] < 2) return false;
	if (terms.apart[unit]?.some((other) => assignment[other] === to)) return false;
	if (!canLeave(graph, assignment, unit, scratch)) return false;
	state.move(unit, to);
	return true;
}
