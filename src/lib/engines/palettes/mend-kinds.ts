import { ciede2000 } from '../colour/ciede2000.ts';
import { labOf } from '../colour/lab.ts';
import { greySafeFrom } from './demand.ts';
import { appearanceOf } from './appearance.ts';
import type { MendTask } from './mend-cost.ts';
import { anneal, isBetter, type Attempt } from './mend-search.ts';
import { smallestMend } from './mend-sets.ts';
import type { Palette } from './palette.ts';

/** What a search has beside its task. */
export interface SearchMeans {
	random: () => number;
	known: readonly Palette[];
	/** what the search for the fewest moves has found, null where it found nothing */
	few: Attempt | null;
}

interface Mended {
	inks: string[];
	from?: string;
}

type MendSearch = (task: MendTask, locked: readonly number[], means: SearchMeans) => Mended | null;

const leastSteps = 8_000;
const pullSteps = 6_000;
/** Well-known sets that are pulled towards what is asked when none keeps it as it is. */
const mostPulled = 4;

/** Every free ink may move, and all of them together as little as can be found. */
export const leastMovement: MendSearch = (task, locked, { random, few }) => {
	const free = freeInks(task, locked);
	if (free.length === 0) return null;
	const tries = [anneal(task, free, task.inks, leastSteps, random)];
	if (few) tries.push(few, anneal(task, free, few.inks, leastSteps, random));
	return mendedOnly(bestOf(tries));
};

/** Gaps in L* of 8 are safe in grey print; more is tried first, as far as the inks that all touch allow. */
export const bestForGrey: MendSearch = (task, locked, { random, few }) => {
	if (!few) return null;
	const widest = Math.min(14, Math.floor(90 / Math.max(1, task.inks.length - 1)));
	for (const grey of [widest, (widest + greySafeFrom) / 2, greySafeFrom]) {
		if (grey < greySafeFrom) continue;
		const wider = withGrey(task, grey);
		const found = smallestMend(wider, locked, random);
		if (found) return { inks: found.inks };
	}
	return null;
};

function withGrey(task: MendTask, grey: number): MendTask {
	const wide = new Map(task.pairs.map((ask) => [ask, { ...ask, grey: Math.max(grey, ask.grey) }]));
	return {
		...task,
		pairs: [...wide.values()],
		asks: task.asks.map((row) => row.map((ask) => wide.get(ask) ?? ask)),
	};
}

/**
 * Lays each well-known set on the free inks, nearest colours to each other, and takes the one that keeps
 * what is asked with the least movement; else the nearest that keeps it once moved a little.
 */
export const fromKnownSet: MendSearch = (task, locked, { known, random }) => {
	const free = freeInks(task, locked);
	const laid = known
		.filter(({ inks }) => inks.length >= free.length && free.length > 0)
		.map(({ name, inks }) => {
			const hexes = assigned(
				task,
				free,
				inks.map(({ hex }) => hex),
			);
			return { name, attempt: attemptOf(task, hexes) };
		})
		.sort((one, two) => (isBetter(one.attempt, two.attempt) ? -1 : 1));
	if (laid.length === 0) return null;
	if (laid[0].attempt.missing === 0) return { inks: laid[0].attempt.inks, from: laid[0].name };
	for (const { name, attempt } of laid.slice(0, mostPulled)) {
		// as near to the set as can be, not to where the inks stood
		const fromSet = { ...task, start: attempt.inks.map(appearanceOf) };
		const pulled = anneal(fromSet, free, attempt.inks, pullSteps, random);
		if (pulled.missing === 0) return { inks: pulled.inks, from: name };
	}
	return null;
};

/** The closest pairs of ink and colour first, then exchanges while they bring the sum down. */
function assigned(task: MendTask, free: readonly number[], set: readonly string[]): string[] {
	const labs = set.map(labOf);
	const cost = free.map((ink) => labs.map((lab) => ciede2000(labOf(task.inks[ink]), lab)));
	const chosen = greedily(cost);
	for (let better = true; better;) {
		better = false;
		for (let i = 0; i < free.length; i++)
			for (let j = i + 1; j < free.length; j++) {
				const [c, d] = [chosen[i], chosen[j]];
				if (cost[i][d] + cost[j][c] >= cost[i][c] + cost[j][d] - 1e-9) continue;
				[chosen[i], chosen[j]] = [d, c];
				better = true;
			}
	}
	const hexes = [...task.inks];
	free.forEach((ink, i) => (hexes[ink] = set[chosen[i]]));
	return hexes;
}

function greedily(cost: readonly (readonly number[])[]): number[] {
	const entries = cost.flatMap((row, i) => row.map((value, c) => ({ i, c, value })));
	entries.sort((one, two) => one.value - two.value || one.i - two.i || one.c - two.c);
	const chosen: number[] = new Array<number>(cost.length).fill(-1);
	const taken = new Set<number>();
	for (const { i, c } of entries) {
		if (chosen[i] >= 0 || taken.has(c)) continue;
		chosen[i] = c;
		taken.add(c);
	}
	return chosen;
}

/** A state that nothing is searched from: no step, only its cost. */
const attemptOf = (task: MendTask, hexes: readonly string[]): Attempt =>
	anneal(task, [0], hexes, 0, () => 0);

const freeInks = (task: MendTask, locked: readonly number[]): number[] =>
	task.inks.map((_, ink) => ink).filter((ink) => !locked.includes(ink));

const bestOf = (tries: readonly Attempt[]): Attempt =>
	tries.reduce((one, two) => (isBetter(two, one) ? two : one));

const mendedOnly = ({ inks, missing }: Attempt): Mended | null => (missing === 0 ? { inks } : null);
