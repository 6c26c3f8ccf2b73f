import type { Aim } from './improve-aim.ts';
import type { Random } from './random.ts';

/** Turns weighed before the first heat is set. */
const samples = 200;
/** The coldest heat as a share of the hottest, for a goal of one scale. */
const coldest = 1e-2;
/** Share of a phase at its end in which nothing gets worse any more. */
const descent = 0.1;
const fine = 2 ** 24;
/** How warm for goals that descend: going straight down has brought nearly everything. */
const lukewarm = 1e-3;

export interface PhaseSettings {
	/** the goal in hand; those before it are held within their limits */
	goal: number;
	length: number;
	/** share of the full heat */
	warmth: number;
	/** goals that descend: not at all, hardly, or as warm as the others */
	descending: 'cold' | 'lukewarm' | 'hot';
	/** earlier goals may go past their limits while it is hot */
	loose: boolean;
}

/**
 * One goal followed for so many tries: by falling heat where that pays, else only downwards. The heat of a
 * goal starts at the mean change that a turn makes in it, and falls through every scale of its value. In a
 * loose phase what earlier goals are past their limits is weighed the same way, and is driven out as it
 * cools: some exchanges can only be made two or three at a time.
 *
 * Source: S. Kirkpatrick, C. Gelatt, M. Vecchi, Optimization by simulated annealing, Science 220 (1983).
 */
export class Phase {
	tries = 0;
	private weighed = 0;
	/** tries gone when the last sample was taken */
	private cool = 0;
	private readonly changes: Float64Array;

	constructor(
		private readonly aims: readonly Aim[],
		readonly settings: PhaseSettings,
	) {
		this.changes = new Float64Array(aims.length);
	}

	get goal(): number {
		return this.settings.goal;
	}

	get over(): boolean {
		const aim = this.aims[this.goal];
		return this.tries >= this.settings.length || aim.value <= aim.enough;
	}

	/** Whether a turn that brings the goals to `after` is to be made. */
	takes(after: ArrayLike<number>, limit: (goal: number) => number, random: Random): boolean {
		this.sample(after);
		let uphill = 0;
		for (let j = 0; j <= this.goal; j++) {
			const { value } = this.aims[j];
			const floor = j < this.goal ? limit(j) : -Infinity;
			const change = Math.max(after[j], floor) - Math.max(value, floor);
			if (change === 0) continue;
			const heat = this.heat(j);
			if (heat === 0) return change < 0;
			uphill += change / heat;
		}
		return uphill <= 0 || random.below(fine) < fine * Math.exp(-uphill);
	}

	private sample(after: ArrayLike<number>): void {
		if (this.weighed >= samples || after[this.goal] === this.aims[this.goal].value) return;
		this.weighed++;
		this.cool = this.tries;
		for (let j = 0; j <= this.goal; j++) {
			this.changes[j] += Math.abs(after[j] - this.aims[j].value);
		}
	}

	private heat(j: number): number {
		const { length, warmth, descending } = this.settings;
		const { descends, scales } = this.aims[j];
		const gone = (this.tries - this.cool) / (length * (1 - descent) - this.cool);
		if ((descends && descending === 'cold') || this.weighed < samples || gone >= 1) return 0;
		const range = coldest * 64 ** (1 - scales);
		const full =
			((j === this.goal && descends && descending === 'lukewarm' ? lukewarm : 1) *
				this.changes[j]) /
			samples;
		return warmth * full * range ** gone;
	}
}
