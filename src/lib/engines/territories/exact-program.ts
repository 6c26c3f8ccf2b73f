import { ProgramBuilder } from '../solver/program-builder.ts';
import { fillable, loadsOf, piecesOf, type Choices } from './exact-choices.ts';
import type { Prepared } from './prepare.ts';

export interface PlanObjective {
	/** cost of moves, the largest deviation of a bound measure, or cut borders */
	least: 'moves' | 'cuts' | { deviationOf: number };
	/** only plans whose moves cost no more than this */
	costAtMost?: number;
}

/** The program of a plan; rows for contiguity are added as they are found wanting. */
export interface PlanProgram {
	builder: ProgramBuilder;
	/** column of block b in territory t, -1 for none: `column[b * territories + t]` */
	column: Int32Array;
	/** territories that must come right and have a choice */
	active: number[];
}

/**
 * Columns say which block ends in which territory (Shirabe 2009, without the flow); rows: every block
 * ends once, loads stay within tolerance, blocks apart, no territory empty, and a block needs a
 * neighbour in its territory. Loads are in shares of the target, limits wider by a ten-millionth, so
 * that what the program refuses is refused by the rules.
 */
export function planProgram(
	prepared: Prepared,
	choices: Choices,
	judged: (territory: number) => boolean,
	objective: PlanObjective,
): PlanProgram {
	const { territories, blocks } = prepared;
	const program: PlanProgram = {
		builder: new ProgramBuilder(),
		column: new Int32Array(blocks.length * territories).fill(-1),
		active: [],
	};
	const open = new Set(choices.of.flatMap((list) => (list.length > 1 ? list : [])));
	program.active = [...open].filter(judged).sort((a, b) => a - b);
	choices.of.forEach((list, b) => {
		for (const t of list) {
			if (list.length === 1 && !open.has(t)) continue;
			const cost = objective.least === 'moves' ? moveCost(prepared, b, t) : 0;
			program.column[b * territories + t] = program.builder.whole(cost, list.length === 1 ? 1 : 0);
		}
		const columns = columnsOf(program, list, b, territories);
		if (list.length > 1) program.builder.row(1, 1, columns);
	});
	loadRows(prepared, choices, program, objective);
	apartRows(prepared, choices, program);
	for (const t of program.active) neighbourRows(prepared, choices, program, t);
	if (objective.costAtMost !== undefined) costRow(prepared, choices, program, objective.costAtMost);
	if (objective.least === 'cuts') cutRows(prepared, choices, program);
	return program;
}

/** What it costs that a block ends in a territory. */
export function moveCost({ blocks, problem, cost }: Prepared, block: number, territory: number) {
	let sum = 0;
	for (const unit of blocks[block]) if (problem.today[unit] !== territory) sum += cost[unit];
	return sum;
}

const columnsOf = ({ column }: PlanProgram, list: number[], block: number, territories: number) =>
	list.map((t) => column[block * territories + t]).filter((c) => c >= 0);

/** Columns and blocks of the pool of a territory. */
export function poolColumns(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	territory: number,
): { columns: number[]; blocks: number[] } {
	const blocks = [...new Set(choices.pool[territory].map((unit) => prepared.block[unit]))];
	return {
		blocks,
		columns: blocks.map((b) => program.column[b * prepared.territories + territory]),
	};
}

const WIDER = 1e-7;

function loadRows(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	{ least: goal }: PlanObjective,
): void {
	const { bound, territories, targets, least, greatest, loads, units } = prepared;
	const freed = typeof goal === 'object' ? goal.deviationOf : -1;
	const still = freed >= 0 ? stillDeviation(prepared, choices, program, freed) : 0;
	const deviation = freed >= 0 ? program.builder.real(1, still, 1e6) : -1;
	for (const t of program.active) {
		const { columns, blocks } = poolColumns(prepared, choices, program, t);
		program.builder.row(1, Infinity, columns);
		bound.forEach((_, m) => {
			const target = targets[m * territories + t];
			const shares = blocks.map((b) =>
				prepared.blocks[b].reduce((sum, unit) => sum + loads[m * units + unit] / target, 0),
			);
			if (m === freed) {
				program.builder.row(-Infinity, 1, [...columns, deviation], [...shares, -1]);
				program.builder.row(1, Infinity, [...columns, deviation], [...shares, 1]);
				return;
			}
			const low = least[m * territories + t] / target - WIDER;
			program.builder.row(low, greatest[m * territories + t] / target + WIDER, columns, shares);
		});
	}
}

/** The largest deviation among territories that stay and have no choice. */
function stillDeviation(prepared: Prepared, choices: Choices, program: PlanProgram, m: number) {
	let most = 0;
	for (let t = 0; t < prepared.territories; t++) {
		const target = prepared.targets[m * prepared.territories + t];
		if (!prepared.stays[t] || program.active.includes(t)) continue;
		const load = loadsOf(prepared, choices.pool[t])[m];
		most = Math.max(most, Math.abs(load - target) / target);
	}
	return most;
}

function apartRows(prepared: Prepared, choices: Choices, { builder, column }: PlanProgram): void {
	const { apart, block, territories } = prepared;
	for (const [unit, others] of apart) {
		for (const other of others) {
			if (other < unit) continue;
			for (const t of choices.of[block[unit]]) {
				const a = column[block[unit] * territories + t];
				const b = column[block[other] * territories + t];
				if (a >= 0 && b >= 0) builder.row(-Infinity, 1, [a, b]);
			}
		}
	}
}

/** Each piece of a block needs a neighbour in its territory, unless it may be the whole of it. */
function neighbourRows(
	prepared: Prepared,
	choices: Choices,
	{ builder, column }: PlanProgram,
	t: number,
): void {
	const { block, blocks, territories, graph } = prepared;
	const root = choices.root[t];
	const inPool = new Set(choices.pool[t]);
	for (const b of new Set(choices.pool[t].map((unit) => block[unit]))) {
		for (const piece of piecesOf(prepared, blocks[b])) {
			if (piece.includes(root)) continue;
			const alone = root < 0 && piece.length === blocks[b].length && fillable(prepared, t, piece);
			if (alone) continue;
			const near = new Set<number>();
			for (const unit of piece) {
				for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
					const other = graph.targets[i];
					if (inPool.has(other) && block[other] !== b)
						near.add(column[block[other] * territories + t]);
				}
			}
			const signs = [-1, ...Array.from(near, () => 1)];
			builder.row(0, Infinity, [column[b * territories + t], ...near], signs);
		}
	}
}

function costRow(prepared: Prepared, choices: Choices, program: PlanProgram, most: number): void {
	const { column } = program;
	const columns: number[] = [];
	const costs: number[] = [];
	let given = 0;
	choices.of.forEach((list, b) => {
		for (const t of list) {
			const cost = moveCost(prepared, b, t);
			const at = column[b * prepared.territories + t];
			if (at < 0) given += cost;
			else if (cost > 0) {
				columns.push(at);
				costs.push(cost);
			}
		}
	});
	const scale = Math.max(1, ...costs);
	program.builder.row(
		-Infinity,
		(most - given) / scale,
		columns,
		costs.map((cost) => cost / scale),
	);
}

/** A column of cost 1 for each pair of blocks that may be cut: at least the difference in each territory. */
function cutRows(prepared: Prepared, choices: Choices, { builder, column }: PlanProgram): void {
	const { graph, block, territories } = prepared;
	for (let unit = 0; unit < graph.count; unit++) {
		for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
			const other = graph.targets[i];
			const [a, b] = [block[unit], block[other]];
			if (other < unit || a === b) continue;
			const cut = builder.real(1, 0, 1);
			for (const t of new Set([...choices.of[a], ...choices.of[b]])) {
				const [p, q] = [column[a * territories + t], column[b * territories + t]];
				if (p >= 0 && q >= 0) {
					builder.row(0, Infinity, [cut, p, q], [1, -1, 1]);
					builder.row(0, Infinity, [cut, p, q], [1, 1, -1]);
				} else if (p >= 0) builder.row(0, Infinity, [cut, p], [1, -1]);
				else if (q >= 0) builder.row(0, Infinity, [cut, q], [1, -1]);
			}
		}
	}
}
