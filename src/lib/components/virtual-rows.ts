/** Above this many rows a table keeps only those in view in the page. */
export const rowsKeptWhole = 300;
/** rows kept ready above and below the view */
const spare = 12;

/**
 * Which rows of a long table exist, and how many pixels stand in for the rest.
 * `scrolled` and `seen` are pixels; rows are all of one height.
 */
export function windowOf(rows: number, rowHeight: number, scrolled: number, seen: number) {
	if (rows <= rowsKeptWhole) return { from: 0, to: rows, above: 0, below: 0, windowed: false };
	const last = Math.max(0, rows - Math.ceil(seen / rowHeight));
	const first = Math.min(Math.floor(scrolled / rowHeight), last);
	const from = Math.max(0, first - spare);
	const to = Math.min(rows, first + Math.ceil(seen / rowHeight) + spare);
	return {
		from,
		to,
		above: from * rowHeight,
		below: (rows - to) * rowHeight,
		windowed: true,
	};
}
