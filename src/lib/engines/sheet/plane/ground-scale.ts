import geodesic from 'geographiclib-geodesic';
import type { GeoProjection } from 'd3-geo';
import type { Fit } from './fit.ts';

/** How many metres on the ground a hundredth of a millimetre on the sheet stands for, by direction. */
export interface GroundScale {
	across: number;
	down: number;
}

/** Half the length measured, in hundredths of a millimetre. */
const half = 50;

/**
 * The scale of the map at a place on the sheet, measured on the WGS 84 ellipsoid by Karney's inverse
 * (geographiclib-geodesic). Null where the place is off the globe.
 */
export function groundScaleAt(
	projection: GeoProjection,
	{ scale, dx, dy }: Fit,
	x: number,
	y: number,
): GroundScale | null {
	const ground = (px: number, py: number) =>
		projection.invert?.([(px - dx) / scale, (py - dy) / scale]);
	const metres = (ax: number, ay: number, bx: number, by: number): number => {
		const [a, b] = [ground(ax, ay), ground(bx, by)];
		if (!a || !b || ![...a, ...b].every(Number.isFinite)) return NaN;
		return geodesic.Geodesic.WGS84.Inverse(a[1], a[0], b[1], b[0]).s12 ?? NaN;
	};
	const across = metres(x - half, y, x + half, y) / (2 * half);
	const down = metres(x, y - half, x, y + half) / (2 * half);
	return across > 0 && down > 0 ? { across, down } : null;
}
