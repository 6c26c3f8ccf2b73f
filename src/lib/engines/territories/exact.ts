import { solveProgram } from '../solver/program.ts';
import { choicesOf, type Choices, type DeadEnd, type MayEnd } from './exact-choices.ts';
import { addBroken } from './exact-cuts.ts';
import { addBrokenFractions } from './exact-fractions.ts';
import { moveCost, planProgram, type PlanObjective, type PlanProgram } from './exact-program.ts';
import type { Prepared } from './prepare.ts';

export interface ExactLimits {
	/** most programs solved one after the other */
	rounds: number;
	/** most nodes and simplex iterations of all programs together */
	nodes: number;
	iterations: number;
	cancelled?: () => boolean;
}

export interface ExactScope {
	/** narrows the rules on single units; absent: all of them */
	may?: MayEnd;
	/** territories that must come right; absent: all that stay */
	judged?: (territory: number) => boolean;
}

export type ExactOutcome =
	/** `value` is the least the objective can be */
	| { status: 'optimal'; assignment: Int32Array; value: number }
	/** no plan keeps the rules (and costs no more than asked); `deadEnd` where it was told at once */
	| { status: 'infeasible'; deadEnd: DeadEnd | null }
	/** a budget ended it; nothing that keeps the rules is worth less than `bound`; a plan, if one came up */
	| { status: 'limit'; bound: number; assignment: Int32Array | null };

/**
 * The best plan there is, or that there is none, as an integer program (`highs`): what belongs where,
 * tolerance of every measure, blocks, apart. Contiguity is imposed where a solution lacks it: each
 * round solves the program, looks for pieces cut off and adds rows that forbid them (vertex separators,
 * Validi, Buchanan, Lykhovyd, "Imposing contiguity constraints in political districting models",
 * 2022); the flow of Shirabe 2009 says the same with many more columns. Meant for about 60 free units.
 * A claim of optimality is within a millionth of the value.
 */
export async function solveExact(
	prepared: Prepared,
	objective: PlanObjective,
	limits: ExactLimits,
	{ may, judged = (t) => prepared.stays[t] === 1 }: ExactScope = {},
): Promise<ExactOutcome> {
	const choices = choicesOf(prepared, may, judged);
	if ('dead' in choices) return { status: 'infeasible', deadEnd: choices };
	const program = planProgram(prepared, choices, judged, objective);
	const given = objective.least === 'moves' ? givenCost(prepared, choices, program) : 0;
	let { nodes, iterations } = limits;
	let bound = await tighten(prepared, choices, program, limits);
	if (bound === Infinity) return { status: 'infeasible', deadEnd: null };
	bound += given;
	for (let round = 0; round < limits.rounds && nodes >= 0 && iterations > 0; round++) {
		if (limits.cancelled?.()) break;
		const { cancelled } = limits;
		const outcome = await solveProgram(program.builder.build(), { nodes, iterations, cancelled });
		if (outcome.status === 'infeasible') return { status: 'infeasible', deadEnd: null };
		if (outcome.status === 'unbounded') throw new Error('a plan cannot cost endlessly little');
		bound = Math.max(bound, outcome.bound + given);
		nodes -= outcome.spent.nodes;
		iterations -= outcome.spent.iterations;
		if (!outcome.values) break;
		const assignment = assignmentOf(prepared, choices, program, outcome.values);
		const broken = addBroken(prepared, choices, program, assignment);
		if (broken === 0 && outcome.status === 'optimal') {
			return { status: 'optimal', assignment, value: outcome.objective + given };
		}
		if (broken === 0) return { status: 'limit', bound, assignment };
	}
	return { status: 'limit', bound, assignment: null };
}

/** rounds of the program without whole numbers, which are cheap */
const FRACTION_ROUNDS = 40;

/** Adds rows on contiguity by the program without whole numbers; its bound, Infinity when nothing fits. */
async function tighten(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	{ cancelled }: ExactLimits,
): Promise<number> {
	let bound = -Infinity;
	for (let round = 0; round < FRACTION_ROUNDS && !cancelled?.(); round++) {
		const whole = program.builder.build();
		const outcome = await solveProgram({ ...whole, integer: whole.integer.map(() => 0) });
		if (outcome.status === 'infeasible') return Infinity;
		if (outcome.status !== 'optimal') break;
		bound = Math.max(bound, outcome.bound);
		if (addBrokenFractions(prepared, choices, program, outcome.values) === 0) break;
	}
	return bound;
}

function givenCost(prepared: Prepared, choices: Choices, { column }: PlanProgram): number {
	let cost = 0;
	choices.of.forEach((list, b) => {
		if (list.length === 1 && column[b * prepared.territories + list[0]] < 0) {
			cost += moveCost(prepared, b, list[0]);
		}
	});
	return cost;
}

function assignmentOf(
	prepared: Prepared,
	choices: Choices,
	{ column }: PlanProgram,
	values: Float64Array,
): Int32Array {
	const assignment = new Int32Array(prepared.units);
	choices.of.forEach((list, b) => {
		const chosen = list.find((t) => values[column[b * prepared.territories + t]] > 0.5) ?? list[0];
		for (const unit of prepared.blocks[b]) assignment[unit] = chosen;
	});
	return assignment;
}
