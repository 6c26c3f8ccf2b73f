import Flatbush from 'flatbush';
import { leastLegiblePt } from '../layout/lettering.ts';
import type { Box } from '../plane/fit.ts';
import { boxAround } from './ground.ts';
import type { LabelInput } from './label-sheet.ts';
import type { NameTask } from './region-labels.ts';
import type { DrawnLettering, SetName } from './set-name.ts';

/** Names and pairs that are told one by one. */
const mostTold = 5;

const listed = (names: string[]): string => {
	const told = names.slice(0, mostTold).join(', ');
	return names.length > mostTold ? `${told} and ${names.length - mostTold} more` : told;
};
const meet = (a: Box, b: Box) =>
	a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
const boxOf = ({ box, x, y }: SetName): Box => boxAround(x, y, box.width, box.height);

/** What is not as it should be with the names of a sheet, in sentences. */
export function letteringNotes(
	{ names, keys, obstacles }: LabelInput,
	{ ways }: NameTask,
	set: SetName[],
	{ points, isFew, how }: Omit<DrawnLettering, 'notes'> & { isFew: boolean },
): string[] {
	const nameOf = (region: number) => names[region] || keys[region];
	const notes: string[] = [];
	if (points.regions !== null && points.regions < leastLegiblePt) {
		notes.push(
			`Names are set in ${points.regions} pt; under ${leastLegiblePt} pt print is hard to read.`,
		);
	}
	const lacking = ways.flatMap(({ lacking: lacks }, region) => (lacks ? region : []));
	if (lacking.length) {
		const [are, have] = lacking.length === 1 ? ['name has', 'It is'] : ['names have', 'They are'];
		notes.push(
			`${lacking.length} ${are} letters that the sheet's fonts (Latin, Greek, Cyrillic) lack: ${listed(lacking.map(nameOf))}. ${have} not drawn; an abbreviation in those letters can be.`,
		);
	}
	if (isFew && names.length && how.some((one) => one === 'listed')) {
		notes.push('Too few names of regions fit at a size that can be read, so they are listed.');
	}
	return [...notes, ...handNotes(set, obstacles, nameOf)];
}

/** Pairs of names whose boxes overlap. */
function overlaps(names: SetName[]): [SetName, SetName][] {
	if (names.length < 2) return [];
	const index = new Flatbush(names.length);
	const boxes = names.map(boxOf);
	for (const { x, y, width, height } of boxes) index.add(x, y, x + width, y + height);
	index.finish();
	return boxes.flatMap(({ x, y, width, height }, i) =>
		index
			.search(x, y, x + width, y + height)
			.filter((j) => j > i && meet(boxes[i], boxes[j]))
			.sort((a, b) => a - b)
			.map((j): [SetName, SetName] => [names[i], names[j]]),
	);
}

/** Names set by hand that lie over each other or over something else. */
function handNotes(
	set: SetName[],
	obstacles: readonly Box[],
	nameOf: (region: number) => string,
): string[] {
	const hand = set.filter(({ how }) => how === 'hand');
	const pairs = overlaps(hand).map(([a, b]) => `${nameOf(a.region)} with ${nameOf(b.region)}`);
	const over = hand.filter((one) => obstacles.some((box) => meet(box, boxOf(one))));
	const notes: string[] = [];
	if (pairs.length) notes.push(`Names set by hand overlap: ${listed(pairs)}.`);
	if (over.length) {
		const said = listed(over.map(({ region }) => nameOf(region)));
		notes.push(`Names set by hand stand on other things of the sheet: ${said}.`);
	}
	return notes;
}
