import type { Join } from '../join/join.ts';
import { counted, listed, note } from '../note.ts';
import type { Cell, TableNote } from '../table.ts';
import type { TakeRefused } from './rules.ts';

export interface TakenTexts {
	status: 'taken';
	/** by region; null where there is none */
	values: (string | null)[];
	notes: TableNote[];
}

/**
 * One text a region from a column of a joined table, such as the territory each region is assigned to.
 *
 * In: the join; the cells of a column of the same table; what to do where several rows of a region hold
 * different texts: take the `first` or `last` of the file, or `refuse`. Equal texts are no conflict, blanks
 * at either end do not count, and empty cells are passed over. Out: texts by region; or a refusal naming
 * the regions. Throws RangeError for a column of another table.
 */
export function takeTexts(
	join: Join,
	cells: Cell[],
	doubled: 'first' | 'last' | 'refuse' = 'refuse',
): TakenTexts | TakeRefused {
	if (cells.length !== join.region.length) {
		throw new RangeError('The column has other rows than the join.');
	}
	const values = new Array<string | null>(join.regions).fill(null);
	const unlike = new Set<number>();
	join.region.forEach((region, row) => {
		const text = cells[row] === null ? '' : String(cells[row]).trim();
		if (region < 0 || !text) return;
		const before = values[region];
		if (before !== null && before !== text) unlike.add(region);
		if (before === null || doubled === 'last') values[region] = text;
	});
	const notes = [...notesOnUnlike([...unlike], doubled), ...notesOnMissing(values)];
	if (unlike.size && doubled === 'refuse') return { status: 'refused', notes };
	return { status: 'taken', values, notes };
}

function notesOnUnlike(found: number[], doubled: 'first' | 'last' | 'refuse'): TableNote[] {
	if (!found.length) return [];
	const regions = found.sort((a, b) => a - b);
	const outcome = doubled === 'refuse' ? '' : `; the ${doubled} of each counts`;
	const message = `${counted(regions.length, 'region stands', 'regions stand')} in several rows with different texts (${listed(regions.map((r) => `#${r}`))})${outcome}.`;
	const severity = doubled === 'refuse' ? 'error' : 'warning';
	return [note(severity, 'region-doubled', message, { regions: regions.slice(0, 5) })];
}

function notesOnMissing(values: (string | null)[]): TableNote[] {
	const regions = values.flatMap((value, region) => (value === null ? [region] : []));
	if (!regions.length) return [];
	const message = `${counted(regions.length, 'region has', 'regions have')} no text: ${listed(regions.map((r) => `#${r}`))}.`;
	return [note('warning', 'value-missing', message, { regions: regions.slice(0, 5) })];
}
