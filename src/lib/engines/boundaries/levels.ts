import { metresPerDegree } from '../geometry/ellipsoid.ts';
import type { Coverage } from './coverage.ts';
import { arcWeights, simplifyCoverage } from './simplify.ts';

/** A coverage for the screen, thinned to what can be seen at one size. */
export interface DisplayLevel {
	/** 1 is the coarsest */
	level: number;
	toleranceMetres: number;
	points: number;
	/** lines that cross in the picture though they were thinned less */
	crossings: number;
	coverage: Coverage;
}

/** Pixels along the longer side of the land where the sheet fills a screen. */
const pixels = 1_000;
/** Each level serves until the sheet is shown four times as large. */
const step = 4;
const levels = 3;
/** A file with fewer points than this is drawn as it is. */
const fewest = 100_000;
/** A level is worth its room when it has at most this share of the points of the next finer one. */
const worth = 0.7;

/**
 * Levels of display, coarsest first; none for a coverage that needs none. The tolerance of the coarsest is
 * half a pixel of a sheet that fills a screen 1,000 pixels wide, of the next half a pixel at four times
 * that size, of the last at sixteen times.
 *
 * Guarantees: those of `simplifyCoverage` for every level. The points of a coarser level are points of the
 * finer ones but for arcs that had to be thinned less. The extent of the land is that of the full geometry.
 */
export function displayLevels(coverage: Coverage): DisplayLevel[] {
	const full = coverage.arcPoints.length / 2;
	if (full < fewest) return [];
	const weights = arcWeights(coverage);
	holdExtremes(coverage.arcPoints, weights);
	const made: DisplayLevel[] = [];
	let finer = full;
	for (let level = levels; level >= 1; level--) {
		const toleranceMetres = longSideMetres(coverage.arcPoints) / pixels / 2 / step ** (level - 1);
		if (pointsAbove(weights, toleranceMetres) > worth * finer) continue;
		const simple = simplifyCoverage(coverage, toleranceMetres, weights);
		finer = simple.coverage.arcPoints.length / 2;
		made.unshift({ level, toleranceMetres, points: finer, ...simple });
	}
	return made.map((one, i) => ({ ...one, level: i + 1 }));
}

/** Marks the outermost points as never to go, so that the sheet is framed as with the full geometry. */
function holdExtremes(points: Float64Array, weights: Float32Array): void {
	const outermost = [0, 0, 0, 0];
	for (let i = 1; i < weights.length; i++) {
		if (points[2 * i] < points[2 * outermost[0]]) outermost[0] = i;
		if (points[2 * i] > points[2 * outermost[1]]) outermost[1] = i;
		if (points[2 * i + 1] < points[2 * outermost[2] + 1]) outermost[2] = i;
		if (points[2 * i + 1] > points[2 * outermost[3] + 1]) outermost[3] = i;
	}
	for (const i of outermost) weights[i] = Infinity;
}

function pointsAbove(weights: Float32Array, metres: number): number {
	let count = 0;
	for (const weight of weights) if (weight >= metres) count++;
	return count;
}

/** Longer side of the land's box, in metres, measured at its middle latitude. */
function longSideMetres(points: Float64Array): number {
	let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = 0; i < points.length; i += 2) {
		if (points[i] < west) west = points[i];
		if (points[i] > east) east = points[i];
		if (points[i + 1] < south) south = points[i + 1];
		if (points[i + 1] > north) north = points[i + 1];
	}
	const metres = metresPerDegree((south + north) / 2);
	return Math.max((east - west) * metres.east, (north - south) * metres.north);
}
