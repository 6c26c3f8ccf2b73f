import type { Ink } from './palette.ts';

/** Reads our own tables of inks, `rrggbb Name, rrggbb Name`: the form in which they are easiest to compare. */
export function readInks(table: string): Ink[] {
	return table.split(', ').map((entry) => {
		const space = entry.indexOf(' ');
		return { name: entry.slice(space + 1), hex: `#${entry.slice(0, space)}` };
	});
}
