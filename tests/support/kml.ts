import type { Feature, Geometry, Position } from 'geojson';

const escaped = (text: unknown) =>
	String(text).replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('"', '&quot;');

/** KML 2.2 (OGC 07-147r2) with a placemark a feature, its properties as ExtendedData. */
export function writeKml(features: Feature<Geometry | null>[], around = ['', '']): string {
	return `<?xml version="1.0" encoding="UTF-8"?>
<kml xmlns="http://www.opengis.net/kml/2.2"><Document><name>Land</name>${around[0]}
${features.map(placemark).join('\n')}
${around[1]}</Document></kml>`;
}

export function placemark({ id, properties, geometry }: Feature<Geometry | null>): string {
	const { name, ...data } = properties ?? {};
	const rows = Object.entries(data).map(
		([key, value]) => `<Data name="${escaped(key)}"><value>${escaped(value)}</value></Data>`,
	);
	const attribute = id === undefined ? '' : ` id="${escaped(id)}"`;
	const title = name === undefined ? '' : `<name>${escaped(name)}</name>`;
	const extended = rows.length ? `<ExtendedData>${rows.join('')}</ExtendedData>` : '';
	return `<Placemark${attribute}>${title}${extended}${geometry ? shape(geometry) : ''}</Placemark>`;
}

const tuples = (points: Position[]) =>
	`<coordinates>${points.map((p) => p.join(',')).join(' ')}</coordinates>`;
const ring = (points: Position[]) => `<LinearRing>${tuples(points)}</LinearRing>`;

function polygon([outer, ...inner]: Position[][]): string {
	const holes = inner.map((hole) => `<innerBoundaryIs>${ring(hole)}</innerBoundaryIs>`);
	return `<Polygon><outerBoundaryIs>${ring(outer)}</outerBoundaryIs>${holes.join('')}</Polygon>`;
}

function shape(geometry: Geometry): string {
	const several = (shapes: string[]) => `<MultiGeometry>${shapes.join('')}</MultiGeometry>`;
	switch (geometry.type) {
		case 'Point':
			return `<Point>${tuples([geometry.coordinates])}</Point>`;
		case 'LineString':
			return `<LineString>${tuples(geometry.coordinates)}</LineString>`;
		case 'Polygon':
			return polygon(geometry.coordinates);
		case 'MultiPolygon':
			return several(geometry.coordinates.map(polygon));
		case 'GeometryCollection':
			return several(geometry.geometries.map(shape));
		default:
			throw new Error(`no KML for ${geometry.type}`);
	}
}
