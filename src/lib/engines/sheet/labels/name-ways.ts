import type { Face } from '../type/face.ts';
import { isSetIn, textWidth } from '../type/text-width.ts';
import { linesOfName } from './lines-of-name.ts';

/** A name and its abbreviation, each in one, two or three lines; none where it cannot be set. */
export interface NameWays {
	full: string[][];
	short: string[][];
	/** whether the fonts lack letters of the name */
	lacking: boolean;
}

/** In: a cleaned name, and the abbreviation, '' for none. */
export function nameWays(face: Face, name: string, abbreviation: string): NameWays {
	const ways = (text: string) =>
		text && isSetIn(face, text) ? linesOfName(text, (part) => textWidth(face, 1000, part)) : [];
	return {
		full: ways(name),
		short: abbreviation === name ? [] : ways(abbreviation),
		lacking: name !== '' && !isSetIn(face, name),
	};
}
