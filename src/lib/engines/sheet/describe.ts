import type { Drawing } from './drawing.ts';
import { inksInUse } from './draw-sheet.ts';
import { caution } from './layout.ts';

const many = (count: number, one: string, more: string): string =>
	`${count.toLocaleString('en-GB')} ${count === 1 ? one : more}`;

/** What a reader who does not see the sheet should know of it, in a few sentences. */
export function describe({ fills, unplaced, notes }: Omit<Drawing, 'description'>): string {
	const used = inksInUse(fills).length;
	const inks = used ? ` in ${many(used, 'ink', 'inks')}` : ', not coloured yet';
	const listed = unplaced.length
		? ` ${many(unplaced.length, 'name is', 'names are')} listed in the table and not on the map.`
		: '';
	const scale = notes.scale ? ` ${notes.scale}` : '';
	const insets = notes.insets ? ` ${notes.insets}` : '';
	return `Map of ${many(fills.length, 'region', 'regions')}${inks}.${listed} ${notes.projection}${scale}${insets} ${caution}`;
}
