import { createHash } from 'node:crypto';
import type { DeskSheet } from '../../schemas/desk.ts';

/** Changes whenever sheets are arranged or pictures are made in another way. */
const maker = 1;

/**
 * Names the picture that a sheet shows first: a digest of everything beside its boundaries that decides
 * where regions lie and which lines are drawn. Inks count by their names only, because the legend takes
 * room; so does the line that says which draft it is.
 */
export function firstPictureTag({
	draft,
	theme,
	colouring,
	lastInks,
	...sheet
}: DeskSheet): string {
	const { labels: _, lettering: __, ...layout } = draft.layout;
	const told = [
		maker,
		layout,
		draft.palette.inks.map(({ name }) => name),
		theme && [theme.title, theme.note, theme.told, theme.inks.map(({ name }) => name)],
		colouring?.status === 'coloured' || lastInks !== null,
		[sheet.editions.length > 0, String(sheet.revision).length, sheet.savedAt.slice(0, 7)],
		// which borders are drawn double, if they are, follows from the colouring
		layout.lines.doubleWeak && sheet.revision,
	];
	return createHash('sha256').update(JSON.stringify(told)).digest('hex').slice(0, 32);
}
