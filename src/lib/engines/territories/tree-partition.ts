import { components } from '../graph/components.ts';
import { Dice } from './dice.ts';
import type { Prepared } from './prepare.ts';
import { treeSplit } from './tree-split.ts';

/**
 * Territories from nothing: the units are split in two along random spanning trees, and each part again,
 * until every territory has its part, with loads near the capacities. Parts of the map that are not
 * joined get territories by their load.
 *
 * @returns territory of every unit; null when there are more separate parts than territories or a part
 * could not be split
 */
export function treePartition(prepared: Prepared, seed: number): Int32Array | null {
	const { graph, units, problem } = prepared;
	const load = combinedLoad(prepared);
	const dice = new Dice(seed);
	const { count, of } = components(graph);
	const parts: number[][] = Array.from({ length: count }, () => []);
	for (let unit = 0; unit < units; unit++) parts[of[unit]].push(unit);
	const staying = [...problem.territories.keys()].filter((t) => prepared.stays[t]);
	const shares = sharedOut(parts, load, staying, prepared);
	if (!shares) return null;
	const assignment = new Int32Array(units).fill(-1);
	const divide = (part: number[], territories: number[]): boolean => {
		if (territories.length === 1) {
			for (const unit of part) assignment[unit] = territories[0];
			return true;
		}
		const half = territories.length >> 1;
		const [first, second] = [territories.slice(0, half), territories.slice(half)];
		const whole = capacityOf(prepared, territories);
		const share = capacityOf(prepared, first) / whole;
		const split = treeSplit(graph, part, load, share, [first.length, second.length], dice);
		return split !== null && divide(split[0], first) && divide(split[1], second);
	};
	return parts.every((part, i) => divide(part, shares[i])) ? assignment : null;
}

/** The sum of all bound measures, each with a total of 1; units where none is bound. */
function combinedLoad({ bound, units, loads }: Prepared): Float64Array {
	const load = new Float64Array(units);
	for (let m = 0; m < bound.length; m++) {
		const own = loads.subarray(m * units, (m + 1) * units);
		const total = own.reduce((sum, value) => sum + value, 0);
		if (total > 0) for (let unit = 0; unit < units; unit++) load[unit] += own[unit] / total;
	}
	return bound.length > 0 ? load : load.fill(1);
}

const capacityOf = ({ problem }: Prepared, territories: readonly number[]) =>
	territories.reduce((sum, t) => sum + problem.territories[t].capacity, 0);

/** Territories for each separate part: at least one, then one at a time to the part most in need. */
function sharedOut(
	parts: number[][],
	load: Float64Array,
	territories: number[],
	prepared: Prepared,
): number[][] | null {
	if (parts.length > territories.length) return null;
	const loads = parts.map((part) => part.reduce((sum, unit) => sum + load[unit], 0));
	const shares: number[][] = parts.map(() => []);
	const need = (i: number) => {
		const { length } = shares[i];
		if (length === 0) return Infinity;
		if (length >= parts[i].length) return -1;
		return loads[i] / (capacityOf(prepared, shares[i]) + 1e-9);
	};
	for (const t of territories) {
		let neediest = 0;
		for (let i = 1; i < parts.length; i++) if (need(i) > need(neediest)) neediest = i;
		if (need(neediest) < 0) return null;
		shares[neediest].push(t);
	}
	return shares;
}
