import type { CarriedRow } from '../../schemas/recut.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { replaceGaps } from '../repositories/gaps.repository.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { NotFound } from './outcomes.ts';

/**
 * The new boundaries of a sheet with the gaps across water measured as far as on those before, so that a
 * rule about them still counts; where that is too much work, a line that says so.
 */
export async function withGapsAs(
	shop: Pick<Workshop, 'db' | 'pool'>,
	before: BoundaryView,
	toSet: string,
): Promise<{ view: BoundaryView; short: CarriedRow[] }> {
	const km = before.set.gaps_km;
	const { set, asRead } = await boundaryView(shop.db, toSet);
	if (set.gaps_km < km) {
		const geometry = await readGeometry(shop.db, toSet);
		if (!geometry) throw new NotFound('boundary set');
		const { gaps, withinKm } = await shop.pool.run('measureGaps', {
			geometry,
			borders: asRead,
			km,
		});
		await shop.db.transaction().execute((trx) => replaceGaps(trx, toSet, withinKm, gaps));
	}
	const view = await boundaryView(shop.db, toSet);
	return { view, short: view.set.gaps_km < km ? [shortOf(view.set.gaps_km, km)] : [] };
}

const shortOf = (known: number, km: number): CarriedRow => ({
	...{ stage: 'draft', what: 'gaps', keys: [], now: [], outcome: 'changed' },
	words: `Gaps across water were known up to ${km} km; on the new boundaries they are up to ${known} km.`,
});
