import type { Geometry, Position } from 'geojson';

/** How well-known binary is written: byte order, and which of height and measure follow each position. */
export interface WkbForm {
	little?: boolean;
	z?: boolean;
	m?: boolean;
}

const codes: Record<string, number> = {
	Point: 1,
	LineString: 2,
	Polygon: 3,
	MultiPoint: 4,
	MultiLineString: 5,
	MultiPolygon: 6,
	GeometryCollection: 7,
};

/** Well-known binary in the codes of ISO 13249-3 (OGC 06-103r4, clause 8.2), as a list of bytes. */
export function wkbBytes(geometry: Geometry, form: WkbForm = {}): number[] {
	const { little = true, z = false, m = false } = form;
	const of = (bytes: number, write: (view: DataView) => void) => {
		const view = new DataView(new ArrayBuffer(bytes));
		write(view);
		return [...new Uint8Array(view.buffer)];
	};
	const uint = (value: number) => of(4, (view) => view.setUint32(0, value, little));
	const double = (value: number) => of(8, (view) => view.setFloat64(0, value, little));
	const position = ([x, y, height = 0]: Position) => [
		...double(x),
		...double(y),
		...(z ? double(height) : []),
		...(m ? double(-1) : []),
	];
	const points = (list: Position[]) => [...uint(list.length), ...list.flatMap(position)];
	const rings = (list: Position[][]) => [...uint(list.length), ...list.flatMap(points)];
	const members = (list: Geometry[]) => [
		...uint(list.length),
		...list.flatMap((one) => wkbBytes(one, form)),
	];
	const code = codes[geometry.type] + (z ? 1000 : 0) + (m ? 2000 : 0);
	const body = {
		Point: (g: Geometry) => (g.type === 'Point' ? position(g.coordinates) : []),
		LineString: (g: Geometry) => (g.type === 'LineString' ? points(g.coordinates) : []),
		Polygon: (g: Geometry) => (g.type === 'Polygon' ? rings(g.coordinates) : []),
		MultiPoint: (g: Geometry) =>
			members(
				g.type === 'MultiPoint'
					? g.coordinates.map((c) => ({ type: 'Point', coordinates: c }))
					: [],
			),
		MultiLineString: (g: Geometry) =>
			members(
				g.type === 'MultiLineString'
					? g.coordinates.map((c) => ({ type: 'LineString', coordinates: c }))
					: [],
			),
		MultiPolygon: (g: Geometry) =>
			members(
				g.type === 'MultiPolygon'
					? g.coordinates.map((c) => ({ type: 'Polygon', coordinates: c }))
					: [],
			),
		GeometryCollection: (g: Geometry) =>
			members(g.type === 'GeometryCollection' ? g.geometries : []),
	}[geometry.type](geometry);
	return [little ? 1 : 0, ...uint(code), ...body];
}
