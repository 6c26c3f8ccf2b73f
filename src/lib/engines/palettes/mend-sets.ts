import { ciede2000 } from '../colour/ciede2000.ts';
import { labOf } from '../colour/lab.ts';
import { wideSets } from './limits.ts';
import { labelShortfall, shortfall, type MendTask } from './mend-cost.ts';
import { covers } from './mend-covers.ts';
import { anneal, isBetter, type Attempt } from './mend-search.ts';

/** Sets of one size that are tried; steps for a first look at each and for the promising ones. */
const setsOfSize = 80;
const lookSteps = 300;
const closeSteps = 3_000;
const lastSteps = 8_000;
/** Up to so many pairs a step is cheap; with more of them fewer steps are made. */
const cheapPairs = 28;
/** Sets times pairs looked at before the search goes on to moving every free ink at once. */
const mostSpent = 15_000;

/**
 * Tries the sets of inks that could mend a palette, the smallest first, and takes the least move of the
 * first size that does it; null when the effort is spent without a mend.
 */
export function smallestMend(
	task: MendTask,
	locked: readonly number[],
	random: () => number,
): Attempt | null {
	const { pairs } = task;
	const free = task.inks.map((_, ink) => ink).filter((ink) => !locked.includes(ink));
	const failing = failingPairs(task);
	const needed = free.filter((ink) => labelShortfall(task.label, task.inks[ink]) > 0);
	const pace = Math.min(1, cheapPairs / pairs.length);
	let spent = 0;
	for (let size = Math.max(1, needed.length); size <= free.length; size++) {
		if (spent > mostSpent) size = free.length;
		const sets = covers(free, size, failing, needed, setsOfSize);
		const found =
			sets.length === 0 ? null : bestOfSize(task, sets, pace, size === free.length, random);
		if (found) return found;
		spent += Math.max(1, sets.length) * pairs.length;
	}
	return null;
}

/** The touching pairs that miss what is asked as they stand. */
const failingPairs = ({ pairs, start }: MendTask): [number, number][] =>
	pairs.filter((ask) => shortfall(ask, start[ask.a], start[ask.b]) > 0).map(({ a, b }) => [a, b]);

/** A short look at every set, then a close one at the three most promising. */
function bestOfSize(
	task: MendTask,
	sets: readonly number[][],
	pace: number,
	last: boolean,
	random: () => number,
): Attempt | null {
	const looks = sets
		.map((set) => ({ set, look: look(task, set, Math.ceil(lookSteps * pace), random) }))
		.sort((one, two) => (isBetter(one.look, two.look) ? -1 : 1))
		.slice(0, 3);
	const steps = Math.ceil((last ? lastSteps : closeSteps) * pace);
	const close = looks.flatMap(({ set, look: first }) => [
		first,
		anneal(task, set, first.inks, steps, random),
		look(task, set, steps, random),
	]);
	const best = close.reduce((one, two) => (isBetter(two, one) ? two : one));
	return best.missing === 0 ? best : null;
}

/** Half the steps from where the inks stand, half from a wide set laid on the movable inks. */
function look(
	task: MendTask,
	set: readonly number[],
	steps: number,
	random: () => number,
): Attempt {
	const here = anneal(task, set, task.inks, steps / 2, random);
	const there = anneal(task, set, laidOn(task, set, random), steps / 2, random);
	return isBetter(there, here) ? there : here;
}

/** A wide set of at least as many inks, its colours given to the movable inks nearest first. */
function laidOn(task: MendTask, set: readonly number[], random: () => number): string[] {
	const count = Math.min(task.inks.length, 8);
	const fitting = wideSets.filter((wide) => wide.length >= count);
	const wide = [...fitting[Math.floor(random() * fitting.length)]];
	const inks = [...task.inks];
	for (const ink of set) {
		const here = labOf(inks[ink]);
		wide.sort((one, two) => ciede2000(here, labOf(one)) - ciede2000(here, labOf(two)));
		inks[ink] = wide.shift() ?? inks[ink];
	}
	return inks;
}
