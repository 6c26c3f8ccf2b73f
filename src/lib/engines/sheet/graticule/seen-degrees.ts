import type { GeoProjection } from 'd3-geo';
import { lonStep } from '../plane/extent.ts';
import type { Box, Fit } from '../plane/fit.ts';

/** Which part of the globe shows within a box of the paper. */
export interface SeenDegrees {
	/** east and west of `middle`, degrees; the whole turn where a pole shows */
	west: number;
	east: number;
	south: number;
	north: number;
	middle: number;
	pole: 'north' | 'south' | null;
}

const samples = 40;

/** In: `middle`, a longitude in the middle of the map. By asking at places all over the box. */
export function seenDegrees(
	projection: GeoProjection,
	fit: Fit,
	box: Box,
	middle: number,
): SeenDegrees {
	let [west, east, south, north] = [Infinity, -Infinity, Infinity, -Infinity];
	for (let i = 0; i <= samples; i++) {
		for (let j = 0; j <= samples; j++) {
			const x = box.x + (box.width * i) / samples;
			const y = box.y + (box.height * j) / samples;
			const place = groundAt(projection, fit, x, y);
			if (!place) continue;
			const step = lonStep(middle, place[0]);
			[west, east] = [Math.min(west, step), Math.max(east, step)];
			[south, north] = [Math.min(south, place[1]), Math.max(north, place[1])];
		}
	}
	const pole = (['north', 'south'] as const).find((one) =>
		holds(box, onPaper(projection, fit, [middle, one === 'north' ? 90 : -90])),
	);
	if (pole && isPoint(projection, pole)) {
		const [s, n] = pole === 'north' ? [south, 90] : [-90, north];
		return { west: -180, east: 180, south: s, north: n, middle, pole };
	}
	return { west, east, south, north, middle, pole: null };
}

/** A pole that is a place on the map and not a line. */
function isPoint(projection: GeoProjection, pole: 'north' | 'south'): boolean {
	const lat = pole === 'north' ? 90 : -90;
	const [a, b] = [projection([0, lat])!, projection([90, lat])!];
	return Math.hypot(a[0] - b[0], a[1] - b[1]) < 1e-6;
}

export const onPaper = (
	projection: GeoProjection,
	{ scale, dx, dy }: Fit,
	place: [number, number],
): [number, number] => {
	const [x, y] = projection(place)!;
	return [x * scale + dx, y * scale + dy];
};

const holds = (box: Box, [x, y]: [number, number]): boolean =>
	x >= box.x && y >= box.y && x <= box.x + box.width && y <= box.y + box.height;

/** The place on the ground at a place on the paper; null off the globe. */
export function groundAt(
	projection: GeoProjection,
	{ scale, dx, dy }: Fit,
	x: number,
	y: number,
): [number, number] | null {
	const plane: [number, number] = [(x - dx) / scale, (y - dy) / scale];
	const place = projection.invert?.(plane);
	if (!place || !place.every(Number.isFinite) || Math.abs(place[1]) > 90) return null;
	const again = projection(place);
	if (!again || Math.hypot(again[0] - plane[0], again[1] - plane[1]) > 1e-6) return null;
	return place;
}
