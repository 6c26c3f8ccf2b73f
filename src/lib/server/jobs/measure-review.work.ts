import type { Join, RawTable, Regions, TypedColumn } from '../../engines/measures/index.ts';
import type {
	ColumnNote,
	DecidedRow,
	OpenRow,
	ReviewedJoin,
	TableReview,
} from '../../schemas/measure-review.ts';
import { joinKept, type JoinInput } from './measure-join.ts';
import { outcomeOf, type Standing } from './measure-outcome.ts';
import { choiceFor } from './measure-proposal.ts';
import { regionName, sentenceOf } from './measure-words.ts';
import type { Task } from './task-port.ts';

export interface ReviewInput extends JoinInput {
	/** page of the open rows, from 1, and words that they must hold */
	page: number;
	find: string;
	/** what the sheet has already */
	standing: Standing[];
}

/** Rows on one page of the review. */
export const pageRows = 50;
const previewRows = 8;
/** So many are named; the rest is counted. */
const mostListed = 200;

/** Everything the page of a review shows, apart from what is stored with the table. */
export function reviewMeasureTable({ input }: Task<ReviewInput>): Omit<TableReview, 'source'> {
	const { regions } = input;
	const joined = joinKept(input);
	const { table, typed, join } = joined;
	return {
		headings: table.headings,
		columns: typed.map(columnNote),
		rows: table.rows,
		preview: preview(table, join, regions),
		join: join && reviewJoin(table, join, joined.guessed, input),
		outcome: join ? outcomeOf({ table, typed, join }, input) : [],
	};
}

/** For every open row whose nearest region is nearer than any other: the row and that region's key. */
export function nearestRegions({ input }: Task<JoinInput>): [row: number, key: string][] {
	const { join } = joinKept(input);
	return (join?.unmatched ?? []).flatMap(({ row, suggestions: [first, second] }) =>
		first && (!second || first.distance < second.distance)
			? [[row, input.regions.keys[first.region]] satisfies [number, string]]
			: [],
	);
}

const cellText = (cell: unknown): string => (cell === null ? '' : String(cell)).slice(0, 200);
function columnNote(typed: TypedColumn): ColumnNote {
	const { column, heading, kind, numbers, empty, notNumbers, negativeRows } = typed;
	const { unit, percent, leadingZeros, notes, cells } = typed;
	const examples = cells.filter((cell) => cell !== null).slice(0, 3);
	return {
		...{ column, heading, kind, numbers, empty, unit, percent, leadingZeros },
		notNumbers: notNumbers.length,
		badCells: notNumbers
			.slice(0, 5)
			.map(({ fileRow, text }) => ({ fileRow, text: cellText(text) })),
		negatives: negativeRows.length,
		negativeRows: negativeRows.slice(0, 5),
		examples: examples.map(cellText),
		notes: notes.map(({ message }) => message),
		proposal: choiceFor(typed),
	};
}

const preview = (table: RawTable, join: Join | null, regions: Regions): TableReview['preview'] =>
	Array.from({ length: Math.min(previewRows, table.rows) }, (_, row) => ({
		fileRow: table.fileRows[row],
		cells: table.cells.map((column) => cellText(column[row])),
		region: join && join.region[row] >= 0 ? regionName(regions, join.region[row]).name : null,
	}));

function reviewJoin(
	table: RawTable,
	join: Join,
	guessed: boolean,
	{ regions, page, find, options }: ReviewInput,
): ReviewedJoin {
	const { unmatched, leftOut, doubled, missing, counts, choice } = join;
	const found = foundRows(join, find);
	const pages = Math.max(1, Math.ceil(found.length / pageRows));
	const shown = Math.min(Math.max(1, page), pages);
	const rows = found.slice((shown - 1) * pageRows, shown * pageRows);
	return {
		...{ choice, guessed, counts },
		joined: counts.exact + counts.folded + counts.zeros + counts['by-hand'],
		open: unmatched.length,
		leftOut: leftOut.length,
		list: {
			rows: rows.map((row) => openRow(table, row, choice.column, regions)),
			...{ found: found.length, page: shown, pages, find },
		},
		decided: {
			rows: options.amends
				.slice(-mostListed)
				.flatMap((amend) => decidedRow(table, join, amend, regions)),
			all: options.amends.length,
		},
		doubled: {
			regions: doubled.slice(0, mostListed).map(({ region, rows }) => ({
				...regionName(regions, region),
				rows: rows.slice(0, 20).map((row) => table.fileRows[row]),
			})),
			all: doubled.length,
		},
		missing: {
			regions: missing.slice(0, mostListed).map((region) => regionName(regions, region)),
			all: missing.length,
		},
		notes: join.notes.map((note) => ({
			severity: note.severity,
			sentence: sentenceOf(note, regions),
		})),
	};
}

function foundRows({ unmatched }: Join, find: string): Join['unmatched'] {
	const words = find.toLocaleLowerCase().split(/\s+/).filter(Boolean);
	if (words.length === 0) return unmatched;
	return unmatched.filter(({ text }) => {
		const small = text.toLocaleLowerCase();
		return words.every((word) => small.includes(word));
	});
}

function openRow(
	table: RawTable,
	{ row, fileRow, text, why, candidates, suggestions }: Join['unmatched'][number],
	column: number,
	regions: Regions,
): OpenRow {
	const offers = [...candidates.slice(0, 12), ...suggestions.map(({ region }) => region)];
	const others = table.cells
		.filter((_, other) => other !== column)
		.map((cells) => cellText(cells[row]))
		.filter(Boolean);
	return {
		...{ row, fileRow, why, text: cellText(text) },
		offers: offers.map((region) => regionName(regions, region)),
		others: others.slice(0, 4).join(', ').slice(0, 120),
	};
}

function decidedRow(
	table: RawTable,
	join: Join,
	[row, key]: [number, string | null],
	regions: Regions,
): DecidedRow[] {
	const region = join.region[row] ?? -1;
	if (key !== null && join.how[row] !== 'by-hand') return [];
	return [
		{
			row,
			fileRow: table.fileRows[row],
			text: cellText(table.cells[join.choice.column][row]),
			region: key === null ? null : regionName(regions, region),
		},
	];
}
