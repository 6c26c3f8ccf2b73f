/** Areas by GEOS (npm geos-wasm), in square degrees; a second way beside the engines' own. */
import initGeosJs from 'geos-wasm';
import { geojsonToGeosGeom } from 'geos-wasm/helpers';
import type { Feature, MultiPolygon, Polygon } from 'geojson';

type Area = Feature<Polygon | MultiPolygon>;

const quiet = { errorHandler: () => undefined, noticeHandler: () => undefined };

/** The parts of an area, each a polygon. */
export const partsOf = (geometry: Polygon | MultiPolygon): Polygon[] =>
	geometry.type === 'Polygon'
		? [geometry]
		: geometry.coordinates.map((coordinates) => ({ type: 'Polygon', coordinates }));

/** Area of the union of all parts, each made valid first, and the sum of the features' own areas. */
export async function unionAndSum(features: Area[]): Promise<{ union: number; sum: number }> {
	const geos = await initGeosJs(quiet);
	const areaOf = (shape: number) => {
		const place = geos.Module._malloc(8);
		geos.GEOSArea(shape, place);
		const area = geos.Module.HEAPF64[place / 8];
		geos.Module._free(place);
		return area;
	};
	let all = 0;
	let sum = 0;
	for (const { geometry } of features) {
		const shape = geos.GEOSMakeValid(geojsonToGeosGeom(geometry, geos));
		sum += areaOf(shape);
		for (const part of partsOf(geometry)) {
			const valid = geos.GEOSMakeValid(geojsonToGeosGeom(part, geos));
			all = all ? geos.GEOSUnion(all, valid) : valid;
		}
	}
	return { union: areaOf(all), sum };
}

/** Whether GEOS takes each feature for a valid area (OGC 06-103r4, 6.1.11). */
export async function allValid(features: Area[]): Promise<boolean> {
	const geos = await initGeosJs(quiet);
	return features.every(
		({ geometry }) => geos.GEOSisValid(geojsonToGeosGeom(geometry, geos)) === 1,
	);
}
