import { geoArea } from 'd3-geo';
import type { FeatureCollection, Geometry, MultiPolygon, Position } from 'geojson';
import { feature, neighbors } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import { describe, expect, it } from 'vitest';
import { topology as topologyFrom } from 'topojson-server';
import { bordersOf, coverageFrom } from '../../../../../tests/support/coverage.ts';
import { sheetOf, statesCoverage, worldCoverage } from '../../../../../tests/support/sheets.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import { drawSheet, sheetTable } from '../../sheet/index.ts';
import { exportGeoJson } from '../geojson.ts';
import { exportTopoJson } from './topojson.ts';

type Regions = GeometryCollection<Record<string, unknown>>;

const columns = (coverage: Coverage) => [
	{
		...{ id: 'territory', heading: 'territory', kind: 'text' as const },
		values: coverage.keys.map((_, i) => (i % 3 ? `T${i % 5}` : null)),
	},
];

function filesOf(coverage: Coverage, steps: number) {
	const sheet = sheetOf(coverage);
	const rows = sheetTable(drawSheet(sheet), coverage, sheet.groups);
	const bytes = exportTopoJson(coverage, rows, columns(coverage), steps);
	const text = (file: Uint8Array) => new TextDecoder().decode(file);
	const topology: Topology<{ regions: Regions }> = JSON.parse(text(bytes));
	const geojson: FeatureCollection = JSON.parse(
		text(exportGeoJson(coverage, rows, columns(coverage))),
	);
	// read by topojson-client 3.1.0, which shares nothing with the writer
	const read = feature(topology, topology.objects.regions) as FeatureCollection;
	return { bytes, topology, geojson, read, rows };
}

const ringsOf = (geometry: Geometry): Position[][] =>
	geometry.type === 'Polygon'
		? geometry.coordinates
		: (geometry as MultiPolygon).coordinates.flat();

/** The farthest that places of one line lie from those of another, in degrees, both walked in order. */
function farthest(line: Position[], given: Position[]): number {
	let [far, at] = [0, 0];
	const away = ([x, y]: Position, from: Position) =>
		Math.max(Math.abs(x - from[0]), Math.abs(y - from[1]));
	for (const place of line) {
		let least = Infinity;
		for (let to = at; to < given.length && to < at + 50; to++) {
			const distance = away(place, given[to]);
			if (distance < least) [least, at] = [distance, to];
		}
		far = Math.max(far, least);
	}
	return far;
}

describe('TopoJSON of the states', () => {
	const coverage = statesCoverage();
	const { bytes, topology, geojson, read, rows } = filesOf(coverage, 1_000_000);
	const quantum = topology.transform!.scale[0];

	it('has the properties and ids of the GeoJSON file', () => {
		expect(read.features.map(({ id }) => id)).toEqual(coverage.keys);
		expect(read.features.map(({ properties }) => properties)).toEqual(
			geojson.features.map(({ properties }) => properties),
		);
	});

	it('lies within a step of the GeoJSON file, place by place', () => {
		read.features.forEach(({ geometry }, i) => {
			const [found, given] = [ringsOf(geometry), ringsOf(geojson.features[i].geometry)];
			expect(found.length).toBe(given.length);
			found.forEach((ring, at) => {
				expect(farthest(ring, given[at])).toBeLessThan(quantum);
			});
		});
	});

	it('has the neighbours that our borders of lines name', () => {
		const { a, b, kind } = bordersOf(coverage);
		const lists: number[][] = coverage.keys.map(() => []);
		a.forEach((one, border) => {
			if (kind[border] !== 0) return;
			lists[one].push(b[border]);
			lists[b[border]].push(one);
		});
		// a state that has one arc on both sides, as around a cut-out pond, counts as its own neighbour there
		const found = neighbors(topology.objects.regions.geometries).map((list, region) =>
			list.filter((other) => other !== region),
		);
		expect(found).toEqual(lists.map((list) => list.sort((x, y) => x - y)));
	});

	it('uses every arc, and is the same every time', () => {
		const arcs = topology.objects.regions.geometries.flatMap(
			(one) => (one as unknown as { arcs: number[][] }).arcs.flat(2) as number[],
		);
		const used = new Set(arcs.map((signed) => (signed < 0 ? ~signed : signed)));
		expect(used.size).toBe(topology.arcs.length);
		expect(exportTopoJson(coverage, rows, columns(coverage), 1_000_000)).toEqual(bytes);
	});
});

describe('TopoJSON of the world', () => {
	const coverage = worldCoverage();
	const { topology, geojson, read } = filesOf(coverage, 10_000_000);

	it('stays within 180 degrees and keeps areas, by d3-geo', () => {
		for (const arc of read.features.flatMap(({ geometry }) => ringsOf(geometry))) {
			expect(arc.every(([lon, lat]) => Math.abs(lon) <= 180 + 1e-9 && Math.abs(lat) <= 90)).toBe(
				true,
			);
			// the supplier's Antarctica runs along the pole, where all longitudes are one place
			const off = arc.filter(([, lat]) => lat > -90);
			const steps = off.slice(1).map(([lon], i) => Math.abs(lon - off[i][0]));
			if (off.length === arc.length) expect(Math.max(...steps)).toBeLessThanOrEqual(180);
		}
		const area = (geometry: Geometry) => {
			const turned = ringsOf(geometry).map((ring) => ring.toReversed());
			return geometry.type === 'Polygon' ? geoArea({ type: 'Polygon', coordinates: turned }) : 0;
		};
		read.features.forEach((one, i) => {
			const [found, given] = [area(one.geometry), area(geojson.features[i].geometry)];
			expect(Math.abs(found - given)).toBeLessThan(1e-6);
			expect(one.geometry.type).toBe(geojson.features[i].geometry.type);
		});
	});

	it('keeps Russia beside all that it touches, though it is cut', () => {
		const names = read.features.map(({ properties }) => properties!.name as string);
		const russia = names.indexOf('Russia');
		const { a, b, kind } = bordersOf(coverage);
		const beside = [...a.keys()].flatMap((border) => {
			if (kind[border] !== 0) return [];
			return a[border] === russia ? [b[border]] : b[border] === russia ? [a[border]] : [];
		});
		const found = neighbors(topology.objects.regions.geometries)[russia];
		expect(found.map((one) => names[one])).toEqual(
			beside.sort((x, y) => x - y).map((one) => names[one]),
		);
		expect(beside.length).toBeGreaterThan(10);
		const lons = ringsOf(read.features[russia].geometry).flatMap((ring) =>
			ring.map(([lon]) => lon),
		);
		expect(lons.filter((lon) => lon < 0).every((lon) => lon < -169)).toBe(true);
		expect(lons.filter((lon) => lon > 0).every((lon) => lon > 19)).toBe(true);
	});
});

describe('regions across 180 degrees', () => {
	const square = (south: number, north: number) => ({
		...{ type: 'Feature' as const, properties: { name: `${south}` } },
		geometry: {
			type: 'Polygon' as const,
			coordinates: [
				[175, 184]
					.flatMap((lon) => [[lon, south]])
					.concat([
						[184, north],
						[175, north],
						[175, south],
					]),
			],
		},
	});
	const squares = {
		type: 'FeatureCollection' as const,
		features: [square(10, 20), square(20, 30)],
	};
	const coverage = coverageFrom(topologyFrom({ regions: squares }) as Topology, 'regions', {
		key: (_, _id, index) => `${index}`,
	});
	const { topology, read, geojson } = filesOf(coverage, 1_000_001);

	it('are cut there and still share the line between them', () => {
		expect(neighbors(topology.objects.regions.geometries)).toEqual([[1], [0]]);
		const boxes = read.features.map(({ geometry }) => ringsOf(geometry).map(boxOf).sort());
		expect(boxes[0]).toEqual([
			[-180, 10, -176, 20],
			[175, 10, 180, 20],
		]);
		expect(boxes).toEqual(
			geojson.features.map(({ geometry }) => ringsOf(geometry).map(boxOf).sort()),
		);
	});
});

const boxOf = (ring: Position[]): number[] =>
	[Math.min, Math.max]
		.flatMap((most) => [0, 1].map((axis) => most(...ring.map((place) => place[axis]))))
		.map((value) => Math.round(value * 1e3) / 1e3);
