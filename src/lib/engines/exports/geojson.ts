import type { Coverage } from '../boundaries/coverage.ts';
import type { SheetRow } from '../sheet/index.ts';
import { polygonsOf } from './geojson-rings.ts';

function featureOf(coverage: Coverage, row: SheetRow) {
	const polygons = polygonsOf(coverage, row.region);
	const { key, name, group, inkNumber, inkName, hex, theme } = row;
	return {
		type: 'Feature',
		id: key,
		properties: { key, name, group, inkNumber, inkName, hex, ...theme },
		geometry:
			polygons.length === 1
				? { type: 'Polygon', coordinates: polygons[0] }
				: { type: 'MultiPolygon', coordinates: polygons },
	};
}

/**
 * The coloured regions as GeoJSON (RFC 7946): one feature a line in region order, with the number of
 * the ink from 1 as in the legend, its name and its hex digits, and of a themed sheet class and range. Full geometry, not the sheet's.
 * Longitudes stay within -180 to 180. Byte for byte repeatable.
 */
export function exportGeoJson(coverage: Coverage, rows: SheetRow[]): Uint8Array {
	const features = rows.map((row) => JSON.stringify(featureOf(coverage, row)));
	const text = `{"type":"FeatureCollection","features":[\n${features.join(',\n')}\n]}\n`;
	return new TextEncoder().encode(text);
}
