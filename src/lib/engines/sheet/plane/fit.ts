import type { PlaneArcs } from './project-arcs.ts';

/** A box on the paper, in hundredths of a millimetre. */
export interface Box {
	x: number;
	y: number;
	width: number;
	height: number;
}

/** From radii of the sphere to hundredths of a millimetre: x times `scale` plus `dx`, likewise y. */
export interface Fit {
	scale: number;
	dx: number;
	dy: number;
}

/** The largest fit of the arcs into a box, centred in it. */
export function fitInto({ points }: Pick<PlaneArcs, 'points'>, box: Box): Fit {
	let [left, right, top, bottom] = [Infinity, -Infinity, Infinity, -Infinity];
	for (let i = 0; i < points.length; i += 2) {
		left = Math.min(left, points[i]);
		right = Math.max(right, points[i]);
		top = Math.min(top, points[i + 1]);
		bottom = Math.max(bottom, points[i + 1]);
	}
	const scale = Math.min(
		box.width / Math.max(right - left, 1e-12),
		box.height / Math.max(bottom - top, 1e-12),
	);
	return {
		scale,
		dx: box.x + box.width / 2 - (scale * (left + right)) / 2,
		dy: box.y + box.height / 2 - (scale * (top + bottom)) / 2,
	};
}
