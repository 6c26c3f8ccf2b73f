import type { SearchState } from './search-state.ts';

/** Moves of units that must stay together: slower than single ones, and seldom asked for. */
export class BlockMover {
	private readonly state: SearchState;

	constructor(state: SearchState) {
		this.state = state;
	}

	/** Whether the block may go to `to` as one, with both territories in one piece after it. */
	mayGo(block: number, to: number): boolean {
		const { state } = this;
		const { prepared, may, row, apart } = state.terms;
		const units = prepared.blocks[block];
		for (const unit of units) {
			if (!may[row[unit] * prepared.territories + to]) return false;
			for (const other of apart[unit] ?? []) if (state.assignment[other] === to) return false;
		}
		return this.leavesWhole(block) && this.comesWhole(block, to);
	}

	private leavesWhole(block: number): boolean {
		const { state } = this;
		const units = state.terms.prepared.blocks[block];
		const from = state.assignment[units[0]];
		const left = state.sizes[from] - units.length;
		if (left < 1) return false;
		const { members } = state;
		let start = 0;
		while (this.isIn(block, members[from][start])) start++;
		const stays = (unit: number) => state.assignment[unit] === from && !this.isIn(block, unit);
		return this.joined(members[from][start], left, stays);
	}

	private comesWhole(block: number, to: number): boolean {
		const { state } = this;
		const units = state.terms.prepared.blocks[block];
		const has = (unit: number) => state.assignment[unit] === to || this.isIn(block, unit);
		return this.joined(units[0], state.sizes[to] + units.length, has);
	}

	/** Whether the `count` units that `has` holds for are joined; `start` is one of them. */
	private joined(start: number, count: number, has: (unit: number) => boolean): boolean {
		const { offsets, targets } = this.state.terms.prepared.graph;
		const met = new Set([start]);
		for (const unit of met) {
			for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
				if (has(targets[i])) met.add(targets[i]);
			}
		}
		return met.size === count;
	}

	private isIn(block: number, unit: number): boolean {
		return this.state.terms.prepared.block[unit] === block;
	}

	move(block: number, to: number): void {
		for (const unit of this.state.terms.prepared.blocks[block]) this.state.move(unit, to);
	}
}
