import type { SheetLayout } from '$lib/engines/sheet/layout';
import { without, type Merger } from './merge';

/**
 * Two people changed one layout: every part of it is merged by its own members, names by region, text
 * blocks one by one, so that a clash is told of what both touched and of nothing around it.
 */
export function rebaseLayout(
	merge: Merger,
	base: SheetLayout,
	mine: SheetLayout,
	theirs: SheetLayout,
): SheetLayout {
	const own = (layout: SheetLayout) => without(layout, 'frame', 'lettering', 'lines', 'collar');
	return {
		...merge.fields('layout', own(base), own(mine), own(theirs)),
		frame: frameOf(merge, base.frame, mine.frame, theirs.frame),
		lettering: letteringOf(merge, base.lettering, mine.lettering, theirs.lettering),
		lines: merge.fields('lines', base.lines, mine.lines, theirs.lines),
		collar: collarOf(merge, base.collar, mine.collar, theirs.collar),
	};
}

type Frame = SheetLayout['frame'];
function frameOf({ fields }: Merger, base: Frame, mine: Frame, theirs: Frame): Frame {
	const own = (frame: Frame) => without(frame, 'insetChoices');
	return {
		...fields('frame', own(base), own(mine), own(theirs)),
		insetChoices: fields('inset', base.insetChoices, mine.insetChoices, theirs.insetChoices),
	};
}

type Lettering = SheetLayout['lettering'];
function letteringOf(
	{ fields, members, pick }: Merger,
	base: Lettering,
	mine: Lettering,
	theirs: Lettering,
): Lettering {
	const own = (lettering: Lettering) =>
		without(lettering, 'abbreviations', 'placed', 'hidden', 'first');
	return {
		...fields('lettering', own(base), own(mine), own(theirs)),
		abbreviations: fields(
			'abbreviation of',
			base.abbreviations,
			mine.abbreviations,
			theirs.abbreviations,
		),
		placed: fields('place of', base.placed, mine.placed, theirs.placed),
		hidden: members(base.hidden, mine.hidden, theirs.hidden),
		// an order, which cannot be put together from two
		first: pick('names that come first', base.first, mine.first, theirs.first),
	};
}

type Collar = SheetLayout['collar'];
function collarOf({ fields, places }: Merger, base: Collar, mine: Collar, theirs: Collar): Collar {
	const own = (collar: Collar) => without(collar, 'lineNames', 'blocks');
	return {
		...fields('collar', own(base), own(mine), own(theirs)),
		lineNames: fields('line name', base.lineNames, mine.lineNames, theirs.lineNames),
		blocks: places('text block', base.blocks, mine.blocks, theirs.blocks),
	};
}
