import { paintSvg, type Drawing, type EmbeddedFace, type Face } from '../sheet/index.ts';
import { base64 } from './base64.ts';
import { subsetFont } from './subset-font.ts';

/** Whole TrueType files by face, as shipped in static/fonts. */
export type FaceFiles = Partial<Record<Face, Uint8Array>>;

/** Characters each face sets on this sheet. */
function characters({ texts }: Drawing): Map<Face, Set<string>> {
	const used = new Map<Face, Set<string>>();
	for (const { face, text } of texts) {
		const set = used.get(face) ?? new Set();
		for (const character of text) set.add(character);
		used.set(face, set);
	}
	return used;
}

function embed(drawing: Drawing, files: FaceFiles): EmbeddedFace[] {
	return [...characters(drawing)]
		.sort(([a], [b]) => (a < b ? -1 : 1))
		.flatMap(([face, set]) => {
			const file = files[face];
			if (!file) return [];
			const subset = subsetFont(file, [...set].join(''));
			return [{ face, format: 'truetype' as const, base64: base64(subset) }];
		});
}

/**
 * The sheet as an SVG file that needs nothing beside it: UTF-8 with an XML declaration, colours by
 * class, and the letters it uses carried inside where `fonts` gives their faces (about 10 to 25 kB a
 * face). Byte for byte repeatable.
 */
export function exportSvg(drawing: Drawing, options: { fonts?: FaceFiles } = {}): Uint8Array {
	const fonts = embed(drawing, options.fonts ?? {});
	const svg = paintSvg(drawing, { fills: 'class', fonts });
	return new TextEncoder().encode(`<?xml version="1.0" encoding="UTF-8"?>\n${svg}`);
}
