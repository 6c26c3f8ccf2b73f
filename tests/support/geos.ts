import initGeosJs from 'geos-wasm';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import geodesic from 'geographiclib-geodesic';

/** What GEOS finds of two areas in the plane of their coordinates. */
export interface Related {
	/** entries of the DE-9IM matrix: T of interiors, and the dimension of what the outlines share */
	interiors: string;
	outlines: string;
}

/** `GEOS_MAKE_VALID_STRUCTURE` of the GEOS C API: rings are mended one by one, then holes are cut out. */
const byStructure = 1;

/** GEOS by geos-wasm: an independent second way that shares nothing with the matching of segments here. */
export class Geos {
	private constructor(private geos: Awaited<ReturnType<typeof initGeosJs>>) {}

	static async start(): Promise<Geos> {
		return new Geos(await initGeosJs());
	}

	/** `grid`: coordinates are rounded to it first, in degrees. */
	area(feature: Feature<Polygon | MultiPolygon>, grid = 0): number {
		const { geos } = this;
		const text = wkt(feature);
		const pointer = geos.Module._malloc(text.length + 1);
		geos.Module.stringToUTF8(text, pointer, text.length + 1);
		const read = geos.GEOSWKTReader_read(geos.GEOSWKTReader_create(), pointer);
		geos.Module._free(pointer);
		return grid ? geos.GEOSGeom_setPrecision(read, grid, 0) : read;
	}

	isValid(area: number): boolean {
		return Number(this.geos.GEOSisValid(area)) === 1;
	}

	/** The same area without self-crossings and without parts of no width. */
	madeValid(area: number): number {
		const { geos } = this;
		if (this.isValid(area)) return area;
		const params = geos.GEOSMakeValidParams_create();
		geos.GEOSMakeValidParams_setMethod(params, byStructure);
		geos.GEOSMakeValidParams_setKeepCollapsed(params, 0);
		return geos.GEOSMakeValidWithParams(area, params);
	}

	related(a: number, b: number): Related | null {
		const matrix = this.geos.Module.UTF8ToString(this.geos.GEOSRelate(a, b));
		if (matrix.length !== 9) return null;
		return { interiors: matrix[0], outlines: matrix[4] };
	}

	/** Metres of what the outlines share, by Karney's geodesics. */
	sharedMetres(a: number, b: number): number {
		const { geos } = this;
		const lines = geos.GEOSIntersection(geos.GEOSBoundary(a), geos.GEOSBoundary(b));
		let metres = 0;
		for (const line of this.lists(lines).filter((points) => points.length > 1)) {
			line.slice(1).forEach(([x2, y2], i) => {
				const [x1, y1] = line[i];
				metres += geodesic.Geodesic.WGS84.Inverse(y1, x1, y2, x2).s12 ?? NaN;
			});
		}
		return metres;
	}

	/** Square kilometres of what two areas have in common, by Karney's polygon area; holes are not looked for. */
	commonKm2(a: number, b: number): number {
		let km2 = 0;
		for (const ring of this.lists(this.geos.GEOSIntersection(a, b))) {
			if (ring.length < 4) continue;
			const polygon = geodesic.Geodesic.WGS84.Polygon(false);
			for (const [x, y] of ring.slice(1)) polygon.AddPoint(y, x);
			km2 += Math.abs(polygon.Compute(false, true).area ?? NaN) / 1e6;
		}
		return km2;
	}

	/** Common area in square units of the coordinates and the length around it. */
	commonInPlane(a: number, b: number): { area: number; outline: number } {
		let [area, outline] = [0, 0];
		for (const ring of this.lists(this.geos.GEOSIntersection(a, b))) {
			if (ring.length < 4) continue;
			let turned = 0;
			for (let i = 1; i < ring.length; i++) {
				const [x1, y1, x2, y2] = [...ring[i - 1], ...ring[i]];
				turned += (x1 - ring[0][0]) * (y2 - ring[0][1]) - (x2 - ring[0][0]) * (y1 - ring[0][1]);
				outline += Math.hypot(x2 - x1, y2 - y1);
			}
			area += Math.abs(turned) / 2;
		}
		return { area, outline };
	}

	/** The lists of points in a geometry's well-known text. */
	private lists(geometry: number): number[][][] {
		const { geos } = this;
		const writer = geos.GEOSWKTWriter_create();
		geos.GEOSWKTWriter_setRoundingPrecision(writer, 17);
		const text = geos.Module.UTF8ToString(geos.GEOSWKTWriter_write(writer, geometry));
		return (text.match(/\([^()]+\)/g) ?? []).map((list) =>
			list
				.slice(1, -1)
				.split(',')
				.map((point) => point.trim().split(' ').map(Number)),
		);
	}
}

/** Well-known text (OGC 06-103r4) of an area. */
function wkt({ geometry }: Feature<Polygon | MultiPolygon>): string {
	const ring = (points: number[][]) => `(${points.map(([x, y]) => `${x} ${y}`).join(',')})`;
	const part = (rings: number[][][]) => `(${rings.map(ring).join(',')})`;
	const parts = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;
	return `MULTIPOLYGON(${parts.map(part).join(',')})`;
}

type Areas = Feature<Polygon | MultiPolygon>[];

/** "a-b line" or "a-b point" for every two areas that GEOS relates so, sorted; overlaps apart. */
export function geosPairs(geos: Geos, features: Areas, grid = 0) {
	const areas = features.map((feature) => geos.madeValid(geos.area(feature, grid)));
	const boxes = features.map(boxOf);
	const touching: string[] = [];
	const overlapping: { pair: string; a: number; b: number }[] = [];
	const lines: { pair: string; a: number; b: number }[] = [];
	for (let i = 0; i < areas.length; i++) {
		for (let j = i + 1; j < areas.length; j++) {
			if (!boxesMeet(boxes[i], boxes[j])) continue;
			const related = geos.related(areas[i], areas[j]);
			const pair = [features[i].id, features[j].id].map(String).sort().join('-');
			const both = { pair, a: areas[i], b: areas[j] };
			if (related === null) throw new Error(`GEOS cannot relate ${pair}`);
			if (related.interiors === '2') overlapping.push(both);
			else if (related.outlines === '1') lines.push(both);
			if (related.outlines === '1') touching.push(`${pair} line`);
			else if (related.outlines === '0') touching.push(`${pair} point`);
		}
	}
	return { touching: touching.sort(), overlapping, lines };
}

function boxOf({ geometry }: Areas[number]): [number, number, number, number] {
	const points = geometry.coordinates.flat(geometry.type === 'Polygon' ? 1 : 2) as number[][];
	const xs = points.map(([x]) => x);
	const ys = points.map(([, y]) => y);
	return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)];
}

function boxesMeet(a: number[], b: number[]): boolean {
	const near = 1e-6;
	return a[0] <= b[2] + near && b[0] <= a[2] + near && a[1] <= b[3] + near && b[1] <= a[3] + near;
}
