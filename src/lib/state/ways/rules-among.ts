import type { Rule } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';

/**
 * The rules of a draft that speak of some regions only, as rules of the engine: those a collision of locks
 * on these regions may rest on. A group is one rule, named by its first two regions among them.
 */
export function rulesAmong(
	regions: readonly number[],
	draft: Draft,
	keys: readonly string[],
): Rule[] {
	const number = new Map(regions.map((region) => [keys[region], region]));
	const pair = (kind: 'border' | 'alike' | 'apart', one: string, other: string): Rule[] => {
		const [a, b] = [number.get(one), number.get(other)];
		return a === undefined || b === undefined || a === b ? [] : [{ kind, a, b }];
	};
	return [
		...draft.forbidden.flatMap(({ key, ink }): Rule[] => {
			const region = number.get(key);
			return region === undefined ? [] : [{ kind: 'forbidden', region, ink }];
		}),
		...draft.alike.flatMap(([a, b]) => pair('alike', a, b)),
		...draft.apart.flatMap(([a, b]) => pair('apart', a, b)),
		...draft.groups.flatMap(({ kind, keys: members }) => {
			const [a, b] = members.filter((key) => number.has(key));
			return a && b ? pair(kind === 'alike' ? 'alike' : 'apart', a, b) : [];
		}),
		...draft.reserved.map((ink): Rule => ({ kind: 'reserved', region: regions[0] ?? 0, ink })),
		...draft.added.flatMap(({ a, b }) => pair('border', a, b)),
	];
}
