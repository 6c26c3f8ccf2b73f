import type { BorderList } from '../engines/borders/border-list.ts';
import type { DeskRegions } from './desk.ts';

/** Regions and borders of a boundary set, which never change; the level above is the draft's. */
export interface SheetColumns {
	regions: Omit<DeskRegions, 'group'>;
	borders: BorderList;
}

/** Columns of numbers in the order in which they stand in the bytes, widest first so that all are aligned. */
const kinds = [
	['areaKm2', Float64Array],
	['metres', Float64Array],
	['at', Float64Array],
	['parts', Uint32Array],
	['enclaveOf', Int32Array],
	['a', Uint32Array],
	['b', Uint32Array],
	['kind', Uint8Array],
] as const;
type Numbers = Pick<BorderList, 'a' | 'b' | 'kind' | 'metres' | 'at'> & {
	areaKm2: Float64Array;
	parts: Uint32Array;
	enclaveOf: Int32Array;
};

/**
 * Regions and borders as bytes, a fifth of what they take as text: the number of regions, of borders and
 * of bytes of text, each in four bytes and four more left empty; the columns of numbers; keys and names as
 * JSON. Little-endian.
 */
export function encodeColumns({ regions, borders }: SheetColumns): Uint8Array {
	const numbers: Numbers = {
		...borders,
		areaKm2: Float64Array.from(regions.areaKm2),
		parts: Uint32Array.from(regions.parts),
		enclaveOf: Int32Array.from(regions.enclaveOf),
	};
	const text = new TextEncoder().encode(JSON.stringify([regions.key, regions.name]));
	const size = kinds.reduce((sum, [name]) => sum + numbers[name].byteLength, 16 + text.length);
	const bytes = new Uint8Array(size);
	bytes.set(
		new Uint8Array(Uint32Array.of(regions.key.length, borders.a.length, text.length).buffer),
	);
	let at = 16;
	for (const [name] of kinds) {
		const { buffer, byteOffset, byteLength } = numbers[name];
		bytes.set(new Uint8Array(buffer, byteOffset, byteLength), at);
		at += byteLength;
	}
	bytes.set(text, at);
	return bytes;
}

/** What `encodeColumns` made. Throws RangeError for bytes that are cut off. */
export function decodeColumns(bytes: ArrayBuffer): SheetColumns {
	if (bytes.byteLength < 16) throw new RangeError('The columns are cut off.');
	const [regions, borders, textBytes] = new Uint32Array(bytes, 0, 3);
	const entries: Record<keyof Numbers, number> = {
		...{ areaKm2: regions, parts: regions, enclaveOf: regions },
		...{ metres: borders, at: 2 * borders, a: borders, b: borders, kind: borders },
	};
	const read: { [K in keyof Numbers]?: Numbers[keyof Numbers] } = {};
	let at = 16;
	for (const [name, Kind] of kinds) {
		const length = entries[name] * Kind.BYTES_PER_ELEMENT;
		if (at + length > bytes.byteLength) throw new RangeError('The columns are cut off.');
		read[name] = new Kind(bytes, at, entries[name]);
		at += length;
	}
	if (at + textBytes !== bytes.byteLength) throw new RangeError('The columns are cut off.');
	const { areaKm2, parts, enclaveOf, ...list } = read as Numbers;
	const [key, name]: [string[], string[]] = JSON.parse(
		new TextDecoder().decode(new Uint8Array(bytes, at)),
	);
	return {
		regions: {
			...{ key, name, parts: [...parts] },
			...{ areaKm2: [...areaKm2], enclaveOf: [...enclaveOf] },
		},
		borders: list,
	};
}
