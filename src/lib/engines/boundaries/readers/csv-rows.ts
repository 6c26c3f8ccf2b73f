import Papa from 'papaparse';
import type { ByteSource } from '../options.ts';
import { Refusal } from '../refusal.ts';
import { decoded } from './decoded.ts';

const usualCharacters = 1024 * 1024;
/** of one row */
const mostCharacters = 24 * usualCharacters;

export interface CsvForm {
	encoding: string;
	delimiter: string;
	newline: '\n' | '\r';
}

/**
 * The rows of a delimited text (RFC 4180) by `papaparse`, some at a time, so that a file of any size is
 * read within a window; only a row larger than the window makes it grow. Blank lines are left out.
 */
export async function* csvRows(source: ByteSource, form: CsvForm): AsyncGenerator<string[][]> {
	let text = '';
	let helping = usualCharacters;
	for await (const piece of decoded(source, form.encoding)) {
		text += piece;
		if (text.length < helping) continue;
		const { rows, used } = soundRows(text, form, false);
		text = text.slice(used);
		helping = Math.min(mostCharacters + 1, Math.max(usualCharacters, 2 * text.length));
		if (text.length > mostCharacters) {
			const message = `A row of the table is longer than ${mostCharacters} characters; a quotation mark is probably missing.`;
			throw new Refusal('too-large-unpacked', message);
		}
		yield rows;
	}
	yield soundRows(text, form, true).rows;
}

function soundRows(text: string, form: CsvForm, isAll: boolean) {
	const { rows, used, error } = parseRows(text, form, isAll);
	if (!error) return { rows, used };
	const isOpen = error.code === 'MissingQuotes';
	const message = isOpen
		? 'The table ends inside a quoted value; it is cut off.'
		: `A quoted value of the table goes on after its quotation mark, near "${text.substr(error.index ?? 0, 20)}".`;
	throw new Refusal(isOpen ? 'file-truncated' : 'file-damaged', message);
}

/** The whole rows of a piece of text, how many characters they took, and what is wrong with them; `most` rows,
 * all unless given. */
export function parseRows(
	text: string,
	{ delimiter, newline }: Omit<CsvForm, 'encoding'>,
	isAll: boolean,
	most = 0,
): { rows: string[][]; used: number; error: Papa.ParseError | undefined } {
	const parser = new Papa.Parser({ delimiter, newline, preview: most });
	const { data, errors, meta } = parser.parse(text, 0, !isAll) as Papa.ParseResult<string[]>;
	for (const row of data) {
		const last = row.length - 1;
		if (row[last].endsWith('\r')) row[last] = row[last].slice(0, -1);
	}
	const rows = data.filter((row) => row.length > 1 || row[0] !== '');
	return { rows, used: meta.cursor, error: errors[0] };
}
