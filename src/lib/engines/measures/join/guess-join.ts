import type { TypedColumn } from '../columns/typed-column.ts';
import type { RawTable } from '../table.ts';
import type { JoinChoice, Regions } from './join.ts';
import { findRegion, indexRegions, type RegionIndex } from './region-index.ts';

/** So many cells are looked up in all; of a larger table every second row, or third, and so on. */
const mostLookups = 2_000_000;
/** A match by zeros at the front counts half, since figures are often small whole numbers. */
const zerosCount = 0.5;

/**
 * The column whose cells name regions best, by key or by name, and the share of its filled rows that do.
 * Prefers many different regions over many rows, then keys over names, then the leftmost column. Null where
 * no column names any region.
 */
export function guessJoin(
	table: RawTable,
	typed: TypedColumn[],
	regions: Regions,
): (JoinChoice & { share: number }) | null {
	const step = Math.max(1, Math.ceil((2 * table.rows * typed.length) / mostLookups));
	let best: { choice: JoinChoice; index: RegionIndex; score: number } | null = null;
	for (const by of ['key', 'name'] as const) {
		const index = indexRegions(regions, by);
		for (const { column, kind } of typed) {
			if (kind === 'empty') continue;
			const { score } = hits(table, column, index, step);
			if (score > (best?.score ?? 0)) best = { choice: { column, by }, index, score };
		}
	}
	if (!best) return null;
	return { ...best.choice, share: hits(table, best.choice.column, best.index, 1).share };
}

function hits(table: RawTable, column: number, index: RegionIndex, step: number) {
	const cells = table.cells[column];
	const regions = new Set<number>();
	let filled = 0;
	let matched = 0;
	let certain = 0;
	for (let row = 0; row < cells.length; row += step) {
		if (cells[row] === null) continue;
		filled++;
		const found = findRegion(index, cells[row]);
		if (found.is !== 'found') continue;
		matched++;
		certain += found.how === 'zeros' ? zerosCount : 1;
		regions.add(found.region);
	}
	const share = filled ? matched / filled : 0;
	// figures that happen to be small whole numbers hit few regions again and again
	const reachable = Math.max(1, Math.min(filled, index.exact.size));
	return { share, score: filled ? (certain / filled) * (regions.size / reachable) : 0 };
}
