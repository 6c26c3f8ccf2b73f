/**
 * The container of a TrueType font: named tables of bytes. Source: OpenType specification 1.9.1,
 * "Organization of an OpenType font" (table directory, checksums, alignment to four bytes).
 */
export type Tables = Map<string, Uint8Array>;

export const viewOf = (bytes: Uint8Array): DataView =>
	new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

/** In: a single TrueType font. Throws RangeError for anything else. */
export function readTables(font: Uint8Array): Tables {
	const view = viewOf(font);
	if (view.getUint32(0) !== 0x00010000) throw new RangeError('not a TrueType font');
	const tables: Tables = new Map();
	for (let i = 0; i < view.getUint16(4); i++) {
		const entry = 12 + 16 * i;
		const tag = String.fromCharCode(...font.subarray(entry, entry + 4));
		const [start, length] = [view.getUint32(entry + 8), view.getUint32(entry + 12)];
		tables.set(tag, font.subarray(start, start + length));
	}
	return tables;
}

function checksum(bytes: Uint8Array): number {
	let sum = 0;
	for (let i = 0; i < bytes.length; i++) sum = (sum + (bytes[i] << (8 * (3 - (i % 4))))) >>> 0;
	return sum;
}

const padded = (length: number): number => Math.ceil(length / 4) * 4;

/** Puts tables together into a font file, in order of their names, with all checksums right. */
export function writeTables(tables: Tables): Uint8Array {
	const tags = [...tables.keys()].sort();
	const power = Math.floor(Math.log2(tags.length));
	const header = 12 + 16 * tags.length;
	const size = tags.reduce((sum, tag) => sum + padded(tables.get(tag)!.length), header);
	const font = new Uint8Array(size);
	const view = viewOf(font);
	view.setUint32(0, 0x00010000);
	[tags.length, 16 * 2 ** power, power, 16 * tags.length - 16 * 2 ** power].forEach((value, i) =>
		view.setUint16(4 + 2 * i, value),
	);
	let at = header;
	tags.forEach((tag, i) => {
		const bytes = tables.get(tag)!;
		const entry = 12 + 16 * i;
		[...tag].forEach((letter, j) => view.setUint8(entry + j, letter.charCodeAt(0)));
		font.set(bytes, at);
		if (tag === 'head') view.setUint32(at + 8, 0);
		view.setUint32(entry + 4, checksum(font.subarray(at, at + padded(bytes.length))));
		view.setUint32(entry + 8, at);
		view.setUint32(entry + 12, bytes.length);
		at += padded(bytes.length);
	});
	adjust(font, view, tags);
	return font;
}

/** The `head` table holds what makes the whole file sum to a fixed number. */
function adjust(font: Uint8Array, view: DataView, tags: string[]): void {
	const head = view.getUint32(12 + 16 * tags.indexOf('head') + 8);
	view.setUint32(head + 8, (0xb1b0afba - checksum(font)) >>> 0);
}
