import { LineWeights } from '../geometry/line-weights.ts';
import type { Coverage } from './coverage.ts';
import { crossedArcs, turnedArcs } from './tangles.ts';

/** An arc that crosses or turns over is thinned to a quarter of its tolerance, this often; then not at all. */
const quarters = 3;
/** Rounds in which crossings are looked for; what is left after them is counted. */
const rounds = 12;

export interface Simplified {
	coverage: Coverage;
	/** pairs of lines that cross in the picture and were not mended; those of the full geometry among them */
	crossings: number;
}

/**
 * How much each arc point matters, in metres (see `LineWeights`). Ends weigh Infinity, and so do the two
 * inner points that a closed arc keeps and the one that an arc keeps where two arcs make a ring.
 */
export function arcWeights(coverage: Coverage): Float32Array {
	const { arcPoints, arcStarts } = coverage;
	const weights = new Float32Array(arcPoints.length / 2);
	const lines = new LineWeights(arcPoints);
	const least = leastInner(coverage);
	for (let arc = 0; arc + 1 < arcStarts.length; arc++)
		lines.weigh(arcStarts[arc], arcStarts[arc + 1] - 1, least[arc], weights);
	return weights;
}

/**
 * A coverage with fewer points for display: each arc thinned once, so borders stay shared, every part of
 * every region stays and regions keep their neighbours. `metres`: detail smaller than a triangle of this
 * many metres squared goes. Junctions stay where they are. `weights`: of `arcWeights`, made once where
 * several levels are wanted.
 *
 * Guarantees: the invariants of a coverage hold; arcs of a ring that would turn over or close up, and arcs
 * that would cross, are thinned less until they do not, and crossings left over are counted. Areas, lengths
 * and enclaves stay those of the full geometry. Not guaranteed: that an island is not covered whole by a
 * coast that was straightened over it.
 */
export function simplifyCoverage(
	coverage: Coverage,
	metres: number,
	weights = arcWeights(coverage),
): Simplified {
	const tolerance = new Float32Array(coverage.arcLeft.length).fill(metres);
	let changed: Uint8Array | null = null;
	let crossings = 0;
	for (let round = 0; ; round++) {
		const thinned = withPoints(coverage, weights, tolerance);
		const crossed = round < rounds ? crossedArcs(thinned, changed) : [];
		const last = round === rounds - 1;
		crossings += crossed.filter(([a, b]) => last || tolerance[a] + tolerance[b] === 0).length;
		const tangled = new Set([...turnedArcs(thinned), ...(last ? [] : crossed.flat())]);
		changed = new Uint8Array(tolerance.length);
		if (!refine(tangled, tolerance, changed, metres)) return { coverage: thinned, crossings };
	}
}

/** Asks for more points on some arcs; false when all of them have every point already. */
function refine(
	arcs: Iterable<number>,
	tolerance: Float32Array,
	changed: Uint8Array,
	metres: number,
): boolean {
	let any = false;
	for (const arc of arcs) {
		if (tolerance[arc] === 0) continue;
		tolerance[arc] = tolerance[arc] > metres / 4 ** quarters ? tolerance[arc] / 4 : 0;
		changed[arc] = 1;
		any = true;
	}
	return any;
}

/** Inner points each arc must keep: two when it closes by itself, one when two arcs make a ring. */
function leastInner(coverage: Coverage): Uint8Array {
	const { ringArcs, ringStarts } = coverage;
	const least = new Uint8Array(coverage.arcLeft.length);
	for (let ring = 0; ring + 1 < ringStarts.length; ring++) {
		const arcs = ringStarts[ring + 1] - ringStarts[ring];
		if (arcs > 2) continue;
		for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
			const arc = ringArcs[i] >= 0 ? ringArcs[i] : ~ringArcs[i];
			least[arc] = Math.max(least[arc], arcs === 1 ? 2 : 1);
		}
	}
	return least;
}

/**
 * The coverage with the points that weigh no less than the tolerance of their arc. Inner points stand on a
 * grid far finer than the tolerance, which halves the bytes; ends, and arcs with all their points, do not.
 */
function withPoints(coverage: Coverage, weights: Float32Array, tolerance: Float32Array): Coverage {
	const { arcPoints, arcStarts } = coverage;
	const starts = new Uint32Array(arcStarts.length);
	let kept = 0;
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		starts[arc] = kept;
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++)
			if (weights[i] >= tolerance[arc]) kept++;
	}
	starts[starts.length - 1] = kept;
	const points = new Float64Array(2 * kept);
	let at = 0;
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		const grid = gridFor(tolerance[arc]);
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++) {
			if (weights[i] < tolerance[arc]) continue;
			const whole = grid && weights[i] < Infinity;
			points[at++] = whole ? Math.round(arcPoints[2 * i] * grid) / grid : arcPoints[2 * i];
			points[at++] = whole ? Math.round(arcPoints[2 * i + 1] * grid) / grid : arcPoints[2 * i + 1];
		}
	}
	return { ...coverage, arcPoints: points, arcStarts: starts };
}

/** Steps to a degree, a power of two, of which about a hundred make the tolerance; 0 for no grid. */
const gridFor = (metres: number): number =>
	metres > 0 ? 2 ** Math.ceil(Math.log2((111_320 * 100) / metres)) : 0;
