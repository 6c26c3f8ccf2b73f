import { exactLimits } from './exact-size.ts';
import { solveExact } from './exact.ts';
import type { Prepared } from './prepare.ts';
import { prepare } from './prepared.ts';
import type { Relief, Watch } from './problem.ts';
import { relieve } from './relieve.ts';

const MOST_TRIED = 8;

/**
 * Changes that make a small problem possible, each alone, the smallest of its kind: the tolerance of each
 * measure by the plan whose largest deviation is least; each lock and each frozen territory dropped. Only
 * what was shown to help by a plan is told.
 */
export async function smallReliefs(
	prepared: Prepared,
	best: Int32Array | null,
	watch: Watch,
): Promise<Relief[]> {
	const reliefs: Relief[] = [];
	for (let m = 0; m < prepared.bound.length && !watch.cancelled?.(); m++) {
		const relief = await leastTolerance(prepared, m, watch);
		if (relief) reliefs.push(relief);
	}
	if (reliefs.length === 0) reliefs.push(...reliefByBest(prepared, best));
	const { locks, territories, today } = prepared.problem;
	const pinned = Array.from(today.keys()).filter((unit) => locks && locks[unit] >= 0);
	const drops: Relief[] = [
		...pinned.slice(0, MOST_TRIED).map((unit): Relief => ({ kind: 'unlock', unit })),
		...territories.flatMap(({ frozen }, territory): Relief[] =>
			frozen ? [{ kind: 'unfreeze', territory }] : [],
		),
	];
	for (const relief of drops.slice(0, MOST_TRIED)) {
		if (watch.cancelled?.()) break;
		if (await helps(prepared, relief, watch)) reliefs.push(relief);
	}
	return reliefs;
}

async function helps(prepared: Prepared, relief: Relief, watch: Watch): Promise<boolean> {
	const eased = relieve(prepared.problem, relief);
	const again = eased && prepare(eased);
	if (!again || 'status' in again) return false;
	const outcome = await solveExact(again, { least: 'moves' }, exactLimits(again, watch, 0.1));
	if (outcome.status === 'optimal') return true;
	return outcome.status === 'limit' && outcome.assignment !== null;
}

async function leastTolerance(prepared: Prepared, m: number, watch: Watch): Promise<Relief | null> {
	const limits = exactLimits(prepared, watch, 0.3);
	const outcome = await solveExact(freed(prepared, m), { least: { deviationOf: m } }, limits);
	if (outcome.status === 'infeasible' || !outcome.assignment) return null;
	const value = roundedUp(largestDeviation(prepared, outcome.assignment, m));
	return { kind: 'tolerance', measure: prepared.bound[m], value };
}

/** The same problem without limits for bound measure `m`. */
function freed(prepared: Prepared, m: number): Prepared {
	const { territories } = prepared;
	return {
		...prepared,
		least: prepared.least.slice().fill(-Infinity, m * territories, (m + 1) * territories),
		greatest: prepared.greatest.slice().fill(Infinity, m * territories, (m + 1) * territories),
	};
}

/** What the plan that came nearest shows to be enough: the tolerance of the only measure it misses. */
export function reliefByBest(prepared: Prepared, best: Int32Array | null): Relief[] {
	if (!best) return [];
	const missed = prepared.bound.flatMap((measure, m) => {
		const deviation = largestDeviation(prepared, best, m);
		const tolerance = prepared.problem.measures[measure].tolerance ?? Infinity;
		return deviation > tolerance + 1e-9 ? [{ measure, value: roundedUp(deviation) }] : [];
	});
	return missed.length === 1 ? [{ kind: 'tolerance', ...missed[0] }] : [];
}

/** In tenths of a per cent, upwards, so that it does help. */
const roundedUp = (share: number) => Math.ceil(share * 1000 - 1e-7) / 1000;

function largestDeviation(prepared: Prepared, assignment: Int32Array, m: number): number {
	const { territories, units, loads, targets, stays } = prepared;
	const sums = new Float64Array(territories);
	for (let unit = 0; unit < units; unit++) sums[assignment[unit]] += loads[m * units + unit];
	let most = 0;
	for (let t = 0; t < territories; t++) {
		const target = targets[m * territories + t];
		if (stays[t]) most = Math.max(most, Math.abs(sums[t] - target) / target);
	}
	return most;
}
