/**
 * Clauses under unit propagation, for replaying refutations. Literals are v and -v; a literal's place
 * in the tables is `middle + literal`. Two literals of each clause that are not false are watched: they
 * come first in it.
 */
export class Replay {
	contradiction = false;
	private middle: number;
	/** 1 true, -1 false, 0 open, by literal */
	private values: Int8Array;
	private watching: number[][][];
	private byText = new Map<string, number[][]>();
	private gone = new Set<number[]>();
	private order: number[] = [];
	private done = 0;
	private looked = 0;

	/** `steps`: literals looked at before propagation stops for good, with `spent` set. */
	constructor(
		variables: number,
		private readonly steps = Infinity,
	) {
		this.middle = variables;
		this.values = new Int8Array(2 * variables + 1);
		this.watching = Array.from({ length: 2 * variables + 1 }, () => []);
	}

	/** Whether the steps ran out: what was told since then is not to be relied on. */
	get spent(): boolean {
		return this.looked > this.steps;
	}

	/** Is the clause a consequence by unit propagation? Leaves everything as it was. */
	follows(clause: readonly number[]): boolean {
		const before = this.order.length;
		this.looked += clause.length;
		const clash = !clause.every((literal) => this.assume(-literal)) || !this.propagate();
		for (let i = before; i < this.order.length; i++) {
			this.values[this.middle + this.order[i]] = 0;
			this.values[this.middle - this.order[i]] = 0;
		}
		this.order.length = before;
		this.done = before;
		return clash;
	}

	/** Adds a clause and what it forces. */
	add(given: readonly number[]): void {
		const literals = new Set(given);
		const clause = [...literals];
		this.looked += clause.length;
		if (clause.some((literal) => literals.has(-literal))) return;
		const name = nameOf(clause);
		const twins = this.byText.get(name);
		if (twins) twins.push(clause);
		else this.byText.set(name, [clause]);
		clause.sort((a, b) => this.rank(a) - this.rank(b));
		if (clause.length === 0 || this.value(clause[0]) < 0) {
			this.contradiction = true;
			return;
		}
		if (clause.length > 1) {
			this.watch(clause[0], clause);
			this.watch(clause[1], clause);
		}
		if (clause.length > 1 && this.value(clause[1]) >= 0) return;
		this.contradiction ||= !this.assume(clause[0]) || !this.propagate();
	}

	/** Takes one such clause away, if there is one. */
	remove(clause: readonly number[]): void {
		const twin = this.byText.get(nameOf([...new Set(clause)]))?.pop();
		if (twin) this.gone.add(twin);
	}

	private value(literal: number): number {
		return this.values[this.middle + literal];
	}

	private rank(literal: number): number {
		return this.value(literal) < 0 ? 1 : 0;
	}

	private watch(literal: number, clause: number[]): void {
		this.watching[this.middle + literal].push(clause);
	}

	/** False when the literal is false already. */
	private assume(literal: number): boolean {
		const value = this.value(literal);
		if (value !== 0) return value > 0;
		this.values[this.middle + literal] = 1;
		this.values[this.middle - literal] = -1;
		this.order.push(literal);
		return true;
	}

	/** False when a clause has become false; no more is told once the steps are spent. */
	private propagate(): boolean {
		while (this.done < this.order.length && !this.spent) {
			if (!this.look(-this.order[this.done++])) return false;
		}
		return true;
	}

	/** Sees to every clause that watches a literal which is now false. */
	private look(lost: number): boolean {
		const list = this.watching[this.middle + lost];
		let kept = 0;
		let clash = false;
		this.looked += list.length;
		for (const clause of list) {
			if (!clash && this.gone.has(clause)) continue;
			if (!clash && this.moveWatch(clause, lost)) continue;
			list[kept++] = clause;
			clash ||= !this.assume(clause[0]);
		}
		list.length = kept;
		return !clash;
	}

	/** True when the clause found another literal to watch instead of `lost`. */
	private moveWatch(clause: number[], lost: number): boolean {
		if (clause[0] === lost) {
			clause[0] = clause[1];
			clause[1] = lost;
		}
		if (this.value(clause[0]) > 0) return false;
		for (let place = 2; place < clause.length; place++) {
			const other = clause[place];
			this.looked++;
			if (this.value(other) < 0) continue;
			clause[1] = other;
			clause[place] = lost;
			this.watch(other, clause);
			return true;
		}
		return false;
	}
}

const nameOf = (clause: readonly number[]) => Int32Array.from(clause).sort().join(' ');
