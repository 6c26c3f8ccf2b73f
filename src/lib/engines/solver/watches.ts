import { HEADER, type ClauseStore } from './clause-store.ts';

/** shared by all literals that are in no clause yet */
const NONE = new Int32Array(0);

/**
 * For each literal the clauses to look at when it becomes false: pairs (clause, blocker). A blocker
 * is another literal of the clause: while it is true the clause need not be opened. Clauses of two
 * literals are entered as ~clause, and their blocker is all there is to know about them.
 * Method: two watched literals (Moskewicz et al. 2001) with blockers (Een and Sorensson 2008).
 */
export class Watches {
	lists: Int32Array[] = [];
	sizes = new Int32Array(16);

	/** Room for literal codes below `codes`. */
	grow(codes: number): void {
		while (this.lists.length < codes) this.lists.push(NONE);
		if (this.sizes.length < codes) {
			const larger = new Int32Array(codes * 2);
			larger.set(this.sizes);
			this.sizes = larger;
		}
	}

	add(literal: number, clause: number, blocker: number): void {
		const size = this.sizes[literal];
		let list = this.lists[literal];
		if (size + 2 > list.length) {
			const larger = new Int32Array(Math.max(8, list.length * 2));
			larger.set(list);
			list = this.lists[literal] = larger;
		}
		list[size] = clause;
		list[size + 1] = blocker;
		this.sizes[literal] = size + 2;
	}

	attach(store: ClauseStore, at: number): void {
		const first = store.data[at + HEADER];
		const second = store.data[at + HEADER + 1];
		const entry = store.data[at] === 2 ? ~at : at;
		this.add(first, entry, second);
		this.add(second, entry, first);
	}

	rebuild(store: ClauseStore): void {
		this.sizes.fill(0);
		for (const at of store.given) this.attach(store, at);
		for (const at of store.learnt) this.attach(store, at);
	}
}
