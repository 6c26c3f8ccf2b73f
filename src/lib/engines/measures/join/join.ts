import type { TableNote } from '../table.ts';

/** The regions that tables are joined to. */
export interface Regions {
	/** no two alike */
	keys: string[];
	names: string[];
}

export interface JoinChoice {
	/** column of the table, from 0 */
	column: number;
	by: 'key' | 'name';
}

/** A person's decision on one row: the region it belongs to, or null to leave it out. */
export interface Amend {
	/** place in the table, from 0 */
	row: number;
	region: number | null;
}

export type Match =
	| 'exact'
	/** alike but for case, accents, spaces and punctuation */
	| 'folded'
	/** alike but for zeros at the front, which spreadsheets drop */
	| 'zeros'
	| 'by-hand';

export interface Unmatched {
	/** place in the table, from 0 */
	row: number;
	/** number in the file, from 1 */
	fileRow: number;
	text: string;
	why: 'blank' | 'unknown' | 'ambiguous';
	/** regions that the text could mean equally well; only where ambiguous */
	candidates: number[];
	/** up to three regions whose key or name is nearest, nearest first */
	suggestions: Suggestion[];
}

export interface Suggestion {
	region: number;
	/** letters to change, put in or leave out, after folding */
	distance: number;
}

/** Which row belongs to which region, and what is open. */
export interface Join {
	choice: JoinChoice;
	/** number of regions */
	regions: number;
	/** by row: region from 0, or -1 */
	region: Int32Array;
	/** by row; null where no region was found or the row is left out */
	how: (Match | null)[];
	/** number of each row in the file, from 1 */
	fileRows: number[];
	/** in the order of rows */
	unmatched: Unmatched[];
	/** rows a person left out */
	leftOut: number[];
	/** regions that stand in several rows, by region */
	doubled: { region: number; rows: number[] }[];
	/** regions that stand in no row */
	missing: number[];
	counts: Record<Match, number>;
	notes: TableNote[];
}
