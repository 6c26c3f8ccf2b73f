import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import type { ColumnValues } from '../../schemas/column-values.ts';
import { boundaryView } from './boundary-view.ts';
import { sheetOf } from './draft.service.ts';
import { NotFound } from './outcomes.ts';
import { groupsOf } from './sheet.service.ts';

/** The values of a column of the boundary file's table, in region order; `NotFound` for another name. */
export async function columnOfSheet(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	name: string,
): Promise<ColumnValues> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const view = await boundaryView(shop.db, sheet.boundary_set_id);
	if (!view.set.columns.includes(name)) throw new NotFound('column');
	return { boundarySet: view.set.id, values: await groupsOf(shop.db, view, name) };
}
