import { canonicalJson } from './canonical-json.ts';
import type { EditionContent } from './edition-content.ts';
import { rulesCompared } from './rules-compared.ts';

/** What is compared: an edition, or a draft with the colouring it has now. */
export type Comparable = Pick<EditionContent, 'draft' | 'colouring'> & {
	boundaries: { digest: string };
};

export interface InkChange {
	key: string;
	/** ink numbers from 0; null where the region is not in that state or has no ink */
	before: number | null;
	after: number | null;
}

export interface Change {
	/** what changed: a member of the palette, the rules or the layout */
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
	layout: Change[];
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
		layout: changed(before.draft.layout, after.draft.layout),
	};
	const { boundariesChanged, regions, palette, rules, layout } = found;
	const lists = [regions, palette, rules, layout];
	return { ...found, same: !boundariesChanged && lists.every((list) => list.length === 0) };
}
