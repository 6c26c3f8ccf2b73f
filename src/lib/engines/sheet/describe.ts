import type { Drawing, SheetThemed } from './drawing.ts';
import { inksInUse } from './draw-sheet.ts';
import { caution } from './layout.ts';

const many = (count: number, one: string, more: string): string =>
	`${count.toLocaleString('en-GB')} ${count === 1 ? one : more}`;

/** What a reader who does not see the sheet should know of it, in a few sentences. */
export function describe(drawing: Omit<Drawing, 'description'>): string {
	const { fills, unplaced, notes } = drawing;
	const inks = drawing.themed ? classWords(drawing, drawing.themed) : inkWords(drawing);
	const listed = unplaced.length
		? ` ${many(unplaced.length, 'name is', 'names are')} listed in the table and not on the map.`
		: '';
	const scale = notes.scale ? ` ${notes.scale}` : '';
	const insets = notes.insets ? ` ${notes.insets}` : '';
	return `Map of ${many(fills.length, 'region', 'regions')}${inks}.${listed} ${notes.projection}${scale}${insets} ${caution}`;
}

function inkWords({ fills }: Pick<Drawing, 'fills'>): string {
	const used = inksInUse(fills).length;
	return used ? ` in ${many(used, 'ink', 'inks')}` : ', not coloured yet';
}

/** Every class with its number of regions, which is what the picture says. */
function classWords(
	{ fills, inks }: Pick<Drawing, 'fills' | 'inks'>,
	{ told }: SheetThemed,
): string {
	const regions = inks.map(() => 0);
	for (const { ink } of fills) if (ink >= 0) regions[ink]++;
	const each = inks
		.map(({ name }, ink) => `${name}: ${many(regions[ink], 'region', 'regions')}`)
		.filter((_, ink) => ink < told || regions[ink] > 0);
	return ` in ${many(told, 'class', 'classes')} of a measure (${each.join('; ')})`;
}
