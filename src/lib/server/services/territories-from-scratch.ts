import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { Unfit } from './outcomes.ts';
import { newEntry } from './territories-from-column.ts';
import { freshName } from './territory-names.ts';
import type { TerritoryState } from './territory-state.ts';

export interface ScratchWish {
	territories: number;
	/** id of the measure to even out; null counts regions */
	measure: string | null;
	seed: number;
}

/**
 * A draft with so many territories in one piece each and about even, each called after its heaviest
 * region. Territories that were there, and locks to them, go; links and wishes stay.
 */
export async function scratchDraft(
	shop: Pick<Workshop, 'pool'>,
	{ view, ground, document }: TerritoryState,
	{ territories, measure, seed }: ScratchWish,
): Promise<TerritoryDraft> {
	const column = ground.measures.find(({ id }) => id === measure);
	if (measure !== null && !column) throw new Unfit('unknown-measure', 'Choose a measure again.');
	const found = await shop.pool.run('scratchPlan', {
		...{ ground, draft: document, territories, seed },
		values: column?.values ?? null,
	});
	if (found.status === 'refused') throw new Unfit(found.code, found.message);
	const { assignment, heaviest } = found;
	const [keys, names] = [new Set(document.territories.map(({ key }) => key)), new Set<string>()];
	const entries = heaviest.map((region) => newEntry(freshName(view.names[region], names), keys));
	return {
		...document,
		territories: entries,
		assignment: Object.fromEntries(
			view.keys.map((key, region) => [key, entries[assignment[region]].key]),
		),
		locks: {},
	};
}
