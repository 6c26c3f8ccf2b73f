import type { GoalKind, GoalWish } from '$lib/engines/colouring/goal-wish';
import type { Draft } from '$lib/engines/editions/draft';

/** What people do to the aims of a draft, each a new draft; the old one is never touched. */

type Edit = (draft: Draft) => Draft;

export const addGoal =
	(kind: GoalKind): Edit =>
	(draft) =>
		draft.goals.some((goal) => goal.kind === kind)
			? draft
			: { ...draft, goals: [...draft.goals, { kind, give: 0 }] };

export const removeGoal =
	(kind: GoalKind): Edit =>
	(draft) => ({ ...draft, goals: draft.goals.filter((goal) => goal.kind !== kind) });

/** One place up (-1) or down (1) in the order. */
export const moveGoal =
	(kind: GoalKind, by: -1 | 1): Edit =>
	(draft) => {
		const from = draft.goals.findIndex((goal) => goal.kind === kind);
		const to = from + by;
		if (from < 0 || to < 0 || to >= draft.goals.length) return draft;
		const goals = [...draft.goals];
		[goals[from], goals[to]] = [goals[to], goals[from]];
		return { ...draft, goals };
	};

/** What is `undefined` in the change is taken out. */
export const changeGoal =
	(kind: GoalKind, change: Partial<Omit<GoalWish, 'kind'>>): Edit =>
	(draft) => ({
		...draft,
		goals: draft.goals.map((goal) => {
			if (goal.kind !== kind) return goal;
			const entries = Object.entries({ ...goal, ...change });
			return Object.fromEntries(
				entries.filter(([, value]) => value !== undefined),
			) as unknown as GoalWish;
		}),
	});
