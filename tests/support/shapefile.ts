import { strToU8, zipSync, type Zippable } from 'fflate';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { writeDbf, type Column } from './dbf.ts';

/** What a zipped shapefile is made from; coordinates are written as they are, in the system of `prj`. */
export interface ShapefileInput {
	features: Feature<Polygon | MultiPolygon | null>[];
	/** WKT of the coordinate system; no .prj is written when absent */
	prj?: string;
	/** any single-byte encoding that TextDecoder knows, or utf-8 (the usual one) */
	encoding?: string;
	/** file name without ending */
	name?: string;
	/** false leaves the .cpg out */
	cpg?: boolean;
	/** language driver byte of the .dbf header */
	languageByte?: number;
	/** columns with widths; worked out from the properties when absent */
	columns?: Column[];
}

/** A zip of .shp, .shx, .dbf and, where given, .prj and .cpg (ESRI Shapefile Technical Description, 1998). */
export function writeShapefileZip(input: ShapefileInput): Uint8Array {
	return zipSync(shapefileMembers(input));
}

/** The members of the archive, so that several layers can go into one zip. */
export function shapefileMembers(input: ShapefileInput): Zippable {
	const { name = 'regions', encoding = 'utf-8', prj, cpg = true } = input;
	const records = input.features.map((feature) => record(feature.geometry));
	const rows = input.features.map((feature) => feature.properties ?? {});
	const members: Zippable = {
		[`${name}.shp`]: shp(records),
		[`${name}.shx`]: shx(records),
		[`${name}.dbf`]: writeDbf(rows, encoding, input.languageByte ?? 0, input.columns),
	};
	if (prj !== undefined) members[`${name}.prj`] = strToU8(prj);
	if (cpg) members[`${name}.cpg`] = strToU8(encoding);
	return members;
}

/** Content of one record: a polygon (type 5), outer rings clockwise, holes anticlockwise; or null (type 0). */
function record(geometry: Polygon | MultiPolygon | null): Uint8Array {
	if (!geometry) return new Uint8Array(4);
	const polygons = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
	const rings = polygons.flatMap((polygon) =>
		polygon.map((ring, i) => (area(ring) > 0 === (i === 0) ? [...ring].reverse() : ring)),
	);
	const points = rings.flat();
	const bytes = new Uint8Array(44 + 4 * rings.length + 16 * points.length);
	const view = new DataView(bytes.buffer);
	view.setInt32(0, 5, true);
	box(points).forEach((value, i) => view.setFloat64(4 + 8 * i, value, true));
	view.setInt32(36, rings.length, true);
	view.setInt32(40, points.length, true);
	let first = 0;
	rings.forEach((ring, i) => {
		view.setInt32(44 + 4 * i, first, true);
		first += ring.length;
	});
	points.forEach(([x, y], i) => {
		view.setFloat64(44 + 4 * rings.length + 16 * i, x, true);
		view.setFloat64(52 + 4 * rings.length + 16 * i, y, true);
	});
	return bytes;
}

function shp(records: Uint8Array[]): Uint8Array {
	const length = 100 + records.reduce((sum, r) => sum + 8 + r.length, 0);
	const bytes = header(length, records);
	const view = new DataView(bytes.buffer);
	let at = 100;
	records.forEach((content, i) => {
		view.setInt32(at, i + 1);
		view.setInt32(at + 4, content.length / 2);
		bytes.set(content, at + 8);
		at += 8 + content.length;
	});
	return bytes;
}

function shx(records: Uint8Array[]): Uint8Array {
	const bytes = header(100 + 8 * records.length, records);
	const view = new DataView(bytes.buffer);
	let offset = 50;
	records.forEach((content, i) => {
		view.setInt32(100 + 8 * i, offset);
		view.setInt32(104 + 8 * i, content.length / 2);
		offset += 4 + content.length / 2;
	});
	return bytes;
}

function header(length: number, records: Uint8Array[]): Uint8Array {
	const bytes = new Uint8Array(length);
	const view = new DataView(bytes.buffer);
	view.setInt32(0, 9994);
	view.setInt32(24, length / 2);
	view.setInt32(28, 1000, true);
	view.setInt32(32, 5, true);
	const boxes = records.filter((r) => r.length > 44).map((r) => new DataView(r.buffer));
	const extent = [Math.min, Math.min, Math.max, Math.max].map((pick, i) =>
		boxes.reduce(
			(best, v) => pick(best, v.getFloat64(4 + 8 * i, true)),
			i < 2 ? Infinity : -Infinity,
		),
	);
	extent.forEach((value, i) =>
		view.setFloat64(36 + 8 * i, Number.isFinite(value) ? value : 0, true),
	);
	return bytes;
}

function box(points: number[][]): number[] {
	const extent = [Infinity, Infinity, -Infinity, -Infinity];
	for (const [x, y] of points) {
		extent[0] = Math.min(extent[0], x);
		extent[1] = Math.min(extent[1], y);
		extent[2] = Math.max(extent[2], x);
		extent[3] = Math.max(extent[3], y);
	}
	return extent;
}

function area(ring: number[][]): number {
	let sum = 0;
	for (let i = 0; i + 1 < ring.length; i++) {
		sum += (ring[i][0] - ring[0][0]) * (ring[i + 1][1] - ring[0][1]);
		sum -= (ring[i + 1][0] - ring[0][0]) * (ring[i][1] - ring[0][1]);
	}
	return sum;
}
