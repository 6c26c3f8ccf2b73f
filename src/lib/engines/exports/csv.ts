import { csvField } from '../measures/text/csv-field.ts';
import type { SheetRow } from '../sheet/index.ts';
import { headingOf } from './data-table.ts';
import type { ExtraColumn } from './source.ts';

export { csvField };

const columns = ['key', 'name', 'group', 'ink number', 'ink', 'hex', 'area km2'];

/**
 * The sheet as a table: RFC 4180, UTF-8, one line a region in region order, ink numbers from 1 as in
 * the legend, areas to the hundredth of a square kilometre, then the further columns. `byteOrderMark` helps
 * spreadsheets that would otherwise misread accents; data pipelines do better without. A themed sheet adds
 * class and range of each region, never its figure. Byte for byte repeatable.
 */
export function exportCsv(
	rows: SheetRow[],
	options: { byteOrderMark?: boolean } = {},
	more: readonly ExtraColumn[] = [],
): Uint8Array {
	const themed = rows.some(({ theme }) => theme);
	const headings = [...columns, ...(themed ? ['class', 'range'] : []), ...more.map(headingOf)];
	const lines = rows.map((row) => [
		row.key,
		row.name,
		row.group,
		row.inkNumber,
		row.inkName,
		row.hex,
		Math.round(row.areaKm2 * 100) / 100,
		...(themed ? [row.theme?.class ?? null, row.theme?.range ?? null] : []),
		...more.map(({ values }) => values[row.region]),
	]);
	const text = [headings, ...lines].map((line) => `${line.map(csvField).join(',')}\r\n`).join('');
	return new TextEncoder().encode(options.byteOrderMark ? `\ufeff${text}` : text);
}
