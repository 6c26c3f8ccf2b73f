import type { Cell } from '../attribute-table.ts';
import { Refusal } from '../refusal.ts';
import { textDecoder } from './windows-1252.ts';

interface Field {
	name: Uint8Array;
	type: string;
	from: number;
	to: number;
}

/** A dBASE table as bytes: what its header says, checked against its length. */
export interface DbfTable {
	languageByte: number;
	fields: Field[];
	records: number;
	/** bytes of one record, deletion mark included */
	record(i: number): Uint8Array;
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
	const fields = fieldsOf(bytes, start, width);
	const record = (i: number) => bytes.subarray(start + i * width, start + (i + 1) * width);
	function* texts() {
		for (const field of fields) yield field.name;
		for (let i = 0; i < records; i++) {
			for (const field of fields) {
				if (field.type === 'C') yield record(i).subarray(field.from, field.to);
			}
		}
	}
	return { languageByte: bytes[29], fields, records, record, texts };
}

function fieldsOf(bytes: Uint8Array, end: number, width: number): Field[] {
	const fields: Field[] = [];
	let from = 1;
	for (let at = 32; at + 32 <= end && bytes[at] !== 0x0d; at += 32) {
		const name = bytes.subarray(at, at + 11);
		const stop = name.indexOf(0);
		const to = from + bytes[at + 16];
		if (to > width)
			throw new Refusal('file-truncated', 'The columns of the .dbf file do not fit its rows.');
		const type = String.fromCharCode(bytes[at + 11]);
		fields.push({ name: stop < 0 ? name : name.subarray(0, stop), type, from, to });
		from = to;
	}
	return fields;
}

/** The rows as named values: numbers where they are exact, else their text; empty is null. */
export function* dbfRows(table: DbfTable, encoding: string): Generator<Record<string, Cell>> {
	const decoder = textDecoder(encoding);
	const names = table.fields.map((field) => decoder.decode(field.name));
	for (let i = 0; i < table.records; i++) {
		const record = table.record(i);
		const row: Record<string, Cell> = {};
		table.fields.forEach((field, f) => {
			row[names[f]] = cellOf(decoder.decode(record.subarray(field.from, field.to)), field.type);
		});
		yield row;
	}
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
