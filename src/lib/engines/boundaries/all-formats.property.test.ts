import fc from 'fast-check';
import { strToU8, zipSync } from 'fflate';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { topology } from 'topojson-server';
import { expect, it } from 'vitest';
import { writeGeoPackage } from '../../../../tests/support/geopackage.ts';
import { writeKml } from '../../../../tests/support/kml.ts';
import { accepted, collection } from '../../../../tests/support/read-boundaries.ts';
import { writeShapefileZip } from '../../../../tests/support/shapefile.ts';
import { wktText } from '../../../../tests/support/wkt.ts';
import { coverageFaults, readBoundaries, sourceOf } from './index.ts';

type Land = Feature<Polygon | MultiPolygon>[];

/** A grid of shaken cells, all with heights; the first has a hole filled by another, the last an island. */
function land(size: number, shakes: number[]): Land {
	const at = (x: number, y: number) => {
		const i = 2 * (y * (size + 1) + x);
		return [10 + x * 0.01 + shakes[i] * 0.003, 50 + y * 0.01 + shakes[i + 1] * 0.003, 7];
	};
	const cell = (x: number, y: number): number[][][] => [
		[at(x, y), at(x + 1, y), at(x + 1, y + 1), at(x, y + 1), at(x, y)],
	];
	const hole = square(10.0045, 50.0045, 0.001);
	const shapes: number[][][][][] = [];
	for (let y = 0; y < size; y++) for (let x = 0; x < size; x++) shapes.push([cell(x, y)]);
	shapes[0][0].push([...hole].reverse());
	shapes[shapes.length - 1].push([square(10.2, 50.2, 0.01)]);
	shapes.push([[hole]]);
	return shapes.map((parts, i) => ({
		type: 'Feature',
		properties: { key: `k${i}`, name: `Land "${i}", & <more>` },
		geometry:
			parts.length > 1
				? { type: 'MultiPolygon', coordinates: parts }
				: { type: 'Polygon', coordinates: parts[0] },
	}));
}

const square = (x: number, y: number, side: number) => [
	[x, y, 7],
	[x + side, y, 7],
	[x + side, y + side, 7],
	[x, y + side, 7],
	[x, y, 7],
];

const csv = (features: Land, separator: string) =>
	[
		['key', 'shape', 'name'].join(separator),
		...features.map(({ properties, geometry }) =>
			[
				properties?.key,
				`"${wktText(geometry)}"`,
				`"${properties?.name.replaceAll('"', '""')}"`,
			].join(separator),
		),
	].join('\r\n');

/** The same land in every format, by writers that share nothing with the readers. */
async function written(features: Land): Promise<Record<string, Uint8Array>> {
	const json = strToU8(JSON.stringify(collection(features)));
	const lines = features.map((feature) => JSON.stringify(feature));
	const layer = { name: 'land "of" mine', features };
	const geopackage = await writeGeoPackage([{ ...layer, form: { z: true, m: true }, envelope: 2 }]);
	const kml = strToU8(writeKml(features));
	return {
		lines: strToU8(`\ufeff\n${lines.join('\n\n')}`),
		sequence: strToU8(lines.map((line) => `\x1e${line}\n`).join('')),
		topology: strToU8(JSON.stringify(topology({ land: collection(features) }))),
		geopackage,
		'geopackage, big-endian': await writeGeoPackage([
			{ ...layer, form: { little: false, z: true } },
		]),
		kml,
		kmz: zipSync({ 'doc.kml': kml, 'files/legend.png': new Uint8Array(9) }),
		csv: strToU8(csv(features, ',')),
		'csv with semicolons': strToU8(csv(features, ';')),
		'csv with tabs, in UTF-16': Uint8Array.from([0xff, 0xfe, ...utf16(csv(features, '\t'))]),
		'zipped GeoJSON': zipSync({ 'a/land.geojson': json }),
		'zipped GeoPackage': zipSync({ 'land.gpkg': geopackage }),
		'zipped CSV': zipSync({ 'land.csv': strToU8(csv(features, ',')) }),
	};
}

const utf16 = (text: string) =>
	[...text].flatMap((c) => [c.charCodeAt(0) & 255, c.charCodeAt(0) >> 8]);

const lands = fc.record({
	size: fc.integer({ min: 1, max: 3 }),
	shakes: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 32, maxLength: 32 }),
});

it('the same land in every format gives the same coverage and borders', () =>
	fc.assert(
		fc.asyncProperty(lands, async ({ size, shakes }) => {
			const features = land(size, shakes);
			const options = { keyField: 'key' };
			const read = await accepted(strToU8(JSON.stringify(collection(features))), options);
			expect(coverageFaults(read.coverage)).toEqual([]);
			for (const [form, bytes] of Object.entries(await written(features))) {
				const other = await accepted(bytes, options);
				expect(other.coverage, form).toEqual(read.coverage);
				expect(other.borders, form).toEqual(read.borders);
			}
		}),
		{ numRuns: 8 },
	));

// a shapefile turns its rings the other way, so that arcs may start elsewhere
it('and the same in a shapefile, but for where outlines start', () =>
	fc.assert(
		fc.asyncProperty(lands, async ({ size, shakes }) => {
			const features = land(size, shakes);
			const options = { keyField: 'key' };
			const read = await accepted(strToU8(JSON.stringify(collection(features))), options);
			const prj =
				'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]]';
			const other = await accepted(writeShapefileZip({ features, prj }), options);
			const { a, b, kind } = read.borders;
			expect({ ...other.borders }).toMatchObject({ a, b, kind });
			other.borders.metres.forEach((m, i) => expect(m).toBeCloseTo(read.borders.metres[i], 6));
			expect(other.coverage.names).toEqual(read.coverage.names);
		}),
		{ numRuns: 8 },
	));

it('whatever the size of the pieces it comes in', async () => {
	const features = land(2, new Array(32).fill(0.3));
	for (const [form, bytes] of Object.entries(await written(features))) {
		const whole = await accepted(bytes, { keyField: 'key' });
		for (const size of [1, 13, 1000]) {
			const pieces = await readBoundaries(sourceOf('test', bytes, size), { keyField: 'key' });
			expect(pieces, form).toEqual(whole);
		}
	}
});
