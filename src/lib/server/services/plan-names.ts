import { boundMeasures } from '../../engines/territories/problem-of-draft.ts';
import type { TerritoryDraft, Wishes } from '../../engines/territories/territory-draft.ts';
import type { PlanNames } from './proposal-result.ts';
import type { TerritoryState } from './territory-state.ts';

/** The names that sentences about a plan put in place of numbers. */
export const planNames = (
	{ view, ground }: Pick<TerritoryState, 'view' | 'ground'>,
	{ territories }: Pick<TerritoryDraft, 'territories'>,
	wishes: Wishes,
): PlanNames => ({
	regions: view.names,
	territories: territories.map(({ name }) => name),
	measures: boundMeasures(ground, wishes),
	cost: ground.measures.find(({ id }) => id === wishes.cost)?.name ?? null,
});

/** A plan as a draft keeps it: region key to territory key. */
export const assignmentByKey = (
	keys: readonly string[],
	territoryKeys: readonly string[],
	assignment: ArrayLike<number>,
): Record<string, string> =>
	Object.fromEntries(
		keys.flatMap((key, region) => {
			const territory = territoryKeys[assignment[region]];
			return territory === undefined ? [] : [[key, territory]];
		}),
	);
