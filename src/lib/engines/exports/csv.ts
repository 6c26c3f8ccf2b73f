import { csvField } from '../measures/text/csv-field.ts';
import type { SheetRow } from '../sheet/index.ts';

export { csvField };

const columns = ['key', 'name', 'group', 'ink number', 'ink', 'hex', 'area km2'];

/**
 * The sheet as a table: RFC 4180, UTF-8, one line a region in region order, ink numbers from 1 as in
 * the legend, areas to the hundredth of a square kilometre. `byteOrderMark` helps spreadsheets that
 * would otherwise misread accents; data pipelines do better without. A themed sheet
 * adds class and range of each region, never its figure. Byte for byte repeatable.
 */
export function exportCsv(rows: SheetRow[], options: { byteOrderMark?: boolean } = {}): Uint8Array {
	const themed = rows.some(({ theme }) => theme);
	const head = themed ? [...columns, 'class', 'range'] : columns;
	const lines = rows.map(({ key, name, group, inkNumber, inkName, hex, areaKm2, theme }) => [
		key,
		name,
		group,
		inkNumber,
		inkName,
		hex,
		Math.round(areaKm2 * 100) / 100,
		...(theme ? [theme.class, theme.range] : []),
	]);
	const text = [head, ...lines].map((line) => `${line.map(csvField).join(',')}\r\n`).join('');
	return new TextEncoder().encode(options.byteOrderMark ? `\ufeff${text}` : text);
}
