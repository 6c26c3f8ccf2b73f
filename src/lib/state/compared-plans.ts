import {
	figures,
	type Measure,
	type TerritoryProblem,
	type UnitGeometry,
} from '$lib/engines/territories';
import { problemOfDraft, type TerritoryGround } from '$lib/engines/territories/problem-of-draft';
import type { TerritoryDraft, Wishes } from '$lib/engines/territories/territory-draft';
import type { DeskProposal } from '$lib/schemas/desk-territories';
import type { ComparedPlan } from './plan-comparison';

export interface Comparison {
	measures: { id: string; name: string; unit: string }[];
	plans: ComparedPlan[];
}

type DeskMeasure = TerritoryGround['measures'][number] & { unit: string };

/**
 * Today and some proposals in the same figures: the measures that any of them has a tolerance for, each
 * plan judged by its own. A missing figure counts as nothing, as it does in the tables.
 */
export function comparePlans(
	ground: Omit<TerritoryGround, 'measures'> & { measures: readonly DeskMeasure[] },
	draft: TerritoryDraft,
	geometry: UnitGeometry | null,
	proposals: readonly DeskProposal[],
): Comparison {
	const asked = proposals.map(({ wishes }) => wishes);
	const wished = new Set(
		[draft.wishes, ...asked].flatMap(({ tolerances }) => Object.keys(tolerances)),
	);
	const named = ground.measures.filter(({ id }) => wished.has(id));
	const measures = named.length ? named : ground.measures.slice(0, 1);
	const problemFor = (wishes: Wishes): TerritoryProblem => ({
		...problemOfDraft({ ...ground, measures: [] }, draft, { ...wishes, cost: 'units' }),
		measures: measures.map((column) => measureOf(column, wishes)),
	});
	const today = problemFor(draft.wishes);
	const place = new Map(draft.territories.map(({ key }, number) => [key, number]));
	return {
		measures: measures.map(({ id, name, unit }) => ({ id, name, unit })),
		plans: [
			{ number: 0, name: 'Today', figures: figures(today, today.today, geometry), bound: null },
			...proposals.flatMap(({ number, name, wishes, assignment, territoryKeys, outcome }) => {
				if (!assignment) return [];
				const plan = Int32Array.from(assignment, (t) => place.get(territoryKeys[t]) ?? -1);
				const { cost = 0, lowerBound = 0, proved = false } = outcome ?? {};
				return [
					{
						...{ number, name, bound: { cost, lowerBound, proved } },
						figures: figures(problemFor(wishes), plan, geometry),
					},
				];
			}),
		],
	};
}

const measureOf = ({ id, name, values }: DeskMeasure, { tolerances }: Wishes): Measure => ({
	name,
	values: Float64Array.from(values, (value) => value ?? 0),
	tolerance: Object.hasOwn(tolerances, id) ? tolerances[id] : null,
});
