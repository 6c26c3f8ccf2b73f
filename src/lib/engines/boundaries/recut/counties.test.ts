/** Counties of the U.S. Census Bureau (us-atlas), and a re-cut of them made here: what was done is known. */
import { mergeArcs, feature, neighbors } from 'topojson-client';
import type {
	GeometryCollection,
	MultiPolygon as TopoMultiPolygon,
	Polygon as TopoPolygon,
} from 'topojson-specification';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { describe, expect, it } from 'vitest';
import { bytesOf, topologyOf, usAtlas } from '../../../../../tests/support/atlas.ts';
import { accepted, collection } from '../../../../../tests/support/read-boundaries.ts';
import { checkMatch, matchRegions, type RegionMatch } from './index.ts';

const topology = topologyOf('us-atlas', 'counties-10m.json');
const geometries = (
	topology.objects.counties as GeometryCollection<{ name: string }>
).geometries.filter(({ id }) => id !== undefined) as ((TopoPolygon | TopoMultiPolygon) & {
	id: string;
})[];

/** Every 25th county is merged with a neighbour, every 25th renamed, every 100th left out. */
function recut() {
	const near = neighbors(geometries);
	const isTaken = new Set<number>();
	const told: string[] = [];
	const features: Feature[] = [];
	geometries.forEach((_, i) => {
		if (i % 25 !== 0) return;
		const other = near[i].find((j) => j % 25 > 1 && !isTaken.has(j));
		if (other === undefined || isTaken.has(i)) return;
		isTaken.add(i).add(other);
		const [key, pair] = [`M${i}`, [i, other]];
		const arcs = mergeArcs(
			topology,
			pair.map((at) => geometries[at]),
		);
		features.push({ ...(feature(topology, arcs) as Feature), id: key, properties: {} });
		told.push(`${pair.map((at) => geometries[at].id).sort()} > ${key}: merged`);
	});
	geometries.forEach((geometry, i) => {
		if (isTaken.has(i)) return;
		const one = feature(topology, geometry) as Feature<Polygon | MultiPolygon>;
		const key = i % 25 === 1 ? `N${i}` : geometry.id;
		if (i % 100 === 3) told.push(`${geometry.id} > : gone`);
		else features.push({ ...one, id: key, properties: {} });
		if (i % 25 === 1 && i % 100 !== 3) told.push(`${geometry.id} > ${key}: renamed`);
	});
	return { features, told: told.sort() };
}

const changed = ({ groups, before, after }: RegionMatch) =>
	groups
		.filter(({ outcome }) => outcome !== 'kept')
		.map((group) => {
			const from = group.before.map((r) => before.keys[r]).sort();
			return `${from} > ${group.after.map((r) => after.keys[r])}: ${group.outcome}`;
		})
		.sort();

describe('counties', async () => {
	const { features, told } = recut();
	const before = (await accepted(bytesOf(usAtlas('counties')))).coverage;
	const after = (await accepted(bytesOf(collection(features)))).coverage;

	it('are matched as they were re-cut', () => {
		const match = matchRegions(before, after);
		expect(told.length).toBeGreaterThan(200);
		expect(changed(match)).toEqual(told);
		expect(match.groups.filter(({ sure }) => !sure)).toEqual([]);
		expect(checkMatch(before, after, match, { sample: 100 })).toEqual([]);
	});
	it('are matched the other way round, and with every outline a little displaced', () => {
		expect(changed(matchRegions(after, before))).toHaveLength(told.length);
		const moved = {
			...after,
			arcPoints: after.arcPoints.map((value, i) => value + (i % 2 ? 0.002 : -0.003)),
		};
		const match = matchRegions(before, moved);
		expect(changed(match)).toEqual(told);
		expect(checkMatch(before, moved, match, { sample: 50 })).toEqual([]);
	});
});
