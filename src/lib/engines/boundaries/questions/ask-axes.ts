import { crsOf } from '../crs.ts';
import type { Finding } from '../finding.ts';
import type { BoundaryOptions } from '../options.ts';
import type { Choice, Found, Question } from '../question.ts';
import { redrawn, whereText } from './where.ts';

type Box = [number, number, number, number];

/** Which of the two numbers is the longitude: the orders that are possible, with where each would lie. */
export function askAxes(found: Found): Question {
	const { sketch } = found;
	const box: Box = sketch?.box ?? [0, 0, 0, 0];
	const turned: Box = [box[1], box[0], box[3], box[2]];
	const asWritten: Choice = {
		value: 'lonlat',
		words: `Longitude first: the map would lie ${whereText(box)}.`,
		options: { axes: 'lonlat' },
		sketch,
	};
	const other: Choice = {
		value: 'latlon',
		words: `Latitude first: the map would lie ${whereText(turned)}.`,
		options: { axes: 'latlon' },
		sketch: redrawn(sketch, ([x, y]) => [y, x]),
	};
	return {
		about: 'axes',
		message: 'Which of the two numbers of a position comes first?',
		choices: [...(isLegal(box) ? [asWritten] : []), ...(isLegal(turned) ? [other] : [])],
		free: false,
		likeness: found.likeness,
		found,
	};
}

const isLegal = ([west, south, east, north]: Box): boolean =>
	south >= -90 && north <= 90 && west >= -360 && east <= 540;

/**
 * A note where both orders are possible, nobody said which, and the format is known for either: the file
 * was read longitude first, and the other order would lie elsewhere.
 */
export function axesNote(box: Box | null, crs: string, options: BoundaryOptions): Finding[] {
	if (!box || options.axes || !crsOf(crs).geographic) return [];
	const turned: Box = [box[1], box[0], box[3], box[2]];
	if (!isLegal(turned)) return [];
	const message = `The file does not say which number of a position comes first; longitude was taken first, so that the map lies ${whereText(box)}. Latitude first, it would lie ${whereText(turned)}.`;
	return [{ code: 'axes-assumed', severity: 'note', message, regions: [], at: null }];
}
