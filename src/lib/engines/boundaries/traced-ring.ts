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
		private positions: Float64Array,
	) {
		this.doubleArea = doubleAreaOf(arcs, from, positions);
	}

	/** Interleaved, the first point not repeated. */
	get points(): Float64Array {
		return (this.laidOut ??= pointsOf(this.arcs, this.from, this.positions));
	}
}

/** As `doubleArea` of the points, without laying them out. */
function doubleAreaOf(ring: ArcRing, arcs: Arcs, p: Float64Array): number {
	const start = 2 * vertexOf(arcs, ring[0], 0);
	const x0 = p[start];
	const y0 = p[start + 1];
	let [x, y, sum] = [0, 0, 0];
	for (const half of ring) {
		const steps = stepsOf(arcs, half);
		const first = placeOf(arcs, half);
		for (let k = 1; k <= steps; k++) {
			const v = 2 * arcs.vertices[half >= 0 ? first + k : first - k];
			const [nextX, nextY] = [p[v] - x0, p[v + 1] - y0];
			sum += x * nextY - nextX * y;
			x = nextX;
			y = nextY;
		}
	}
	return sum;
}

function pointsOf(ring: ArcRing, arcs: Arcs, positions: Float64Array): Float64Array {
	let length = 0;
	for (const half of ring) length += stepsOf(arcs, half);
	const points = new Float64Array(2 * length);
	let at = 0;
	for (const half of ring) {
		for (let k = 0; k < stepsOf(arcs, half); k++) {
			const v = vertexOf(arcs, half, k);
			points[at++] = positions[2 * v];
			points[at++] = positions[2 * v + 1];
		}
	}
	return points;
}

function stepsOf({ starts }: Arcs, half: number): number {
	const a = half >= 0 ? half : ~half;
	return starts[a + 1] - starts[a] - 1;
}

/** Where in `arcs.vertices` the walk along a half begins. */
const placeOf = ({ starts }: Arcs, half: number) =>
	half >= 0 ? starts[half] : starts[~half + 1] - 1;

const vertexOf = (arcs: Arcs, half: number, k: number) =>
	arcs.vertices[half >= 0 ? placeOf(arcs, half) + k : placeOf(arcs, half) - k];
