import { createHash } from 'node:crypto';
import { inksText } from '../../engines/palettes/same-inks.ts';
import type { Ink } from '../../engines/palettes/palette.ts';
import type { PaletteApproval, TeamPalette } from '../../schemas/team-palette.ts';
import type { ApprovalRow } from '../repositories/palette-approvals.repository.ts';
import type { PaletteRow } from '../repositories/palettes.repository.ts';

/** SHA-256 over the name and the inks of a palette. */
export const paletteDigest = ({ name, inks }: { name: string; inks: readonly Ink[] }): string =>
	createHash('sha256')
		.update(JSON.stringify([name, inksText(inks)]))
		.digest('hex');

/** A palette as pages are given it, with the approval that says most about it. */
export function paletteView(row: PaletteRow, approvals: readonly ApprovalRow[]): TeamPalette {
	const { id, name, inks, revision, source, licence } = row;
	const last = approvals.find(({ palette_id }) => palette_id === id);
	return {
		...{ id, name, inks, revision, digest: paletteDigest(row) },
		...(source ? { source } : {}),
		...(licence ? { licence } : {}),
		approval: last ? approvalView(last, row) : null,
	};
}

function approvalView(approval: ApprovalRow, row: PaletteRow): PaletteApproval {
	return {
		by: approval.approver_name ?? approval.approver_email ?? 'somebody who has left',
		at: approval.approved_at.toISOString(),
		inks: approval.inks,
		digest: approval.digest,
		name: approval.name,
		inForce: approval.ended_at === null && approval.digest === paletteDigest(row),
	};
}
