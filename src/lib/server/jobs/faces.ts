import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { Drawing, EmbeddedFace, Face } from '../../engines/sheet/index.ts';

const kept = new Map<Face, EmbeddedFace>();

/** The faces a drawing is lettered in, to be carried inside its file. */
export function facesIn(drawing: Drawing): EmbeddedFace[] {
	const used = new Set(drawing.texts.map(({ face }) => face));
	return [...used].sort().map(faceFile);
}

function faceFile(face: Face): EmbeddedFace {
	let known = kept.get(face);
	if (!known) {
		const bytes = readFileSync(path.resolve('static/fonts', `${face}.ttf`));
		known = { face, format: 'truetype', base64: bytes.toString('base64') };
		kept.set(face, known);
	}
	return known;
}
