import type { District } from './survey.ts';

interface Column {
	name: string;
	kind: 'C' | 'N';
	width: number;
	value: (district: District) => string | number;
}

const columns: Column[] = [
	{ name: 'CODE', kind: 'C', width: 4, value: (district) => district.code },
	{ name: 'NAME', kind: 'C', width: 40, value: (district) => district.name },
	{ name: 'PROVINCE', kind: 'C', width: 20, value: (district) => district.province },
	{ name: 'POPULATION', kind: 'N', width: 9, value: (district) => district.population },
	{ name: 'HOUSEHOLDS', kind: 'N', width: 9, value: (district) => district.households },
];

/** Letters of the names that windows-1252 does not place where Unicode does. */
const placed: Record<string, number> = { œ: 0x9c, Œ: 0x8c, š: 0x9a, Š: 0x8a, ž: 0x9e, Ž: 0x8e };

/** dBASE III table with the language byte of windows-1252 (0x03). Source: dBASE III file structure. */
export function table(districts: readonly District[]): Uint8Array {
	const headLength = 33 + 32 * columns.length;
	const rowLength = 1 + columns.reduce((sum, { width }) => sum + width, 0);
	const bytes = new Uint8Array(headLength + rowLength * districts.length + 1).fill(
		0x20,
		headLength,
	);
	const view = new DataView(bytes.buffer);
	bytes.set([0x03, 126, 1, 1]);
	view.setUint32(4, districts.length, true);
	view.setUint16(8, headLength, true);
	view.setUint16(10, rowLength, true);
	bytes[29] = 0x03;
	columns.forEach(({ name, kind, width }, i) => {
		bytes.set(encoded(name), 32 + 32 * i);
		bytes[32 + 32 * i + 11] = kind.charCodeAt(0);
		bytes[32 + 32 * i + 16] = width;
	});
	bytes[headLength - 1] = 0x0d;
	districts.forEach((district, row) => writeRow(bytes, headLength + row * rowLength, district));
	bytes[bytes.length - 1] = 0x1a;
	return bytes;
}

function writeRow(bytes: Uint8Array, start: number, district: District): void {
	let at = start + 1;
	for (const { kind, width, value } of columns) {
		const text = encoded(String(value(district)));
		if (text.length > width) throw new Error(`Too long for its column: ${value(district)}`);
		bytes.set(text, kind === 'N' ? at + width - text.length : at);
		at += width;
	}
}

function encoded(text: string): number[] {
	return [...text].map((letter) => {
		const code = placed[letter] ?? letter.charCodeAt(0);
		if (code > 0xff) throw new Error(`Not in windows-1252: ${letter}`);
		return code;
	});
}
