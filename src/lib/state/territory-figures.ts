import type { DeskMeasure } from '$lib/schemas/desk-territories';
import type { MarkKind } from '$lib/components/Mark.svelte';

/** A measure as figures are made of it: a missing value counts as 0 and is told elsewhere. */
export interface Figure {
	id: string;
	name: string;
	unit: string;
	values: Float64Array;
	/** largest deviation allowed, as a share; null: free */
	tolerance: number | null;
}

export const figureOf = (
	{ id, name, unit, values }: DeskMeasure,
	tolerance: number | undefined,
): Figure => ({
	id,
	name,
	unit,
	values: Float64Array.from(values, (value) => value ?? 0),
	tolerance: tolerance ?? null,
});

/** What a plan comes to in one measure, by territory. */
export interface Loads {
	load: Float64Array;
	/** capacity share of the total; 0 for a territory that closes */
	target: Float64Array;
	/** (load - target) / target; NaN where there is no target */
	deviation: Float64Array;
	/** region with the largest value in each territory, -1 where there is none */
	largest: Int32Array;
	/** target of a full share */
	fullTarget: number;
	total: number;
}

interface Sharing {
	capacity: number;
	closing: boolean;
}

/** Loads, targets and deviations of every territory. Linear in the regions. */
export function loadsOf(
	values: Float64Array,
	assignment: Int32Array,
	territories: readonly Sharing[],
): Loads {
	const load = new Float64Array(territories.length);
	const largest = new Int32Array(territories.length).fill(-1);
	let total = 0;
	for (let region = 0; region < values.length; region++) {
		const territory = assignment[region];
		const value = values[region];
		total += value;
		if (territory < 0) continue;
		load[territory] += value;
		if (largest[territory] < 0 || value > values[largest[territory]]) largest[territory] = region;
	}
	const shares = territories.map(({ capacity, closing }) => (closing ? 0 : capacity));
	const whole = shares.reduce((sum, share) => sum + share, 0);
	const fullTarget = whole > 0 ? total / whole : NaN;
	const target = Float64Array.from(shares, (share) => (share > 0 ? share * fullTarget : 0));
	const deviation = load.map((sum, t) => (target[t] > 0 ? (sum - target[t]) / target[t] : NaN));
	return { load, target, deviation, largest, fullTarget, total };
}

/** Regions in each territory, and without any. */
export function countRegions(assignment: Int32Array, territories: number) {
	const regions = new Int32Array(territories);
	let without = 0;
	for (const territory of assignment) {
		if (territory < 0) without++;
		else regions[territory]++;
	}
	return { regions, without };
}

/** Inclusive: a deviation of the tolerance itself is inside, whatever the last bit says. */
const slack = 1e-9;
/** from this share of the tolerance on a territory is called near the limit */
const nearly = 0.9;

export const isOutside = (deviation: number, tolerance: number | null): boolean =>
	tolerance !== null && Math.abs(deviation) > tolerance + slack;

/** Square: outside; half square: inside, with a tenth of the tolerance left at most; ring: inside. */
export function deviationMark(deviation: number, tolerance: number | null): MarkKind | null {
	if (tolerance === null || Number.isNaN(deviation)) return null;
	if (isOutside(deviation, tolerance)) return 'error';
	return Math.abs(deviation) > nearly * tolerance ? 'warning' : 'clear';
}
