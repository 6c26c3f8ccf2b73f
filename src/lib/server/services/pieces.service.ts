import type { PieceColumns } from '../../schemas/pieces.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { insertPieces, readPieces } from '../repositories/pieces.repository.ts';
import { sheetOf } from './draft.service.ts';
import { NotFound } from './outcomes.ts';

/**
 * Exclaves, islands, enclaves and parts of a sheet's regions: as kept when the file was read, or worked
 * out now, in a thread, where it was read before they were kept.
 */
export async function sheetPieces(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	asker?: AbortSignal,
): Promise<PieceColumns> {
	requireAccess(member, 'sheet.read');
	const { boundary_set_id: set } = await sheetOf(shop.db, member, number);
	const kept = await readPieces(shop.db, set);
	if (kept) return kept;
	const geometry = await readGeometry(shop.db, set);
	if (!geometry) throw new NotFound('boundary set');
	const found = await shop.pool.run('findPieces', { geometry }, { signal: asker });
	await shop.db.transaction().execute((trx) => insertPieces(trx, set, found));
	return found;
}
