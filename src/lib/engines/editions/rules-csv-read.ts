import { readCsvRows } from '../measures/text/csv-rows.ts';
import { RuleGathering } from './rule-gathering.ts';
import {
	CellReader,
	columnsOf,
	LineFault,
	type Cells,
	type RulesCsvGround,
} from './rules-csv-cells.ts';
import type { RuleParts } from './rule-parts.ts';
import { ruleKinds } from './rule-list.ts';

export interface RowFault {
	/** number of the row in the file, from 1; a row may take several lines */
	row: number;
	/** a plain sentence without a full stop; texts of the file as they are */
	words: string;
}

export type RulesRead =
	| {
			status: 'read';
			/** the rules of all rows without a fault */
			parts: RuleParts;
			faults: RowFault[];
			/** rows of the file that are not blank, and rules of each part that they make */
			counts: { rows: number } & Record<keyof RuleParts, number>;
	  }
	| { status: 'refused'; message: string };

/**
 * Rules from a table as `rulesToCsv` writes it, or as people make it: comma or semicolon separated, with
 * or without a byte order mark, columns in any order, regions by key or by a name that only one has, inks
 * by number from 1 or by name. In: the bytes of a file, or a text. Out: the rules and what is wrong, row
 * by row; a row with a fault makes no rule. Refused where it is no such table. Linear time.
 */
export function rulesFromCsv(file: Uint8Array | string, ground: RulesCsvGround): RulesRead {
	const bytes = typeof file === 'string' ? new TextEncoder().encode(file) : file;
	const read = readCsvRows(bytes);
	if ('refused' in read) return { status: 'refused', message: read.refused };
	const [headings, ...rows] = read.rows;
	if (headings === undefined) return { status: 'refused', message: 'The file is empty.' };
	const columns = columnsOf(headings);
	if (typeof columns === 'string') return { status: 'refused', message: columns };
	const broken = read.notes.find(({ severity }) => severity === 'error');
	if (broken) return { status: 'refused', message: broken.message };

	const gathering = new RuleGathering();
	const cells = new CellReader(ground);
	const faults: RowFault[] = [];
	rows.forEach((row, i) => {
		const fileRow = read.fileRows[i + 1];
		try {
			takeRow((column) => row[columns.get(column) ?? -1] ?? '', cells, gathering, fileRow);
		} catch (error) {
			if (!(error instanceof LineFault)) throw error;
			faults.push({ row: fileRow, words: error.message });
		}
	});
	const { parts, late } = gathering.done();
	faults.push(...late);
	return {
		status: 'read',
		parts,
		faults: faults.sort((a, b) => a.row - b.row),
		counts: {
			rows: rows.length,
			...{ locks: Object.keys(parts.locks).length, forbidden: parts.forbidden.length },
			...{ alike: parts.alike.length, apart: parts.apart.length },
			...{ groups: parts.groups.length, reserved: parts.reserved.length },
		},
	};
}

function takeRow(cell: Cells, read: CellReader, into: RuleGathering, row: number): void {
	const written = cell('rule').trim().toLowerCase();
	const kind = ruleKinds.find((name) => name === written);
	const region = () => read.region(cell('region'), cell('name'));
	const other = () => read.region(cell('other region'), cell('other name'));
	switch (kind) {
		case 'lock':
			return into.lock(region(), read.ink(cell('ink')), read.weight(cell('weight')));
		case 'forbidden ink':
			return into.forbid(region(), read.ink(cell('ink')));
		case 'keep alike':
			return into.pair('alike', region(), other());
		case 'keep apart':
			return into.pair('apart', region(), other());
		case 'all alike':
			return into.group('alike', cell('group'), region(), row);
		case 'all different':
			return into.group('different', cell('group'), region(), row);
		case 'reserved ink':
			return into.reserve(read.ink(cell('ink')));
		case undefined:
			throw new LineFault(`the rule must be one of: ${ruleKinds.join(', ')}`);
	}
}
