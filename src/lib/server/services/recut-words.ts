import type { Mend } from '../../engines/boundaries/index.ts';
import type { ReadingFields } from '../../schemas/upload.ts';
import { answerInWords } from './answer-words.ts';

/** What a re-cut does, in one sentence; regions by key. */

export function readingInWords(fileName: string, fields: ReadingFields): string {
	const { toleranceMetres, acrossWaterKm } = fields;
	const told = [
		toleranceMetres === undefined ? '' : `borders joined within ${toleranceMetres} m`,
		acrossWaterKm === undefined ? '' : `borders across water up to ${acrossWaterKm} km`,
		answerInWords(fields),
	].filter((phrase) => phrase !== '');
	return `Reads ${fileName} again: ${told.join(', ') || 'everything decided from the file'}.`;
}

export function mendsInWords(mends: Mend[]): string {
	const [first] = mends;
	return mends.length === 1 ? mendInWords(first) : `Mends ${mends.length} faults.`;
}

function mendInWords(mend: Mend): string {
	switch (mend.kind) {
		case 'fill':
			return `Gives the land of nobody at ${place(mend.at)} to ${mend.into}.`;
		case 'settle':
			return `Leaves to ${mend.keep} what ${mend.a} and ${mend.b} both cover.`;
		case 'drop':
			return `Leaves out ${mend.key}.`;
		case 'merge':
			return `Makes ${mend.key} part of ${mend.into}.`;
		case 'untangle':
			return `Untangles the outline of ${mend.key}.`;
		case 'part':
			return mend.into === null
				? `Leaves out the part of ${mend.key} at ${place(mend.at)}.`
				: `Gives the part of ${mend.key} at ${place(mend.at)} to ${mend.into}.`;
	}
}

const place = ([lon, lat]: [number, number]): string =>
	`${Math.abs(lat).toFixed(4)}° ${lat < 0 ? 'S' : 'N'}, ${Math.abs(lon).toFixed(4)}° ${lon < 0 ? 'W' : 'E'}`;
