import { strToU8 } from 'fflate';
import { openDbf as openRows } from 'shapefile';
import type { Cell } from '../attribute-table.ts';
import { Refusal } from '../refusal.ts';
import { mendWindows1252, textDecoder } from './windows-1252.ts';

const nameBytes = 11;
/** the kind of a column of text */
const textKind = 'C'.charCodeAt(0);

interface Field {
	name: Uint8Array;
	type: string;
	/** offset in the header */
	at: number;
	from: number;
	to: number;
}

/** A dBASE table as bytes: what its header says, checked against its length. */
export interface DbfTable {
	bytes: Uint8Array;
	languageByte: number;
	fields: Field[];
	records: number;
	/** names and texts, by which the encoding is told */
	texts(): Generator<Uint8Array>;
}

export function openDbf(bytes: Uint8Array): DbfTable {
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	if (bytes.length < 33) throw cutOff(bytes.length, 33);
	const records = view.getUint32(4, true);
	const start = view.getUint16(8, true);
	const width = view.getUint16(10, true);
	if (start + records * width > bytes.length) throw cutOff(bytes.length, start + records * width);
	if (width === 0) throw new Refusal('file-truncated', 'The rows of the .dbf file have no width.');
	const fields = fieldsOf(bytes, start, width);
	function* texts() {
		for (const field of fields) yield field.name;
		const columns = fields.filter((field) => field.type === 'C');
		for (let at = start; at < start + records * width; at += width) {
			for (const field of columns) yield bytes.subarray(at + field.from, at + field.to);
		}
	}
	const used = bytes.subarray(0, start + records * width);
	return { bytes: used, languageByte: bytes[29], fields, records, texts };
}

function fieldsOf(bytes: Uint8Array, end: number, width: number): Field[] {
	const fields: Field[] = [];
	let from = 1;
	let at = 32;
	for (; at + 32 <= end && bytes[at] !== 0x0d; at += 32) {
		const name = bytes.subarray(at, at + nameBytes);
		const stop = name.indexOf(0);
		const to = from + bytes[at + 16];
		if (to > width)
			throw new Refusal('file-truncated', 'The columns of the .dbf file do not fit its rows.');
		const type = String.fromCharCode(bytes[at + nameBytes]);
		const used = stop < 0 ? name : name.subarray(0, stop);
		fields.push({ name: used, type, at, from, to });
		from = to;
	}
	if (at >= end || bytes[at] !== 0x0d)
		throw new Refusal('file-truncated', 'The list of columns of the .dbf file has no end.');
	return fields;
}

/**
 * The rows as named values, by the `shapefile` package: numbers where they are exact, else their text;
 * empty is null.
 */
export async function* dbfRows(
	table: DbfTable,
	encoding: string,
): AsyncGenerator<Record<string, Cell>> {
	const source = await openRows(asNumberedTexts(table), { encoding });
	const mend = encoding === 'windows-1252' ? mendWindows1252 : (text: string) => text;
	const decoder = textDecoder(encoding);
	const names = table.fields.map((field) => decoder.decode(field.name));
	for (let rows = 0; rows < table.records; rows++) {
		const { done, value } = await source.read();
		if (done || !value) {
			const message = `The .dbf file announces ${table.records} rows but ends after ${rows}.`;
			throw new Refusal('file-truncated', message);
		}
		const row: Record<string, Cell> = {};
		table.fields.forEach(({ type }, f) => {
			const raw: unknown = value[`c${f}`];
			row[names[f]] = typeof raw === 'string' ? cellOf(mend(raw), type) : null;
		});
		yield row;
	}
}

/**
 * The table with columns called c0, c1, ... that are all text: the package would round long numbers, shift
 * days by the local time, stop at kinds of column it does not know, and lose columns of the same name.
 */
function asNumberedTexts({ bytes, fields }: DbfTable): Uint8Array {
	const copy = bytes.slice();
	fields.forEach(({ at }, f) => {
		copy.fill(0, at, at + nameBytes);
		copy.set(strToU8(`c${f}`), at);
		copy[at + nameBytes] = textKind;
	});
	return copy;
}

function cellOf(raw: string, type: string): Cell {
	const text = raw.replace(/\0.*$/s, '').trim();
	if (text === '' || /^\*+$/.test(text)) return null;
	if (type === 'L') return /^[yt]$/i.test(text) ? true : /^[nf]$/i.test(text) ? false : null;
	if (type === 'D') return text.replace(/^(\d{4})(\d\d)(\d\d)$/, '$1-$2-$3');
	if (type !== 'N' && type !== 'F') return text;
	const value = Number(text);
	if (!Number.isFinite(value)) return text;
	return /^-?\d+$/.test(text) && !Number.isSafeInteger(value) ? text : value;
}

function cutOff(has: number, wants: number): Refusal {
	const message = `The .dbf file has ${has} bytes but needs ${wants}; it is cut off.`;
	return new Refusal('file-truncated', message);
}
