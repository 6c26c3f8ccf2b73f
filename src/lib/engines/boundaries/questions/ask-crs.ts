import type { Choice, Found, Question } from '../question.ts';
import { likelySystems } from './likely-systems.ts';
import { redrawn, whereText } from './where.ts';

/** points of a choice's drawing; several choices travel together */
const mostPoints = 1500;

/** In which system metres are: the likely ones, each with where the map would lie. */
export function askCrs(found: Found, fileName: string): Question {
	const { sketch } = found;
	const systems = sketch ? likelySystems(sketch.box, [fileName, found.layer ?? '']) : [];
	const points = (sketch?.lines ?? []).reduce((sum, line) => sum + line.length / 2, 0);
	const every = Math.max(1, Math.ceil(points / mostPoints));
	const choices = systems.map(({ code, name, swapped, box, place }): Choice => {
		const order = swapped ? ', northing first' : '';
		return {
			value: `EPSG:${code}`,
			words: `${name} (EPSG:${code})${order}: the map would lie ${whereText(box)}.`,
			options: { crs: `EPSG:${code}`, ...(swapped ? { axes: 'latlon' as const } : {}) },
			sketch: redrawn(sketch, place, every),
		};
	});
	return {
		about: 'crs',
		message: 'In which coordinate system are the numbers of this file?',
		choices,
		free: true,
		likeness: found.likeness,
		found,
	};
}
