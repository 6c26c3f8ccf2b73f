import type { SearchState } from './search-state.ts';
import type { SearchTerms } from './search-terms.ts';

/**
 * What a territory's loads cost the search, in moves: `excess` for each mean unit outside tolerance,
 * `step` for being outside at all, and
 * `spread` times the squared distance from the target over the width of the band. The second, which
 * fades, lets a surplus travel through territories that are within tolerance.
 */
export class Penalty {
	excess = 0;
	step = 0;
	spread = 0;
	/** penalty of each territory at its loads of now */
	readonly now: Float64Array;
	private readonly terms: SearchTerms;
	private readonly state: SearchState;

	constructor(state: SearchState) {
		this.state = state;
		this.terms = state.terms;
		this.now = new Float64Array(this.terms.prepared.territories);
	}

	/** Sets both weights and reckons every territory in `territories` afresh. */
	weigh(excess: number, step: number, spread: number, territories: Int32Array): void {
		this.excess = excess;
		this.step = step;
		this.spread = spread;
		for (const t of territories) this.now[t] = this.at(t, -1, -1);
	}

	refresh(t: number): void {
		this.now[t] = this.at(t, -1, -1);
	}

	/** The penalty of territory `t` with unit `gained` more and unit `lost` less; -1 for none. */
	at(t: number, gained: number, lost: number): number {
		const { prepared, perUnit, curve } = this.terms;
		const { units, territories, bound, loads, least, greatest, targets } = prepared;
		const held = this.state.loads;
		let sum = 0;
		for (let m = 0, at = t; m < bound.length; m++, at += territories) {
			let load = held[at];
			if (gained >= 0) load += loads[m * units + gained];
			if (lost >= 0) load -= loads[m * units + lost];
			const off = load - targets[at];
			const over =
				load > greatest[at] ? load - greatest[at] : load < least[at] ? least[at] - load : 0;
			if (over > 0) sum += this.step + this.excess * over * perUnit[m];
			sum += this.spread * off * off * curve[at];
		}
		return sum;
	}
}
