import type { Activity } from './activity.ts';
import { HEADER, type ClauseStore } from './clause-store.ts';
import type { Trail } from './trail.ts';

/**
 * Learns from a conflict. After `learn`, `literals` is the learnt clause with the literal to assert
 * first and a literal of the level to return to second; `glue` is the number of levels it spans.
 * Method: first unique implication point (Marques-Silva and Sakallah 1996), clause minimisation
 * (Sorensson and Biere 2009), glue (Audemard and Simon 2009).
 */
export class Analysis {
	literals: number[] = [];
	glue = 0;
	private seen = new Uint8Array(16);
	private marked: number[] = [];
	private stack: number[] = [];
	private stamps = new Int32Array(16);
	private stamp = 0;

	constructor(
		private trail: Trail,
		private store: ClauseStore,
		private activity: Activity,
	) {}

	/** Room for variables up to and including `variable`. */
	grow(variable: number): void {
		if (variable < this.seen.length) return;
		const seen = new Uint8Array(variable * 2);
		seen.set(this.seen);
		this.seen = seen;
		this.stamps = new Int32Array(variable * 2 + 1);
		this.stamp = 0;
	}

	/** The level to return to; `now` is the count of conflicts. */
	learn(conflict: number, now: number): number {
		const { trail, seen } = this;
		this.literals = [0];
		let open = 0;
		let at = trail.size - 1;
		let clause = conflict;
		let asserted = -1;
		do {
			open += this.resolve(clause, asserted, now);
			while (seen[trail.literals[at] >> 1] === 0) at--;
			asserted = trail.literals[at--];
			clause = trail.reasons[asserted >> 1];
			seen[asserted >> 1] = 0;
			open--;
		} while (open > 0);
		this.literals[0] = asserted ^ 1;
		this.minimise();
		this.glue = this.countLevels();
		for (const variable of this.marked) seen[variable] = 0;
		this.marked = [];
		return this.placeSecond();
	}

	/** Marks the literals of a clause; returns how many of them belong to the current level. */
	private resolve(clause: number, asserted: number, now: number): number {
		const { trail, seen } = this;
		const { data } = this.store;
		const end = clause + HEADER + data[clause];
		let current = 0;
		if (data[clause + 1] > 0) data[clause + 2] = now;
		for (let k = clause + HEADER; k < end; k++) {
			const literal = data[k];
			const variable = literal >> 1;
			if (literal === asserted || seen[variable] === 1 || trail.levels[variable] === 0) continue;
			this.mark(variable);
			this.activity.bump(variable);
			if (trail.levels[variable] === trail.level) current++;
			else this.literals.push(literal);
		}
		return current;
	}

	private mark(variable: number): void {
		this.seen[variable] = 1;
		this.marked.push(variable);
	}

	/** Leaves out literals that follow from the others. */
	private minimise(): void {
		const { trail } = this;
		let levels = 0;
		for (let k = 1; k < this.literals.length; k++) {
			levels |= 1 << (trail.levels[this.literals[k] >> 1] & 31);
		}
		let keep = 1;
		for (let k = 1; k < this.literals.length; k++) {
			const literal = this.literals[k];
			if (trail.reasons[literal >> 1] < 0 || !this.follows(literal, levels)) {
				this.literals[keep++] = literal;
			}
		}
		this.literals.length = keep;
	}

	/** Does the negation of `literal` follow from marked literals alone? Marks what it passes when so. */
	private follows(literal: number, levels: number): boolean {
		const { trail, seen, stack } = this;
		const { data } = this.store;
		const before = this.marked.length;
		stack.length = 0;
		stack.push(literal);
		while (stack.length > 0) {
			const top = stack.pop() as number;
			const clause = trail.reasons[top >> 1];
			const end = clause + HEADER + data[clause];
			for (let k = clause + HEADER; k < end; k++) {
				const variable = data[k] >> 1;
				const level = trail.levels[variable];
				if (variable === top >> 1 || seen[variable] === 1 || level === 0) continue;
				if (trail.reasons[variable] < 0 || (levels & (1 << (level & 31))) === 0) {
					this.unmark(before);
					return false;
				}
				this.mark(variable);
				stack.push(data[k]);
			}
		}
		return true;
	}

	private unmark(before: number): void {
		for (let k = before; k < this.marked.length; k++) this.seen[this.marked[k]] = 0;
		this.marked.length = before;
	}

	private countLevels(): number {
		this.stamp++;
		let glue = 0;
		for (const literal of this.literals) {
			const level = this.trail.levels[literal >> 1];
			if (this.stamps[level] === this.stamp) continue;
			this.stamps[level] = this.stamp;
			glue++;
		}
		return glue;
	}

	/** Moves a literal of the highest level below the current one to the second place. */
	private placeSecond(): number {
		const { literals, trail } = this;
		if (literals.length === 1) return 0;
		let highest = 1;
		for (let k = 2; k < literals.length; k++) {
			if (trail.levels[literals[k] >> 1] > trail.levels[literals[highest] >> 1]) highest = k;
		}
		[literals[1], literals[highest]] = [literals[highest], literals[1]];
		return trail.levels[literals[1] >> 1];
	}

	/**
	 * Which decisions force `literal`? All decisions are assumptions when this is asked. Returns them
	 * (as assumed), without `literal` itself.
	 */
	blame(literal: number): number[] {
		const { trail, seen } = this;
		const { data } = this.store;
		const blamed: number[] = [];
		if (trail.levels[literal >> 1] === 0) return blamed;
		this.mark(literal >> 1);
		for (let at = trail.size - 1; at >= trail.starts[0]; at--) {
			const assigned = trail.literals[at];
			if (seen[assigned >> 1] === 0) continue;
			const clause = trail.reasons[assigned >> 1];
			if (clause < 0) {
				blamed.push(assigned);
				continue;
			}
			const end = clause + HEADER + data[clause];
			for (let k = clause + HEADER; k < end; k++) {
				const variable = data[k] >> 1;
				if (seen[variable] === 0 && trail.levels[variable] > 0) this.mark(variable);
			}
		}
		this.unmark(0);
		return blamed;
	}
}
