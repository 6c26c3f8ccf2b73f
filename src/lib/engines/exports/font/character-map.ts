import { viewOf } from './tables.ts';

/**
 * Glyph numbers by code point. Source: OpenType specification 1.9.1, `cmap`, formats 4 and 12.
 * Reads the best Unicode subtable; characters without a glyph are absent.
 */
export function readCharacterMap(cmap: Uint8Array, wanted: Iterable<number>): Map<number, number> {
	const view = viewOf(cmap);
	const found = new Map<number, number>();
	const offsets = Array.from({ length: view.getUint16(2) }, (_, i) => view.getUint32(8 + 8 * i));
	const pick = (format: number) => offsets.find((at) => view.getUint16(at) === format);
	const [twelve, four] = [pick(12), pick(4)];
	for (const code of wanted) {
		const glyph =
			twelve !== undefined
				? inFormat12(view, twelve, code)
				: four !== undefined
					? inFormat4(view, four, code)
					: 0;
		if (glyph > 0) found.set(code, glyph);
	}
	return found;
}

function inFormat12(view: DataView, at: number, code: number): number {
	const groups = view.getUint32(at + 12);
	for (let i = 0; i < groups; i++) {
		const group = at + 16 + 12 * i;
		if (code > view.getUint32(group + 4)) continue;
		const first = view.getUint32(group);
		return code < first ? 0 : view.getUint32(group + 8) + code - first;
	}
	return 0;
}

function inFormat4(view: DataView, at: number, code: number): number {
	const segments = view.getUint16(at + 6) / 2;
	const [ends, starts] = [at + 14, at + 16 + 2 * segments];
	const [deltas, ranges] = [starts + 2 * segments, starts + 4 * segments];
	for (let i = 0; i < segments; i++) {
		if (code > view.getUint16(ends + 2 * i)) continue;
		const first = view.getUint16(starts + 2 * i);
		if (code < first) return 0;
		const delta = view.getUint16(deltas + 2 * i);
		const range = view.getUint16(ranges + 2 * i);
		if (range === 0) return (code + delta) & 0xffff;
		const glyph = view.getUint16(ranges + 2 * i + range + 2 * (code - first));
		return glyph === 0 ? 0 : (glyph + delta) & 0xffff;
	}
	return 0;
}

/** A `cmap` with one subtable of format 4: one segment a character, up to U+FFFE. */
export function writeCharacterMap(map: Map<number, number>): Uint8Array {
	const codes = [...map.keys()].filter((code) => code < 0xffff).sort((a, b) => a - b);
	const segments = codes.length + 1;
	const power = Math.floor(Math.log2(segments));
	const length = 16 + 8 * segments;
	const bytes = new Uint8Array(12 + length);
	const view = viewOf(bytes);
	const shorts = [0, 1, 3, 1, 0, 12, 4, length, 0];
	const search = [2 * segments, 2 * 2 ** power, power, 2 * segments - 2 * 2 ** power];
	const ends = [...codes, 0xffff];
	const deltas = [...codes.map((code) => (map.get(code)! - code) & 0xffff), 1];
	const ranges = ends.map(() => 0);
	[...shorts, ...search, ...ends, 0, ...ends, ...deltas, ...ranges].forEach((value, i) =>
		view.setUint16(2 * i, value),
	);
	return bytes;
}
