import { counted, listed, note } from '../note.ts';
import type { TableNote } from '../table.ts';
import type { Join, Match } from './join.ts';

const hashed = (regions: number[]) => regions.map((region) => `#${region}`);
const mostNamed = 5;

/** What a person should know about a join, gravest first. */
export function notesOnJoin(join: Omit<Join, 'notes'>, column: string): TableNote[] {
	return [
		...openRows(join, column),
		...zeros(join, column),
		...doubled(join),
		...missing(join),
		...folded(join, column),
	];
}

function openRows({ unmatched }: Omit<Join, 'notes'>, column: string): TableNote[] {
	const sentences = {
		unknown: ['names no region', 'name no region', 'row-unknown'],
		ambiguous: ['could mean several regions', 'could mean several regions', 'row-ambiguous'],
		blank: ['has nothing to join by', 'have nothing to join by', 'row-blank'],
	} as const;
	return (['unknown', 'ambiguous', 'blank'] as const).flatMap((kind) => {
		const rows = unmatched.filter(({ why }) => why === kind).map(({ fileRow }) => fileRow);
		if (!rows.length) return [];
		const [one, many, code] = sentences[kind];
		const message = `${counted(rows.length, `row ${one}`, `rows ${many}`)}: ${listed(rows)}.`;
		return [note('warning', code, message, { row: rows[0], column })];
	});
}

const rowsBy = ({ how, fileRows }: Omit<Join, 'notes'>, match: Match): number[] =>
	fileRows.filter((_, row) => how[row] === match);

function zeros(join: Omit<Join, 'notes'>, column: string): TableNote[] {
	const rows = rowsBy(join, 'zeros');
	if (!rows.length) return [];
	const message = `${counted(rows.length, 'row was', 'rows were')} matched although zeros at the front of the key differ, as when a spreadsheet takes keys for numbers: ${listed(rows)}. Check them.`;
	return [note('warning', 'zeros-dropped', message, { row: rows[0], column })];
}

function folded(join: Omit<Join, 'notes'>, column: string): TableNote[] {
	const rows = rowsBy(join, 'folded');
	if (!rows.length) return [];
	const message = `${counted(rows.length, 'row was', 'rows were')} matched although case, accents, spaces or punctuation differ: ${listed(rows)}.`;
	return [note('note', 'matched-folded', message, { row: rows[0], column })];
}

function doubled({ doubled: found, fileRows }: Omit<Join, 'notes'>): TableNote[] {
	if (!found.length) return [];
	const regions = found.map(({ region }) => region);
	const first = found[0].rows.map((row) => fileRows[row]);
	const message =
		found.length === 1
			? `#${regions[0]} stands in rows ${listed(first)}.`
			: `${found.length} regions stand in several rows: ${listed(hashed(regions))}.`;
	return [
		note('warning', 'region-doubled', message, {
			row: first[0],
			regions: regions.slice(0, mostNamed),
		}),
	];
}

function missing({ missing: regions }: Omit<Join, 'notes'>): TableNote[] {
	if (!regions.length) return [];
	const message = `${counted(regions.length, 'region stands', 'regions stand')} in no row: ${listed(hashed(regions))}.`;
	return [note('warning', 'region-missing', message, { regions: regions.slice(0, mostNamed) })];
}
