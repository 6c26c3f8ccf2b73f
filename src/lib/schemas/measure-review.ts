import type { JoinChoice, Match, TableNote, TableSource } from '../engines/measures/index.ts';
import type { TableReading } from './measure-forms.ts';

/** What has been decided about a table under review; kept with it. */
export interface TableOptions {
	reading: TableReading;
	/** null: as guessed */
	join: JoinChoice | null;
	/** rows decided by hand: place in the table and key of the region, or null to leave it out */
	amends: [row: number, key: string | null][];
	/** rows that name no region and are not decided one by one are left out as well */
	leaveOutRest: boolean;
	/** columns to take, once somebody has said which; null: as proposed */
	columns: ColumnChoice[] | null;
	/** what happens where the sheet has a measure of the same name */
	existing: 'replace' | 'add';
	/** sent by a program, which sends it again: its file goes once another takes its place */
	fed?: boolean;
}

/** How one column is taken over. */
export interface ColumnChoice {
	/** place in the table, from 0 */
	column: number;
	name: string;
	unit: string;
	kind: 'number' | 'text';
	/** several rows of one region */
	doubled: 'sum' | 'first' | 'last' | 'refuse';
	/** empty cells */
	empty: 'missing' | 'zero';
	/** cells that hold no number */
	notNumber: 'refuse' | 'missing';
	negative: 'refuse' | 'keep' | 'missing';
}

export interface RegionName {
	key: string;
	name: string;
}

/** A row that names no region, with what it could mean. */
export interface OpenRow {
	row: number;
	fileRow: number;
	text: string;
	why: 'blank' | 'unknown' | 'ambiguous';
	/** regions that it could mean, the nearest first */
	offers: RegionName[];
	/** the row's other cells, for whoever has to decide */
	others: string;
}

export interface DecidedRow {
	row: number;
	fileRow: number;
	text: string;
	/** null: left out */
	region: RegionName | null;
}

export interface ColumnNote {
	column: number;
	heading: string;
	kind: 'number' | 'text' | 'date' | 'empty';
	numbers: number;
	empty: number;
	/** how many cells hold no number, and the first of them */
	notNumbers: number;
	badCells: { fileRow: number; text: string }[];
	negatives: number;
	negativeRows: number[];
	unit: string | null;
	percent: boolean;
	leadingZeros: boolean;
	/** first texts in it */
	examples: string[];
	notes: string[];
	/** how it would be taken if nobody says otherwise */
	proposal: ColumnChoice;
}

/** What a column comes to, before and after joining. */
export interface ColumnOutcome {
	choice: ColumnChoice;
	/** why it cannot be taken, in sentences; empty when it can */
	refusals: string[];
	/** what should be known about it, in sentences */
	notes: string[];
	/** sums: of every row of the file, of the rows that are joined, of what is stored; null for texts */
	sums: { file: number; joined: number; lost: number; lostRows: number; stored: number } | null;
	/** regions without a value */
	missing: number;
	/** the measure of the same name, and what taking over would change; null for a new one */
	change: MeasureChange | null;
}

export interface MeasureChange {
	mode: 'replace' | 'add';
	/** regions whose value differs */
	changed: number;
	added: number;
	removed: number;
	/** the region that changes most */
	largest: { region: RegionName; before: number | null; after: number | null } | null;
	before: number | null;
	after: number | null;
	sentence: string;
}

/** A table under review, as its page shows it. */
export interface TableReview {
	source: Omit<TableSource, 'notes'> & {
		notes: string[];
		sheet: string | null;
		headingRow: number;
	};
	headings: string[];
	columns: ColumnNote[];
	rows: number;
	/** the first rows, cell by cell */
	preview: { fileRow: number; cells: string[]; region: string | null }[];
	/** null: no column names any region */
	join: ReviewedJoin | null;
	outcome: ColumnOutcome[];
}

export interface ReviewedJoin {
	choice: JoinChoice;
	guessed: boolean;
	counts: Record<Match, number>;
	joined: number;
	open: number;
	leftOut: number;
	/** one page of the rows that are open */
	list: { rows: OpenRow[]; found: number; page: number; pages: number; find: string };
	decided: { rows: DecidedRow[]; all: number };
	doubled: { regions: (RegionName & { rows: number[] })[]; all: number };
	missing: { regions: RegionName[]; all: number };
	notes: { severity: TableNote['severity']; sentence: string }[];
}
