import type { EarlierInks } from '../../schemas/desk.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readEditionColouring } from '../repositories/editions.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { draftOf, sheetOf } from './draft.service.ts';
import { NotFound } from './outcomes.ts';

/** Ink of each region by key as an edition was issued with it; regions may have been others then. */
export async function editionInks(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	edition: number,
): Promise<EarlierInks> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const known = Number.isSafeInteger(edition) && edition > 0 && edition < 2 ** 31;
	const inks = known ? await readEditionColouring(shop.db, sheet.id, edition) : undefined;
	if (!inks) throw new NotFound('edition');
	return { inks };
}

/** The same for a revision of the draft that has a colouring. */
export async function revisionInks(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	revision: number,
): Promise<EarlierInks> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const { inks, boundary_set_id: set } = await draftOf(shop.db, sheet.id, revision);
	if (!inks) throw new NotFound('colouring');
	const { keys } = await boundaryView(shop.db, set);
	return { inks: Object.fromEntries(keys.map((key, region) => [key, inks[region]])) };
}
