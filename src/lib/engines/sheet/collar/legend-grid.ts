import type { LegendPlace } from '../drawing.ts';
import { headHeight, linesOf, rowHeight, rowsOf } from './legend-plan.ts';

/** Upper left corner of an entry, and the height of its row. */
export interface Cell {
	x: number;
	y: number;
	high: number;
}

export interface LegendGrid {
	inkCells: Cell[];
	rankCells: Cell[];
	/** below the last row */
	end: number;
}

/** Where the entries of a legend stand: inks column by column, below them ranks of line row by row. */
export function gridOf(place: LegendPlace, inks: string[], ranks: string[]): LegendGrid {
	const { columns, step, x } = place;
	const rows = rowsOf(columns, inks.length);
	const inkAt = inks.map((_, i) => ({ column: Math.floor(i / rows), row: i % rows }));
	const rankAt = ranks.map((_, i) => ({
		column: i % columns,
		row: rows + Math.floor(i / columns),
	}));
	const heights = Array.from({ length: rows + rowsOf(columns, ranks.length) }, () => 0);
	[...inkAt, ...rankAt].forEach(({ row }, i) => {
		const text = i < inks.length ? inks[i] : ranks[i - inks.length];
		heights[row] = Math.max(heights[row], rowHeight(place.size, linesOf(place, text)));
	});
	const tops = [place.y + headHeight(place)];
	for (const high of heights) tops.push(tops[tops.length - 1] + high);
	const cell = ({ column, row }: { column: number; row: number }): Cell => ({
		x: Math.round(x + step * column),
		y: Math.round(tops[row]),
		high: heights[row],
	});
	return { inkCells: inkAt.map(cell), rankCells: rankAt.map(cell), end: tops[tops.length - 1] };
}
