import { faceAdvances, type Face } from './face.ts';

/** A character the face lacks is reckoned a full square, which no usual script exceeds. */
const unknownAdvance = 1000;
/** Marks that stand on the letter before them. */
const combining = /^\p{Mn}$/u;

function advance(face: Face, character: string): number {
	const known = faceAdvances[face].get(character.codePointAt(0)!);
	if (known !== undefined) return known;
	return combining.test(character) ? 0 : unknownAdvance;
}

/**
 * Width of one line of text, unkerned and without ligatures, in the unit of `size`. The same in every
 * painter and on every machine, because it is read from a table and not from installed fonts.
 */
export function textWidth(face: Face, size: number, text: string): number {
	let thousandths = 0;
	for (const character of text) thousandths += advance(face, character);
	return (thousandths * size) / 1000;
}

/** Whether the face has every character; otherwise the reader's machine chooses another face. */
export function isSetIn(face: Face, text: string): boolean {
	for (const character of text) {
		if (!faceAdvances[face].has(character.codePointAt(0)!)) return false;
	}
	return true;
}
