import { canonicalJson } from './canonical-json.ts';
import { wholeDraft } from './draft.ts';
import type { EditionContent } from './edition-content.ts';
import { layoutCompared } from './layout-compared.ts';
import { rulesCompared } from './rules-compared.ts';
import { classRanges, figuresCompared, territoriesCompared } from './shown-compared.ts';

/** What is compared: an edition, or a draft with the colouring, classes and territories it has now. */
export type Comparable = Pick<EditionContent, 'draft' | 'colouring' | 'theme' | 'territories'> & {
	boundaries: { digest: string };
};

export interface InkChange {
	key: string;
	/** ink numbers from 0; null where the region is not in that state or has no ink */
	before: number | null;
	after: number | null;
}

export interface Change {
	/** what changed: a member of the palette, the rules, the theme or the layout */
	what: string;
	before: unknown;
	after: unknown;
}

export interface Differences {
	boundariesChanged: boolean;
	/** in order of keys */
	regions: InkChange[];
	/** by ink number from 0: `ink 0`, and the palette's name */
	palette: Change[];
	/** locks, forbidden and reserved inks, pairs and groups, borders decided by hand, goals, ties, inks */
	rules: Change[];
	/** `collar legendTitle`: parts of the layout by their members */
	layout: Change[];
	/** measure, classes, limits, ramp and so on, each by its name; `shown` where one state has no theme */
	theme: Change[];
	/** range that a region is in, by key; null in a state without a theme */
	classes: Change[];
	/** `taken over`, and `figure of KEY` where both states hold figures */
	figures: Change[];
	/** `region KEY`: the territory it is in, by key; `name of KEY` of a territory */
	territories: Change[];
	same: boolean;
}

const equal = (a: unknown, b: unknown): boolean =>
	a === b || (a !== undefined && b !== undefined && canonicalJson(a) === canonicalJson(b));

/** Members that differ, in order of names. */
function changed(before: object, after: object): Change[] {
	const [a, b] = [new Map(Object.entries(before)), new Map(Object.entries(after))];
	return [...new Set([...a.keys(), ...b.keys()])]
		.sort()
		.filter((name) => !equal(a.get(name), b.get(name)))
		.map((what) => ({ what, before: a.get(what) ?? null, after: b.get(what) ?? null }));
}

function regionChanges(before: Comparable, after: Comparable): InkChange[] {
	return changed(before.colouring, after.colouring).map((change) => ({
		key: change.what,
		before: change.before as number | null,
		after: change.after as number | null,
	}));
}

function paletteOf({ draft }: Comparable) {
	const inks = draft.palette.inks.map((ink, number) => [`ink ${number}`, ink]);
	return { name: draft.palette.name, ...Object.fromEntries(inks) };
}

function themeChanges(before: Comparable, after: Comparable): Change[] {
	const [was, is] = [before, after].map(({ draft }) => wholeDraft(draft).theme);
	if (was && is) return changed(was, is);
	return changed({ shown: was?.measure ?? null }, { shown: is?.measure ?? null });
}

/** Of two themed states; that figures came or went with the theme says the theme. */
function figureChanges({ theme: was }: Comparable, { theme: is }: Comparable): Change[] {
	return was && is ? changed(figuresCompared(was, is), figuresCompared(is, was)) : [];
}

/**
 * What changed between two states of a sheet. Regions are matched by key, so boundaries may differ.
 * Guarantee: `same` exactly when nothing is listed and the boundaries are the same.
 */
export function differences(before: Comparable, after: Comparable): Differences {
	const found = {
		boundariesChanged: before.boundaries.digest !== after.boundaries.digest,
		regions: regionChanges(before, after),
		palette: changed(paletteOf(before), paletteOf(after)),
		rules: changed(rulesCompared(before.draft), rulesCompared(after.draft)),
		layout: changed(layoutCompared(before.draft), layoutCompared(after.draft)),
		theme: themeChanges(before, after),
		classes: changed(classRanges(before.theme), classRanges(after.theme)),
		figures: figureChanges(before, after),
		territories: changed(
			territoriesCompared(before.territories),
			territoriesCompared(after.territories),
		),
	};
	const { boundariesChanged, ...lists } = found;
	const none = Object.values<unknown[]>(lists).every((list) => list.length === 0);
	return { ...found, same: !boundariesChanged && none };
}
