import type { Grid } from '../grid.ts';
import { parseNumber } from '../numbers/parse-number.ts';
import type { ReadOptions } from '../options.ts';
import { TableRefusal } from '../refusal.ts';
import type { Cell } from '../table.ts';

/** Where the heading stands: place of its first row among the grid's rows, and how many rows it takes. */
export interface Heading {
	first: number;
	rows: 0 | 1 | 2;
}

const sampleRows = 60;

/**
 * The heading: the first row that fills more than half of the table's usual width, so that titles and
 * remarks above it are skipped; together with the row above or below where cells span several columns.
 * House rule, no source.
 */
export function findHeading(grid: Grid, options: ReadOptions): Heading {
	if (options.headingRow === 0) return { first: 0, rows: 0 };
	if (options.headingRow !== undefined) {
		const first = grid.fileRows.indexOf(options.headingRow);
		if (first < 0) {
			const message = `Row ${options.headingRow} is blank or does not exist, so it cannot be the heading.`;
			throw new TableRefusal('no-such-row', message);
		}
		return { first, rows: options.headingRows ?? (spansAbove(grid, first) ? 2 : 1) };
	}
	const usual = usualWidth(grid);
	const found = grid.rows.findIndex((row) => filled(row) * 2 > usual || usual === 1);
	const at = Math.max(0, found);
	if (options.headingRows === 1) return { first: at, rows: 1 };
	if (at > 0 && spansAbove(grid, at - 1)) return { first: at - 1, rows: 2 };
	if (options.headingRows === 2 || spansAbove(grid, at)) return { first: at, rows: 2 };
	return { first: at, rows: 1 };
}

export const filled = (row: Cell[]): number =>
	row.reduce<number>((n, c) => n + (c === null ? 0 : 1), 0);

/** The largest number of filled cells that two rows near the beginning reach. */
function usualWidth(grid: Grid): number {
	const counts = grid.rows.slice(0, sampleRows).map(filled);
	counts.sort((a, b) => b - a);
	return counts[1] ?? counts[0] ?? 0;
}

/** Whether the row holds labels over several columns, and the row right below it their parts. */
function spansAbove(grid: Grid, upper: number): boolean {
	const lower = upper + 1;
	// below a heading of two rows there is data
	if (lower + 1 >= grid.rows.length) return false;
	if (grid.fileRows[lower] !== grid.fileRows[upper] + 1) return false;
	if (!grid.rows[lower].some((cell) => typeof cell === 'string')) return false;
	return grid.merges.length ? mergedAbove(grid, upper) : gapsAbove(grid, upper);
}

function mergedAbove(grid: Grid, upper: number): boolean {
	const at = grid.fileRows[upper] - 1;
	const spans = grid.merges.filter((m) => m.top === at && m.bottom === at && m.right > m.left);
	const parted = spans.filter(({ left, right }) => {
		const below = grid.rows[upper + 1].slice(left, right + 1);
		return filled(below) > 1;
	});
	// a single label from the first column on is a title
	return parted.length > 0 && (filled(grid.rows[upper]) > 1 || parted[0].left > 0);
}

/** Without merged cells to go by: gaps in the upper row that are filled in a lower row that is no data. */
function gapsAbove(grid: Grid, upper: number): boolean {
	const [above, below] = [grid.rows[upper], grid.rows[upper + 1]];
	const first = above.findIndex((cell) => cell !== null);
	if (first === 0 && filled(above) < 3) return false;
	const fillsGap = below.some(
		(cell, c) => cell !== null && c > first && (above[c] ?? null) === null,
	);
	return fillsGap && isHeadingLike(grid, upper + 1);
}

/** Some column has numbers in the rows below but a text (or a year) in this one, and none the reverse. */
function isHeadingLike(grid: Grid, at: number): boolean {
	const row = grid.rows[at];
	const data = grid.rows.slice(at + 1, at + 1 + sampleRows);
	if (row.some((cell) => isNumberLike(cell) && !isYear(cell))) return false;
	return row.some((cell, c) => {
		if (cell === null) return false;
		const below = data.map((other) => other[c] ?? null).filter((other) => other !== null);
		const numbers = below.filter((other) => isNumberLike(other) && !isYear(other)).length;
		return below.length > 0 && numbers * 2 > below.length;
	});
}

export function isNumberLike(cell: Cell): boolean {
	if (typeof cell === 'number') return true;
	return typeof cell === 'string' && (parseNumber(cell, '.') ?? parseNumber(cell, ',')) !== null;
}

/** A whole number that may well be the heading of a year's figures. */
export const isYear = (cell: Cell): boolean => /^(19|20)\d\d$/.test(String(cell).trim());
