import type { Face } from './face.ts';
import { textWidth } from './text-width.ts';

/** Longest beginning of a text that fits, ended with an ellipsis if something was left out. */
export function shortened(face: Face, size: number, text: string, width: number): string {
	if (textWidth(face, size, text) <= width) return text;
	const characters = [...text];
	while (characters.length > 0) {
		characters.pop();
		const cut = `${characters.join('').trimEnd()}…`;
		if (textWidth(face, size, cut) <= width) return cut;
	}
	return '';
}

/** A word too long for a line, broken where the line ends. */
function brokenWord(face: Face, size: number, word: string, width: number): string[] {
	const pieces: string[] = [];
	let piece = '';
	for (const character of word) {
		if (piece && textWidth(face, size, piece + character) > width) {
			pieces.push(piece);
			piece = '';
		}
		piece += character;
	}
	return piece ? [...pieces, piece] : pieces;
}

/**
 * Text set in lines no wider than `width`, filled from the first; a word longer than a line is broken.
 * Every line fits, unless a single character is wider than `width`.
 */
export function wrapText(face: Face, size: number, text: string, width: number): string[] {
	const lines: string[] = [];
	let line = '';
	for (const word of text.split(' ').flatMap((one) => brokenWord(face, size, one, width))) {
		const longer = line ? `${line} ${word}` : word;
		if (textWidth(face, size, longer) <= width) line = longer;
		else {
			if (line) lines.push(line);
			line = word;
		}
	}
	return line ? [...lines, line] : lines;
}
