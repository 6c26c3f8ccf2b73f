import { smallestLastOrder } from '../graph/smallest-last.ts';
import type { Answer } from '../solver/sat.ts';
import { newBoard } from './board.ts';
import type { Case } from './explain-case.ts';
import { CaseClauses } from './explain-clauses.ts';
import { immediateCollisions } from './explain-immediate.ts';
import type { Purse } from './explain-purse.ts';
import { kempe } from './kempe.ts';

/** Above so many vertices the chain colourer is asked before the solver, which takes long to agree. */
const LARGE = 10_000;
const WALK = 100;
const CHAIN_STEPS_EACH = 50;

/** Asks which demands can be met together on the whole map. */
export class Whole {
	/** demands that collide at sight */
	readonly immediate: number[][];
	private clauses: CaseClauses | null = null;
	private order: Uint32Array | null = null;
	/** the ink of each vertex, when the chain colourer gave the last answer */
	private inks: Int32Array | null = null;

	constructor(
		private readonly of: Case,
		private readonly seed: number,
	) {
		this.immediate = immediateCollisions(of);
	}

	ask(demands: Iterable<number>, purse: Purse): Answer {
		const held = [...demands];
		this.inks = this.of.graph.count > LARGE && !purse.empty ? this.byChains(held, purse) : null;
		if (this.inks) return 'sat';
		const clauses = (this.clauses ??= this.written());
		return purse.pay(clauses.sat, (budget) => clauses.solve(held, budget));
	}

	/** The demands that clashed in the last answer. */
	failedDemands(): number[] {
		return this.clauses?.failedDemands() ?? [];
	}

	/** Whether the last answer gives a demand what it asks. */
	meets(demand: number): boolean {
		const { vertex, ink } = this.of.demands[demand];
		return this.inks ? this.inks[vertex] === ink : (this.clauses?.meets(demand) ?? false);
	}

	private written(): CaseClauses {
		const everything = Uint32Array.from({ length: this.of.graph.count }, (_, v) => v);
		const clauses = new CaseClauses(this.of, everything, { seed: this.seed });
		for (const variable of clauses.demandVariable) {
			if (variable) clauses.sat.setPhase(variable, true);
		}
		return clauses;
	}

	private byChains(held: number[], { cancelled }: Purse): Int32Array | null {
		const { graph, inks, bans, demands } = this.of;
		const asked = new Set(held);
		if (this.immediate.some((clash) => clash.every((d) => asked.has(d)))) return null;
		const fixed = new Int32Array(graph.count).fill(-1);
		for (const d of held) fixed[demands[d].vertex] = demands[d].ink;
		this.order ??= smallestLastOrder(graph).order;
		const board = newBoard(graph, inks, fixed, bans);
		const steps = CHAIN_STEPS_EACH * graph.count;
		const options = { seed: this.seed, walk: WALK, steps, cancelled };
		const { finished } = kempe(board, this.order, options);
		return finished ? board.ink : null;
	}
}
