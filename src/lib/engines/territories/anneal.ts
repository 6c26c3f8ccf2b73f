import { BlockMover } from './block-mover.ts';
import { canLeave, type ContiguityScratch } from './contiguity.ts';
import { Dice, rises } from './dice.ts';
import { wishEnergy, type Wishes } from './search-energy.ts';
import { Penalty } from './search-penalty.ts';
import type { SearchState } from './search-state.ts';

/** How an annealing goes; weights are in moves of mean cost. */
export interface AnnealSettings extends Wishes {
	proposals: number;
	seed: number;
	/** temperature at the start and at the end */
	hot: number;
	cold: number;
	/** penalty for a mean unit outside tolerance, at the start and at the end */
	loose: number;
	strict: number;
	/** penalty at the end for being outside tolerance at all, however little */
	step: number;
	/** weight of the quadratic term at the start; it fades to `spreadEnd` */
	spread: number;
	/** share of proposals that are chains of two steps, of 65,536 */
	chains: number;
	/** territories that take part; all others stay as they are */
	territories: Int32Array;
	/** true ends the run */
	cancelled?: () => boolean;
	progress?: (share: number) => void;
}

/** Proposals between two looks at temperature, weights and the best so far. */
const ROUND = 2048;
/** What a pair not kept apart costs, in moves. */
const CONFLICT = 1000;

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
	private readonly dice: Dice;
	private readonly scratch: ContiguityScratch;
	private readonly penalty: Penalty;
	private readonly blocks: BlockMover;
	/** 1 for territories that take part */
	private readonly active: Uint8Array;
	private readonly units: Int32Array;
	private temperature = 1;
	private readonly best: Int32Array;
	private bestEnergy = Infinity;
	/** of the chain in hand: second unit and where it goes */
	private second = -1;
	private secondTo = -1;

	constructor(state: SearchState, settings: AnnealSettings, scratch: ContiguityScratch) {
		this.state = state;
		this.settings = settings;
		this.dice = new Dice(settings.seed);
		this.scratch = scratch;
		this.penalty = new Penalty(state);
		this.blocks = new BlockMover(state);
		this.active = new Uint8Array(state.terms.prepared.territories);
		for (const t of settings.territories) this.active[t] = 1;
		const units: number[] = [];
		for (const t of settings.territories) {
			for (let i = 0; i < state.sizes[t]; i++) {
				const unit = state.members[t][i];
				if (state.terms.movable[unit]) units.push(unit);
			}
		}
		this.units = Int32Array.from(units).sort();
		this.best = new Int32Array(this.units.length);
	}

	/** Runs to the end of the budget; answers whether a plan within tolerance was met. */
	run(): boolean {
		const { proposals, chains, cancelled, progress } = this.settings;
		if (this.units.length === 0) return this.isSound();
		for (let done = 0; done < proposals; done += ROUND) {
			this.cool(done / proposals);
			this.keepBest();
			for (let i = 0; i < ROUND; i++) this.propose(this.dice.chance(chains));
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
		this.temperature = hot * (cold / hot) ** share;
		const fade = Math.max(0, 1 - share / 0.7);
		this.state.sumLoads();
		this.penalty.weigh(
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
		for (let i = 0; i < this.state.outsideCount; i++) count += this.active[this.state.outside[i]];
		return count;
	}

	private keepBest(): void {
		const energy = wishEnergy(this.state, this.settings, this.settings.territories);
		if (energy >= this.bestEnergy - 1e-9 || !this.isSound()) return;
		this.bestEnergy = energy;
		for (let i = 0; i < this.units.length; i++) {
			this.best[i] = this.state.assignment[this.units[i]];
		}
	}

	private restoreBest(): boolean {
		if (this.bestEnergy === Infinity) return false;
		for (let i = 0; i < this.units.length; i++) {
			if (this.state.assignment[this.units[i]] !== this.best[i]) {
				this.state.move(this.units[i], this.best[i]);
			}
		}
		this.state.sumLoads();
		return true;
	}

	private propose(chain: boolean): void {
		const { outsideCount, outside, terms } = this.state;
		if (terms.apartPairs.length > 0 && this.dice.chance(3000)) return this.part();
		if (outsideCount > 0 && this.dice.chance(45000)) {
			const t = outside[this.dice.below(outsideCount)];
			if (!this.active[t]) return;
			if (this.state.side(t) > 0) this.give(t, chain);
			else this.take(t, chain);
			return;
		}
		const unit = this.units[this.dice.below(this.units.length)];
		this.consider(unit, this.foreign(unit), chain);
	}

	/** One of a pair to be kept apart goes to a neighbour, if they are together. */
	private part(): void {
		const { assignment, terms } = this.state;
		const at = this.dice.below(terms.apartPairs.length);
		const unit = terms.apartPairs[at];
		if (!this.meets(unit, assignment[unit])) return;
		this.consider(unit, this.foreign(unit), false);
	}

	/** A member of `t` goes to a neighbour. */
	private give(t: number, chain: boolean): void {
		const { members, sizes } = this.state;
		for (let tries = 0; tries < 4; tries++) {
			const unit = members[t][this.dice.below(sizes[t])];
			const to = this.foreign(unit);
			if (to >= 0) return this.consider(unit, to, chain);
		}
	}

	/** A unit that borders on a member of `t` comes to it. */
	private take(t: number, chain: boolean): void {
		const { members, sizes, assignment, terms } = this.state;
		const { offsets, targets } = terms.prepared.graph;
		for (let tries = 0; tries < 4; tries++) {
			const member = members[t][this.dice.below(sizes[t])];
			const degree = offsets[member + 1] - offsets[member];
			if (degree === 0) continue;
			const unit = targets[offsets[member] + this.dice.below(degree)];
			if (assignment[unit] !== t) return this.consider(unit, t, chain);
		}
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

	private mayGo(unit: number, to: number): boolean {
		const { terms } = this.state;
		return (
			this.active[to] === 1 &&
			terms.may[terms.row[unit] * terms.prepared.territories + to] === 1 &&
			this.active[this.state.assignment[unit]] === 1
		);
	}

	private consider(unit: number, to: number, chain: boolean): void {
		const { terms } = this.state;
		if (to < 0 || !terms.movable[unit] || !this.mayGo(unit, to)) return;
		if (terms.grouped[unit]) return this.considerBlock(unit, to);
		if (terms.apart[unit] && this.meets(unit, to)) return;
		if (chain && this.chooseSecond(unit, to)) this.tryChain(unit, to);
		else if (!chain) this.tryStep(unit, to);
	}

	/** Whether a unit that must be apart from `unit` is in `to`. */
	private meets(unit: number, to: number): boolean {
		const { assignment, terms } = this.state;
		for (const other of terms.apart[unit] as Int32Array) if (assignment[other] === to) return true;
		return false;
	}

	private limit(): number {
		return this.temperature * rises[this.dice.next() & 4095];
	}

	/** Change of cost when `unit` goes from `from` to `to`, and of conflicts that end thereby. */
	private moveChange(unit: number, from: number, to: number): number {
		const { cost, prepared, apart } = this.state.terms;
		const today = prepared.problem.today[unit];
		const { moveWeight } = this.settings;
		let change = 0;
		if (from === today) change = moveWeight * cost[unit];
		else if (to === today) change = -moveWeight * cost[unit];
		if (apart[unit] && this.meets(unit, from)) change -= CONFLICT;
		return change;
	}

	private tryStep(unit: number, to: number): void {
		const { state, penalty } = this;
		const from = state.assignment[unit];
		const after = penalty.at(from, -1, unit) + penalty.at(to, unit, -1);
		const change =
			after -
			penalty.now[from] -
			penalty.now[to] +
			this.moveChange(unit, from, to) +
			this.settings.cutWeight * state.cutChange(unit, from, to);
		if (change > 0 && change > this.limit()) return;
		if (!this.leavesWhole(unit)) return;
		state.move(unit, to);
		penalty.refresh(from);
		penalty.refresh(to);
	}

	/** Finds a unit of `middle` to pass on when `first` has come to it. */
	private chooseSecond(first: number, middle: number): boolean {
		const { members, sizes, terms } = this.state;
		for (let tries = 0; tries < 3; tries++) {
			const unit = members[middle][this.dice.below(sizes[middle])];
			const to = this.foreign(unit);
			if (to < 0 || unit === first || !terms.movable[unit] || terms.grouped[unit]) continue;
			if (!this.mayGo(unit, to) || (terms.apart[unit] && this.meets(unit, to))) continue;
			this.second = unit;
			this.secondTo = to;
			return true;
		}
		return false;
	}

	private tryChain(first: number, middle: number): void {
		const { state, penalty, second, secondTo } = this;
		const from = state.assignment[first];
		const swap = secondTo === from;
		let change = penalty.at(middle, first, second) - penalty.now[middle] - penalty.now[from];
		if (swap) change += penalty.at(from, second, first);
		else {
			change += penalty.at(from, -1, first) + penalty.at(secondTo, second, -1);
			change -= penalty.now[secondTo];
		}
		change += this.moveChange(first, from, middle) + this.moveChange(second, middle, secondTo);
		change += this.settings.cutWeight * this.chainCuts(first, from, middle);
		if (change > 0 && change > this.limit()) return;
		if (!this.leavesWhole(first)) return;
		state.move(first, middle);
		if (!this.touches(second, secondTo) || !this.leavesWhole(second)) {
			state.move(first, from);
			return;
		}
		state.move(second, secondTo);
		penalty.refresh(from);
		penalty.refresh(middle);
		if (!swap) penalty.refresh(secondTo);
	}

	private leavesWhole(unit: number): boolean {
		const { assignment, sizes, terms } = this.state;
		if (sizes[assignment[unit]] < 2) return false;
		return canLeave(terms.prepared.graph, assignment, unit, this.scratch);
	}

	private touches(unit: number, territory: number): boolean {
		const { offsets, targets } = this.state.terms.prepared.graph;
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			if (this.state.assignment[targets[i]] === territory) return true;
		}
		return false;
	}

	/** Cut borders more when `first` goes from -> middle and the second unit middle -> its territory. */
	private chainCuts(first: number, from: number, middle: number): number {
		const { state, second, secondTo } = this;
		const { offsets, targets } = state.terms.prepared.graph;
		let change = state.cutChange(first, from, middle);
		for (let i = offsets[second], end = offsets[second + 1]; i < end; i++) {
			const other = targets[i];
			const t = other === first ? middle : state.assignment[other];
			if (t === middle) change++;
			else if (t === secondTo) change--;
		}
		return change;
	}

	private considerBlock(unit: number, to: number): void {
		const { blocks, penalty, state } = this;
		const from = state.assignment[unit];
		const block = state.terms.prepared.block[unit];
		if (!blocks.mayGo(block, to)) return;
		const before = penalty.now[from] + penalty.now[to];
		const { cost, cuts } = state;
		const conflicts = state.conflicts();
		blocks.move(block, to);
		penalty.refresh(from);
		penalty.refresh(to);
		const { moveWeight, cutWeight } = this.settings;
		const change =
			penalty.now[from] +
			penalty.now[to] -
			before +
			moveWeight * (state.cost - cost) +
			cutWeight * (state.cuts - cuts) +
			CONFLICT * (state.conflicts() - conflicts);
		if (change <= 0 || change <= this.limit()) return;
		blocks.move(block, from);
		penalty.refresh(from);
		penalty.refresh(to);
	}
}
