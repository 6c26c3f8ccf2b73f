import { readFileSync } from 'node:fs';
import type { Feature, FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import initGeosJs from 'geos-wasm';
import { geojsonToGeosGeom } from 'geos-wasm/helpers';
import proj4 from 'proj4';
import { open } from 'shapefile';
import { unzipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { carelessOffice } from '../../sample-data/careless-office.ts';
import { nextYear } from '../../sample-data/next-year.ts';
import { shapeRepublic } from '../../sample-data/republic.ts';
import { survey } from '../../sample-data/survey.ts';

type Area = Feature<Polygon | MultiPolygon, Record<string, string | number>>;

const file = (name: string) => readFileSync(new URL(`../../sample-data/${name}`, import.meta.url));
const read = (name: string) =>
	(JSON.parse(file(name).toString()) as FeatureCollection<Polygon | MultiPolygon>)
		.features as Area[];
const byCode = (areas: Area[]) =>
	new Map(areas.map((area) => [String(area.properties.code), area]));
const now = byCode(read('tavaroe.geojson'));
const later = byCode(read('tavaroe-next-year.geojson'));
const geos = await initGeosJs();
const geometry = (area: Area) => geojsonToGeosGeom(area.geometry, geos);

// What is checked is what sample-data/README.md promises; validity and areas are GEOS's.
describe('the republic a year later', () => {
	it('has the changes it says, and no others', () => {
		const gone = [...now.keys()].filter((code) => !later.has(code));
		const come = [...later.keys()].filter((code) => !now.has(code));
		expect(gone).toEqual(['0318', '0408', '0512', '0807']);
		expect(come).toEqual(['0420', '0421', '0517', '0518']);
		const redrawn = [...later].filter(
			([code, { geometry: shape }]) =>
				now.has(code) && JSON.stringify(shape) !== JSON.stringify(now.get(code)?.geometry),
		);
		expect(redrawn.map(([code]) => code)).toEqual(['0612', '0614', '0803']);
		expect(later.get('0420')?.geometry).toEqual(now.get('0408')?.geometry);
		expect(later.get('0205')?.properties.name).toBe('Jarlœrn Bay');
	});

	it('has valid districts, and the land of the old ones where it was divided anew', () => {
		for (const area of later.values()) expect(geos.GEOSisValid(geometry(area))).toBe(1);
		const whole = (from: Map<string, Area>, codes: string[]) =>
			codes
				.map((code) => geometry(from.get(code) as Area))
				.reduce((sum, one) => geos.GEOSUnion(sum, one));
		const same = (before: string[], after: string[]) =>
			geos.GEOSEquals(whole(now, before), whole(later, after));
		expect(same(['0512'], ['0517', '0518'])).toBe(1);
		expect(same(['0803', '0807'], ['0803'])).toBe(1);
		expect(same(['0612', '0614'], ['0612', '0614'])).toBe(1);
	});
});

describe('the file as received', () => {
	it('says no reference system, and its metres are those of UTM zone 25 north', async () => {
		const unpacked = unzipSync(file('tavaroe-as-received.zip'));
		expect(Object.keys(unpacked).some((name) => name.endsWith('.prj'))).toBe(false);
		const rows: Area[] = [];
		const source = await open(
			unpacked['districts.shp'].slice().buffer,
			unpacked['districts.dbf'].slice().buffer,
			{ encoding: 'windows-1252' },
		);
		for (let row = await source.read(); !row.done; row = await source.read())
			rows.push(row.value as Area);
		expect(rows).toHaveLength(184);
		const codes = rows.map(({ properties }) => String(properties.CODE));
		const doubled = codes.filter((code, at) => codes.indexOf(code) !== at);
		expect([...new Set(doubled)]).toEqual(['0402', '0711', '1108']);
		// an untouched district, by the definition that proj4 has of EPSG:32625
		const row = rows[codes.indexOf('1004')].geometry.coordinates[0] as Position[];
		const clean = now.get('1004')?.geometry.coordinates[0] as Position[];
		const [lon, lat] = proj4('EPSG:32625', 'WGS84', row[0]);
		const off = clean.map(([x, y]) => Math.hypot(x - lon, y - lat));
		expect(Math.min(...off)).toBeLessThan(1e-8);
	});

	it('crosses itself in one district only, by GEOS', async () => {
		const unpacked = unzipSync(file('tavaroe-as-received.zip'));
		const source = await open(
			unpacked['districts.shp'].slice().buffer,
			unpacked['districts.dbf'].slice().buffer,
		);
		const broken: string[] = [];
		for (let row = await source.read(); !row.done; row = await source.read()) {
			const area = row.value as Area;
			if (geos.GEOSisValid(geometry(area)) !== 1) broken.push(String(area.properties.CODE));
		}
		expect(broken).toEqual(['0101']);
	});
});

it('both files come out byte for byte', () => {
	const districts = survey(shapeRepublic(21), 21);
	expect(nextYear(districts)).toBe(file('tavaroe-next-year.geojson').toString());
	expect(Buffer.compare(carelessOffice(districts), file('tavaroe-as-received.zip'))).toBe(0);
});
