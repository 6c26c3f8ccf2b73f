import type { AnnealSettings } from './anneal-settings.ts';
import { Annealer } from './anneal.ts';
import { contiguityScratch, type ContiguityScratch } from './contiguity.ts';
import { carrySurplus } from './drift.ts';
import { budgetOf, type Budget } from './effort.ts';
import { giveBack } from './give-back.ts';
import type { Prepared } from './prepare.ts';
import type { TerritoryProblem, Watch } from './problem.ts';
import { regionalAnnealing } from './regional.ts';
import { fullEnergy, type Wishes } from './search-energy.ts';
import { SearchState } from './search-state.ts';
import { searchTerms, type SearchTerms } from './search-terms.ts';
import { startingAssignment } from './start.ts';

export interface Found {
	assignment: Int32Array;
	/** within every tolerance */
	sound: boolean;
	/** pairs to be kept apart that are not */
	conflicts: number;
}

/** Temperature scales of the portfolio: one alone failed on tight cases. */
const scales = [1, 0.5, 2, 0.7, 1.4, 1];

/**
 * Searches for a plan: the compulsory phase, then a portfolio of annealings over the whole and over
 * regions, then units are given back. Every rule but tolerance and `apart` holds in what is found;
 * whether these do is told. The same problem gives the same answer, unless it is cancelled.
 *
 * @param from an assignment to start from, in one piece and true to the rules on units; else one is made
 * @returns null when no contiguous assignment that keeps the rules on units was found to start from
 */
export async function search(
	prepared: Prepared,
	watch: Watch = {},
	from: Int32Array | null = null,
): Promise<Found | null> {
	const terms = searchTerms(prepared);
	const start = from ?? startingAssignment(terms);
	if (!start) return null;
	const run = new SearchRun(terms, start, watch);
	return run.whole();
}

class SearchRun {
	private readonly terms: SearchTerms;
	private readonly start: Int32Array;
	private readonly watch: Watch;
	private readonly budget: Budget;
	private readonly wishes: Wishes;
	private readonly scratch: ContiguityScratch;
	private readonly all: Int32Array;
	/** the share last told, which never falls */
	private told = 0;

	constructor(terms: SearchTerms, start: Int32Array, watch: Watch) {
		const { prepared } = terms;
		this.terms = terms;
		this.start = start;
		this.watch = watch;
		this.budget = budgetOf(prepared);
		this.wishes = wishesOf(prepared.problem);
		this.scratch = contiguityScratch(prepared.units);
		this.all = Int32Array.from(prepared.open.keys()).filter((t) => prepared.open[t] === 1);
	}

	async whole(): Promise<Found> {
		let best = new SearchState(this.terms, this.start);
		let energy = this.energyOf(best);
		const { starts } = this.budget;
		for (let i = 0; i < starts && !this.watch.cancelled?.(); i++) {
			const evenFirst = i > 0 && best.outsideCount > 0;
			const state = await this.once(i, evenFirst, 0.7 / starts, (0.7 * i) / starts);
			const found = this.energyOf(state);
			if (found >= energy) continue;
			best = state;
			energy = found;
		}
		this.regions(best, this.budget.lastRegions, starts, 0.7, 0.25);
		best = await this.rescue(best);
		if (this.wishes.spreadEnd === 0) giveBack(best, this.scratch);
		const conflicts = best.conflicts();
		return { assignment: best.assignment, sound: best.outsideCount === 0, conflicts };
	}

	/** Where territories are still outside, carries what is left over in streams and mends around it. */
	private async rescue(best: SearchState): Promise<SearchState> {
		const { rescues, starts, regions } = this.budget;
		for (let i = 0; i < rescues && best.outsideCount > 0 && !this.watch.cancelled?.(); i++) {
			const state = new SearchState(this.terms, best.assignment);
			await carrySurplus(state, this.scratch, this.wishes.cutWeight, this.watch.cancelled);
			const share = 0.05 / rescues;
			this.regions(state, Math.max(20, regions >> 2), starts + 1 + i, 0.95 + i * share, share);
			if (this.energyOf(state) < this.energyOf(best)) best = state;
		}
		return best;
	}

	private energyOf(state: SearchState): number {
		return fullEnergy(state, this.wishes, this.all);
	}

	/** One start of the portfolio; `evenFirst` reaches tolerance at any cost before it saves moves. */
	private async once(
		turn: number,
		evenFirst: boolean,
		share: number,
		from: number,
	): Promise<SearchState> {
		const state = new SearchState(this.terms, this.start);
		const scale = scales[turn % scales.length];
		const progress = (part: number) => this.tell('Searching', from + part * share * 0.6);
		const anneal = (temper: Partial<AnnealSettings>) =>
			new Annealer(
				state,
				{ ...this.settings(turn, this.budget.proposals), ...temper, progress },
				this.scratch,
			).run();
		const byStreams = this.budget.large || turn % 3 === 1;
		const { cutWeight, spreadEnd, moveWeight } = this.wishes;
		if (byStreams) await carrySurplus(state, this.scratch, cutWeight, this.watch.cancelled);
		if (evenFirst) anneal({ moveWeight: 0.1 * moveWeight, spread: 1 });
		const warm = { hot: 0.15 * scale, loose: 5, spread: spreadEnd };
		anneal(byStreams || evenFirst ? warm : { hot: 0.8 * scale });
		this.regions(state, this.budget.regions, turn, from + share * 0.6, share * 0.4);
		return state;
	}

	private regions(state: SearchState, regions: number, turn: number, from: number, share: number) {
		regionalAnnealing(state, this.scratch, {
			anneal: {
				...this.settings(turn, this.budget.regionProposals),
				hot: 0.4,
				loose: 1,
			},
			regions,
			seed: this.seedOf(turn + 100),
			cancelled: this.watch.cancelled,
			progress: (part) => this.tell('Improving region by region', from + part * share),
		});
	}

	private settings(turn: number, proposals: number): AnnealSettings {
		return {
			...this.wishes,
			proposals,
			seed: this.seedOf(turn),
			hot: 0.8,
			cold: 0.04,
			loose: 0.3,
			strict: 20,
			step: 4,
			spread: Math.max(0.3, this.wishes.spreadEnd),
			chains: 32768,
			territories: this.all,
			cancelled: this.watch.cancelled,
		};
	}

	private seedOf(turn: number): number {
		return Math.imul(this.terms.prepared.problem.seed + 1, 0x9e3779b1) + turn;
	}

	private tell(step: string, share: number): void {
		this.told = Math.max(this.told, share);
		this.watch.progress?.(step, this.told);
	}
}

function wishesOf({ goal, compactness }: TerritoryProblem): Wishes {
	const cutWeight = compactness ?? 0.15;
	return goal === 'fewest-moves'
		? { moveWeight: 1, cutWeight, spreadEnd: 0 }
		: { moveWeight: 0.05, cutWeight: cutWeight * 0.2, spreadEnd: 2 };
}
