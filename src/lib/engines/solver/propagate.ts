import { HEADER, type ClauseStore } from './clause-store.ts';
import type { Trail } from './trail.ts';
import type { Watches } from './watches.ts';

/**
 * Assigns everything that follows from the literals not yet looked at. Returns the clause that became
 * false, or -1. Longer than a function should be because it is the loop that takes the time.
 */
export function propagate(trail: Trail, store: ClauseStore, watches: Watches): number {
	const values = trail.values;
	const data = store.data;
	while (trail.head < trail.size) {
		const gone = trail.literals[trail.head++] ^ 1;
		const list = watches.lists[gone];
		const size = watches.sizes[gone];
		let keep = 0;
		let conflict = -1;
		let i = 0;
		while (i < size) {
			const clause = list[i];
			const blocker = list[i + 1];
			i += 2;
			const seen = values[blocker];
			if (seen === 1 || clause < 0) {
				list[keep++] = clause;
				list[keep++] = blocker;
				if (seen === 1) continue;
				if (seen === 0) trail.assign(blocker, ~clause);
				else {
					conflict = ~clause;
					break;
				}
				continue;
			}
			const first = clause + HEADER;
			if (data[first] === gone) {
				data[first] = data[first + 1];
				data[first + 1] = gone;
			}
			const other = data[first];
			if (other !== blocker && values[other] === 1) {
				list[keep++] = clause;
				list[keep++] = other;
				continue;
			}
			const end = first + data[clause];
			let k = first + 2;
			while (k < end && values[data[k]] === -1) k++;
			if (k < end) {
				const fresh = data[k];
				data[first + 1] = fresh;
				data[k] = gone;
				watches.add(fresh, clause, other);
				continue;
			}
			list[keep++] = clause;
			list[keep++] = other;
			if (values[other] === -1) {
				conflict = clause;
				break;
			}
			trail.assign(other, clause);
		}
		if (keep !== i) list.copyWithin(keep, i, size);
		watches.sizes[gone] = size - (i - keep);
		if (conflict >= 0) {
			trail.head = trail.size;
			return conflict;
		}
	}
	return -1;
}
