import { authalicSine, sweptKm2 } from '../../geometry/areas.ts';
import type { Coverage } from '../coverage.ts';

/**
 * Arcs laid in the equal-area cylindrical plane, on a grid of whole numbers so fine (a ten-thousandth of
 * a millimetre) that sides of lines can be told exactly: see exact-side.ts.
 */
export interface PlaneArcs {
	/** x, y of every point in turn, whole numbers below 2 ** 51 */
	points: Float64Array;
	/** arcs + 1 */
	starts: Uint32Array;
	/** region on either side, -1 for none or for one that was left out */
	left: Int32Array;
	right: Int32Array;
}

const xScale = 2 ** 40;
const yScale = 2 ** 47;

/** Width of the whole world in the plane. */
export const aroundTheWorld = 360 * xScale;

/** Square kilometres of a unit square of the plane. */
export const km2PerUnit = sweptKm2(Float64Array.of(1, 90, 0, 90), 0, 1) / xScale / yScale;

/** The arcs of a coverage that bound a region which is `wanted`; sides of the other regions become -1. */
export function planeArcs(coverage: Coverage, wanted: (region: number) => boolean): PlaneArcs {
	const { arcStarts, arcPoints, arcLeft, arcRight } = coverage;
	const side = (region: number) => (region >= 0 && wanted(region) ? region : -1);
	const kept: number[] = [];
	const starts = [0];
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (side(arcLeft[arc]) === side(arcRight[arc])) continue;
		kept.push(arc);
		starts.push(starts[starts.length - 1] + arcStarts[arc + 1] - arcStarts[arc]);
	}
	const points = new Float64Array(2 * starts[kept.length]);
	let at = 0;
	for (const arc of kept) {
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++) {
			points[at++] = Math.round(arcPoints[2 * i] * xScale);
			points[at++] = Math.round(authalicSine(arcPoints[2 * i + 1]) * yScale);
		}
	}
	return {
		points,
		starts: Uint32Array.from(starts),
		left: Int32Array.from(kept, (arc) => side(arcLeft[arc])),
		right: Int32Array.from(kept, (arc) => side(arcRight[arc])),
	};
}

/** The same arcs so many whole turns further east. */
export function turned(arcs: PlaneArcs, turns: number): PlaneArcs {
	if (turns === 0) return arcs;
	const by = turns * aroundTheWorld;
	return { ...arcs, points: arcs.points.map((value, i) => (i % 2 === 0 ? value + by : value)) };
}

/** Westernmost and easternmost x; an empty stretch when there are no arcs. */
export function widthOf({ points }: PlaneArcs): [number, number] {
	let [west, east] = [Infinity, -Infinity];
	for (let i = 0; i < points.length; i += 2) {
		if (points[i] < west) west = points[i];
		if (points[i] > east) east = points[i];
	}
	return [west, east];
}

/** Signed area between a line and the equator: over a closed anticlockwise line, its area. */
export const sweptUnits = (x0: number, y0: number, x1: number, y1: number) =>
	((x0 - x1) * (y0 + y1)) / 2;

/** Area of each region in square kilometres, from the arcs that bound it. */
export function areasOf(arcs: PlaneArcs, regions: number): Float64Array {
	const areas = new Float64Array(regions);
	const { points, starts, left, right } = arcs;
	for (let arc = 0; arc < left.length; arc++) {
		let swept = 0;
		for (let i = 2 * starts[arc]; i + 2 < 2 * starts[arc + 1]; i += 2) {
			swept += sweptUnits(points[i], points[i + 1], points[i + 2], points[i + 3]);
		}
		if (left[arc] >= 0) areas[left[arc]] += swept * km2PerUnit;
		if (right[arc] >= 0) areas[right[arc]] -= swept * km2PerUnit;
	}
	return areas;
}
