import type { AnnealSettings } from './anneal-settings.ts';
import { BlockMover } from './block-mover.ts';
import { canLeave, type ContiguityScratch } from './contiguity.ts';
import { rises } from './dice.ts';
import type { Proposals } from './proposals.ts';
import { Penalty } from './search-penalty.ts';
import type { SearchState } from './search-state.ts';

/** What a pair not kept apart costs, in moves. */
const CONFLICT = 1000;

/**
 * Weighs what was drawn and carries it out, or not: always when it is no worse, else the less likely the
 * worse it is for the temperature (Metropolis' rule). Territories stay in one piece.
 */
export class AnnealStep {
	temperature = 1;
	readonly penalty: Penalty;
	private readonly state: SearchState;
	private readonly settings: AnnealSettings;
	private readonly scratch: ContiguityScratch;
	private readonly proposals: Proposals;
	private readonly blocks: BlockMover;

	constructor(
		state: SearchState,
		settings: AnnealSettings,
		scratch: ContiguityScratch,
		proposals: Proposals,
	) {
		this.state = state;
		this.settings = settings;
		this.scratch = scratch;
		this.proposals = proposals;
		this.penalty = new Penalty(state);
		this.blocks = new BlockMover(state);
	}

	/** Draws one proposal and decides on it. */
	next(): void {
		const { proposals, state } = this;
		const chain = proposals.dice.chance(this.settings.chains);
		if (!proposals.draw()) return;
		if (state.terms.grouped[proposals.unit]) this.tryBlock(proposals.unit, proposals.to);
		else if (!chain) this.tryStep(proposals.unit, proposals.to);
		else if (proposals.drawSecond()) this.tryChain(proposals.unit, proposals.to);
	}

	/** Whether a rise in energy is let pass at this temperature. */
	private passes(change: number): boolean {
		if (change <= 0) return true;
		return change <= this.temperature * rises[this.proposals.dice.next() & 4095];
	}

	/** Change of cost when `unit` goes from `from` to `to`, and of conflicts that end thereby. */
	private moveChange(unit: number, from: number, to: number): number {
		const { cost, prepared, apart } = this.state.terms;
		const today = prepared.problem.today[unit];
		const { moveWeight } = this.settings;
		let change = 0;
		if (from === today) change = moveWeight * cost[unit];
		else if (to === today) change = -moveWeight * cost[unit];
		if (apart[unit] !== null && this.proposals.meets(unit, from)) change -= CONFLICT;
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
		if (!this.passes(change)) return;
		if (!this.leavesWhole(unit)) return;
		state.move(unit, to);
		penalty.refresh(from);
		penalty.refresh(to);
	}

	private tryChain(first: number, middle: number): void {
		const { state, penalty } = this;
		const { second, secondTo } = this.proposals;
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
		if (!this.passes(change)) return;
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
		const { state } = this;
		const { second, secondTo } = this.proposals;
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

	private tryBlock(unit: number, to: number): void {
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
		if (this.passes(change)) return;
		blocks.move(block, from);
		penalty.refresh(from);
		penalty.refresh(to);
	}
}
