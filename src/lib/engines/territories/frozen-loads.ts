import type { Prepared } from './prepare.ts';
import type { Impossible, Relief } from './problem.ts';
import { amount, percentUp } from './words.ts';

/**
 * A frozen territory whose units of today are outside a tolerance, or null. A tolerance is a relief where
 * it alone would do: not when two measures are outside.
 */
export function frozenOutside(prepared: Prepared): Impossible | null {
	const { problem, bound, least, greatest, territories, loads, units: count } = prepared;
	for (let t = 0; t < territories; t++) {
		if (!problem.territories[t].frozen) continue;
		const units = unitsToday(problem.today, t);
		const outside = bound.flatMap((_, row) => {
			const load = units.reduce((sum, u) => sum + loads[row * count + u], 0);
			const at = row * territories + t;
			return load >= least[at] && load <= greatest[at] ? [] : [{ row, load }];
		});
		if (outside.length > 0) return told(prepared, t, units, outside);
	}
	return null;
}

function told(
	{ problem, bound, targets, territories }: Prepared,
	t: number,
	units: number[],
	outside: { row: number; load: number }[],
): Impossible {
	const relief: Relief[] = [{ kind: 'unfreeze', territory: t }];
	const parts = outside.map(({ row, load }) => {
		const target = targets[row * territories + t];
		const value = Math.abs(load - target) / target;
		if (outside.length === 1) relief.push({ kind: 'tolerance', measure: bound[row], value });
		const { name } = problem.measures[bound[row]];
		const side = load > target ? 'above' : 'below';
		return `${amount(load)} of ${name}, ${percentUp(value)} ${side} its target of ${amount(target)}`;
	});
	const would = outside.length === 1 ? '; a tolerance of that size would do' : '';
	return {
		status: 'impossible',
		reason: 'frozen-outside-tolerance',
		message: `@${t} is frozen with ${parts.join(' and ')}${would}.`,
		witness: { units, territories: [t] },
		relief,
	};
}

function unitsToday(today: Int32Array, territory: number): number[] {
	const units: number[] = [];
	today.forEach((t, u) => {
		if (t === territory) units.push(u);
	});
	return units;
}
