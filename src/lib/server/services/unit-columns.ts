import type { DeskTerritories } from '../../schemas/desk-territories.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { NotFound } from './outcomes.ts';

type UnitColumns = DeskTerritories['geometry'];

/** Sets whose columns are kept at hand; about 400 bytes a region. */
const mostKept = 20;
const kept = new Map<string, Promise<UnitColumns>>();

/** What figures need of the regions of a set; computed in a thread once, because a set never changes. */
export function unitColumns(
	shop: Pick<Workshop, 'db' | 'pool'>,
	boundarySetId: string,
): Promise<UnitColumns> {
	const known = kept.get(boundarySetId) ?? compute(shop, boundarySetId);
	kept.delete(boundarySetId);
	kept.set(boundarySetId, known);
	for (const id of kept.keys()) {
		if (kept.size <= mostKept) break;
		kept.delete(id);
	}
	known.catch(() => kept.delete(boundarySetId));
	return known;
}

async function compute(
	{ db, pool }: Pick<Workshop, 'db' | 'pool'>,
	boundarySetId: string,
): Promise<UnitColumns> {
	const geometry = await readGeometry(db, boundarySetId);
	if (!geometry) throw new NotFound('boundary set');
	return pool.run('unitColumns', { geometry });
}
