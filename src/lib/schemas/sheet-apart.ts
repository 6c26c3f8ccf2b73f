import type { DeskColouring, DeskSheet, DeskSheetApart } from './desk.ts';
import { packNumbers, unpackNumbers } from './packed-numbers.ts';
import type { SheetColumns } from './sheet-columns.ts';

/** Sheets of more regions than this come to the page in two parts. */
export const mostWhole = 4_000;

/**
 * A large sheet as its page is given it: without what never changes, and with long lists as short texts,
 * which a page is quicker to write and to read than lists.
 */
export function sheetApart(sheet: DeskSheet, firstPicture: string): DeskSheetApart {
	const { colouring, lastInks, theme } = sheet;
	return {
		...sheet,
		borders: null,
		regions: null,
		borderCount: sheet.borders.a.length,
		group: groupsApart(sheet.regions.group),
		colouring: colouring?.status === 'coloured' ? withoutInks(colouring) : colouring,
		lastInks: lastInks && packNumbers(lastInks),
		theme: theme && { ...theme, classes: packNumbers(theme.classes) },
		firstPicture,
	};
}

type Coloured = Extract<DeskColouring, { status: 'coloured' }>;

/** A colouring that stands is the last one that kept every rule. */
const withoutInks = ({ inks: _, ...colouring }: Coloured) => colouring;

function groupsApart(group: (string | null)[]): DeskSheetApart['group'] {
	const names = [...new Set(group)];
	if (names.length === 1 && names[0] === null) return null;
	const numbers = new Map(names.map((name, number) => [name, number]));
	return { names, of: packNumbers(group.map((name) => numbers.get(name)!)) };
}

/** The whole sheet again, with the columns that it was given apart from. */
export function wholeSheet(
	{ firstPicture: _, borderCount: __, group, ...sheet }: DeskSheetApart,
	{ regions, borders }: SheetColumns,
): DeskSheet {
	const { colouring, theme } = sheet;
	const lastInks = sheet.lastInks === null ? null : unpackNumbers(sheet.lastInks);
	return {
		...sheet,
		...{ borders, lastInks },
		regions: { ...regions, group: groupsWhole(group, regions.key.length) },
		colouring:
			colouring?.status === 'coloured' ? { ...colouring, inks: lastInks ?? [] } : colouring,
		theme: theme && { ...theme, classes: unpackNumbers(theme.classes) },
	};
}

function groupsWhole(group: DeskSheetApart['group'], regions: number): (string | null)[] {
	if (!group) return Array.from({ length: regions }, () => null);
	return unpackNumbers(group.of).map((number) => group.names[number]);
}
