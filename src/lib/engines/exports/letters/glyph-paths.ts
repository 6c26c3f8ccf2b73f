import { create, type Font } from 'fontkit';
import { textWidth, type Face } from '../../sheet/index.ts';
import type { FaceFiles } from '../svg.ts';

/** One step of an outline: y up, thousandths of the type size. */
export interface GlyphStep {
	command: 'moveTo' | 'lineTo' | 'quadraticCurveTo' | 'bezierCurveTo' | 'closePath';
	args: number[];
}

export interface Glyph {
	/** thousandths of the type size */
	advance: number;
	steps: GlyphStep[];
}

export type Letters = (face: Face, character: string) => Glyph;

/**
 * Outlines of single letters, unkerned and without ligatures as the sheet sets them; no outline where the
 * face is not given or lacks the letter, whose place stays empty. Read by fontkit from the faces' own `glyf` and `hmtx` tables.
 */
export function lettersOf(files: FaceFiles): Letters {
	const fonts = new Map<Face, Font | null>();
	const known = new Map<string, Glyph>();
	return (face, character) => {
		const name = `${face} ${character}`;
		let glyph = known.get(name);
		if (glyph === undefined) {
			if (!fonts.has(face)) fonts.set(face, fontOf(files[face]));
			glyph = glyphOf(fonts.get(face)!, character) ?? {
				advance: textWidth(face, 1000, character),
				steps: [],
			};
			known.set(name, glyph);
		}
		return glyph;
	};
}

function fontOf(file: Uint8Array | undefined): Font | null {
	if (!file) return null;
	// any byte array will do; the package's types ask for Node's
	const font = create(file as Parameters<typeof create>[0]);
	if ('fonts' in font) throw new RangeError('a collection of fonts is not a face');
	return font;
}

function glyphOf(font: Font | null, character: string): Glyph | null {
	const code = character.codePointAt(0)!;
	if (!font || !font.hasGlyphForCodePoint(code)) return null;
	const glyph = font.glyphForCodePoint(code);
	const scale = 1000 / font.unitsPerEm;
	return {
		advance: glyph.advanceWidth * scale,
		steps: glyph.path.commands.map(({ command, args }) => ({
			command,
			args: args.map((one) => one * scale),
		})),
	};
}
