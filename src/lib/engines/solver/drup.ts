/**
 * Replays a refutation. Shares no code with the solver: it knows only unit propagation.
 *
 * In: clauses as lists of non-zero integers (v or -v, v from 1); the proof as text, one clause a line
 * ended by 0, lines that start with `d` take a clause away. Out: whether every line follows from the
 * clauses before it by unit propagation and a contradiction is reached; else the first fault.
 * Source: Goldberg and Novikov 2003 (reverse unit propagation); the text form is DRUP (Heule, Hunt and
 * Wetzler 2013). Taking away a clause that forces a literal does not take back the literal, which is
 * sound, since only consequences are ever added.
 */
export function checkDrup(
	clauses: readonly (readonly number[])[],
	proof: string,
): { valid: boolean; reason?: string } {
	const replay = new Replay();
	for (const clause of clauses) {
		if (!clause.every(isLiteral)) return { valid: false, reason: 'a clause holds no literal' };
		replay.add(clause);
	}
	const lines = proof.split('\n');
	for (let i = 0; i < lines.length && !replay.contradiction; i++) {
		const words = lines[i].trim().split(/\s+/);
		if (words[0] === '' || words[0] === 'c') continue;
		const taken = words[0] === 'd';
		const numbers = (taken ? words.slice(1) : words).map(Number);
		if (numbers.pop() !== 0 || !numbers.every(isLiteral)) {
			return { valid: false, reason: `line ${i + 1} is not a clause` };
		}
		if (taken) replay.remove(numbers);
		else if (replay.follows(numbers)) replay.add(numbers);
		else return { valid: false, reason: `line ${i + 1} does not follow` };
	}
	return replay.contradiction
		? { valid: true }
		: { valid: false, reason: 'the lines end without a contradiction' };
}

const isLiteral = (value: number) => Number.isInteger(value) && value !== 0;

class Replay {
	contradiction = false;
	private assigned = new Map<number, boolean>();
	private watching = new Map<number, number[][]>();
	private byText = new Map<string, number[][]>();
	private gone = new Set<number[]>();
	private order: number[] = [];
	private done = 0;

	/** Is the clause a consequence by unit propagation? Leaves everything as it was. */
	follows(clause: readonly number[]): boolean {
		const before = this.order.length;
		let clash = false;
		for (const literal of clause) clash ||= !this.assume(-literal);
		clash ||= !this.propagate();
		for (const literal of this.order.splice(before)) this.assigned.delete(Math.abs(literal));
		this.done = before;
		return clash;
	}

	add(given: readonly number[]): void {
		const clause = [...new Set(given)];
		if (clause.some((literal) => clause.includes(-literal))) return;
		const name = nameOf(clause);
		const twins = this.byText.get(name);
		if (twins) twins.push(clause);
		else this.byText.set(name, [clause]);
		// Two literals that are not false come first; with fewer the clause forces or contradicts.
		clause.sort((a, b) => Number(this.isFalse(a)) - Number(this.isFalse(b)));
		if (clause.length === 0 || this.isFalse(clause[0])) {
			this.contradiction = true;
			return;
		}
		if (clause.length > 1) {
			this.watch(clause[0], clause);
			this.watch(clause[1], clause);
		}
		if (clause.length > 1 && !this.isFalse(clause[1])) return;
		this.contradiction ||= !this.assume(clause[0]) || !this.propagate();
	}

	remove(clause: readonly number[]): void {
		const twin = this.byText.get(nameOf([...new Set(clause)]))?.pop();
		if (twin) this.gone.add(twin);
	}

	private isFalse(literal: number): boolean {
		return this.assigned.get(Math.abs(literal)) === literal < 0;
	}

	private isTrue(literal: number): boolean {
		return this.assigned.get(Math.abs(literal)) === literal > 0;
	}

	/** False when the literal is false already. */
	private assume(literal: number): boolean {
		if (this.isFalse(literal)) return false;
		if (this.isTrue(literal)) return true;
		this.assigned.set(Math.abs(literal), literal > 0);
		this.order.push(literal);
		return true;
	}

	private watch(literal: number, clause: number[]): void {
		const list = this.watching.get(literal);
		if (list) list.push(clause);
		else this.watching.set(literal, [clause]);
	}

	/** False when a clause has become false. */
	private propagate(): boolean {
		while (this.done < this.order.length) {
			const lost = -this.order[this.done++];
			const list = this.watching.get(lost);
			if (!list) continue;
			const kept: number[][] = [];
			let clash = false;
			for (const clause of list) {
				if (this.gone.has(clause)) continue;
				if (clash || !this.moveWatch(clause, lost)) kept.push(clause);
				if (!clash && clause[1] === lost) clash = !this.assume(clause[0]);
			}
			this.watching.set(lost, kept);
			if (clash) return false;
		}
		return true;
	}

	/** True when the clause found another literal to watch instead of `lost`. */
	private moveWatch(clause: number[], lost: number): boolean {
		if (clause[0] === lost) [clause[0], clause[1]] = [clause[1], clause[0]];
		if (this.isTrue(clause[0])) return false;
		const other = clause.findIndex((literal, place) => place > 1 && !this.isFalse(literal));
		if (other < 0) return false;
		[clause[1], clause[other]] = [clause[other], clause[1]];
		this.watch(clause[1], clause);
		return true;
	}
}

const nameOf = (clause: readonly number[]) => [...clause].sort((a, b) => a - b).join(' ');
