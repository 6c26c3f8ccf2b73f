/**
 * The coloured regions as TopoJSON, taken from the coverage's shared arcs: each border stands once, so
 * that neighbours stay neighbours in the file.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import { ringLonLat, type SheetRow } from '../../sheet/index.ts';
import { cutPart } from '../cut-part.ts';
import { reachesSeam } from '../geojson-rings.ts';
import { propertiesOf } from '../properties.ts';
import type { ExtraColumn } from '../source.ts';
import { ArcBook } from './arc-book.ts';
import { quantised } from './quantised.ts';

/**
 * Source: the TopoJSON format specification, version 1.0.0. One object, `regions`, a geometry a region
 * in region order with its key as id and the properties of the GeoJSON file. Arcs are quantised with one
 * `transform`: square steps, `steps` along the longer side of the extent. Parts across 180 degrees are
 * cut there, the pieces of their borders still shared. Byte for byte repeatable.
 */
export function exportTopoJson(
	coverage: Coverage,
	rows: SheetRow[],
	columns: readonly ExtraColumn[],
	steps: number,
): Uint8Array {
	const book = new ArcBook(coverage);
	const geometries = rows.map((row) => ({
		...geometryOf(coverage, row.region, book),
		id: row.key,
		properties: propertiesOf(row, columns),
	}));
	const { bbox, transform, arcs, numbers } = quantised(book.arcs, geometries, steps);
	const renumbered = geometries.map((geometry) => ({
		...geometry,
		arcs: renumber(geometry.arcs, numbers),
	}));
	const objects = { regions: { type: 'GeometryCollection', geometries: renumbered } };
	return new TextEncoder().encode(
		`${JSON.stringify({ type: 'Topology', bbox, transform, objects, arcs })}\n`,
	);
}

export interface TopoGeometry {
	type: 'Polygon' | 'MultiPolygon';
	arcs: number[][] | number[][][];
}

function geometryOf(coverage: Coverage, region: number, book: ArcBook): TopoGeometry {
	const polygons: number[][][] = [];
	for (let part = coverage.regionParts[region]; part < coverage.regionParts[region + 1]; part++) {
		polygons.push(...polygonsOf(coverage, part, book));
	}
	return polygons.length === 1
		? { type: 'Polygon', arcs: polygons[0] }
		: { type: 'MultiPolygon', arcs: polygons };
}

function polygonsOf(coverage: Coverage, part: number, book: ArcBook): number[][][] {
	const { ringArcs, ringStarts, partRings } = coverage;
	const rings: Int32Array[] = [];
	for (let ring = partRings[part]; ring < partRings[part + 1]; ring++) {
		rings.push(ringArcs.subarray(ringStarts[ring], ringStarts[ring + 1]));
	}
	const lines = rings.map((ring) => ringLonLat(coverage, ring));
	if (!lines.some(reachesSeam)) return [rings.map((ring) => [...ring])];
	for (const signed of rings.flatMap((ring) => [...ring])) book.know(signed);
	return cutPart(lines).map((piece) => piece.map((ring) => book.signedArcs(ring)));
}

type Arcs = TopoGeometry['arcs'];

const renumber = (arcs: Arcs, numbers: Int32Array): Arcs => {
	const one = (signed: number) => (signed < 0 ? ~numbers[~signed] : numbers[signed]);
	return (arcs as (number[] | number[][])[]).map((rings) =>
		(rings as (number | number[])[]).map((ring) =>
			typeof ring === 'number' ? one(ring) : ring.map(one),
		),
	) as Arcs;
};
