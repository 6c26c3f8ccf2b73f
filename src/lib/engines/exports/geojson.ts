import type { Coverage } from '../boundaries/coverage.ts';
import type { SheetRow } from '../sheet/index.ts';
import { polygonsOf } from './geojson-rings.ts';
import { propertiesOf } from './properties.ts';
import type { ExtraColumn } from './source.ts';

function featureOf(coverage: Coverage, row: SheetRow, columns: readonly ExtraColumn[]) {
	const polygons = polygonsOf(coverage, row.region);
	return {
		type: 'Feature',
		id: row.key,
		properties: propertiesOf(row, columns),
		geometry:
			polygons.length === 1
				? { type: 'Polygon', coordinates: polygons[0] }
				: { type: 'MultiPolygon', coordinates: polygons },
	};
}

/**
 * The coloured regions as GeoJSON (RFC 7946): one feature a line in region order, with the number of
 * the ink from 1 as in the legend, its name and its hex digits, and the further columns: territory,
 * class of a theme. Full geometry, not the sheet's.
 * Longitudes stay within -180 to 180. Byte for byte repeatable.
 */
export function exportGeoJson(
	coverage: Coverage,
	rows: SheetRow[],
	columns: readonly ExtraColumn[] = [],
): Uint8Array {
	const features = rows.map((row) => JSON.stringify(featureOf(coverage, row, columns)));
	const text = `{"type":"FeatureCollection","features":[\n${features.join(',\n')}\n]}\n`;
	return new TextEncoder().encode(text);
}
