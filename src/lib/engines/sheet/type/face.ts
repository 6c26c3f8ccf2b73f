import type { DrawnText } from '../drawing.ts';
import { runs as sans } from './sans.ts';
import { runs as sansBold } from './sans-bold.ts';
import { runs as serif } from './serif.ts';
import { runs as serifBold } from './serif-bold.ts';
import { runs as serifItalic } from './serif-italic.ts';

export type Face = DrawnText['face'];

/** What a painter needs to know of a face; the family is one of the two shipped with the product. */
export interface FaceStyle {
	family: string;
	fallback: 'sans-serif' | 'serif';
	weight: 400 | 700;
	italic: boolean;
}

const sansFamily = 'Sofia Sans Semi Condensed';
const serifFamily = 'Source Serif 4';

export const faceStyles: Record<Face, FaceStyle> = {
	sans: { family: sansFamily, fallback: 'sans-serif', weight: 400, italic: false },
	'sans-bold': { family: sansFamily, fallback: 'sans-serif', weight: 700, italic: false },
	serif: { family: serifFamily, fallback: 'serif', weight: 400, italic: false },
	'serif-bold': { family: serifFamily, fallback: 'serif', weight: 700, italic: false },
	'serif-italic': { family: serifFamily, fallback: 'serif', weight: 400, italic: true },
};

function read(runs: string[]): Map<number, number> {
	const advances = new Map<number, number>();
	for (const run of runs) {
		const [first, ...widths] = run.split(' ').map((text) => parseInt(text, 36));
		widths.forEach((width, step) => advances.set(first + step, width));
	}
	return advances;
}

/** Advance of each character the face has, in thousandths of the type size. */
export const faceAdvances: Record<Face, Map<number, number>> = {
	sans: read(sans),
	'sans-bold': read(sansBold),
	serif: read(serif),
	'serif-bold': read(serifBold),
	'serif-italic': read(serifItalic),
};
