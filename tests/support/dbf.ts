/** A column of a .dbf: text (C), number (N) or yes/no (L), with its width in bytes. */
export interface Column {
	name: string;
	type: 'C' | 'N' | 'L';
	width: number;
	decimals?: number;
}

type Row = Record<string, unknown>;

/** A dBASE III table of the rows, texts in the encoding given. */
export function writeDbf(
	rows: Row[],
	encoding: string,
	languageByte: number,
	given?: Column[],
): Uint8Array {
	const encode = encoder(encoding);
	const columns = given ?? columnsOf(rows, encode);
	const width = 1 + columns.reduce((sum, column) => sum + column.width, 0);
	const headerBytes = 32 + 32 * columns.length + 1;
	const bytes = new Uint8Array(headerBytes + width * rows.length + 1).fill(0x20, headerBytes);
	const view = new DataView(bytes.buffer);
	bytes.set([3, 126, 1, 1]);
	view.setUint32(4, rows.length, true);
	view.setUint16(8, headerBytes, true);
	view.setUint16(10, width, true);
	bytes[29] = languageByte;
	columns.forEach((column, i) => {
		const at = 32 + 32 * i;
		bytes.set(encode(column.name).subarray(0, 10), at);
		bytes[at + 11] = column.type.charCodeAt(0);
		bytes[at + 16] = column.width;
		bytes[at + 17] = column.decimals ?? 0;
	});
	bytes[headerBytes - 1] = 0x0d;
	rows.forEach((row, r) => {
		let at = headerBytes + r * width + 1;
		for (const column of columns) {
			const text = encode(cellText(row[column.name], column)).subarray(0, column.width);
			bytes.set(text, column.type === 'N' ? at + column.width - text.length : at);
			at += column.width;
		}
	});
	bytes[bytes.length - 1] = 0x1a;
	return bytes;
}

function columnsOf(rows: Row[], encode: (text: string) => Uint8Array): Column[] {
	const names = [...new Set(rows.flatMap((row) => Object.keys(row)))];
	return names.map((name) => {
		const values = rows
			.map((row) => row[name])
			.filter((value) => value !== null && value !== undefined);
		if (values.length && values.every((value) => typeof value === 'boolean')) {
			return { name, type: 'L', width: 1 };
		}
		if (values.length && values.every((value) => typeof value === 'number')) {
			const decimals = Math.max(...values.map((value) => String(value).split('.')[1]?.length ?? 0));
			return { name, type: 'N', width: 20, decimals };
		}
		const longest = Math.max(1, ...values.map((value) => encode(String(value)).length));
		return { name, type: 'C', width: Math.min(254, longest) };
	});
}

function cellText(value: unknown, column: Column): string {
	if (value === null || value === undefined) return '';
	if (column.type === 'L') return value ? 'T' : 'F';
	return column.type === 'N' ? Number(value).toFixed(column.decimals ?? 0) : String(value);
}

/** UTF-8 by the platform; a single-byte encoding by turning its decoder round. */
function encoder(encoding: string): (text: string) => Uint8Array {
	if (/^utf-?8$/i.test(encoding)) return (text) => new TextEncoder().encode(text);
	const decoder = new TextDecoder(encoding);
	const codes = new Map<string, number>();
	for (let code = 255; code >= 0; code--) codes.set(decoder.decode(Uint8Array.of(code)), code);
	return (text) => Uint8Array.from([...text], (c) => codes.get(c) ?? 0x3f);
}
