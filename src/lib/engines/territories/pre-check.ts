import { contradiction } from './contradictions.ts';
import { cutOff } from './cut-off.ts';
import { frozenOutside } from './frozen-loads.ts';
import { tooHeavy } from './heavy.ts';
import { islandLoad } from './islands.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible } from './problem.ts';
import { noRoom } from './room.ts';
import { unreached } from './unreached.ts';

/**
 * What makes a problem impossible at first sight, with a witness and the reliefs that take just this
 * obstacle away, or null. Null does not mean that there is a plan; an answer is never a false alarm.
 * Linear time but for territories with several fixed units far apart.
 *
 * In this order: rules that contradict each other, no unit or territory left to take, a frozen
 * territory outside a tolerance, units too heavy, fixed units cut off, parts of the map that the
 * territories cannot share, units out of everyone's reach.
 */
export function preCheck(prepared: Prepared): Impossible | null {
	return (
		contradiction(prepared.problem) ??
		noRoom(prepared) ??
		frozenOutside(prepared) ??
		tooHeavy(prepared) ??
		cutOff(prepared) ??
		islandLoad(prepared) ??
		unreached(prepared)
	);
}
