import { freezeTerritories, type FrozenTerritories } from '../../engines/editions/index.ts';
import type { Db } from '../database/connection.ts';
import { currentTerritoryDraft } from '../repositories/territories.repository.ts';
import type { BoundaryView } from './boundary-view.ts';
import { territoriesIn } from './territory-state.ts';

/**
 * The territories that files of a sheet tell: those of its present revision, which a proposal becomes only
 * by being adopted. Null where no region has one.
 */
export async function territoriesOnSheet(
	db: Db,
	sheetId: string,
	{ keys }: Pick<BoundaryView, 'keys'>,
): Promise<FrozenTerritories | null> {
	const row = await currentTerritoryDraft(db, sheetId);
	return row ? freezeTerritories(keys, territoriesIn(row)) : null;
}
