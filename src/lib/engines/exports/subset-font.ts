/**
 * A font cut down to the letters of one text, so that a file can carry it. In: a TrueType font with
 * outlines in `glyf` and a text. Out: a TrueType font with these letters only, without kerning and
 * ligatures, so that its widths are those of the sheet's table everywhere. The same input gives the
 * same bytes. Source: OpenType specification 1.9.1.
 */
import { readCharacterMap, writeCharacterMap } from './font/character-map.ts';
import { glyphReader, partOffsets } from './font/glyphs.ts';
import { readTables, viewOf, writeTables, type Tables } from './font/tables.ts';

/** Tables that hold for any choice of letters. */
const kept = ['OS/2', 'cvt ', 'fpgm', 'gasp', 'name', 'prep'];

export function subsetFont(font: Uint8Array, text: string): Uint8Array {
	const tables = readTables(font);
	const codes = new Set(Array.from(text, (character) => character.codePointAt(0)!));
	const characters = readCharacterMap(tables.get('cmap')!, codes);
	const outline = glyphReader(tables);
	const glyphs = withParts([0, ...characters.values()], outline);
	const renumbered = new Map(glyphs.map((glyph, i) => [glyph, i]));
	const mapped = [...characters].map(([code, glyph]) => [code, renumbered.get(glyph)!] as const);
	const made: Tables = new Map();
	for (const tag of kept) if (tables.has(tag)) made.set(tag, tables.get(tag)!);
	made.set('cmap', writeCharacterMap(new Map(mapped)));
	addOutlines(made, glyphs, outline, renumbered);
	addMetrics(made, tables, glyphs);
	return writeTables(made);
}

/** Glyph numbers, ascending, with all glyphs that composites among them are made of. */
function withParts(first: number[], outline: (glyph: number) => Uint8Array): number[] {
	const found = new Set<number>();
	const open = [...first];
	for (let glyph = open.pop(); glyph !== undefined; glyph = open.pop()) {
		if (found.has(glyph)) continue;
		found.add(glyph);
		const bytes = outline(glyph);
		for (const at of partOffsets(bytes)) open.push(viewOf(bytes).getUint16(at));
	}
	return [...found].sort((a, b) => a - b);
}

function addOutlines(
	made: Tables,
	glyphs: number[],
	outline: (glyph: number) => Uint8Array,
	renumbered: Map<number, number>,
): void {
	const outlines = glyphs.map((glyph) => {
		const bytes = outline(glyph).slice();
		const view = viewOf(bytes);
		for (const at of partOffsets(bytes)) view.setUint16(at, renumbered.get(view.getUint16(at))!);
		return bytes;
	});
	const aligned = outlines.map(({ length }) => Math.ceil(length / 4) * 4);
	const glyf = new Uint8Array(aligned.reduce((sum, length) => sum + length, 0));
	const loca = new Uint8Array(4 * (glyphs.length + 1));
	let at = 0;
	outlines.forEach((bytes, i) => {
		glyf.set(bytes, at);
		at += aligned[i];
		viewOf(loca).setUint32(4 * (i + 1), at);
	});
	made.set('glyf', glyf);
	made.set('loca', loca);
}

function addMetrics(made: Tables, tables: Tables, glyphs: number[]): void {
	const head = tables.get('head')!.slice();
	viewOf(head).setInt16(50, 1);
	const hhea = tables.get('hhea')!.slice();
	const full = viewOf(hhea).getUint16(34);
	viewOf(hhea).setUint16(34, glyphs.length);
	const maxp = tables.get('maxp')!.slice();
	viewOf(maxp).setUint16(4, glyphs.length);
	const from = viewOf(tables.get('hmtx')!);
	const hmtx = new Uint8Array(4 * glyphs.length);
	glyphs.forEach((glyph, i) => {
		// glyphs past the full entries share the last advance and have a bearing only
		const bearing = glyph < full ? 4 * glyph + 2 : 4 * full + 2 * (glyph - full);
		viewOf(hmtx).setUint16(4 * i, from.getUint16(4 * Math.min(glyph, full - 1)));
		viewOf(hmtx).setInt16(4 * i + 2, from.getInt16(bearing));
	});
	const post = new Uint8Array(32);
	post.set(tables.get('post')!.subarray(0, 32));
	viewOf(post).setUint32(0, 0x00030000);
	for (const [tag, bytes] of Object.entries({ head, hhea, maxp, hmtx, post })) made.set(tag, bytes);
}
