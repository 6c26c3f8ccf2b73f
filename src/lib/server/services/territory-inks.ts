import type { Draft } from '../../engines/editions/draft.ts';
import { numbersOf, todayOf } from '../../engines/territories/problem-of-draft.ts';
import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import type { Workshop } from '../jobs/workshop.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { latestTerritoryInks } from '../repositories/territories.repository.ts';
import type { BoundaryView } from './boundary-view.ts';
import { sheetBorders } from './draft-problem.ts';
import { documentOf, draftOf } from './draft.service.ts';
import { CheckFailed } from './outcome-of-colouring.ts';

export interface TerritoryInks {
	/** ink number by territory key; empty while `note` says why */
	inks: Record<string, number>;
	note: string | null;
	/** territories whose ink differs from the one before, by key */
	changed: string[];
}

type Assigned = Pick<TerritoryDraft, 'territories' | 'assignment'>;

/** Inks for territories as they are about to be stored, as near as can be to those they had last. */
export async function inksFor(
	shop: Pick<Workshop, 'db' | 'pool'>,
	sheet: SheetRecord,
	view: BoundaryView,
	document: Assigned,
): Promise<TerritoryInks> {
	if (document.territories.length === 0) return { inks: {}, note: null, changed: [] };
	const drawn = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	return inksOn(shop, sheet.id, { view, drawn }, document);
}

/** The same over boundaries and a draft that are about to be the sheet's. */
export async function inksOn(
	shop: Pick<Workshop, 'db' | 'pool'>,
	sheetId: string,
	{ view, drawn }: { view: BoundaryView; drawn: Draft },
	document: Assigned,
): Promise<TerritoryInks> {
	const before = (await latestTerritoryInks(shop.db, sheetId)) ?? {};
	if (document.territories.length === 0) return { inks: {}, note: null, changed: [] };
	const { a, b } = sheetBorders(view, drawn);
	const keys = document.territories.map(({ key }) => key);
	const most = drawn.palette.inks.length;
	const found = await shop.pool.run('inkTerritories', {
		borders: { a, b },
		assignment: todayOf(view.keys, document),
		territories: keys.length,
		previous: Int32Array.from(keys, (key) => (Object.hasOwn(before, key) ? before[key] : -1)),
		most,
	});
	if (found.status === 'too-few') {
		return { inks: {}, note: tooFew(found.needed, most), changed: [] };
	}
	if (found.faults.length > 0) throw new CheckFailed(found.faults.join(' '));
	const inks = Object.fromEntries(keys.map((key, place) => [key, found.inks[place]]));
	return { inks, note: null, changed: changedInks(before, inks) };
}

/** Territories that had an ink and have another one now. */
export const changedInks = (
	before: Record<string, number>,
	after: Record<string, number>,
): string[] =>
	Object.keys(after).filter((key) => Object.hasOwn(before, key) && before[key] !== after[key]);

const tooFew = (needed: number | null, has: number) =>
	needed === null
		? `The palette’s ${has} inks do not tell the territories apart.`
		: `The territories need ${needed} inks and the palette has ${has}.`;

/** Why stored territories have no inks; told anew when they are saved again. */
export const inkNoteOf = (
	inks: Record<string, number>,
	{ territories }: Pick<TerritoryDraft, 'territories'>,
): string | null => {
	const place = numbersOf(Object.keys(inks));
	return territories.every(({ key }) => place(key) >= 0)
		? null
		: 'The palette has too few inks to tell the territories apart. Add one, then save again.';
};
