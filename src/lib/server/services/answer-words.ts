import type { KnownAnswer } from '../jobs/read-answered.ts';

export type AnswerOptions = KnownAnswer['options'];

const axesInWords = { lonlat: 'longitude first', latlon: 'latitude first' };
const doubledInWords = {
	refuse: 'doubled keys refused',
	merge: 'doubled keys merged as parts of one region',
	rename: 'doubled keys renamed',
};

/** What was answered, as a list of plain phrases. */
export function answerInWords(options: AnswerOptions): string {
	const { layer, crs, axes, duplicateKeys, keyField, nameField } = options;
	return [
		layer === undefined ? '' : `layer ${layer}`,
		crs === undefined ? '' : firstLine(crs),
		axes === undefined ? '' : axesInWords[axes],
		keyField === undefined ? '' : `keys from ${keyField}`,
		nameField === undefined ? '' : `names from ${nameField}`,
		duplicateKeys === undefined ? '' : doubledInWords[duplicateKeys],
	]
		.filter((phrase) => phrase !== '')
		.join(', ');
}

/** A system given as text may be long. */
const firstLine = (text: string): string => (text.length > 80 ? `${text.slice(0, 79)}…` : text);
