import { piecesOf, type Choices } from './exact-choices.ts';
import { addCut, borderOf, enclosed, needsBorder } from './exact-cuts.ts';
import type { PlanProgram } from './exact-program.ts';
import type { Prepared } from './prepare.ts';

/** what counts as taken, when a program may take units in part */
const thresholds = [0.001, 0.15, 0.3, 0.45, 0.6, 0.8];
const LEAST_GAIN = 0.03;

/**
 * Adds rows on contiguity that `values`, a solution of the program without whole numbers, breaks: the
 * pieces of what each territory takes to at least some part, by the border that would join them to its
 * root. Finds many of the broken rows, not all. Returns how many were added.
 */
export function addBrokenFractions(
	prepared: Prepared,
	choices: Choices,
	program: PlanProgram,
	values: Float64Array,
): number {
	const before = program.builder.rows;
	for (const t of program.active) {
		const pool = new Set(choices.pool[t]);
		const part = (unit: number) =>
			values[program.column[prepared.block[unit] * prepared.territories + t]];
		const known = new Set<string>();
		for (const threshold of thresholds) {
			const pieces = piecesOf(
				prepared,
				choices.pool[t].filter((unit) => part(unit) >= threshold),
			);
			const root = choices.root[t];
			const main =
				pieces.find((piece) => piece.includes(root)) ??
				(root >= 0 ? [root] : heaviest(pieces, part));
			for (const piece of pieces) {
				if (piece === main) continue;
				const border = borderOf(prepared, pool, piece, main);
				const shut = enclosed(prepared, pool, border, piece);
				const rooted = needsBorder(prepared, choices, t, shut);
				let across = rooted ? 0 : 1;
				for (const unit of border) across += part(unit);
				const anchor = rooted ? -1 : main.reduce((a, b) => (part(b) > part(a) ? b : a));
				for (const unit of piece) {
					const key = `${unit}:${anchor}:${[...border].sort().join()}`;
					if (part(unit) + (rooted ? 0 : part(anchor)) < across + LEAST_GAIN || known.has(key))
						continue;
					known.add(key);
					addCut(prepared, program, t, unit, border, anchor);
				}
			}
		}
	}
	return program.builder.rows - before;
}

function heaviest(pieces: number[][], part: (unit: number) => number): number[] {
	const weight = (piece: number[]) => piece.reduce((sum, unit) => sum + part(unit), 0);
	return pieces.reduce((a, b) => (weight(b) > weight(a) ? b : a), []);
}
