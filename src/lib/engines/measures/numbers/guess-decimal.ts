import { note } from '../note.ts';
import type { Cell, TableNote } from '../table.ts';
import { parseNumber } from './parse-number.ts';

/** Columns with fewer numbers than this share of their texts have no say. */
const mostlyNumbers = 0.6;

type Hint = '.' | ',' | 'either' | null;

/**
 * What one text says about the decimal sign of its writer: it can only be read with one of the signs
 * ("1.234,5", "12,5"), with both to different numbers ("1,234"), or says nothing (null).
 */
function hint(text: string): Hint {
	if (!/[.,]/.test(text)) return null;
	const point = parseNumber(text, '.');
	const comma = parseNumber(text, ',');
	if (point && comma) return 'either';
	return point ? '.' : comma ? ',' : null;
}

/** Which sign stands before the decimals, by the texts of columns that are mostly numbers. */
export function guessDecimal(
	columns: Cell[][],
	delimiter: string | null,
): { decimal: '.' | ','; notes: TableNote[] } {
	const votes = { '.': 0, ',': 0, either: 0 };
	for (const column of columns) {
		const own = columnVotes(column);
		if (own) for (const sign of ['.', ',', 'either'] as const) votes[sign] += own[sign];
	}
	const decided = votes['.'] + votes[','];
	if (decided) {
		const decimal = votes[','] > votes['.'] ? ',' : '.';
		const against = Math.min(votes['.'], votes[',']);
		return { decimal, notes: against ? [mixed(decimal, against)] : [] };
	}
	if (!votes.either) return { decimal: '.', notes: [] };
	// where cells are parted by something else, a comma within them is most often a decimal one
	const decimal = delimiter === ';' && columns.some(hasOnlyCommas) ? ',' : '.';
	return { decimal, notes: [ambiguous(decimal)] };
}

function columnVotes(column: Cell[]): Record<'.' | ',' | 'either', number> | null {
	const votes = { '.': 0, ',': 0, either: 0 };
	let texts = 0;
	let numbers = 0;
	for (const cell of column) {
		if (typeof cell !== 'string') continue;
		texts++;
		const says = hint(cell);
		if (says) votes[says]++;
		if (says || parseNumber(cell, '.')) numbers++;
	}
	return texts > 0 && numbers >= mostlyNumbers * texts ? votes : null;
}

const hasOnlyCommas = (column: Cell[]): boolean =>
	column.some((cell) => typeof cell === 'string' && /^-?\d{1,3},\d{3}$/.test(cell.trim()));

const names = { '.': 'point', ',': 'comma' };

function mixed(decimal: '.' | ',', against: number): TableNote {
	const message = `Numbers were read with a decimal ${names[decimal]}, but ${against} of them can only be meant with the other sign; those are listed as no numbers.`;
	return note('warning', 'decimal-mixed', message);
}

function ambiguous(decimal: '.' | ','): TableNote {
	const message = `Whether 1${decimal}234 means a little over one or more than a thousand cannot be told from this file; it was read with a decimal ${names[decimal]}. Say so if that is wrong.`;
	return note('warning', 'decimal-unclear', message);
}
