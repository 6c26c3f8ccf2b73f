/**
 * The map in its box: as large as fits or at a given ratio, in the middle or moved. What cannot be done
 * as asked is told in words, and the map stays within its box whatever is asked.
 */
import type { GeoProjection } from 'd3-geo';
import { fitInto, type Box, type Fit } from './fit.ts';
import { groundScaleAt } from './ground-scale.ts';
import type { PlaneArcs } from './project-arcs.ts';

/** Limits of something on the plane, in radii of the sphere. */
export interface PlaneBox {
	left: number;
	right: number;
	top: number;
	bottom: number;
}

export function planeBoxOf({ points }: Pick<PlaneArcs, 'points'>): PlaneBox {
	let [left, right, top, bottom] = [Infinity, -Infinity, Infinity, -Infinity];
	for (let i = 0; i < points.length; i += 2) {
		left = Math.min(left, points[i]);
		right = Math.max(right, points[i]);
		top = Math.min(top, points[i + 1]);
		bottom = Math.max(bottom, points[i + 1]);
	}
	return { left, right, top, bottom };
}

/** Metres on the ground that a hundredth of a millimetre stands for at a fit's middle; null off the globe. */
function metresAtMiddle(projection: GeoProjection, bounds: PlaneBox, fit: Fit): number | null {
	const x = (fit.scale * (bounds.left + bounds.right)) / 2 + fit.dx;
	const y = (fit.scale * (bounds.top + bounds.bottom)) / 2 + fit.dy;
	const ground = groundScaleAt(projection, fit, x, y);
	return ground && Math.sqrt(ground.across * ground.down);
}

/** `1 : n` at the middle; a hundredth of a millimetre for a metre is 1 : 100,000. */
export function ratioOf(projection: GeoProjection, bounds: PlaneBox, fit: Fit): number | null {
	const metres = metresAtMiddle(projection, bounds, fit);
	return metres === null ? null : metres * 100_000;
}

export interface MapFit {
	fit: Fit;
	/** drawn, 1 : n; null where it cannot be measured */
	ratio: number | null;
	told: string[];
	/** size of the map at the ratio that was asked for and did not fit, mm */
	tooLarge: { widthMm: number; heightMm: number } | null;
}

export interface FitWish {
	ratio: number | null;
	shiftMm: [number, number];
}

const figure = (value: number) => Math.round(value).toLocaleString('en-GB');

export function fitMap(
	bounds: PlaneBox,
	projection: GeoProjection,
	box: Box,
	wish: FitWish,
): MapFit {
	const largest = fitInto(
		{ points: Float64Array.of(bounds.left, bounds.top, bounds.right, bounds.bottom) },
		box,
	);
	const ratio = ratioOf(projection, bounds, largest);
	const told: string[] = [];
	if (wish.ratio === null || ratio === null) {
		if (wish.ratio !== null)
			told.push('The ratio cannot be kept: the middle of the map lies off the globe.');
		return { ...shifted(bounds, box, largest.scale, wish.shiftMm, told), ratio, tooLarge: null };
	}
	const scale = (largest.scale * ratio) / wish.ratio;
	// a ratio taken from the sheet itself must fit again, so half a thousandth is let pass
	if (scale <= largest.scale * 1.0005) {
		const kept = Math.min(scale, largest.scale);
		return { ...shifted(bounds, box, kept, wish.shiftMm, told), ratio: wish.ratio, tooLarge: null };
	}
	const size = {
		widthMm: (scale * (bounds.right - bounds.left)) / 100,
		heightMm: (scale * (bounds.bottom - bounds.top)) / 100,
	};
	told.push(tooLargeWords(wish.ratio, size, box, ratio));
	return { ...shifted(bounds, box, largest.scale, wish.shiftMm, told), ratio, tooLarge: size };
}

function tooLargeWords(
	asked: number,
	{ widthMm, heightMm }: { widthMm: number; heightMm: number },
	box: Box,
	drawn: number,
): string {
	const over = [
		[Math.ceil(widthMm - box.width / 100), 'too wide'],
		[Math.ceil(heightMm - box.height / 100), 'too high'],
	] as const;
	const by = over.filter(([mm]) => mm > 0).map(([mm, way]) => `${figure(mm)} mm ${way}`);
	return `At 1 : ${figure(asked)} the map does not fit its place: ${by.join(' and ')}. It is drawn as large as fits, about 1 : ${figure(Number(drawn.toPrecision(3)))}.`;
}

/** In the middle of the box, then moved as far as the box allows. */
function shifted(
	bounds: PlaneBox,
	box: Box,
	scale: number,
	shiftMm: [number, number],
	told: string[],
) {
	const room = [
		(box.width - scale * (bounds.right - bounds.left)) / 2,
		(box.height - scale * (bounds.bottom - bounds.top)) / 2,
	].map((free) => Math.max(0, free));
	const [right, down] = shiftMm.map((mm, axis) =>
		Math.min(room[axis], Math.max(-room[axis], mm * 100)),
	);
	if (Math.abs(right - shiftMm[0] * 100) > 1 || Math.abs(down - shiftMm[1] * 100) > 1) {
		told.push(
			`The map is moved no further than its place allows: ${(right / 100).toFixed(1)} mm to the right and ${(down / 100).toFixed(1)} mm down.`,
		);
	}
	const fit: Fit = {
		scale,
		dx: box.x + box.width / 2 + right - (scale * (bounds.left + bounds.right)) / 2,
		dy: box.y + box.height / 2 + down - (scale * (bounds.top + bounds.bottom)) / 2,
	};
	return { fit, told };
}
