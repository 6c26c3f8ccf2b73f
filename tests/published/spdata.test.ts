import { readFileSync } from 'node:fs';
import { unzipSync } from 'fflate';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { open } from 'shapefile';
import { beforeAll, describe, expect, it } from 'vitest';
import { coverageFaults } from '../../src/lib/engines/boundaries/index.ts';
import { Geos, geosPairs } from '../support/geos.ts';
import { accepted, pairsOf } from '../support/read-boundaries.ts';

// Real shapefiles of statistical offices (tests/fixtures/spdata/README.md), related by GEOS in the plane of
// their own coordinates: two regions meet in a line (point) when their outlines share something of
// dimension 1 (0), exactly; rings that GEOS calls invalid are mended by it first, ring by ring.
let geos: Geos;
beforeAll(async () => {
	geos = await Geos.start();
});

const counted = (pairs: string[]) =>
	['line', 'point'].map((kind) => pairs.filter((pair) => pair.endsWith(kind)).length);

describe('506 census tracts of the Boston area', () => {
	it('have the 1,338 lines and 117 points that GEOS finds', async () => {
		const { features, zip } = await tracts('boston-tracts', 'TRACT');
		const { touching, overlapping } = geosPairs(geos, features);
		const read = await accepted(zip, { keyField: 'TRACT' });
		expect(features).toHaveLength(506);
		expect(counted(touching)).toEqual([1338, 117]);
		expect(overlapping).toEqual([]);
		expect(pairsOf(read)).toEqual(touching);
		expect(coverageFaults(read.coverage)).toEqual([]);
	});
});

describe('281 census tracts of New York State, some of them dirty', () => {
	it('have the 764 lines and 48 points that GEOS finds once it has mended five outlines', async () => {
		const { features, zip } = await tracts('ny8', 'AREAKEY');
		const { touching } = geosPairs(geos, features);
		const read = await accepted(zip, { keyField: 'AREAKEY' });
		expect(features.filter((one) => !geos.isValid(geos.area(one)))).toHaveLength(5);
		expect(counted(touching)).toEqual([764, 48]);
		expect(pairsOf(read)).toEqual(touching);
		expect(coverageFaults(read.coverage)).toEqual([]);
	});

	it('overlap or cross themselves where GEOS finds a common area wider than 2 cm', async () => {
		// The criteria differ: GEOS calls it an overlap when two interiors meet at all, also by less than the
		// 2 cm within which corners are taken for one here. Width: twice the area by the length round it. The
		// third pair shares a line that crosses itself: mending ring by ring, GEOS leaves the fold to both;
		// here it is told as outlines of both that cross themselves.
		const { features, zip } = await tracts('ny8', 'AREAKEY');
		const wide = geosPairs(geos, features).overlapping.filter(({ a, b }) => {
			const { area, outline } = geos.commonInPlane(a, b);
			return (2 * area) / outline > 0.02;
		});
		const read = await accepted(zip, { keyField: 'AREAKEY' });
		const told = (wanted: string) => read.findings.filter(({ code }) => code === wanted);
		const overlaps = told('overlap').map(({ regions }) => [...regions].sort().join('-'));
		expect(overlaps.sort()).toEqual(['36067002800-36067013200', '36067013000-36067013200']);
		const crossed = told('self-crossing').flatMap(({ regions }) => regions);
		expect(crossed.sort()).toEqual(['36007012101', '36007012202', '36067013200']);
		const folded = '36007012101-36007012202';
		expect(wide.map(({ pair }) => pair).sort()).toEqual([folded, ...overlaps]);
	});
});

async function tracts(name: string, key: string) {
	const path = new URL(`../fixtures/spdata/${name}.zip`, import.meta.url);
	const zip = new Uint8Array(readFileSync(path));
	const files = unzipSync(zip);
	const part = (ending: string) => {
		const file = Object.keys(files).find((one) => one.endsWith(ending));
		if (!file) throw new Error(`${name}.zip holds no ${ending}`);
		return files[file].slice().buffer;
	};
	const source = await open(part('.shp'), part('.dbf'));
	const features: Feature<Polygon | MultiPolygon>[] = [];
	for (;;) {
		const { done, value } = await source.read();
		if (done) return { features, zip };
		const area = value as Feature<Polygon | MultiPolygon>;
		features.push({ ...area, id: String(area.properties?.[key]) });
	}
}
