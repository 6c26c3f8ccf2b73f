import { joinedGraph, todayOf } from '../../engines/territories/problem-of-draft.ts';
import { tornParts } from '../../engines/territories/torn-parts.ts';
import type { TerritoryDraft, Wishes } from '../../engines/territories/territory-draft.ts';
import type { NewRow } from '../database/schema.ts';
import type { TerritoryState } from './territory-state.ts';

export type NewMove = Omit<NewRow<'handover_moves'>, 'handover_id'>;

export interface Plan {
	territory_keys: string[];
	assignment: number[];
	wishes: Wishes;
}

/**
 * Every region that a plan gives to another territory than it had, in region order, with the figures it
 * takes along and why it moves.
 * @param before the territories that the plan started from
 */
export function movesOf(before: TerritoryState, plan: Plan): NewMove[] {
	const { view, document, ground } = before;
	const names = new Map(document.territories.map(({ key, name }) => [key, name]));
	const nameOf = (key: string) => names.get(key) ?? key;
	const reasonFor = reasons(before, plan.wishes);
	const moves = view.keys.flatMap((key, unit): Omit<NewMove, 'ordinal'>[] => {
		const from = Object.hasOwn(document.assignment, key) ? document.assignment[key] : null;
		const to = plan.territory_keys[plan.assignment[unit]];
		if (from === to) return [];
		const figures = ground.measures.flatMap(({ name, values }) =>
			values[unit] === null ? [] : [[name, values[unit]]],
		);
		return [
			{
				region_key: key,
				region_name: view.names[unit],
				...{ from_key: from, from_name: from === null ? null : nameOf(from) },
				...{ to_key: to, to_name: nameOf(to) },
				figures: JSON.stringify(Object.fromEntries(figures)),
				reason: reasonFor(unit),
				state: 'proposed' as const,
			},
		];
	});
	return moves.map((move, ordinal) => ({ ...move, ordinal: ordinal + 1 }));
}

/** Why a region moves: because it must, else for the measures that were to be evened out. */
function reasons(before: TerritoryState, wishes: Wishes): (unit: number) => string {
	const { document, ground } = before;
	const today = todayOf(ground.keys, document);
	const torn = tornOff(before, today);
	const measures = ground.measures.filter(({ id }) => Object.hasOwn(wishes.tolerances, id));
	const evened = measures.length > 0 ? measures.map(({ name }) => name).join(' and ') : 'the work';
	return (unit) => {
		if (today[unit] < 0) return 'no territory yet';
		if (document.territories[today[unit]].closing) return 'the territory closes';
		return torn.has(unit) ? 'cut off from its territory today' : `evens out ${evened}`;
	};
}

function tornOff({ ground, document }: TerritoryState, today: Int32Array): Set<number> {
	const unitOf = new Map(ground.keys.map((key, unit) => [key, unit]));
	const territories = document.territories.map(({ base, capacity, frozen, closing }) => ({
		base: base === null ? -1 : (unitOf.get(base) ?? -1),
		...{ capacity, frozen, closing },
	}));
	const torn = tornParts(joinedGraph(ground, document), today, territories);
	return new Set(torn.flatMap(({ parts }) => parts.slice(1).flat()));
}

/** Moves that no longer lead to where the territories stand now, by their ordinals. */
export const contradicted = (
	moves: readonly { ordinal: number; region_key: string; to_key: string }[],
	{ assignment }: Pick<TerritoryDraft, 'assignment'>,
): number[] =>
	moves
		.filter(
			({ region_key: key, to_key: to }) =>
				!Object.hasOwn(assignment, key) || assignment[key] !== to,
		)
		.map(({ ordinal }) => ordinal);
