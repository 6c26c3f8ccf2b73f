import type { Db } from '../database/connection.ts';
import type { PaletteInk } from '../database/palette-tables.ts';

/** Approvals of a team's palettes, those in force first, then the newest. */
export const listApprovals = (db: Db, teamId: string) =>
	db
		.selectFrom('palette_approvals')
		.leftJoin('User as approver', 'approver.id', 'palette_approvals.approved_by')
		.selectAll('palette_approvals')
		.select(['approver.name as approver_name', 'approver.email as approver_email'])
		.where('team_id', '=', teamId)
		.orderBy('palette_approvals.ended_at', (order) => order.desc().nullsFirst())
		.orderBy('palette_approvals.approved_at', 'desc')
		.limit(500)
		.execute();
export type ApprovalRow = Awaited<ReturnType<typeof listApprovals>>[number];

export const insertApproval = (
	trx: Db,
	approval: {
		team_id: string;
		palette_id: string;
		name: string;
		inks: readonly PaletteInk[];
		digest: string;
		approved_by: string | null;
	},
) =>
	trx
		.insertInto('palette_approvals')
		.values({ ...approval, inks: JSON.stringify(approval.inks) })
		.execute();

/** Ends the approval that is in force, if there is one. */
export async function endApproval(trx: Db, paletteId: string): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('palette_approvals')
		.set({ ended_at: new Date() })
		.where('palette_id', '=', paletteId)
		.where('ended_at', 'is', null)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}
