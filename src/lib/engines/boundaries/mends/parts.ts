import { boxOf } from '../../geometry/coverage-rings.ts';
import { doubleArea, sideOfRing } from '../../geometry/rings.ts';
import { ringKm2 } from '../ring-area.ts';

/**
 * A part of a region: its outer ring anticlockwise, then its holes clockwise; points interleaved in
 * degrees, the first not repeated.
 */
export type Part = Float64Array[];

export const pointsIn = (parts: Part[]) =>
	parts.reduce((sum, rings) => sum + rings.reduce((n, ring) => n + ring.length / 2, 0), 0);

/** Area in km²; that of rings which cross themselves counts as it is walked. */
export const partsKm2 = (parts: Part[]) =>
	parts.reduce((sum, rings) => sum + rings.reduce((n, ring) => n + ringKm2(ring), 0), 0);

/** Whether a place lies in a part, its outline included. */
export function isInPart([outer, ...holes]: Part, [x, y]: [number, number]): boolean {
	const side = (ring: Float64Array) => sideOfRing(ring, 0, ring.length / 2, x, y);
	return side(outer) >= 0 && holes.every((hole) => side(hole) <= 0);
}

/** Whether the boxes of two parts meet. */
export function boxesMeet(p: Part, q: Part): boolean {
	const a = boxOf(p[0]);
	const b = boxOf(q[0]);
	return a[0] <= b[2] && b[0] <= a[2] && a[1] <= b[3] && b[1] <= a[3];
}

/** Turns rings so that the first is anticlockwise and the others clockwise. */
export function turned(rings: Float64Array[]): Part {
	return rings.map((ring, i) => {
		const isAnticlockwise = doubleArea(ring, 0, ring.length / 2) > 0;
		return isAnticlockwise === (i === 0) ? ring : reversed(ring);
	});
}

function reversed(ring: Float64Array): Float64Array {
	const back = new Float64Array(ring.length);
	for (let i = 0; i < ring.length; i += 2) {
		back[ring.length - 2 - i] = ring[i];
		back[ring.length - 1 - i] = ring[i + 1];
	}
	return back;
}
