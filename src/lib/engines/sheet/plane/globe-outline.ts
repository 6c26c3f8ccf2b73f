import type { ProjectionChoice } from './choose-projection.ts';

/** Degrees kept clear of the meridian along which the globe is open. */
const clear = 1e-6;
const endless = ['mercator', 'lambert-conformal'];

/**
 * The outline of the whole globe on a projection, in radii of the sphere, x and y interleaved, closed by its
 * first point; null where the projection has none that a map could show.
 */
export function globeOutline({ kind, cut, projection }: ProjectionChoice): Float64Array | null {
	if (cut === null || endless.includes(kind)) return null;
	const [west, east] = [cut + clear - 360, cut - clear];
	const steps = Array.from({ length: 91 }, (_, i) => i / 90);
	const up = (share: number) => 180 * share - 90;
	const across = (share: number) => west + (east - west) * share;
	const places: [number, number][] = [
		...steps.map((share): [number, number] => [east, up(share)]),
		...steps.map((share): [number, number] => [across(1 - share), 90]),
		...steps.map((share): [number, number] => [west, up(1 - share)]),
		...steps.map((share): [number, number] => [across(share), -90]),
	];
	return Float64Array.from(places.flatMap((place) => projection(place)!));
}
