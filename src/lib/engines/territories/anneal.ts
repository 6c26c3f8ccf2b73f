import type { AnnealSettings } from './anneal-settings.ts';
import { AnnealStep } from './anneal-step.ts';
import type { ContiguityScratch } from './contiguity.ts';
import { Proposals } from './proposals.ts';
import { wishEnergy } from './search-energy.ts';
import type { SearchState } from './search-state.ts';

/** Proposals between two looks at temperature, weights and the best so far. */
const ROUND = 2048;

/**
 * Simulated annealing over border units. A proposal moves one unit to a bordering territory, or passes
 * on a unit s -> t and another t -> r at once, most of them from territories outside tolerance.
 * Leaves the state at the best assignment met that is within tolerance and keeps every pair apart; when
 * none was met, at the last. Contiguity and the rules on units hold throughout.
 *
 * Source of the method: S. Kirkpatrick, C. D. Gelatt, M. P. Vecchi, Optimization by Simulated
 * Annealing, Science 220 (1983).
 */
export class Annealer {
	private readonly state: SearchState;
	private readonly settings: AnnealSettings;
	private readonly proposals: Proposals;
	private readonly step: AnnealStep;
	/** territory of each of the free units in the best assignment met */
	private readonly best: Int32Array;
	private bestEnergy = Infinity;

	constructor(state: SearchState, settings: AnnealSettings, scratch: ContiguityScratch) {
		this.state = state;
		this.settings = settings;
		this.proposals = new Proposals(state, settings.territories, settings.seed);
		this.step = new AnnealStep(state, settings, scratch, this.proposals);
		this.best = new Int32Array(this.proposals.units.length);
	}

	/** Runs to the end of the budget; answers whether a plan within tolerance was met. */
	run(): boolean {
		const { proposals, cancelled, progress } = this.settings;
		if (this.best.length === 0) return this.isSound();
		for (let done = 0; done < proposals; done += ROUND) {
			this.cool(done / proposals);
			this.keepBest();
			for (let i = 0; i < ROUND; i++) this.step.next();
			if ((done / ROUND) % 64 === 63) {
				if (cancelled?.()) break;
				progress?.(done / proposals);
			}
		}
		this.keepBest();
		return this.restoreBest();
	}

	private cool(share: number): void {
		const { hot, cold, loose, strict, step, spread, spreadEnd, territories } = this.settings;
		this.step.temperature = hot * (cold / hot) ** share;
		const fade = Math.max(0, 1 - share / 0.7);
		this.state.sumLoads();
		this.step.penalty.weigh(
			loose * (strict / loose) ** share,
			step * share ** 2,
			spreadEnd + (spread - spreadEnd) * fade,
			territories,
		);
	}

	private isSound(): boolean {
		return this.outsideHere() === 0 && this.state.conflicts() === 0;
	}

	/** Territories outside tolerance among those that take part. */
	private outsideHere(): number {
		let count = 0;
		for (let i = 0; i < this.state.outsideCount; i++)
			count += this.proposals.active[this.state.outside[i]];
		return count;
	}

	private keepBest(): void {
		const { units } = this.proposals;
		const energy = wishEnergy(this.state, this.settings, this.settings.territories);
		if (energy >= this.bestEnergy - 1e-9 || !this.isSound()) return;
		this.bestEnergy = energy;
		for (let i = 0; i < units.length; i++) {
			this.best[i] = this.state.assignment[units[i]];
		}
	}

	private restoreBest(): boolean {
		const { units } = this.proposals;
		if (this.bestEnergy === Infinity) return false;
		for (let i = 0; i < units.length; i++) {
			if (this.state.assignment[units[i]] !== this.best[i]) {
				this.state.move(units[i], this.best[i]);
			}
		}
		this.state.sumLoads();
		return true;
	}
}
