/** What the goals come to in one colouring, in the user's order; each is to be small. */
export type Values = readonly number[];

/** Differences smaller than this share of a goal's value at the start are rounding. */
const rounding = 1e-12;

/**
 * Several goals in an order: a later one counts only among colourings in which the earlier ones stay
 * within their limits. A limit is the best met so far, and on top of it the share of the gain since the
 * start that this goal gives away. The last goal has nobody to give to.
 */
export class GoalOrder {
	/** the colouring that is best so far, by its values */
	kept: number[];
	/** the best met of each goal while the earlier ones were within their limits */
	private readonly best: number[];

	constructor(
		readonly start: Values,
		private readonly gives: Values,
		private readonly enough: (goal: number) => number,
	) {
		this.kept = [...start];
		this.best = [...start];
	}

	/** How high a goal may stand while later ones are followed. */
	limit(goal: number): number {
		const gained = Math.max(0, this.start[goal] - this.best[goal]);
		const given = goal + 1 < this.start.length ? this.gives[goal] * gained : 0;
		return Math.max(this.enough(goal), this.best[goal] + given);
	}

	/** Looks at a colouring by its values; true when it is the best so far. */
	note(values: Values): boolean {
		this.learn(values);
		if (!this.better(values, this.kept)) return false;
		this.kept = [...values];
		return true;
	}

	/** Whether one is better than another: the first goal decides that tells them apart past its limit. */
	better(one: Values, other: Values): boolean {
		const clipped = (values: Values) => values.map((value, j) => Math.max(value, this.limit(j)));
		const past = this.compare(clipped(one), clipped(other));
		return (past || this.compare(one, other)) < 0;
	}

	private learn(values: Values): void {
		for (let j = 0; j < values.length; j++) {
			if (values[j] < this.best[j] - this.slack(j)) {
				this.best[j] = values[j];
				const stays = this.kept[j] <= this.limit(j);
				for (let k = j + 1; k < values.length && !stays; k++) this.best[k] = values[k];
				return;
			}
			if (values[j] > this.limit(j)) return;
		}
	}

	private slack(goal: number): number {
		return rounding * Math.abs(this.start[goal]);
	}

	private compare(one: Values, other: Values): number {
		for (let j = 0; j < one.length; j++) {
			const gap = one[j] - other[j];
			if (Math.abs(gap) > this.slack(j)) return gap;
		}
		return 0;
	}
}
