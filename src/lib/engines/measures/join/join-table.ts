import type { RawTable } from '../table.ts';
import type { Amend, Join, JoinChoice, Match, Regions, Unmatched } from './join.ts';
import { notesOnJoin } from './join-notes.ts';
import { findRegion, indexRegions, labelOf } from './region-index.ts';
import { Suggestions } from './suggestions.ts';

/** Unknown texts get suggestions until so many steps are spent; a table with more of them than that, a few
 * hundred among 33,000 regions, is joined by the wrong column. */
const mostSteps = 20_000_000;

/**
 * Joins the rows of a table to regions by one column.
 *
 * In: a table; the column and whether it holds keys or names; the regions; a person's decisions, of which
 * the last on a row counts. Out: the region of every row and how it was found, rows without one with
 * suggestions, regions in several rows and in none. Guarantee: a text that could mean several regions is
 * never given one; the order of rows does not matter to any row's match. Throws RangeError for a column, row
 * or region that does not exist. Time: linear in rows and regions, apart from suggestions.
 */
export function joinTable(
	table: RawTable,
	choice: JoinChoice,
	regions: Regions,
	amends: Amend[] = [],
): Join {
	const cells = table.cells[choice.column];
	if (!cells) throw new RangeError(`The table has no column ${choice.column}.`);
	const decided = decisions(amends, table.rows, regions.keys.length);
	const index = indexRegions(regions, choice.by);
	const region = new Int32Array(table.rows).fill(-1);
	const how = new Array<Match | null>(table.rows).fill(null);
	const unmatched: Unmatched[] = [];
	const leftOut: number[] = [];
	for (let row = 0; row < table.rows; row++) {
		const amended = decided.get(row);
		if (amended === null) leftOut.push(row);
		else if (amended !== undefined) [region[row], how[row]] = [amended, 'by-hand'];
		else {
			const found = findRegion(index, cells[row]);
			if (found.is === 'found') [region[row], how[row]] = [found.region, found.how];
			else unmatched.push(open(table, row, choice.column, found));
		}
	}
	suggest(unmatched, regions, choice.by);
	const { doubled, missing } = tally(region, regions.keys.length);
	const join: Omit<Join, 'notes'> = {
		choice: { column: choice.column, by: choice.by },
		regions: regions.keys.length,
		region,
		how,
		fileRows: table.fileRows,
		unmatched,
		leftOut,
		doubled,
		missing,
		counts: countMatches(how),
	};
	return { ...join, notes: notesOnJoin(join, table.headings[choice.column]) };
}

function decisions(amends: Amend[], rows: number, regions: number): Map<number, number | null> {
	for (const { row, region } of amends) {
		const known = region === null || (Number.isInteger(region) && region >= 0 && region < regions);
		if (!known || !Number.isInteger(row) || row < 0 || row >= rows) {
			throw new RangeError(`No row ${row} or no region ${region} to amend.`);
		}
	}
	return new Map(amends.map(({ row, region }) => [row, region]));
}

function open(
	table: RawTable,
	row: number,
	column: number,
	found: { is: 'ambiguous'; candidates: number[] } | { is: 'unknown' },
): Unmatched {
	const text = labelOf(table.cells[column][row]);
	const candidates = found.is === 'ambiguous' ? found.candidates : [];
	const why = text === '' ? 'blank' : found.is;
	return { row, fileRow: table.fileRows[row], text, why, candidates, suggestions: [] };
}

function suggest(unmatched: Unmatched[], regions: Regions, by: 'key' | 'name'): void {
	const unknown = unmatched.filter(({ why }) => why === 'unknown');
	if (!unknown.length) return;
	const suggestions = new Suggestions(regions, by);
	const byText = new Map<string, Unmatched['suggestions']>();
	for (const row of unknown) {
		if (!byText.has(row.text)) {
			if (suggestions.steps > mostSteps) continue;
			byText.set(row.text, suggestions.for(row.text));
		}
		row.suggestions = byText.get(row.text) ?? [];
	}
}

function tally(region: Int32Array, regions: number): Pick<Join, 'doubled' | 'missing'> {
	const rows = new Map<number, number[]>();
	region.forEach((r, row) => {
		if (r < 0) return;
		const there = rows.get(r);
		if (there) there.push(row);
		else rows.set(r, [row]);
	});
	const doubled: Join['doubled'] = [];
	const missing: number[] = [];
	for (let r = 0; r < regions; r++) {
		const own = rows.get(r);
		if (!own) missing.push(r);
		else if (own.length > 1) doubled.push({ region: r, rows: own });
	}
	return { doubled, missing };
}

function countMatches(how: (Match | null)[]): Join['counts'] {
	const counts = { exact: 0, folded: 0, zeros: 0, 'by-hand': 0 };
	for (const match of how) if (match) counts[match]++;
	return counts;
}
