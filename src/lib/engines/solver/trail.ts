/**
 * What is assigned, in which order, at which decision level and why.
 * `values[code]` is 1 for a true literal, -1 for a false one, 0 while open; `reasons[v]` is the
 * clause that forced variable v, -1 for a decision.
 */
export class Trail {
	values = new Int8Array(32);
	levels = new Int32Array(16);
	reasons = new Int32Array(16);
	literals = new Int32Array(16);
	size = 0;
	/** literals before this one have been propagated */
	head = 0;
	/** where each decision level starts in `literals` */
	starts: number[] = [];

	get level(): number {
		return this.starts.length;
	}

	/** Room for variables up to and including `variable`. */
	grow(variable: number): void {
		if (variable < this.levels.length) return;
		const capacity = variable * 2;
		const widen = (from: Int32Array) => {
			const to = new Int32Array(capacity);
			to.set(from);
			return to;
		};
		this.levels = widen(this.levels);
		this.reasons = widen(this.reasons);
		this.literals = widen(this.literals);
		const values = new Int8Array(capacity * 2);
		values.set(this.values);
		this.values = values;
	}

	assign(literal: number, reason: number): void {
		const variable = literal >> 1;
		this.values[literal] = 1;
		this.values[literal ^ 1] = -1;
		this.levels[variable] = this.starts.length;
		this.reasons[variable] = reason;
		this.literals[this.size++] = literal;
	}

	openLevel(): void {
		this.starts.push(this.size);
	}

	/** Undoes every level above `level`; `undone` is told each literal, last first. */
	backTo(level: number, undone: (literal: number) => void): void {
		if (this.starts.length <= level) return;
		const start = this.starts[level];
		for (let i = this.size - 1; i >= start; i--) {
			const literal = this.literals[i];
			this.values[literal] = 0;
			this.values[literal ^ 1] = 0;
			undone(literal);
		}
		this.size = start;
		this.head = start;
		this.starts.length = level;
	}
}
