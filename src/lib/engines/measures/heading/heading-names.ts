import type { Grid } from '../grid.ts';
import { listed, note, quoted } from '../note.ts';
import type { Cell, TableNote } from '../table.ts';
import { isNumberLike, isYear, type Heading } from './find-heading.ts';

/** A name for each of the columns, no two alike, and what to tell about them. */
export function headingNames(
	grid: Grid,
	heading: Heading,
	columns: number,
): { names: string[]; notes: TableNote[] } {
	const rows = grid.rows.slice(heading.first, heading.first + heading.rows);
	const given = Array.from({ length: columns }, (_, c) => rows.map((row) => tidy(row[c] ?? null)));
	const notes = rows.length ? notesOnPlace(grid, heading) : [noHeading()];
	let names = given.map((parts) => parts[0] ?? '');
	if (heading.rows === 2) {
		const upper = spread(grid, heading, names, columns);
		names = given.map(([, lower], c) => joined(upper[c], lower));
		notes.push(notesOnMerged(grid, heading, names, upper));
	}
	const numbered = names.map((name, c) => name || `Column ${c + 1}`);
	const { unique, repeated } = distinct(numbered);
	if (repeated.length) {
		const message = `Several columns are called ${listed(repeated.map(quoted))}; the later ones got a number.`;
		notes.push(note('warning', 'headings-alike', message));
	}
	return { names: unique, notes };
}

const tidy = (cell: Cell): string =>
	cell === null ? '' : String(cell).replace(/\s+/g, ' ').trim();

const joined = (upper: string, lower: string): string =>
	upper && lower && upper !== lower ? `${upper}, ${lower}` : upper || lower;

/** The upper labels over every column that they span. */
function spread(grid: Grid, heading: Heading, names: string[], columns: number): string[] {
	const upper = [...names];
	const at = grid.fileRows[heading.first] - 1;
	const merges = grid.merges.filter((merge) => merge.top <= at && merge.bottom >= at);
	for (const { left, right } of merges) {
		for (let c = left; c <= right && c < columns; c++) upper[c] = names[left];
	}
	if (grid.merges.length) return upper;
	const lower = grid.rows[heading.first + 1];
	for (let c = 1; c < columns; c++) {
		if (!upper[c] && (lower[c] ?? null) !== null) upper[c] = upper[c - 1];
	}
	return upper;
}

function notesOnMerged(grid: Grid, heading: Heading, names: string[], upper: string[]): TableNote {
	const row = grid.fileRows[heading.first];
	const example = names.find((name, c) => upper[c] && name !== upper[c]) ?? names[0];
	const message = `The heading takes rows ${row} and ${row + 1}; names such as ${quoted(example)} were made of both.`;
	return note('note', 'heading-merged', message, { row });
}

function notesOnPlace(grid: Grid, heading: Heading): TableNote[] {
	const notes: TableNote[] = [];
	const row = grid.fileRows[heading.first];
	if (heading.first > 0) {
		const skipped = grid.fileRows.slice(0, heading.first);
		const message = `${skipped.length === 1 ? 'Row' : 'Rows'} ${listed(skipped)} above the heading (row ${row}) ${skipped.length === 1 ? 'was' : 'were'} left out.`;
		notes.push(note('note', 'rows-above', message, { row: skipped[0] }));
	}
	const last = grid.rows[heading.first + heading.rows - 1];
	if (last.some((cell) => isNumberLike(cell) && !isYear(cell))) {
		const message = `Row ${row} was taken as the heading but holds numbers. Say so if the table has no heading.`;
		notes.push(note('warning', 'heading-numbers', message, { row }));
	}
	return notes;
}

const noHeading = (): TableNote =>
	note('note', 'no-heading', 'The table has no heading; its columns were numbered.');

function distinct(names: string[]): { unique: string[]; repeated: string[] } {
	const taken = new Set(names);
	const seen = new Set<string>();
	const repeated = new Set<string>();
	const unique = names.map((name) => {
		if (!seen.has(name)) {
			seen.add(name);
			return name;
		}
		repeated.add(name);
		let number = 2;
		while (taken.has(`${name} (${number})`)) number++;
		taken.add(`${name} (${number})`);
		return `${name} (${number})`;
	});
	return { unique, repeated: [...repeated] };
}
