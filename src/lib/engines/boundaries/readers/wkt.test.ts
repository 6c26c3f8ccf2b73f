import { wktToGeoJSON } from 'betterknown';
import fc from 'fast-check';
import type { Geometry } from 'geojson';
import { describe, expect, it } from 'vitest';
import { wktText } from '../../../../../tests/support/wkt.ts';
import { defaultLimits } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { looksLikeWkt, readWkt } from './wkt.ts';

function read(text: string) {
	const layer = new RawLayer(defaultLimits);
	layer.startRegion();
	const system = readWkt(text, layer, 'Row 1');
	return { layer, system };
}

/** Parts of rings of positions, as the layer holds them. */
function parts({ layer }: ReturnType<typeof read>): number[][][][] {
	return Array.from({ length: layer.partRings.length }, (_, part) => {
		const rings: number[][][] = [];
		for (let r = layer.ringsBefore(part); r < layer.ringsBefore(part + 1); r++) {
			const flat = [
				...layer.points.items.subarray(2 * layer.pointsBefore(r), 2 * layer.pointsBefore(r + 1)),
			];
			rings.push(flat.flatMap((x, i) => (i % 2 ? [] : [[x, flat[i + 1]]])));
		}
		return rings;
	});
}

function areasOf(geometry: Geometry): number[][][][] {
	if (geometry.type === 'Polygon') return [geometry.coordinates];
	if (geometry.type === 'MultiPolygon') return geometry.coordinates;
	if (geometry.type === 'GeometryCollection') return geometry.geometries.flatMap(areasOf);
	return [];
}

// examples of the encyclopedic article on OGC 06-103r4, from memory
const published = [
	'POINT (30 10)',
	'LINESTRING (30 10, 10 30, 40 40)',
	'POLYGON ((30 10, 40 40, 20 40, 10 20, 30 10))',
	'POLYGON ((35 10, 45 45, 15 40, 10 20, 35 10), (20 30, 35 35, 30 20, 20 30))',
	'MULTIPOINT ((10 40), (40 30), (20 20), (30 10))',
	'MULTIPOINT (10 40, 40 30, 20 20, 30 10)',
	'MULTIPOLYGON (((30 20, 45 40, 10 40, 30 20)), ((15 5, 40 10, 10 20, 5 10, 15 5)))',
	'MULTIPOLYGON (((40 40, 20 45, 45 30, 40 40)), ((20 35, 10 30, 10 10, 30 5, 45 20, 20 35), (30 20, 20 15, 20 25, 30 20)))',
	'GEOMETRYCOLLECTION (POINT (40 10), LINESTRING (10 10, 20 20, 10 40), POLYGON ((40 40, 20 45, 45 30, 40 40)))',
];

describe('well-known text', () => {
	it.each(published)('%s is read as an independent reader reads it', (text) => {
		const geometry = wktToGeoJSON(text) as Geometry;
		expect(parts(read(text))).toEqual(areasOf(geometry));
	});

	it('is read as an independent reader reads it, whatever the numbers', () => {
		// no text tells zero from minus zero
		const number = fc.double({ min: -1e7, max: 1e7, noNaN: true }).map((value) => value + 0);
		const ring = fc
			.array(fc.tuple(number, number), { minLength: 3, maxLength: 6 })
			.map((points) => [...points, points[0]]);
		const polygon = fc.array(ring, { minLength: 1, maxLength: 3 });
		fc.assert(
			fc.property(fc.array(polygon, { minLength: 1, maxLength: 3 }), (coordinates) => {
				const text = wktText({ type: 'MultiPolygon', coordinates });
				expect(parts(read(text))).toEqual(areasOf(wktToGeoJSON(text) as Geometry));
				expect(parts(read(text))).toEqual(coordinates);
			}),
		);
	});

	it('may be in any case and spacing, with heights, measures, nothing, and a system before it', () => {
		const triangle = [[[[0, 0], [1, 0], [1, 1], [0, 0]]]]; // prettier-ignore
		for (const text of [
			'polygon((0 0,1 0,1 1,0 0))',
			' Polygon Z ( ( 0 0 5 , 1 0 5 , 1 1 5 , 0 0 5 ) ) ',
			'POLYGONZM((0 0 5 6,1 0 5 6,1 1 5 6,0 0 5 6))',
			'POLYGON M((0 0 5,1 0 5,1e0 +1. 5,0 -0.0 5))',
			'MULTISURFACE(((0 0,1 0,1 1,0 0)))',
		]) {
			expect(
				parts(read(text)).map((part) => part.map((r) => r.map((p) => p.map((v) => v + 0)))),
			).toEqual(triangle);
		}
		expect(read('SRID=3035;POLYGON((0 0,1 0,1 1,0 0))').system).toBe(3035);
		for (const empty of [
			'POLYGON EMPTY',
			'MULTIPOLYGON Z EMPTY',
			'GEOMETRYCOLLECTION(POLYGON EMPTY)',
		]) {
			expect(looksLikeWkt(empty)).toBe(true);
			expect(parts(read(empty))).toEqual([]);
		}
	});

	it.each([
		['POLYGON((0 0,1 0,1 1,0 0)', 'file-truncated', /before its last bracket/],
		['POLYGON((0 0,1 0,1', 'file-truncated', /before its last bracket/],
		['POLYGON((0 0,1 NaN,1 1,0 0))', 'bad-coordinate', /"NaN"/],
		['POLYGON((0 0,1 Infinity,1 1,0 0))', 'bad-coordinate', /"Infinity"/],
		['POLYGON((0 0,1,1 1,0 0))', 'bad-coordinate', /not a number/],
		['POLYGON((0 0 0 0 0,1 1))', 'file-damaged', /more than four numbers/],
		['POLYGON((0 0,1 0,1 1,0 0)) and more', 'file-damaged', /"and more"/],
		['POLYGON(((0 0,1 0,1 1,0 0)))', 'bad-coordinate', /not a number/],
		['CURVEPOLYGON((0 0,1 0,1 1,0 0))', 'unsupported-format', /is a CURVEPOLYGON/],
		[`${'GEOMETRYCOLLECTION('.repeat(200_000)}`, 'file-damaged', /deeper than 8 levels/],
		[`POLYGON${'('.repeat(200_000)}`, 'bad-coordinate', /not a number/],
		[`POINT${'('.repeat(200_000)}`, 'file-damaged', /deeper than 8 levels/],
	])('%.40s is refused', (text, code, said) => {
		expect(looksLikeWkt(text)).toBe(true);
		try {
			read(text);
			expect.unreachable();
		} catch (error) {
			expect(error).toMatchObject({ code, message: expect.stringMatching(said) });
			expect(error).toBeInstanceOf(Refusal);
		}
	});
});
