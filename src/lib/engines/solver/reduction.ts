import { HEADER, type ClauseStore } from './clause-store.ts';
import type { ProofRecorder } from './proof-recorder.ts';
import type { Trail } from './trail.ts';
import type { Watches } from './watches.ts';

const KEEP_GLUE = 2;

/**
 * Forgets the half of the learnt clauses that promises least: those that span many levels and have
 * not been used lately. Clauses of two literals, of glue 2 and those that hold up the present
 * assignment stay. Method: Audemard and Simon 2009.
 */
export function forgetHalf(
	store: ClauseStore,
	trail: Trail,
	watches: Watches,
	proof: ProofRecorder | null,
): void {
	const { data } = store;
	const spare = store.learnt.filter(
		(at) => data[at] > 2 && data[at + 1] > KEEP_GLUE && !holdsUp(store, trail, at),
	);
	spare.sort((a, b) => data[b + 1] - data[a + 1] || data[a + 2] - data[b + 2] || a - b);
	const dropped = new Set(spare.slice(0, spare.length >> 1));
	if (proof) for (const at of dropped) proof.forgotten(store.literals(at));
	store.compact(dropped, (from, to) => follow(store, trail, from, to));
	watches.rebuild(store);
}

/** Only a watched literal, one of the first two, can be the one that a clause forces. */
function holdsUp({ data }: ClauseStore, trail: Trail, at: number): boolean {
	const first = data[at + HEADER] >> 1;
	const second = data[at + HEADER + 1] >> 1;
	return isReason(trail, first, at) || isReason(trail, second, at);
}

function isReason(trail: Trail, variable: number, at: number): boolean {
	return trail.values[2 * variable] !== 0 && trail.reasons[variable] === at;
}

function follow({ data }: ClauseStore, trail: Trail, from: number, to: number): void {
	for (let k = 0; k < 2; k++) {
		const variable = data[to + HEADER + k] >> 1;
		if (isReason(trail, variable, from)) trail.reasons[variable] = to;
	}
}
