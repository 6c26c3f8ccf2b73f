import type { ArcRing } from './arc-rings.ts';
import type { Arcs } from './arcs.ts';

/** A ring traced from arcs: outer when its area is positive. Its points are laid out only when asked for. */
export class TracedRing {
	/** twice the signed area in squared degrees */
	readonly doubleArea: number;
	private laidOut: Float64Array | null = null;

	constructor(
		readonly arcs: ArcRing,
		private from: Arcs,
	) {
		this.doubleArea = doubleAreaOf(arcs, from);
	}

	/** Interleaved, the first point not repeated. */
	get points(): Float64Array {
		return (this.laidOut ??= pointsOf(this.arcs, this.from));
	}
}

/** As `doubleArea` of the points, without laying them out. */
function doubleAreaOf(ring: ArcRing, arcs: Arcs): number {
	const { points: p } = arcs;
	const start = 2 * placeOf(arcs, ring[0]);
	const x0 = p[start];
	const y0 = p[start + 1];
	let [x, y, sum] = [0, 0, 0];
	for (const half of ring) {
		const step = half >= 0 ? 2 : -2;
		let at = 2 * placeOf(arcs, half);
		for (let left = stepsOf(arcs, half); left > 0; left--) {
			at += step;
			const nextX = p[at] - x0;
			const nextY = p[at + 1] - y0;
			sum += x * nextY - nextX * y;
			x = nextX;
			y = nextY;
		}
	}
	return sum;
}

/** Points of a ring of arcs, interleaved, the first not repeated. */
export function pointsOf(ring: ArcRing, arcs: Arcs): Float64Array {
	let length = 0;
	for (const half of ring) length += stepsOf(arcs, half);
	const points = new Float64Array(2 * length);
	let to = 0;
	for (const half of ring) {
		const step = half >= 0 ? 2 : -2;
		let at = 2 * placeOf(arcs, half);
		for (let left = stepsOf(arcs, half); left > 0; left--, at += step) {
			points[to++] = arcs.points[at];
			points[to++] = arcs.points[at + 1];
		}
	}
	return points;
}

function stepsOf({ starts }: Arcs, half: number): number {
	const a = half >= 0 ? half : ~half;
	return starts[a + 1] - starts[a] - 1;
}

/** The point at which the walk along a half begins. */
const placeOf = ({ starts }: Arcs, half: number) =>
	half >= 0 ? starts[half] : starts[~half + 1] - 1;
