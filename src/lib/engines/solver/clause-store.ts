/**
 * All clauses of a solver in one growing typed array. A clause is named by its place `at`:
 * data[at] = number of literals, data[at + 1] = glue (0 for a clause that was given, else the number
 * of decision levels it was learnt from), data[at + 2] = conflict at which it was last used,
 * data[at + 3 ...] = its literals. Literal codes: 2v for variable v, 2v + 1 for its negation. The
 * first two literals are the watched ones.
 */
export const HEADER = 3;

export class ClauseStore {
	data = new Int32Array(1 << 12);
	used = 0;
	learnt: number[] = [];
	given: number[] = [];

	add(literals: ArrayLike<number>, glue: number, now: number): number {
		const at = this.used;
		this.used += HEADER + literals.length;
		if (this.used > this.data.length) {
			const larger = new Int32Array(Math.max(this.used, this.data.length * 2));
			larger.set(this.data);
			this.data = larger;
		}
		this.data[at] = literals.length;
		this.data[at + 1] = glue;
		this.data[at + 2] = now;
		for (let k = 0; k < literals.length; k++) this.data[at + HEADER + k] = literals[k];
		(glue === 0 ? this.given : this.learnt).push(at);
		return at;
	}

	literals(at: number): Int32Array {
		return this.data.subarray(at + HEADER, at + HEADER + this.data[at]);
	}

	/**
	 * Drops the learnt clauses in `dropped` and closes the holes. `moved` is told every clause that
	 * changed its place, so that reasons can follow; watch lists have to be built afresh.
	 */
	compact(dropped: ReadonlySet<number>, moved: (from: number, to: number) => void): void {
		const kept = [...this.given, ...this.learnt.filter((at) => !dropped.has(at))];
		kept.sort((a, b) => a - b);
		let free = 0;
		this.given = [];
		this.learnt = [];
		for (const at of kept) {
			const length = HEADER + this.data[at];
			if (free !== at) {
				this.data.copyWithin(free, at, at + length);
				moved(at, free);
			}
			(this.data[free + 1] === 0 ? this.given : this.learnt).push(free);
			free += length;
		}
		this.used = free;
	}
}
