import Papa from 'papaparse';

/** How rows and cells are parted. */
export interface Dialect {
	delimiter: string;
	newline: '\r\n' | '\n' | '\r';
	/** several kinds of line ends stand in the file; they must be made one before parsing */
	mixedNewlines: boolean;
	/** the first row only names the delimiter ("sep=;"), as spreadsheets write and read it */
	namesDelimiter: boolean;
}

/** In the order in which they are taken where the sample speaks equally for several. */
const delimiters = [';', '\t', '|', ','];
const sampleRows = 200;

/** The delimiter and line end of a text by its beginning. */
export function findDialect(sample: string, told?: string): Dialect {
	const named = /^sep=(.)\r?\n?/.exec(sample);
	const newlines = findNewline(sample);
	const text = newlines.mixedNewlines ? sample.replace(/\r\n?/g, '\n') : sample;
	const delimiter = told ?? named?.[1] ?? findDelimiter(text, newlines.newline);
	return { delimiter, ...newlines, namesDelimiter: named !== null };
}

function findNewline(sample: string): Pick<Dialect, 'newline' | 'mixedNewlines'> {
	// line ends within quotes are text, and the sample may end in a quote or amid a line end
	const bare = sample.replace(/"[^"]*("|$)/g, '').replace(/\r$/, '');
	const count = (pattern: RegExp) => bare.match(pattern)?.length ?? 0;
	const kinds = [
		{ newline: '\r\n' as const, count: count(/\r\n/g) },
		{ newline: '\n' as const, count: count(/(?<!\r)\n/g) },
		{ newline: '\r' as const, count: count(/\r(?!\n)/g) },
	].filter((kind) => kind.count > 0);
	if (kinds.length === 0) return { newline: '\n', mixedNewlines: false };
	if (kinds.length > 1) return { newline: '\n', mixedNewlines: true };
	return { newline: kinds[0].newline, mixedNewlines: false };
}

/** The one by which most rows have the same number of cells, and of those the one with most cells. */
function findDelimiter(sample: string, newline: Dialect['newline']): string {
	const scored = delimiters.map((delimiter) => ({
		delimiter,
		...evenness(sample, delimiter, newline),
	}));
	const usable = scored.filter(({ cells }) => cells > 1);
	usable.sort((a, b) => b.share - a.share || b.cells - a.cells);
	return usable[0]?.delimiter ?? ',';
}

function evenness(sample: string, delimiter: string, newline: Dialect['newline']) {
	const parsed = Papa.parse<string[]>(sample, { delimiter, newline, preview: sampleRows });
	const filled = parsed.data.filter((row) => row.some((cell) => cell.trim() !== ''));
	// the sample may end within a row
	const rows = filled.length > 2 ? filled.slice(0, -1) : filled;
	const counts = new Map<number, number>();
	for (const row of rows) counts.set(row.length, (counts.get(row.length) ?? 0) + 1);
	let cells = 1;
	let most = 0;
	for (const [length, count] of counts) {
		if (length > 1 && (count > most || (count === most && length > cells))) {
			[cells, most] = [length, count];
		}
	}
	return { cells, share: rows.length ? most / rows.length : 0 };
}
