import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { beforeAll, describe, expect, it } from 'vitest';
import { bytesOf, conterminousStates, usAtlas } from '../support/atlas.ts';
import { Geos, geosPairs } from '../support/geos.ts';
import { accepted, acceptedFeatures, box, metresOf, pairsOf } from '../support/read-boundaries.ts';

// GEOS (geos-wasm) compares two areas at a time by DE-9IM in the plane of longitude and latitude; it shares
// nothing with the matching of segments here. Its criterion: two areas meet in a line (point) when their
// outlines share something of dimension 1 (0), exactly; an overlap is a common interior.
let geos: Geos;
beforeAll(async () => {
	geos = await Geos.start();
});

const only = <F extends { features: Feature<Polygon | MultiPolygon>[] }>(
	areas: F,
	wanted: (id: string) => boolean,
): F => ({ ...areas, features: areas.features.filter((f) => wanted(String(f.id))) });

describe('GEOS relates real regions as we do', () => {
	it('the western states', async () => {
		const west = new Set(['04', '06', '08', '16', '30', '32', '35', '41', '49', '53', '56']);
		const states = only(conterminousStates(), (id) => west.has(id));
		const { touching } = geosPairs(geos, states.features);
		expect(touching).toHaveLength(22);
		expect(pairsOf(await accepted(bytesOf(states)))).toEqual(touching);
	});

	it('the counties round the four-state corner, with their border lengths', async () => {
		const counties = only(usAtlas('counties'), (id) => /^(04|08|35|49)/.test(id));
		const { touching, overlapping, lines } = geosPairs(geos, counties.features);
		const read = await accepted(bytesOf(counties));
		expect(counties.features).toHaveLength(141);
		expect(overlapping).toEqual([]);
		expect(touching.filter((pair) => pair.endsWith('line')).length).toBeGreaterThan(350);
		expect(pairsOf(read)).toEqual(touching);
		const metres = metresOf(read);
		for (const { pair, a, b } of lines) {
			expect(Math.abs(metres[pair] / geos.sharedMetres(a, b) - 1), pair).toBeLessThan(1e-6);
		}
	});

	it('the counties of New England, with islands and lakes', async () => {
		const counties = only(usAtlas('counties'), (id) => /^(09|23|25|33|44|50)/.test(id));
		const { touching } = geosPairs(geos, counties.features);
		expect(touching.length).toBeGreaterThan(100);
		expect(pairsOf(await accepted(bytesOf(counties)))).toEqual(touching);
	});
});

describe('GEOS on dirty files', () => {
	it('finds the same pairs where corners lie on the edges of others', async () => {
		// The edges are level or upright, so that a corner on them is exactly on them for GEOS too.
		const features = [
			box('a', 0, 50, 2, 51),
			box('b', 0, 51, 1, 52),
			box('c', 1, 51, 2, 52),
			box('d', 2, 50.25, 3, 51.5),
			box('e', 2, 51.5, 3, 52),
		];
		const { touching, lines } = geosPairs(geos, features);
		const read = await acceptedFeatures(features);
		expect(pairsOf(read)).toEqual(touching);
		const metres = metresOf(read);
		for (const { pair, a, b } of lines) {
			// an edge that GEOS keeps whole is noded here, and a level line is no geodesic
			expect(Math.abs(metres[pair] / geos.sharedMetres(a, b) - 1), pair).toBeLessThan(1e-4);
		}
	});

	it('finds the same pairs in noise once its coordinates are rounded', async () => {
		// The criteria differ: GEOS compares to the last bit and calls these apart or overlapping, we take
		// corners within 2 cm for one. On a grid of a millionth of a degree (11 cm) both say the same.
		const counties = only(usAtlas('counties'), (id) => /^(09|44)/.test(id));
		const clean = onGrid(counties.features, () => 0);
		const noisy = onGrid(counties.features, noise);
		const { touching } = geosPairs(geos, clean);
		expect(geosPairs(geos, noisy).touching).not.toEqual(touching);
		expect(geosPairs(geos, noisy, 1e-6).touching).toEqual(touching);
		expect(pairsOf(await acceptedFeatures(noisy))).toEqual(touching);
	});

	it('finds the same overlaps, of the same size', async () => {
		// The criteria differ: for GEOS the outlines of two overlapping boxes share points; here the overlap
		// counts as a line between them and is told.
		const features = [
			box('a', 0, 50, 1, 51),
			box('b', 0.9, 50.2, 2, 50.8),
			box('c', 2, 50, 3, 51),
			box('d', 2.4, 50.4, 2.6, 50.6),
		];
		const { overlapping } = geosPairs(geos, features);
		const read = await acceptedFeatures(features);
		const told = read.findings.filter(({ code }) => code === 'overlap');
		expect(overlapping.map(({ pair }) => pair)).toEqual(['a-b', 'c-d']);
		expect(told.map(({ regions }) => regions.join('-')).sort()).toEqual(['a-b', 'c-d']);
		expect(pairsOf(read)).toEqual(['a-b line', 'b-c line', 'c-d line']);
		for (const { pair, a, b } of overlapping) {
			const { message } = told.find(({ regions }) => regions.join('-') === pair) ?? { message: '' };
			const [, said] = /overlap by ([\d.,]+) km²/.exec(message) ?? [];
			const km2 = geos.commonKm2(a, b);
			expect(Math.abs(Number(said.replace(',', '')) / km2 - 1), message).toBeLessThan(0.05);
		}
	});
});

/** Coordinates rounded to a thousandth of a degree and then moved a little. */
function onGrid(features: Feature<Polygon | MultiPolygon>[], aside: (i: number) => number) {
	let i = 0;
	const moved = (value: number) => Math.round(value * 1000) / 1000 + aside(i++);
	const ring = (points: number[][]) => {
		const open = points.slice(0, -1).map(([x, y]) => [moved(x), moved(y)]);
		return [...open, open[0]];
	};
	return features.map(({ id, geometry }): Feature<MultiPolygon> => {
		const parts = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
		const coordinates = parts.map((rings) => rings.map(ring));
		return { type: 'Feature', id, properties: {}, geometry: { type: 'MultiPolygon', coordinates } };
	});
}

/** Up to a ten-millionth of a degree, about 1 cm, either way. */
const noise = (i: number) => (((i * 7919) % 2001) - 1000) * 5e-11;
