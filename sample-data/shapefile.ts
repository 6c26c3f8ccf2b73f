import { zipSync } from 'fflate';
import type { Point } from './cells.ts';
import { table } from './table.ts';
import { gridText, toGrid, type District } from './survey.ts';

const polygonType = 5;

/** A reference system: how to get there, and what the .prj says of it (null: there is none). */
interface System {
	project: (position: Point) => Point;
	system: string | null;
}
const surveyGrid: System = { project: toGrid, system: gridText };

/**
 * The districts as a zipped shapefile, on the survey's grid unless told otherwise; text in windows-1252,
 * said by the table's language byte. Source: ESRI Shapefile Technical Description, July 1998.
 */
export function shapefileZip(
	districts: readonly District[],
	name: string,
	{ project, system }: System = surveyGrid,
): Uint8Array {
	const records = districts.map(({ polygons }) => polygonRecord(polygons, project));
	const bounds = box(districts.flatMap(({ polygons }) => polygons.flat(2).map(project)));
	const mainLength = 100 + records.reduce((sum, record) => sum + 8 + record.length, 0);
	const main = header(mainLength, bounds);
	const index = header(100 + 8 * records.length, bounds);
	const { shp, shx } = laidOut(records, main, index);
	return zipSync(
		{
			[`${name}.shp`]: shp,
			[`${name}.shx`]: shx,
			[`${name}.dbf`]: table(districts),
			...(system && { [`${name}.prj`]: new TextEncoder().encode(system) }),
		},
		{ level: 9, mtime: '2026-01-01T00:00:00' },
	);
}

function laidOut(records: Uint8Array[], main: Uint8Array, index: Uint8Array) {
	const [shp, shx] = [[main], [index]];
	let offset = 100;
	records.forEach((record, i) => {
		const head = new DataView(new ArrayBuffer(8));
		head.setInt32(0, i + 1);
		head.setInt32(4, record.length / 2);
		shp.push(new Uint8Array(head.buffer), record);
		const entry = new DataView(new ArrayBuffer(8));
		entry.setInt32(0, offset / 2);
		entry.setInt32(4, record.length / 2);
		shx.push(new Uint8Array(entry.buffer));
		offset += 8 + record.length;
	});
	return { shp: joined(shp), shx: joined(shx) };
}

function header(length: number, bounds: number[]): Uint8Array {
	const view = new DataView(new ArrayBuffer(100));
	view.setInt32(0, 9994);
	view.setInt32(24, length / 2);
	view.setInt32(28, 1000, true);
	view.setInt32(32, polygonType, true);
	bounds.forEach((value, i) => view.setFloat64(36 + 8 * i, value, true));
	return new Uint8Array(view.buffer);
}

/** Shapefiles turn outer rings clockwise and holes anticlockwise: each ring is written backwards. */
function polygonRecord(polygons: Point[][][], project: System['project']): Uint8Array {
	const rings = polygons.flat().map((ring) => [...ring].reverse().map(project));
	const points = rings.flat();
	const view = new DataView(new ArrayBuffer(44 + 4 * rings.length + 16 * points.length));
	view.setInt32(0, polygonType, true);
	box(points).forEach((value, i) => view.setFloat64(4 + 8 * i, value, true));
	view.setInt32(36, rings.length, true);
	view.setInt32(40, points.length, true);
	let start = 0;
	rings.forEach((ring, i) => {
		view.setInt32(44 + 4 * i, start, true);
		start += ring.length;
	});
	const from = 44 + 4 * rings.length;
	points.flat().forEach((value, i) => view.setFloat64(from + 8 * i, value, true));
	return new Uint8Array(view.buffer);
}

function box(points: Point[]): number[] {
	const bounds = [Infinity, Infinity, -Infinity, -Infinity];
	for (const [x, y] of points) {
		bounds[0] = Math.min(bounds[0], x);
		bounds[1] = Math.min(bounds[1], y);
		bounds[2] = Math.max(bounds[2], x);
		bounds[3] = Math.max(bounds[3], y);
	}
	return bounds;
}

function joined(pieces: Uint8Array[]): Uint8Array {
	const all = new Uint8Array(pieces.reduce((sum, piece) => sum + piece.length, 0));
	let at = 0;
	for (const piece of pieces) {
		all.set(piece, at);
		at += piece.length;
	}
	return all;
}
