import { fillable, fits, piecesOf, type Choices } from './exact-choices.ts';
import { poolColumns, type PlanProgram } from './exact-program.ts';
import type { Prepared } from './prepare.ts';

/**
 * Adds rows that every plan of the rules keeps and `assignment` does not: for a piece of a territory cut
 * off from the rest, that its units need a unit of the border between the two (vertex separators as in
 * Fischetti et al. 2017 and, for districts, Validi, Buchanan, Lykhovyd 2022); for a load outside its
 * limits by less than the solver's tolerance, that this very set is not taken. Returns how many rows.
 */
export function addBroken(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	assignment: Int32Array,
): number {
	const before = program.builder.rows;
	for (const t of program.active) {
		const held = unitsIn(assignment, choices.pool[t], t);
		const pieces = piecesOf(prepared, held);
		const main = mainPiece(pieces, choices.root[t]);
		for (const piece of pieces) {
			if (piece === main) continue;
			cutBetween(prepared, choices, program, t, piece, main);
			cutElsewhere(prepared, choices, program, t, piece);
		}
		if (pieces.length === 1) addMisfit(prepared, choices, program, t, held);
	}
	return program.builder.rows - before;
}

const unitsIn = (assignment: Int32Array, pool: number[], t: number) =>
	pool.filter((unit) => assignment[unit] === t);

function mainPiece(pieces: number[][], root: number): number[] {
	if (root >= 0) return pieces.find((piece) => piece.includes(root)) ?? pieces[0];
	return pieces.reduce((a, b) => (b.length > a.length ? b : a));
}

/** Units of the pool next to `region` from which `main` can be reached without it: the border needed. */
export function borderOf(prepared: Prepared, pool: Set<number>, region: number[], main: number[]) {
	const { offsets, targets } = prepared.graph;
	const inside = new Set(region);
	const rim = new Set<number>();
	for (const unit of region) {
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			const other = targets[i];
			if (pool.has(other) && !inside.has(other)) rim.add(other);
		}
	}
	const border = new Set<number>();
	const seen = new Set(main);
	const queue = [...main];
	for (const unit of queue) {
		if (rim.has(unit)) {
			border.add(unit);
			continue;
		}
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			const other = targets[i];
			if (!pool.has(other) || seen.has(other) || inside.has(other)) continue;
			seen.add(other);
			queue.push(other);
		}
	}
	return border;
}

/** What `border` shuts in with `region`. */
export function enclosed(
	prepared: Prepared,
	pool: Set<number>,
	border: Set<number>,
	region: number[],
) {
	const { offsets, targets } = prepared.graph;
	const seen = new Set(region);
	const queue = [...region];
	for (const unit of queue) {
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			const other = targets[i];
			if (!pool.has(other) || seen.has(other) || border.has(other)) continue;
			seen.add(other);
			queue.push(other);
		}
	}
	return queue;
}

/** Whether no plan can have the territory among the units shut in alone: it is rooted, or they are too light. */
export const needsBorder = (prepared: Prepared, choices: Choices, t: number, shut: number[]) =>
	choices.root[t] >= 0 || !fillable(prepared, t, shut);

function cutBetween(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	t: number,
	piece: number[],
	main: number[],
): void {
	const pool = new Set(choices.pool[t]);
	const border = borderOf(prepared, pool, piece, main);
	const shut = enclosed(prepared, pool, border, piece);
	const rooted = needsBorder(prepared, choices, t, shut);
	for (const unit of rooted ? shut.slice(0, MOST) : piece) {
		addCut(prepared, program, t, unit, border, rooted ? -1 : main[0]);
	}
}

/** rows for the units shut in, nearest first; more would only slow the program */
const MOST = 24;

/** The same piece may be cut off in any territory with a root: say so before it is tried there. */
function cutElsewhere(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	t: number,
	piece: number[],
): void {
	for (const other of program.active) {
		const root = choices.root[other];
		if (other === t || root < 0 || piece.includes(root)) continue;
		const pool = new Set(choices.pool[other]);
		const region = piecesOf(
			prepared,
			piece.filter((unit) => pool.has(unit)),
		);
		for (const part of region) {
			const border = borderOf(prepared, pool, part, [root]);
			if (border.size === 0 || border.has(root)) continue;
			for (const unit of part) addCut(prepared, program, other, unit, border, -1);
		}
	}
}

/** x(unit) <= sum of x(border), or x(unit) + x(anchor) <= 1 + sum of x(border). */
export function addCut(
	prepared: Prepared,
	{ builder, column }: PlanProgram,
	t: number,
	unit: number,
	border: Set<number>,
	anchor: number,
): void {
	const at = (u: number) => column[prepared.block[u] * prepared.territories + t];
	const columns = new Set([...border].map(at));
	const head = new Set(anchor < 0 ? [at(unit)] : [at(unit), at(anchor)]);
	for (const own of head) if (columns.has(own)) return;
	const signs = [...Array.from(head, () => 1), ...Array.from(columns, () => -1)];
	builder.row(-Infinity, anchor < 0 ? 0 : 1, [...head, ...columns], signs);
}

function addMisfit(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	t: number,
	held: number[],
): void {
	const { columns, blocks } = poolColumns(prepared, choices, program, t);
	const taken = new Set(held.map((unit) => prepared.block[unit]));
	const inside = columns.filter((_, i) => taken.has(blocks[i]));
	const outside = columns.filter((_, i) => !taken.has(blocks[i]));
	if (!fillable(prepared, t, held)) program.builder.row(1, Infinity, outside);
	if (!fits(prepared, t, held)) program.builder.row(-Infinity, inside.length - 1, inside);
}
