import { viewOf, type Tables } from './tables.ts';

/** Flags of a part of a composite glyph. Source: OpenType specification 1.9.1, `glyf`. */
const wordArguments = 0x0001;
const oneScale = 0x0008;
const moreParts = 0x0020;
const twoScales = 0x0040;
const matrix = 0x0080;

/** Outline of each glyph as bytes; empty for a space. */
export function glyphReader(tables: Tables): (glyph: number) => Uint8Array {
	const [glyf, loca] = [tables.get('glyf')!, viewOf(tables.get('loca')!)];
	const long = viewOf(tables.get('head')!).getInt16(50) === 1;
	const offset = (i: number) => (long ? loca.getUint32(4 * i) : 2 * loca.getUint16(2 * i));
	return (glyph) => glyf.subarray(offset(glyph), offset(glyph + 1));
}

/** Where a composite glyph names the glyphs it is made of; none for a simple one. */
export function partOffsets(outline: Uint8Array): number[] {
	if (outline.length === 0) return [];
	const view = viewOf(outline);
	if (view.getInt16(0) >= 0) return [];
	const offsets: number[] = [];
	let at = 10;
	let flags = moreParts;
	while (flags & moreParts) {
		flags = view.getUint16(at);
		offsets.push(at + 2);
		at += 4 + (flags & wordArguments ? 4 : 2);
		if (flags & oneScale) at += 2;
		else if (flags & twoScales) at += 4;
		else if (flags & matrix) at += 8;
	}
	return offsets;
}
