import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { endApproval, insertApproval } from '../repositories/palette-approvals.repository.ts';
import { holdPalette } from '../repositories/palettes.repository.ts';
import { record } from './activity.service.ts';
import { Conflict, NotFound, Refused } from './outcomes.ts';
import { paletteDigest } from './palette-view.ts';

type Writing = Pick<Workshop, 'db'>;

/**
 * Approves a palette as the approver has seen it: `digest` is that of the page. Any later change of it ends
 * the approval.
 */
export async function approvePalette(
	shop: Writing,
	member: Member,
	id: string,
	digest: string,
): Promise<void> {
	requireAccess(member, 'palette.approve');
	await shop.db.transaction().execute(async (trx) => {
		const row = await holdPalette(trx, member.team.id, id);
		if (!row) throw new NotFound('palette');
		if (paletteDigest(row) !== digest)
			throw new Conflict(
				'stale',
				'The palette was changed after this page was loaded. Look at it again before you approve it.',
			);
		await endApproval(trx, id);
		const { name, inks } = row;
		const approval = { team_id: member.team.id, palette_id: id, name, inks, digest };
		await insertApproval(trx, { ...approval, approved_by: member.userId });
		const detail = { name, inks: inks.length, digest };
		await record(trx, member, 'palette.approved', { kind: 'palette', id }, detail);
	});
}

/** Takes an approval back; the palette stays as it is. */
export async function endPaletteApproval(shop: Writing, member: Member, id: string): Promise<void> {
	requireAccess(member, 'palette.approve');
	await shop.db.transaction().execute(async (trx) => {
		const row = await holdPalette(trx, member.team.id, id);
		if (!row) throw new NotFound('palette');
		if (!(await endApproval(trx, id))) throw new Refused('This palette is not approved.');
		await record(
			trx,
			member,
			'palette.approval-ended',
			{ kind: 'palette', id },
			{ name: row.name },
		);
	});
}
