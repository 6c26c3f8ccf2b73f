/**
 * Shapes, middles and travel of territories. The definitions of Polsby and Popper (1991) and of Reock
 * (1961) and the values that follow from them for a circle, a square and a triangle are from memory;
 * so is the constant of Johnson, McGeoch and Rothberg (1996) in the round of Beardwood, Halton and
 * Hammersley (1959). Lengths, areas, middles and circles are held against libraries that share nothing
 * with ours.
 */
import { geoCentroid, geoDistance } from 'd3-geo';
import geodesic from 'geographiclib-geodesic';
import initGeosJs from 'geos-wasm';
import type { FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { beforeAll, describe, expect, it } from 'vitest';
import { coverageToGeoJson } from '../../src/lib/engines/boundaries/index.ts';
import { buildGraph } from '../../src/lib/engines/graph/index.ts';
import {
	figures,
	unitGeometry,
	type TerritoryFigures,
	type TerritoryProblem,
	type UnitGeometry,
} from '../../src/lib/engines/territories/index.ts';
import { polsbyPopper, reock, roundKm } from '../../src/lib/engines/territories/shape.ts';
import { smallestCircle } from '../../src/lib/engines/territories/smallest-circle.ts';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { accepted, acceptedFeatures, box } from '../support/read-boundaries.ts';
import { territory } from '../support/small-territories.ts';

describe('shapes by their definitions', () => {
	it('a circle is 1 by both', () => {
		expect(polsbyPopper(Math.PI * 9, 6 * Math.PI)).toBeCloseTo(1, 12);
		expect(reock(Math.PI * 9, 3)).toBeCloseTo(1, 12);
	});

	it('a square is pi/4 and 2/pi', () => {
		const corners = Float64Array.of(0, 0, 2, 0, 2, 2, 0, 2);
		expect(polsbyPopper(4, 8)).toBeCloseTo(Math.PI / 4, 12);
		expect(reock(4, smallestCircle(corners, 4)?.radius ?? NaN)).toBeCloseTo(2 / Math.PI, 12);
	});

	it('an equilateral triangle is pi sqrt(3)/9 and 3 sqrt(3)/(4 pi)', () => {
		const root = Math.sqrt(3);
		const corners = Float64Array.of(0, 0, 2, 0, 1, root);
		expect(polsbyPopper(root, 6)).toBeCloseTo((Math.PI * root) / 9, 12);
		const { radius } = smallestCircle(corners, 3) ?? { radius: NaN };
		expect(reock(root, radius)).toBeCloseTo((3 * root) / (4 * Math.PI), 12);
	});

	it('a round through 100 places in 10,000 square kilometres is 712.4 km', () => {
		expect(roundKm(100, 10_000)).toBeCloseTo(712.4, 9);
	});
});

/** Figures of one territory of all units. */
function whole(geometry: UnitGeometry, base = -1): TerritoryFigures {
	const units = geometry.areaKm2.length;
	const problem: TerritoryProblem = {
		graph: buildGraph(units, [], []),
		measures: [],
		today: new Int32Array(units),
		territories: [territory({ base })],
		goal: 'fewest-moves',
		reach: null,
		seed: 0,
		effort: 'quick',
	};
	return figures(problem, problem.today, geometry).territories[0];
}

describe('shapes on the ellipsoid', () => {
	it('four small squares on the equator make one square', async () => {
		// degrees of longitude and latitude there: 111.3195 and 110.5743 km (WGS 84)
		const tall = (0.1 * 111.3195) / 110.5743;
		const { coverage } = await acceptedFeatures([
			box('a', 0, 0, 0.1, tall),
			box('b', 0.1, 0, 0.2, tall),
			box('c', 0, -tall, 0.1, 0),
			box('d', 0.1, -tall, 0.2, 0),
		]);
		const { shape, areaKm2, travel } = whole(unitGeometry(coverage), 0);
		const side = 0.2 * 111.3195;
		expect(areaKm2 / side ** 2).toBeCloseTo(1, 4);
		expect((shape?.perimeterKm ?? 0) / (4 * side)).toBeCloseTo(1, 4);
		expect(shape?.polsbyPopper).toBeCloseTo(Math.PI / 4, 4);
		expect(shape?.reock).toBeCloseTo(2 / Math.PI, 4);
		// from the middle of one small square to that of all and back
		expect((travel?.approachKm ?? 0) / (side / Math.SQRT2)).toBeCloseTo(1, 4);
		expect((travel?.roundKm ?? 0) / (0.7124 * 2 * side)).toBeCloseTo(1, 4);
	});

	it('an area across the 180th meridian is that of its twin elsewhere', async () => {
		const at = async (west: number) => {
			const middle = west + 1 > 180 ? west + 1 - 360 : west + 1;
			const east = west + 2 > 180 ? west + 2 - 360 : west + 2;
			const features = [box('a', west, 50, middle, 51), box('b', middle, 50, east, 51)];
			return whole(unitGeometry((await acceptedFeatures(features)).coverage), 0);
		};
		const [here, there] = [await at(10), await at(178.5)];
		expect(there.shape?.perimeterKm).toBeCloseTo(here.shape?.perimeterKm ?? NaN, 3);
		expect(there.shape?.reock).toBeCloseTo(here.shape?.reock ?? NaN, 6);
		expect(there.travel?.totalKm).toBeCloseTo(here.travel?.totalKm ?? NaN, 3);
	});
});

describe('the conterminous states', () => {
	const states = conterminousStates();
	let geometry: UnitGeometry;
	let keys: string[];
	let drawn: FeatureCollection<Polygon | MultiPolygon>;
	beforeAll(async () => {
		const { coverage } = await accepted(bytesOf(states));
		geometry = unitGeometry(coverage);
		keys = coverage.keys;
		drawn = coverageToGeoJson(coverage) as typeof drawn;
	});
	const featureOf = (key: string) => {
		const found = states.features.find(({ id }) => String(id) === key);
		if (!found) throw new Error(key);
		return found;
	};

	it('have the middles that d3-geo finds, to 2 km (it takes the globe for a sphere)', () => {
		keys.forEach((key, u) => {
			const [lon, lat] = geoCentroid(featureOf(key));
			const [x, y] = [geometry.at[2 * u], geometry.at[2 * u + 1]];
			expect(6371 * geoDistance([lon, lat], [x, y]), key).toBeLessThan(2);
		});
	});

	it('have outlines as long as those of GeographicLib', () => {
		keys.forEach((key, u) => {
			const { geometry: area } = drawn.features[u];
			const parts = area.type === 'Polygon' ? [area.coordinates] : area.coordinates;
			const metres = parts.flat().reduce((sum, ring) => sum + ringMetres(ring), 0);
			expect((geometry.outlineMetres?.[u] ?? 0) / metres, key).toBeCloseTo(1, 6);
		});
	});

	it('have smallest circles of the radius that GEOS finds on the plane', async () => {
		const geos = await initGeosJs();
		const reader = geos.GEOSWKTReader_create();
		for (const key of ['08', '56', '49', '04', '32']) {
			const outline = featureOf(key).geometry;
			if (outline.type !== 'Polygon') throw new Error(`${key} has several parts`);
			const [ring] = outline.coordinates;
			const text = `POLYGON((${ring.map(([x, y]) => `${x} ${y}`).join(',')}))`;
			const pointer = geos.Module._malloc(text.length + 1);
			geos.Module.stringToUTF8(text, pointer, text.length + 1);
			const radius = geos.Module._malloc(8);
			const area = geos.GEOSWKTReader_read(reader, pointer);
			geos.GEOSMinimumBoundingCircle(area, radius, 0);
			const theirs = geos.Module.getValue(radius, 'double');
			const ours = smallestCircle(Float64Array.from(ring.flat()), ring.length)?.radius;
			expect(ours, key).toBeCloseTo(theirs, 9);
		}
	});
});

function ringMetres(ring: number[][]): number {
	const line = geodesic.Geodesic.WGS84.Polygon(true);
	for (const [lon, lat] of ring) line.AddPoint(lat, lon);
	return line.Compute(false, true).perimeter;
}
