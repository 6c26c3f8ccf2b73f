import type { FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import { ringPoints } from '../geometry/coverage-rings.ts';
import type { Coverage } from './coverage.ts';

/**
 * A coverage as GeoJSON (RFC 7946): a feature a region with its key as `id`, outer rings anticlockwise.
 * `properties` gives more columns for a region by number; `name` is always there.
 */
export function coverageToGeoJson(
	coverage: Coverage,
	properties: (region: number) => Record<string, unknown> = () => ({}),
): FeatureCollection<Polygon | MultiPolygon> {
	return {
		type: 'FeatureCollection',
		features: coverage.keys.map((key, r) => ({
			type: 'Feature' as const,
			id: key,
			properties: { name: coverage.names[r], ...properties(r) },
			geometry: geometryOf(coverage, r),
		})),
	};
}

/** One region of a coverage as a GeoJSON geometry. */
export function geometryOf(coverage: Coverage, region: number): Polygon | MultiPolygon {
	const parts: Position[][][] = [];
	for (let p = coverage.regionParts[region]; p < coverage.regionParts[region + 1]; p++) {
		const rings: Position[][] = [];
		for (let ring = coverage.partRings[p]; ring < coverage.partRings[p + 1]; ring++) {
			rings.push(closedRing(ringPoints(coverage, ring)));
		}
		parts.push(rings);
	}
	return parts.length === 1
		? { type: 'Polygon', coordinates: parts[0] }
		: { type: 'MultiPolygon', coordinates: parts };
}

function closedRing(points: Float64Array): Position[] {
	const ring: Position[] = [];
	for (let i = 0; i < points.length; i += 2) ring.push([points[i], points[i + 1]]);
	ring.push([points[0], points[1]]);
	return ring;
}
