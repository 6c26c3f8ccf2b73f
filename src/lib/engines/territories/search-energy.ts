import type { SearchState } from './search-state.ts';

/** What the search holds against a plan besides being outside tolerance; in moves of mean cost. */
export interface Wishes {
	/** weight of a move of mean cost */
	moveWeight: number;
	/** weight of a cut border */
	cutWeight: number;
	/** weight of the squared distance from the targets (see `Penalty`), 0 for fewest moves */
	spreadEnd: number;
}

/** A mean unit outside tolerance, and a territory outside at all, in moves: more than any repair costs. */
const EXCESS = 1000;
const OUTSIDE = 1000;

/** The wishes a plan leaves open: the lower the better among plans within tolerance. */
export function wishEnergy(state: SearchState, wishes: Wishes, territories: Int32Array): number {
	const { moveWeight, cutWeight, spreadEnd } = wishes;
	let spread = 0;
	if (spreadEnd > 0) {
		const { prepared, curve } = state.terms;
		for (const t of territories) {
			for (let at = t; at < curve.length; at += prepared.territories) {
				spread += (state.loads[at] - prepared.targets[at]) ** 2 * curve[at];
			}
		}
	}
	return moveWeight * state.cost + cutWeight * state.cuts + spreadEnd * spread;
}

/** The wishes and, far above them, what is outside tolerance or not kept apart. */
export function fullEnergy(state: SearchState, wishes: Wishes, territories: Int32Array): number {
	const { prepared, perUnit } = state.terms;
	const { least, greatest } = prepared;
	let excess = 0;
	for (const t of territories) {
		if (!prepared.stays[t]) continue;
		for (let m = 0, at = t; m < perUnit.length; m++, at += prepared.territories) {
			const load = state.loads[at];
			const over = Math.max(load - greatest[at], least[at] - load, 0);
			if (over > 0) excess += OUTSIDE + EXCESS * over * perUnit[m];
		}
	}
	const conflicts = 1e6 * state.conflicts();
	return wishEnergy(state, wishes, territories) + excess + conflicts;
}
