import type { Answer, Budget, Sat } from '../solver/sat.ts';

/** Conflicts that may be spent in all and on a single question. */
export class Purse {
	constructor(
		private left: number,
		private readonly each: number,
		readonly cancelled?: (conflicts?: number) => boolean,
	) {}

	get empty(): boolean {
		return this.left <= 0 || this.cancelled?.() === true;
	}

	/** Asks a solver within what is left and takes off what it used. */
	pay(sat: Sat, ask: (budget: Budget) => Answer): Answer {
		if (this.empty) return 'unknown';
		const before = sat.conflicts;
		const conflicts = Math.min(this.left, this.each);
		const answer = ask({ conflicts, cancelled: this.cancelled });
		// A question costs a little even when nothing conflicts, so that every loop ends.
		this.left -= sat.conflicts - before + 1;
		return answer;
	}
}
