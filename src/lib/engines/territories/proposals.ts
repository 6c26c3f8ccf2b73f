import { Dice } from './dice.ts';
import type { SearchState } from './search-state.ts';

/**
 * Draws what an annealing looks at next: a unit and the bordering territory it might go to (`unit`, `to`),
 * and for a chain a second one that the latter passes on (`second`, `secondTo`). Most start at
 * territories outside tolerance. Only what the rules on single units allow is drawn.
 */
export class Proposals {
	unit = -1;
	to = -1;
	second = -1;
	secondTo = -1;
	readonly dice: Dice;
	/** free units of the territories that take part, ascending */
	readonly units: Int32Array;
	/** 1 for territories that take part */
	readonly active: Uint8Array;
	private readonly state: SearchState;

	constructor(state: SearchState, territories: Int32Array, seed: number) {
		this.state = state;
		this.dice = new Dice(seed);
		this.active = new Uint8Array(state.terms.prepared.territories);
		const units: number[] = [];
		for (const t of territories) {
			this.active[t] = 1;
			for (let i = 0; i < state.sizes[t]; i++) {
				const unit = state.members[t][i];
				if (state.terms.movable[unit]) units.push(unit);
			}
		}
		this.units = Int32Array.from(units).sort();
	}

	/** Draws `unit` and `to`; false when the draw came to nothing. */
	draw(): boolean {
		const { outsideCount, outside, terms } = this.state;
		if (terms.apartPairs.length > 0 && this.dice.chance(3000)) return this.part();
		if (outsideCount > 0 && this.dice.chance(45000)) {
			const t = outside[this.dice.below(outsideCount)];
			if (!this.active[t]) return false;
			return this.state.side(t) > 0 ? this.give(t) : this.take(t);
		}
		const unit = this.units[this.dice.below(this.units.length)];
		return this.allowed(unit, this.foreign(unit));
	}

	/** One of a pair to be kept apart goes to a neighbour, if they are together. */
	private part(): boolean {
		const { assignment, terms } = this.state;
		const unit = terms.apartPairs[this.dice.below(terms.apartPairs.length)];
		return this.meets(unit, assignment[unit]) && this.allowed(unit, this.foreign(unit));
	}

	/** A member of `t` goes to a neighbour. */
	private give(t: number): boolean {
		const { members, sizes } = this.state;
		for (let tries = 0; tries < 4; tries++) {
			const unit = members[t][this.dice.below(sizes[t])];
			const to = this.foreign(unit);
			if (to >= 0) return this.allowed(unit, to);
		}
		return false;
	}

	/** A unit that borders on a member of `t` comes to it. */
	private take(t: number): boolean {
		const { members, sizes, assignment, terms } = this.state;
		const { offsets, targets } = terms.prepared.graph;
		for (let tries = 0; tries < 4; tries++) {
			const member = members[t][this.dice.below(sizes[t])];
			const degree = offsets[member + 1] - offsets[member];
			if (degree === 0) continue;
			const unit = targets[offsets[member] + this.dice.below(degree)];
			if (assignment[unit] !== t) return this.allowed(unit, t);
		}
		return false;
	}

	/** Draws `second` and `secondTo`: a unit of `to` to pass on when `unit` has come to it. */
	drawSecond(): boolean {
		const { members, sizes, terms } = this.state;
		const middle = this.to;
		for (let tries = 0; tries < 3; tries++) {
			const second = members[middle][this.dice.below(sizes[middle])];
			const to = this.foreign(second);
			if (to < 0 || terms.grouped[second] || !this.mayGo(second, to)) continue;
			if (this.meets(second, to)) continue;
			this.second = second;
			this.secondTo = to;
			return true;
		}
		return false;
	}

	/** The territory of a random neighbour of `unit` that is in another, -1 for none. */
	private foreign(unit: number): number {
		const { assignment, terms } = this.state;
		const { offsets, targets } = terms.prepared.graph;
		const start = offsets[unit];
		const degree = offsets[unit + 1] - start;
		if (degree === 0) return -1;
		const own = assignment[unit];
		let i = this.dice.below(degree);
		for (let k = 0; k < degree; k++) {
			const t = assignment[targets[start + i]];
			if (t !== own) return t;
			if (++i === degree) i = 0;
		}
		return -1;
	}

	private allowed(unit: number, to: number): boolean {
		if (to < 0 || !this.mayGo(unit, to)) return false;
		if (!this.state.terms.grouped[unit] && this.meets(unit, to)) return false;
		this.unit = unit;
		this.to = to;
		return true;
	}

	private mayGo(unit: number, to: number): boolean {
		const { terms, assignment } = this.state;
		return (
			terms.movable[unit] === 1 &&
			this.active[to] === 1 &&
			terms.may[terms.row[unit] * terms.prepared.territories + to] === 1 &&
			this.active[assignment[unit]] === 1
		);
	}

	/** Whether a unit that must be apart from `unit` is in `territory`. */
	meets(unit: number, territory: number): boolean {
		const { assignment, terms } = this.state;
		const others = terms.apart[unit];
		if (others === null) return false;
		for (const other of others) if (assignment[other] === territory) return true;
		return false;
	}
}
