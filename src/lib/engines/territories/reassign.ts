import { boundTerms } from './bound-terms.ts';
import { solveExact } from './exact.ts';
import { exactLimits } from './exact-size.ts';
import { mayEndIn, type Prepared } from './prepare.ts';
import type { Watch } from './problem.ts';

/**
 * The units of a few neighbouring territories dealt out anew among them, all others left alone: the
 * cheapest way that brings these territories within tolerance and in one piece. Meant for three or four
 * territories of up to about 60 units together; `assignment` is not changed.
 * @returns null when there is no cheaper way (or none at all, where they are out of tolerance), or a
 * budget ended the search with nothing found
 */
export async function reassign(
	prepared: Prepared,
	assignment: Int32Array,
	chosen: readonly number[],
	{ sound, watch = {} }: { sound: boolean; watch?: Watch },
): Promise<Int32Array | null> {
	const among = new Set(chosen);
	const costAtMost = sound ? costBelow(prepared, assignment) : undefined;
	const outcome = await solveExact(
		prepared,
		{ least: 'moves', costAtMost },
		exactLimits(prepared, watch, 0.1),
		{
			judged: (t) => among.has(t),
			may: (unit, t) =>
				among.has(assignment[unit])
					? among.has(t) && mayEndIn(prepared, unit, t)
					: t === assignment[unit],
		},
	);
	return outcome.status === 'infeasible' ? null : outcome.assignment;
}

/** The next lower cost a plan could have. */
function costBelow(prepared: Prepared, assignment: Int32Array): number {
	const { problem, cost } = prepared;
	let sum = 0;
	assignment.forEach((to, unit) => {
		if (problem.today[unit] !== to) sum += cost[unit];
	});
	const { step } = boundTerms(prepared);
	return sum - (step > 0 ? step : 1e-6 * Math.max(1, sum));
}
