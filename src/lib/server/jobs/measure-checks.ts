import { checkJoin, checkTaken, type Regions } from '../../engines/measures/index.ts';
import type { Joined, TakenColumn } from './measure-outcome.ts';

/** What the engine's checkers find wrong with a join and the columns taken from it, in words. */
export const faultsInTaking = (
	{ table, typed, join }: Joined,
	regions: Regions,
	columns: TakenColumn[],
): string[] => [
	...checkJoin(table, join, regions),
	...columns.flatMap(({ taken, outcome: { choice } }) =>
		taken ? checkTaken(join, typed[choice.column], choice, taken) : [],
	),
	...columns.flatMap(({ texts, stored, outcome }) =>
		fits(texts ?? stored, regions, outcome.refusals)
			? []
			: [`${outcome.choice.name} has not one entry a region.`],
	),
];

const fits = (entries: ArrayLike<unknown> | null, regions: Regions, refusals: string[]): boolean =>
	entries === null ? refusals.length > 0 : entries.length === regions.keys.length;
