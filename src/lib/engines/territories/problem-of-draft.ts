import { borderKinds, type BorderList } from '../borders/border-list.ts';
import { buildGraph } from '../graph/build-graph.ts';
import type { RegionGraph } from '../graph/region-graph.ts';
import type { Measure, TerritoryProblem } from './problem.ts';
import type { TerritoryDraft, Wishes } from './territory-draft.ts';

/** What a draft of territories stands on: regions by number, their borders, and the figures joined to them. */
export interface TerritoryGround {
	keys: readonly string[];
	borders: BorderList;
	measures: readonly MeasureColumn[];
}

export interface MeasureColumn {
	id: string;
	name: string;
	/** one a region; null where it is missing */
	values: readonly (number | null)[];
}

/**
 * The question that a draft and wishes put to the engine, asked by server and browser alike. Units are the
 * regions in their order, territories those of the draft's list, measures those of `boundMeasures`.
 *
 * The draft must be one in which `draftFaults` finds nothing, and the wishes one in which `wishFaults`
 * finds nothing; names that are not there are passed over. A missing figure becomes NaN, which the engine
 * answers with `missing-value`.
 */
export function problemOfDraft(
	ground: TerritoryGround,
	draft: TerritoryDraft,
	wishes: Wishes = draft.wishes,
): TerritoryProblem {
	const unit = numbersOf(ground.keys);
	const territory = numbersOf(draft.territories.map(({ key }) => key));
	const pairs = (list: readonly (readonly [string, string])[]) =>
		list.map(([a, b]) => [unit(a), unit(b)] as const).filter(([a, b]) => a >= 0 && b >= 0);
	const locks = new Int32Array(ground.keys.length).fill(-1);
	for (const [key, lock] of Object.entries(draft.locks)) {
		if (unit(key) >= 0) locks[unit(key)] = territory(lock.territory);
	}
	return {
		graph: joinedGraph(ground, draft),
		measures: boundMeasures(ground, wishes).map((column) => measureOf(column, wishes)),
		today: todayOf(ground.keys, draft),
		territories: draft.territories.map(({ base, capacity, frozen, closing }) => ({
			base: base === null ? -1 : unit(base),
			...{ capacity, frozen, closing },
		})),
		locks,
		together: pairs(draft.together),
		apart: pairs(draft.apart),
		...(wishes.cost === 'units' ? {} : { cost: costOf(ground, wishes.cost) }),
		goal: wishes.goal,
		compactness: wishes.compactness,
		reach: wishes.reach,
		seed: wishes.seed,
		effort: wishes.effort,
	};
}

/** The measures that have a tolerance, in the order of the ground; the problem's measures are these. */
export const boundMeasures = (
	{ measures }: Pick<TerritoryGround, 'measures'>,
	{ tolerances }: Wishes,
): MeasureColumn[] => measures.filter(({ id }) => Object.hasOwn(tolerances, id));

/** Which regions count as joined: line borders, the water links that were chosen, links made by hand. */
export function joinedGraph(
	{ keys, borders }: Pick<TerritoryGround, 'keys' | 'borders'>,
	{ waterLinks, handLinks }: Pick<TerritoryDraft, 'waterLinks' | 'handLinks'>,
): RegionGraph {
	const unit = numbersOf(keys);
	const line = borderKinds.indexOf('line');
	const isLine = (_: number, i: number) => borders.kind[i] === line;
	const links = [...waterLinks, ...handLinks.map(({ a, b }) => [a, b])]
		.map(([a, b]) => [unit(a), unit(b)])
		.filter(([a, b]) => a >= 0 && b >= 0 && a !== b);
	return buildGraph(
		keys.length,
		[...borders.a.filter(isLine), ...links.map(([a]) => a)],
		[...borders.b.filter(isLine), ...links.map(([, b]) => b)],
	);
}

/** Territory of every region by its place in the draft's list, -1 where it has none. */
export function todayOf(
	keys: readonly string[],
	{ territories, assignment }: Pick<TerritoryDraft, 'territories' | 'assignment'>,
): Int32Array {
	const territory = numbersOf(territories.map(({ key }) => key));
	return Int32Array.from(keys, (key) =>
		Object.hasOwn(assignment, key) ? territory(assignment[key]) : -1,
	);
}

/** Place of every key in a list, -1 for one that is not there. */
export function numbersOf(keys: readonly string[]): (key: string) => number {
	const numbers = new Map(keys.map((key, number) => [key, number]));
	return (key) => numbers.get(key) ?? -1;
}

const measureOf = ({ id, name, values }: MeasureColumn, { tolerances }: Wishes): Measure => ({
	name,
	values: Float64Array.from(values, (value) => value ?? NaN),
	tolerance: tolerances[id],
});

function costOf({ measures, keys }: TerritoryGround, id: string): Float64Array {
	const values = measures.find((column) => column.id === id)?.values;
	return Float64Array.from(keys, (_, unit) => values?.[unit] ?? 0);
}
