import { isAcross } from '../../engines/borders/index.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { replaceGaps } from '../repositories/gaps.repository.ts';
import { record } from './activity.service.ts';
import { boundaryView } from './boundary-view.ts';
import { sheetOf } from './draft.service.ts';
import { NotFound, Unfit } from './outcomes.ts';

export interface GapsMeasured {
	/** up to which width all gaps are known now, in kilometres */
	withinKm: number;
	/** pairs across water that are known now */
	pairs: number;
	/** whether the work ran out before the distance that was asked for */
	cut: boolean;
}

/**
 * Measures the gaps across water of a sheet's boundaries up to `km`, in a thread, and keeps them with the
 * boundary set. What was measured as far before is answered at once.
 */
export async function measureSheetGaps(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	km: number,
	asker?: AbortSignal,
): Promise<GapsMeasured> {
	requireAccess(member, 'borders.edit');
	const sheet = await sheetOf(shop.db, member, number);
	const { set, asRead } = await boundaryView(shop.db, sheet.boundary_set_id);
	if (set.gaps_km < km) {
		const geometry = await readGeometry(shop.db, set.id);
		if (!geometry) throw new NotFound('boundary set');
		const input = { geometry, borders: asRead, km };
		const { gaps, withinKm } = await shop.pool.run('measureGaps', input, { signal: asker });
		if (withinKm <= set.gaps_km) throw new Unfit('too-much-work', tooMuch(km, set.gaps_km));
		await shop.db.transaction().execute(async (trx) => {
			if (!(await replaceGaps(trx, set.id, withinKm, gaps))) return;
			const subject = { kind: 'sheet', id: sheet.id };
			const detail = { sheet: number, km: withinKm, pairs: gaps.a.length };
			await record(trx, member, 'gaps.measured', subject, detail);
		});
	}
	const view = await boundaryView(shop.db, set.id);
	const withinKm = view.set.gaps_km;
	return { withinKm, pairs: acrossIn(view.borders.kind), cut: withinKm < km };
}

const acrossIn = (kinds: Uint8Array): number =>
	kinds.reduce((sum, code) => sum + Number(isAcross(code)), 0);

const tooMuch = (km: number, known: number) =>
	`Measuring up to ${km} km is too much work for these boundaries${
		known ? `; they stay measured up to ${known} km` : ''
	}. Ask for a shorter distance.`;
