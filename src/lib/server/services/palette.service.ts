import type { Ink, Palette } from '../../engines/palettes/index.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { deletePalette, insertPalette, listPalettes } from '../repositories/palettes.repository.ts';
import { record } from './activity.service.ts';
import { NotFound, Refused } from './outcomes.ts';

type Reading = Pick<Workshop, 'db'>;

/** The team's own palettes, by name. */
export async function teamPalettes(shop: Reading, member: Member): Promise<Palette[]> {
	requireAccess(member, 'sheet.read');
	const rows = await listPalettes(shop.db, member.team.id);
	return rows.map(({ id, name, inks }) => ({ id, name, inks }));
}

export async function addPalette(
	shop: Reading,
	member: Member,
	palette: { name: string; inks: Ink[] },
): Promise<string> {
	requireAccess(member, 'palette.edit');
	return shop.db.transaction().execute(async (trx) => {
		const entry = { teamId: member.team.id, ...palette, createdBy: member.userId };
		const made = await insertPalette(trx, entry);
		if (!made) throw new Refused('The team has a palette of this name already.', 'name');
		const detail = { name: palette.name, inks: palette.inks.length };
		await record(trx, member, 'palette.added', { kind: 'palette', id: made.id }, detail);
		return made.id;
	});
}

/** Sheets that use it keep their copy. */
export async function removePalette(shop: Reading, member: Member, id: string): Promise<void> {
	requireAccess(member, 'palette.edit');
	await shop.db.transaction().execute(async (trx) => {
		if (!(await deletePalette(trx, member.team.id, id))) throw new NotFound('palette');
		await record(trx, member, 'palette.deleted', { kind: 'palette', id });
	});
}
