import initGeosJs from 'geos-wasm';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { expect, it } from 'vitest';
import { bytesOf, conterminousStates } from '../support/atlas.ts';
import { accepted, pairsOf } from '../support/read-boundaries.ts';

/** Well-known text (OGC 06-103r4) of an area. */
function wkt({ geometry }: Feature<Polygon | MultiPolygon>): string {
	const ring = (points: number[][]) => `(${points.map(([x, y]) => `${x} ${y}`).join(',')})`;
	const part = (rings: number[][][]) => `(${rings.map(ring).join(',')})`;
	const parts = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
	return `MULTIPOLYGON(${parts.map(part).join(',')})`;
}

it('GEOS relates the western states as lines and points where we do', async () => {
	// GEOS (geos-wasm) compares two areas at a time by DE-9IM; it shares nothing with the matching of
	// segments here. In the matrix the fifth entry is the dimension of what the two outlines share.
	const west = new Set(['04', '06', '08', '16', '30', '32', '35', '41', '49', '53', '56']);
	const states = conterminousStates();
	states.features = states.features.filter((f) => west.has(String(f.id)));
	const geos = await initGeosJs();
	const reader = geos.GEOSWKTReader_create();
	const areas = states.features.map((feature) => {
		const text = wkt(feature);
		const pointer = geos.Module._malloc(text.length + 1);
		geos.Module.stringToUTF8(text, pointer, text.length + 1);
		return geos.GEOSWKTReader_read(reader, pointer);
	});
	const found: string[] = [];
	for (let i = 0; i < areas.length; i++) {
		for (let j = i + 1; j < areas.length; j++) {
			const matrix = geos.Module.UTF8ToString(geos.GEOSRelate(areas[i], areas[j]));
			const pair = [states.features[i].id, states.features[j].id].sort().join('-');
			if (matrix[4] === '1') found.push(`${pair} line`);
			if (matrix[4] === '0') found.push(`${pair} point`);
		}
	}
	expect(found).toHaveLength(22);
	expect(pairsOf(await accepted(bytesOf(states)))).toEqual(found.sort());
});
