import geodesic from 'geographiclib-geodesic';
import { mesh, neighbors } from 'topojson-client';
import { topology as topologyFrom } from 'topojson-server';
import type { GeometryCollection, MultiPolygon, Polygon } from 'topojson-specification';
import { describe, expect, it } from 'vitest';
import { borderKinds } from '../../src/lib/engines/borders/index.ts';
import { coverageFaults } from '../../src/lib/engines/boundaries/index.ts';
import { bytesOf, conterminousStates, topologyOf, usAtlas, worldAtlas } from '../support/atlas.ts';
import { accepted, metresOf, pairsOf } from '../support/read-boundaries.ts';
import { writeShapefileZip } from '../support/shapefile.ts';

const counted = (read: Awaited<ReturnType<typeof accepted>>) =>
	borderKinds.map((_, kind) => read.borders.kind.filter((k) => k === kind).length);

const wgs84 =
	'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]]';

describe('the 48 states and the District of Columbia', () => {
	// 49 vertices and 107 edges: the contiguous USA graph (D. E. Knuth, The Art of Computer Programming,
	// volume 4, fascicle 0, section 7; MathWorld, "Contiguous USA Graph"). The two point touches are the
	// diagonals of the four-state corner of Arizona, Colorado, New Mexico and Utah.
	const states = conterminousStates();

	it('have 107 line borders and 2 point touches as GeoJSON', async () => {
		const read = await accepted(bytesOf(states));
		expect(read.coverage.keys).toHaveLength(49);
		expect(counted(read)).toEqual([107, 2, 0, 0, 0]);
		expect(coverageFaults(read.coverage)).toEqual([]);
		expect(pairsOf(read).filter((pair) => pair.endsWith('point'))).toEqual([
			'04-08 point',
			'35-49 point',
		]);
	});

	it('and as a zipped shapefile', async () => {
		const features = states.features.map((f) => ({
			...f,
			properties: { fips: f.id, ...f.properties },
		}));
		const zip = writeShapefileZip({ features, prj: wgs84, name: 'states' });
		const read = await accepted(zip);
		expect(counted(read)).toEqual([107, 2, 0, 0, 0]);
		expect(pairsOf(read)).toEqual(pairsOf(await accepted(bytesOf(states))));
	});

	it('have border lengths as geographiclib measures the shared arcs, within a millionth', async () => {
		const read = await accepted(bytesOf(states));
		const topology = topologyOf('us-atlas', 'states-10m.json');
		const layer = topology.objects.states as GeometryCollection;
		const metres = metresOf(read);
		// A part of Delaware along the shore of New Jersey was squeezed to a line by the file's maker: its
		// shared arc is walked three times and has Delaware on both sides, so it is no border here.
		const squeezed = '10-34';
		let compared = 0;
		for (const pair of pairsOf(read).filter((p) => p.endsWith('line'))) {
			const [key, both] = [pair.split(' ')[0], new Set(pair.split(' ')[0].split('-'))];
			if (key === squeezed) continue;
			const shared = mesh(
				topology,
				layer,
				(p, q) => p !== q && both.has(String(p.id)) && both.has(String(q.id)),
			);
			expect(Math.abs(metres[key] / karney(shared.coordinates) - 1)).toBeLessThan(1e-6);
			compared++;
		}
		expect(compared).toBe(106);
	});
});

describe('countries of the world at 1:110 million', () => {
	it('have the 313 pairs that their shared arcs give', async () => {
		// Natural Earth by world-atlas; counted by topojson-client's neighbors over the file's own arcs.
		const topology = topologyOf('world-atlas', 'countries-110m.json');
		const layer = topology.objects.countries as GeometryCollection;
		const read = await accepted(bytesOf(worldAtlas('110m')));
		expect(counted(read)[0]).toBe(313);
		expect(counted(read)[0]).toBe(pairCount(neighbors(layer.geometries)));
	});
});

describe('the counties of the United States', () => {
	it('have the line borders that topojson-server and topojson-client find', async () => {
		const counties = usAtlas('counties');
		const read = await accepted(bytesOf(counties));
		const topology = topologyFrom({ counties });
		const layer = topology.objects.counties as GeometryCollection;
		const listed = neighbors(layer.geometries as (Polygon | MultiPolygon)[]);
		const keys = layer.geometries.map((g) => String(g.id));
		const theirs = new Set(
			listed.flatMap((list, i) =>
				list.filter((j) => j !== i).map((j) => [keys[i], keys[j]].sort().join('-')),
			),
		);
		const ours = new Set(
			pairsOf(read)
				.filter((p) => p.endsWith('line'))
				.map((p) => p.split(' ')[0]),
		);
		// The file's maker squeezed Falls Church (51610) and a spit of San Francisco (06075) to lines.
		// The library counts them as neighbours; a region without area has none here, and that is told.
		const squeezed = ['06001-06075', '51013-51610', '51059-51610'];
		expect([...theirs].filter((pair) => !ours.has(pair)).sort()).toEqual(squeezed);
		// Shared lines that cross leave a corner to San Joaquin and to Santa Clara county both, which no shared
		// arc shows; GEOS (geos-wasm) finds the same common area of 2,600 m².
		expect([...ours].filter((pair) => !theirs.has(pair))).toEqual(['06077-06085']);
		const told = read.findings.find(({ code }) => code === 'touch-without-width');
		for (const pair of squeezed) expect(told?.message).toContain(pair.replace('-', ' and '));
		expect(coverageFaults(read.coverage)).toEqual([]);
	});
});

/** Pairs of two different regions; a region whose outline doubles back on itself is listed as its own neighbour. */
const pairCount = (lists: number[][]) =>
	lists.reduce((sum, list, i) => sum + list.filter((j) => j !== i).length, 0) / 2;

function karney(lines: number[][][]): number {
	let metres = 0;
	for (const line of lines) {
		for (let i = 1; i < line.length; i++) {
			const [[x1, y1], [x2, y2]] = [line[i - 1], line[i]];
			metres += geodesic.Geodesic.WGS84.Inverse(y1, x1, y2, x2).s12 ?? NaN;
		}
	}
	return metres;
}
