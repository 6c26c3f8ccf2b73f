import type { Geometry, Position } from 'geojson';

/** Well-known text (OGC 06-103r4, clause 7), `Z` where positions have a third number. */
export function wktText(geometry: Geometry): string {
	const name = geometry.type.toUpperCase();
	const inner = body(geometry);
	return `${name}${/\d \S+ \S+[,)]/.test(inner) && hasHeight(geometry) ? ' Z' : ''} ${inner}`;
}

function hasHeight(geometry: Geometry): boolean {
	if (geometry.type === 'GeometryCollection') return geometry.geometries.some(hasHeight);
	const first = (value: unknown): number =>
		Array.isArray(value) ? (Array.isArray(value[0]) ? first(value[0]) : value.length) : 0;
	return first(geometry.coordinates) > 2;
}

const position = (p: Position) => p.join(' ');
const listed = (items: string[]) => (items.length ? `(${items.join(', ')})` : 'EMPTY');
const line = (points: Position[]) => listed(points.map(position));
const rings = (list: Position[][]) => listed(list.map(line));

function body(geometry: Geometry): string {
	switch (geometry.type) {
		case 'Point':
			return `(${position(geometry.coordinates)})`;
		case 'LineString':
		case 'MultiPoint':
			return line(geometry.coordinates);
		case 'Polygon':
		case 'MultiLineString':
			return rings(geometry.coordinates);
		case 'MultiPolygon':
			return listed(geometry.coordinates.map(rings));
		case 'GeometryCollection':
			return listed(geometry.geometries.map(wktText));
	}
}
