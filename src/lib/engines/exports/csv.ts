import type { SheetRow } from '../sheet/index.ts';

/** A plain number may begin with a sign; nothing else may begin like a formula. */
const plainNumber = /^[-+]?\d+(\.\d+)?$/;
const formulaStart = /^[=+\-@\t\r\n\uff1d\uff0b\uff0d\uff20]/;

/**
 * One field. Quoted where it must be (RFC 4180, section 2); a text that a spreadsheet would run as a
 * formula is led by an apostrophe (OWASP, CSV Injection).
 */
export function csvField(value: string | number | null): string {
	if (value === null) return '';
	if (typeof value === 'number') return Number.isFinite(value) ? String(value) : '';
	const safe = formulaStart.test(value) && !plainNumber.test(value) ? `'${value}` : value;
	return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe;
}

const columns = ['key', 'name', 'group', 'ink number', 'ink', 'hex', 'area km2'];

/**
 * The sheet as a table: RFC 4180, UTF-8, one line a region in region order, ink numbers from 1 as in
 * the legend, areas to the hundredth of a square kilometre. `byteOrderMark` helps spreadsheets that
 * would otherwise misread accents; data pipelines do better without. Byte for byte repeatable.
 */
export function exportCsv(rows: SheetRow[], options: { byteOrderMark?: boolean } = {}): Uint8Array {
	const lines = rows.map(({ key, name, group, inkNumber, inkName, hex, areaKm2 }) => [
		key,
		name,
		group,
		inkNumber,
		inkName,
		hex,
		Math.round(areaKm2 * 100) / 100,
	]);
	const text = [columns, ...lines].map((line) => `${line.map(csvField).join(',')}\r\n`).join('');
	return new TextEncoder().encode(options.byteOrderMark ? `\ufeff${text}` : text);
}
