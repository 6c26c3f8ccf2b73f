import { readFileSync } from 'node:fs';
import { unzipSync } from 'fflate';
import type { Feature, FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import initGeosJs from 'geos-wasm';
import { geojsonToGeosGeom } from 'geos-wasm/helpers';
import proj4 from 'proj4';
import { open } from 'shapefile';
import { neighbors } from 'topojson-client';
import { topology } from 'topojson-server';
import type { GeometryCollection, Objects } from 'topojson-specification';
import { describe, expect, it } from 'vitest';
import { geojsonText } from '../../sample-data/geojson.ts';
import { shapeRepublic } from '../../sample-data/republic.ts';
import { secondSupplier } from '../../sample-data/second-supplier.ts';
import { shapefileZip } from '../../sample-data/shapefile.ts';
import { survey } from '../../sample-data/survey.ts';

type District = Feature<Polygon | MultiPolygon, Record<string, string | number>>;

const file = (name: string) => readFileSync(new URL(`../../sample-data/${name}`, import.meta.url));
const districtsOf = (name: string) =>
	(JSON.parse(file(name).toString()) as FeatureCollection<Polygon | MultiPolygon>)
		.features as District[];
const partsOf = ({ geometry }: District) =>
	geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;

const clean = districtsOf('tavaroe.geojson');
const dirty = districtsOf('tavaroe-second-supplier.geojson');

/** Neighbours by shared line, found by topojson-server 3.0.1 (exact positions). */
function lineNeighbours(districts: District[]): number[][] {
	const objects = { all: { type: 'FeatureCollection' as const, features: districts } };
	const { all } = topology(objects).objects as Objects & { all: GeometryCollection };
	return neighbors(all.geometries);
}

/** Pairs that share a position but no line. */
function pointPairs(districts: District[], lines: number[][]): string[] {
	const at = new Map<string, Set<number>>();
	districts.forEach((district, number) => {
		for (const position of partsOf(district).flat(2)) {
			at.set(position.join(), (at.get(position.join()) ?? new Set()).add(number));
		}
	});
	const pairs = [...at.values()].flatMap((set) =>
		[...set].flatMap((a) =>
			[...set].filter((b) => a < b && !lines[a].includes(b)).map((b) => `${a} ${b}`),
		),
	);
	return [...new Set(pairs)];
}

// The counts are those sample-data/README.md promises; found here by topojson-server and GEOS.
describe('the sample republic', () => {
	it('has 180 districts in 11 provinces, with codes that keep their zeros', () => {
		expect(clean).toHaveLength(180);
		expect(new Set(clean.map(({ properties }) => properties.province)).size).toBe(11);
		const codes = clean.map(({ properties }) => String(properties.code));
		expect(new Set(codes).size).toBe(180);
		expect(codes.every((code) => /^(0[1-9]|1[01])\d\d$/.test(code))).toBe(true);
		expect(new Set(clean.map(({ properties }) => properties.name)).size).toBe(180);
	});

	it('has 445 borders by line and 2 by point, at one four-corner point', () => {
		const lines = lineNeighbours(clean);
		expect(lines.reduce((sum, list) => sum + list.length, 0) / 2).toBe(445);
		const points = pointPairs(clean, lines);
		expect(points).toHaveLength(2);
		expect(new Set(points.flatMap((pair) => pair.split(' '))).size).toBe(4);
	});

	it('has 183 parts and one district inside another', () => {
		expect(clean.flatMap(partsOf)).toHaveLength(183);
		const holed = clean.filter((district) => partsOf(district).some((part) => part.length > 1));
		const city = clean.findIndex(({ properties }) => properties.name === 'Tavarhavn');
		expect(holed.map((district) => clean.indexOf(district))).toEqual(lineNeighbours(clean)[city]);
	});

	it('lies in the open sea and weighs less than 2.5 MB', () => {
		const all = clean.flatMap(partsOf).flat(2);
		const [lon, lat] = [0, 1].map((axis) => all.map((position) => position[axis]));
		expect(Math.min(...lat)).toBeGreaterThan(50);
		expect(Math.max(...lat)).toBeLessThan(57);
		expect(Math.min(...lon)).toBeGreaterThan(-42);
		expect(Math.max(...lon)).toBeLessThan(-30);
		expect(file('tavaroe.geojson').length).toBeLessThan(2_500_000);
	});

	it('has valid districts that do not overlap, by GEOS', async () => {
		const geos = await initGeosJs();
		const read = (geometry: Polygon | MultiPolygon) => geojsonToGeosGeom(geometry, geos);
		expect(clean.filter(({ geometry }) => geos.GEOSisValid(read(geometry)) !== 1)).toEqual([]);
		const whole: MultiPolygon = { type: 'MultiPolygon', coordinates: clean.flatMap(partsOf) };
		const areaOf = (pointer: number) => {
			const out = geos.Module._malloc(8);
			geos.GEOSArea(pointer, out);
			return geos.Module.HEAPF64[out / 8];
		};
		const sum = clean.reduce((total, { geometry }) => total + areaOf(read(geometry)), 0);
		expect(areaOf(geos.GEOSUnaryUnion(read(whole)))).toBeCloseTo(sum, 9);
	});
});

describe('the shapefile', () => {
	it('is the same republic on the survey grid, by shapefile 0.6.6 and proj4 2.22.0', async () => {
		const {
			'tavaroe.shp': shp,
			'tavaroe.dbf': dbf,
			'tavaroe.prj': prj,
		} = unzipSync(file('tavaroe-survey-grid.zip'));
		const back = proj4(new TextDecoder().decode(prj), 'WGS84');
		const source = await open(shp, dbf, { encoding: 'windows-1252' });
		for (const district of clean) {
			const { value } = await source.read();
			expect(value.properties?.CODE).toBe(district.properties.code);
			expect(value.properties?.NAME).toBe(district.properties.name);
			expect(value.properties?.HOUSEHOLDS).toBe(district.properties.households);
			const sorted = (feature: District) =>
				partsOf(feature)
					.flat(2)
					.sort((a: Position, b: Position) => a[0] - b[0] || a[1] - b[1]);
			const moved = partsOf(value as District).map((part) =>
				part.map((ring) =>
					ring.map((position) => back.forward(position).map((v) => Math.round(v * 1e7) / 1e7)),
				),
			);
			const same: District = {
				...district,
				geometry: { type: 'MultiPolygon', coordinates: moved },
			};
			expect(sorted(same)).toEqual(sorted(district));
		}
		expect((await source.read()).done).toBe(true);
	});
});

describe("the second supplier's file", () => {
	const rings = dirty.map((district) => ({
		code: String(district.properties.DIST_ID),
		ring: partsOf(district)[0][0],
	}));

	it('has one district twice and a crumb', () => {
		expect(dirty).toHaveLength(181);
		const shapes = dirty.map(({ geometry }) => JSON.stringify(geometry));
		expect(new Set(shapes).size).toBe(180);
		expect(dirty.flatMap(partsOf)).toHaveLength(185);
	});

	it('has one ring left open and one turned the wrong way', () => {
		const unclosed = rings.filter(({ ring }) => ring[0].join() !== ring[ring.length - 1].join());
		expect(unclosed).toHaveLength(1);
		const area = (ring: Position[]) =>
			ring.reduce((sum, [x, y], i) => {
				const [nx, ny] = ring[(i + 1) % ring.length];
				return sum + x * ny - nx * y;
			}, 0);
		expect(rings.filter(({ ring }) => area(ring) < 0)).toHaveLength(1);
	});

	it('hides neighbours from a reader of exact positions', () => {
		const lines = lineNeighbours(dirty);
		expect(lines.reduce((sum, list) => sum + list.length, 0) / 2).toBeLessThan(400);
	});
});

it('is made again byte for byte', () => {
	const districts = survey(shapeRepublic(21), 21);
	expect(geojsonText(districts, 'Districts of Tavaröe')).toBe(file('tavaroe.geojson').toString());
	expect(secondSupplier(districts, 21)).toBe(file('tavaroe-second-supplier.geojson').toString());
	expect(Buffer.compare(shapefileZip(districts, 'tavaroe'), file('tavaroe-survey-grid.zip'))).toBe(
		0,
	);
});
