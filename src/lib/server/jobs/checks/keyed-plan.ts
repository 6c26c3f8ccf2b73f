import { putNames } from '../../../engines/territories/put-names.ts';
import type {
	Impossible,
	Plan,
	RebalanceResult,
	Relief,
} from '../../../engines/territories/index.ts';

/** Results with units, territories and measures by key, as programs read them. */
export interface PlanKeys {
	units: readonly string[];
	territories: readonly string[];
	/** in the problem's order */
	measures: readonly string[];
}

export function rebalanceByKey(keys: PlanKeys, result: RebalanceResult): object {
	if (result.status === 'impossible') return impossibleByKey(keys, result);
	const { status, lowerBound } = result;
	if (result.status === 'proposed') {
		return { status, ...planByKey(keys, result), lowerBound, proved: result.proved };
	}
	const best = result.best ? { best: planByKey(keys, result.best) } : {};
	return { status, ...best, lowerBound, message: messageByKey(keys, result.message) };
}

export function planByKey(keys: PlanKeys, plan: Plan) {
	const { cost, compulsoryCost, cutBorders } = plan;
	const name = (territory: number) => keys.territories[territory];
	return {
		assignment: Object.fromEntries(
			keys.units.map((key, unit) => [key, name(plan.assignment[unit])]),
		),
		moves: plan.moves.map(({ unit, from, to, compulsory }) => ({
			unit: keys.units[unit],
			from: from < 0 ? null : name(from),
			to: name(to),
			compulsory,
		})),
		...{ cost, compulsoryCost, cutBorders },
		deviations: deviationsByKey(keys, plan.deviations),
	};
}

/** Without the territories that close, which have none. */
export const deviationsByKey = (
	{ measures, territories }: PlanKeys,
	deviations: readonly ArrayLike<number | null>[],
): Record<string, Record<string, number>> =>
	Object.fromEntries(
		measures.map((measure, m) => [
			measure,
			Object.fromEntries(
				territories.flatMap((key, t) => {
					const deviation = deviations[m]?.[t];
					return typeof deviation === 'number' && Number.isFinite(deviation)
						? [[key, deviation]]
						: [];
				}),
			),
		]),
	);

const impossibleByKey = (keys: PlanKeys, found: Impossible) => ({
	status: found.status,
	reason: found.reason,
	message: messageByKey(keys, found.message),
	witness: {
		units: found.witness.units.map((unit) => keys.units[unit]),
		territories: found.witness.territories.map((territory) => keys.territories[territory]),
	},
	relief: found.relief.map((one) => reliefByKey(keys, one)),
});

export function reliefByKey(keys: PlanKeys, relief: Relief) {
	if (relief.kind === 'tolerance') {
		return { kind: relief.kind, measure: keys.measures[relief.measure], value: relief.value };
	}
	if (relief.kind === 'unfreeze') {
		return { kind: relief.kind, territory: keys.territories[relief.territory] };
	}
	return { kind: relief.kind, unit: keys.units[relief.unit] };
}

const messageByKey = ({ units, territories }: PlanKeys, message: string) =>
	putNames(
		message,
		(unit) => `"${units[unit]}"`,
		(territory) => `"${territories[territory]}"`,
	);
